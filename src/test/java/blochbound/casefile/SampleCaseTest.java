package blochbound.casefile;

import static blochbound.casefile.Matrices.assertClose;
import static blochbound.casefile.Matrices.assertContains;
import static blochbound.casefile.Matrices.at;
import static blochbound.casefile.Matrices.real;
import static blochbound.casefile.Matrices.row;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertInstanceOf;
import static org.junit.jupiter.api.Assertions.assertTrue;

import blochbound.interval.ExactNumber;
import blochbound.linalg.ComplexMatrix;
import blochbound.model.Ball;
import blochbound.model.DesignCase;
import blochbound.model.Distribution;
import blochbound.model.Jump;
import blochbound.model.MeasureSpec;
import blochbound.model.Parameter;
import blochbound.model.Requirement;
import blochbound.model.Scalar;
import blochbound.model.StateSpec;
import blochbound.model.When;
import java.math.BigDecimal;
import java.util.List;
import org.apache.commons.math3.fraction.BigFraction;
import org.junit.jupiter.api.BeforeAll;
import org.junit.jupiter.api.Test;

/** The pump-stabilised pair of the format description, read as a whole. */
class SampleCaseTest {
  static final String TEXT =
      """
      format: blochbound-case/1
      title: "Parity-pumped emitter pair, lot tolerance check"
      timeUnit: us                       # internal unit
      sites:
        left:  {levels: [g, e]}
        right: {levels: [g, e]}
      parameters:
        pumpParity: {nominal: 1.0 /us,  tolerance: 20 %}
        pumpPhase:  {nominal: 1.0 /us,  tolerance: 20 %}
        decayLeft:  {nominal: 0.02 /us, range: [0.01 /us, 0.03 /us]}
        decayRight: {nominal: 0.02 /us, range: [0.01 /us, 0.03 /us]}
        shiftLeft:  {nominal: 0 kHz,    tolerance: 8 kHz, distribution: normal, sigma: 3 kHz}
      operators:
        odd:   (1 - Z@left * Z@right) / 2
        minus: (1 - X@left * X@right) / 2
      hamiltonian: "shiftLeft * |e><e|@left"
      jumps:
        - {rate: pumpParity, operator: X@left * odd}
        - {rate: pumpPhase,  operator: Z@left * minus}
        - {rate: decayLeft,  operator: lower@left}
        - {rate: decayRight, operator: lower@right}
      target: "(|g,g> + |e,e>) / sqrt(2)"
      ball: {norm: inf, radius: 1}
      requirements:
        - {name: entangled, measure: "concurrence(left, right)", atLeast: 0.90}
        - {name: on target, measure: fidelity, atLeast: 0.94}
        - {name: quick,     measure: gap, atLeast: 0.3 /us}
        - {name: in time,   measure: fidelity, at: 12 us, start: "|g,g>", atLeast: 0.94}
      """;

  private static DesignCase read;

  @BeforeAll
  static void readSample() throws CaseFaultException {
    read = CaseText.read(TEXT);
  }

  @Test
  void titleTimeUnitAndSitesAreAsWritten() {
    assertEquals("Parity-pumped emitter pair, lot tolerance check", read.title());
    assertEquals("us", read.timeUnit());
    assertEquals(List.of("g", "e"), read.device().space().sites().get(1).levels());
    assertEquals(4, read.device().space().dimension());
    assertEquals(Ball.unitBox(), read.device().ball());
  }

  @Test
  void parametersKeepExactDecimalsInTheirOwnUnits() {
    List<Parameter> p = read.device().parameters();
    assertEquals(
        List.of("pumpParity", "pumpPhase", "decayLeft", "decayRight", "shiftLeft"),
        p.stream().map(Parameter::name).toList());
    // [closed form] 1.0 -+ 20 % is 0.8 to 1.2
    assertDecimal("0.8", p.get(0).lower());
    assertDecimal("1.2", p.get(0).upper());
    assertEquals("/us", p.get(0).unit().symbol());
    assertDecimal("0.02", p.get(2).nominal());
    assertDecimal("0.01", p.get(2).lower());
    assertDecimal("0.03", p.get(2).upper());
    assertDecimal("-8", p.get(4).lower());
    assertDecimal("8", p.get(4).upper());
    assertEquals(new Distribution.Normal(3), p.get(4).distribution());
    assertEquals(new Distribution.Uniform(), p.get(0).distribution());
  }

  @Test
  void kilohertzCountCyclesInTheInternalUnit() {
    // [closed form] 1 kHz = 2 pi 1e3 / s = (2 pi / 1000) / us
    assertEquals(
        new ExactNumber(new BigFraction(1, 500), 1),
        read.device().parameters().get(4).unit().factor());
  }

