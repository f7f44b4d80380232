package blochbound.casefile;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import blochbound.model.Ball;
import blochbound.model.DesignCase;
import blochbound.model.Scalar;
import java.math.BigDecimal;
import java.util.List;
import org.junit.jupiter.api.Test;

/** What the sections of a case may leave out, and how the ball and the dynamics are read. */
class SectionReaderTest {
  private static Ball ball(String ball) throws CaseFaultException {
    return CaseText.dimensionless()
        .set("parameters", "{x: {nominal: 2, tolerance: 1}, y: {nominal: 5, tolerance: 1}}")
        .set("ball", ball)
        .read()
        .device()
        .ball();
  }

  @Test
  void ballsAreRead() throws CaseFaultException {
    assertEquals(Ball.unitBox(), CaseText.pair().read().device().ball());
    assertEquals(Ball.unitBox(), ball("{}"));
    assertEquals(
        new Ball(Ball.Norm.DIAMOND, new BigDecimal("0.50"), List.of()),
        ball("{norm: 1, radius: 0.50}"));
    assertEquals(
        new Ball(Ball.Norm.BOX, BigDecimal.ZERO, List.of()), ball("{norm: inf, radius: 0}"));
    assertEquals(
        new Ball(
            Ball.Norm.ELLIPSOID,
            BigDecimal.ONE,
            List.of(new Ball.Correlation(1, 0, new BigDecimal("-0.6")))),
        ball("{norm: 2, correlations: [{between: [y, x], value: -0.6}]}"));
  }

  @Test
  void onlyOneOfHamiltonianAndJumpsIsNeeded() throws CaseFaultException {
    DesignCase quiet = CaseText.pair().without("hamiltonian").read();
    assertTrue(quiet.device().hamiltonian().terms().isEmpty());
    assertEquals(4, quiet.device().hamiltonian().dimension());
    assertEquals(List.of(), CaseText.pair().without("jumps").read().device().jumps());
    assertEquals("", quiet.title());
    assertTrue(quiet.target().isEmpty());
  }

  @Test
  void parametersMayBeAbsent() throws CaseFaultException {
    DesignCase fixed =
        CaseText.pair()
            .without("parameters")
            .set("hamiltonian", "3 kHz * Z@a")
            .set("jumps", "[{rate: 0.1 /us, operator: lower@a}]")
            .read();
    assertEquals(List.of(), fixed.device().parameters());
  }

  @Test
  void ratesMayBeReciprocalTimes() throws CaseFaultException {
    DesignCase read =
        CaseText.pair()
            .set("parameters", "{g: {nominal: 2 /us}, T1: {nominal: 30 us, tolerance: 10 %}}")
            .set("jumps", "[{rate: 1/T1, operator: lower@a}, {operator: lower@b / sqrt(T1)}]")
            .read();
    assertEquals(Scalar.parameter(1).reciprocal(), read.device().jumps().get(0).rate());
    assertEquals(Scalar.ONE, read.device().jumps().get(1).rate());
  }

  @Test
  void zeroHasEveryDimension() throws CaseFaultException {
    DesignCase read = CaseText.pair().set("hamiltonian", "0").read();
    assertTrue(read.device().hamiltonian().terms().isEmpty());
    CaseText.pair().set("hamiltonian", "0 + g * Z@a").read();
  }

  @Test
  void sitesMayBeNumberedOrLabelledAndOneIsEnough() throws CaseFaultException {
    DesignCase read =
        CaseText.pair()
            .set("sites", "{a: {levels: 3}}")
            .set("hamiltonian", "g * |2><2|")
            .set("jumps", "[]")
            .read();
    assertEquals(List.of("0", "1", "2"), read.device().space().sites().get(0).levels());
    assertEquals(
        1,
        CaseText.pair()
            .set("sites", "{a: {levels: [g]}}")
            .set("hamiltonian", "g")
            .set("jumps", "[]")
            .read()
            .device()
            .space()
            .dimension());
  }
}