  @Test
  void hamiltonianShiftsTheSecondLevelOfTheFirstSite() {
    // [closed form] |e><e| x 1 with the first site most significant
    ComplexMatrix expected =
        real(row(0, 0, 0, 0), row(0, 0, 0, 0), row(0, 0, 3, 0), row(0, 0, 0, 3));
    assertClose(expected, at(read.device().hamiltonian(), 1, 1, 1, 1, 3));
  }

  @Test
  void jumpsAreTheDeclaredOperators() {
    List<Jump> jumps = read.device().jumps();
    assertEquals(4, jumps.size());
    for (int k = 0; k < 4; k++) {
      assertEquals(Scalar.parameter(k), jumps.get(k).rate());
    }
    // [closed form] odd = diag(0, 1, 1, 0); X@left maps |g,e> to |e,e> and |e,g> to |g,g>
    assertClose(
        real(row(0, 0, 1, 0), row(0, 0, 0, 0), row(0, 0, 0, 0), row(0, 1, 0, 0)),
        at(jumps.get(0).operator(), 1, 1, 1, 1, 0));
    // [closed form] minus = (1 - XX)/2 has 1/2 on the diagonal and -1/2 on the antidiagonal
    assertClose(
        real(row(.5, 0, 0, -.5), row(0, .5, -.5, 0), row(0, .5, -.5, 0), row(.5, 0, 0, -.5)),
        at(jumps.get(1).operator(), 1, 1, 1, 1, 0));
    // [closed form] lower@left = |g><e| x 1, lower@right = 1 x |g><e|
    assertClose(
        real(row(0, 0, 1, 0), row(0, 0, 0, 1), row(0, 0, 0, 0), row(0, 0, 0, 0)),
        at(jumps.get(2).operator(), 1, 1, 1, 1, 0));
    assertClose(
        real(row(0, 1, 0, 0), row(0, 0, 0, 0), row(0, 0, 0, 1), row(0, 0, 0, 0)),
        at(jumps.get(3).operator(), 1, 1, 1, 1, 0));
  }

  @Test
  void targetIsNormalisedWithAnErrorBound() {
    StateSpec.Pure target = assertInstanceOf(StateSpec.Pure.class, read.target().orElseThrow());
    // [closed form] amplitudes 1/sqrt(2), whose nearest double is off by less than 2^-54
    double h = Math.sqrt(0.5);
    assertContains(target.ket(), real(row(h), row(0), row(0), row(h)));
    assertTrue(target.ket().radius() < 1e-14);
  }

  @Test
  void requirementsAreRead() {
    List<Requirement> r = read.requirements();
    assertEquals(List.of("entangled", "on target", "quick", "in time"), names(r));
    assertEquals(new MeasureSpec.Concurrence(0, 1), r.get(0).measure());
    assertEquals("concurrence(left, right)", r.get(0).measureText());
    assertEquals(Requirement.Sense.AT_LEAST, r.get(0).sense());
    assertEquals(new BigDecimal("0.90"), r.get(0).limit());
    assertEquals(new When.Steady(), r.get(0).when());
    assertEquals(new MeasureSpec.Fidelity(read.target().orElseThrow()), r.get(1).measure());
    assertEquals(new MeasureSpec.Gap(), r.get(2).measure());
    assertEquals("/us", r.get(2).unit().symbol());
    When.At at = assertInstanceOf(When.At.class, r.get(3).when());
    assertDecimal("12", at.time());
    assertEquals("us", at.unit().symbol());
    StateSpec.Pure start = assertInstanceOf(StateSpec.Pure.class, r.get(3).start().orElseThrow());
    assertEquals(real(row(1), row(0), row(0), row(0)), start.ket().centre());
    assertEquals(0, start.ket().radius());
  }

  @Test
  void digestIsTheOneOfTheBytes() {
    // [independent] GNU coreutils 9.1 sha256sum of the text above, see the shell line
    // printf '%s' "$TEXT" | sha256sum
    assertEquals("3bd320e7ade2d9e12aa8ddeb6257df38f5bf0c7e209f0a14932cd47b952ffd78", read.sha256());
  }

  private static List<String> names(List<Requirement> requirements) {
    return requirements.stream().map(Requirement::name).toList();
  }

  private static void assertDecimal(String expected, BigDecimal actual) {
    assertEquals(0, new BigDecimal(expected).compareTo(actual), () -> "was " + actual);
  }
}
