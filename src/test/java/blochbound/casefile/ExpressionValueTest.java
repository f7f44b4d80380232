package blochbound.casefile;

import static blochbound.casefile.Matrices.assertClose;
import static blochbound.casefile.Matrices.at;
import static blochbound.casefile.Matrices.real;
import static blochbound.casefile.Matrices.row;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import blochbound.interval.ExactNumber;
import blochbound.linalg.ComplexMatrix;
import blochbound.model.DesignCase;
import blochbound.model.Monomial;
import blochbound.model.OperatorForm;
import blochbound.model.Scalar;
import org.apache.commons.math3.fraction.BigFraction;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

/** Values of expressions; x = 2 is the parameter at position 0, y = 0.5 the one at position 1. */
class ExpressionValueTest {
  private static Scalar rate(String expression) throws CaseFaultException {
    return CaseText.dimensionless()
        .set("jumps", "[{rate: \"" + expression + "\", operator: lower@a}]")
        .read()
        .device()
        .jumps()
        .get(0)
        .rate();
  }

  private static OperatorForm operator(String expression) throws CaseFaultException {
    return CaseText.dimensionless()
        .set("jumps", "[{operator: \"" + expression + "\"}]")
        .read()
        .device()
        .jumps()
        .get(0)
        .operator();
  }

  private static OperatorForm single(String levels, String expression) throws CaseFaultException {
    return CaseText.dimensionless()
        .set("sites", "{a: {levels: " + levels + "}}")
        .without("hamiltonian")
        .set("jumps", "[{operator: \"" + expression + "\"}]")
        .read()
        .device()
        .jumps()
        .get(0)
        .operator();
  }

  // [closed form] arithmetic by hand
  @ParameterizedTest
  @CsvSource({
    "2 + 3 * 4, 14, 1",
    "(2 + 3) * 4, 20, 1",
    "2^3^2, 512, 1",
    "0 - -2^2, 4, 1",
    "10 - 4 - 3, 3, 1",
    "12 / 4 / 3, 1, 1",
    "12 / 4 * 3, 9, 1",
    "2 * -3 + 7, 1, 1",
    "(-2)^2, 4, 1",
    "2^-2, 1, 4",
    "2^(1 + 1), 4, 1",
    "- - 3, 3, 1",
    "0.1 + 0.2, 3, 10",
    "1 / 3 + 1 / 6, 1, 2",
    ".5 + 1., 3, 2",
    "1e-3 * 2.5E+3, 5, 2",
    "sqrt(2) * sqrt(2) - sqrt(2)^2 + sqrt(81 / 16), 9, 4",
    "i * i + 3, 2, 1",
    "(1 + 2 * i) * adj(1 + 2 * i), 5, 1",
    "(4 + 2 * i) / (2 + i), 2, 1",
    "1 / i + i, 0, 1",
    "exp(0) + cos(0), 2, 1",
  })
  void constantsAreComputed(String expression, long numerator, long denominator)
      throws CaseFaultException {
    Scalar value = rate(expression);
    assertTrue(value.isConstant());
    double expected = (double) numerator / denominator;
    assertTrue(
        value.constantTerm().enclosure().minus(of(expected)).contains(0)
            || Math.abs(value.constantTerm().value() - expected) < 1e-15,
        () -> value.toString());
    if (!expression.contains("exp") && !expression.contains("sqrt(2)")) {
      BigFraction fraction = new BigFraction(numerator, denominator);
      assertEquals(Scalar.constant(new ExactNumber(fraction, 0)), value, "exactly");
    }
  }

  private static blochbound.interval.Interval of(double value) {
    return blochbound.interval.Interval.of(value);
  }

  @Test
  void piStaysExact() throws CaseFaultException {
    assertEquals(Scalar.constant(new ExactNumber(new BigFraction(3, 2), 2)), rate("3 * pi^2 / 2"));
    assertEquals(Scalar.constant(new ExactNumber(new BigFraction(3), 1)), rate("sqrt(9 * pi^2)"));
  }

  @Test
  void exponentialOfAnImaginaryNumberIsAPhase() throws CaseFaultException {
    Scalar value = rate("exp(i * pi / 3) + exp(-i * pi / 3)");
    // [closed form] 2 cos(pi / 3) = 1
    assertTrue(value.constantTerm().enclosure().contains(1));
    assertTrue(value.constantTerm().enclosure().radius() < 1e-14);
  }

  @Test
  void parametersAreCollectedExactly() throws CaseFaultException {
    Scalar x = Scalar.parameter(0);
    Scalar y = Scalar.parameter(1);
    assertEquals(x.times(x), rate("x^2"));
    assertEquals(y.times(x), rate("sqrt(x) * y * sqrt(x)"));
    assertEquals(x.times(x).minus(y.times(y)), rate("(x - y) * (x + y)"));
    assertEquals(y, rate("x * y / x"));
    assertEquals(x.reciprocal(), rate("1/x"));
    assertEquals(x.plus(y).reciprocal(), rate("(x + y)^-1"));
  }

  @Test
  void functionsOfParametersAreEvaluated() throws CaseFaultException {
    // [independent] Python 3 math: 2*exp(-0.5)+sin(2)**2+cos(2)**2
    assertEquals(
        2.213061319425267,
        rate("x*exp(-y) + sin(x)^2 + cos(x)^2").value(new double[] {2, 0.5}),
        1e-14);
  }

  @Test
  void pauliOperatorsHaveTheStatedSigns() throws CaseFaultException {
    // [closed form] Z|g> = +|g>, Y = -i|g><e| + i|e><g|
    assertClose(real(row(0, 1), row(1, 0)), at(single("[g, e]", "X@a"), 0, 0));
    assertClose(real(row(1, 0), row(0, -1)), at(single("[g, e]", "Z@a"), 0, 0));
    ComplexMatrix y = at(single("[g, e]", "Y@a"), 0, 0);
    assertEquals(-1, y.im(0, 1));
    assertEquals(1, y.im(1, 0));
    assertClose(
        real(row(0, 0), row(0, 0)), at(single("[g, e]", "lower@a - (X@a + i*Y@a)/2"), 0, 0));
    assertClose(real(row(0, 0), row(0, 0)), at(single("[g, e]", "X@a*Y@a - i*Z@a"), 0, 0));
    assertClose(real(row(0, 1), row(0, 0)), at(single("[g, e]", "|g><e|@a"), 0, 0));
  }

  @Test
  void ladderOperatorsCarrySquareRoots() throws CaseFaultException {
    // [closed form] lower |k> = sqrt(k) |k-1>
    OperatorForm lower = single("4", "lower@a");
    double r2 = 1.4142135623730951;
    double r3 = 1.7320508075688772;
    assertClose(
        real(row(0, 1, 0, 0), row(0, 0, r2, 0), row(0, 0, 0, r3), row(0, 0, 0, 0)),
        at(lower, 0, 0));
    assertClose(
        real(row(0, 0, 0, 0), row(0, 1, 0, 0), row(0, 0, 2, 0), row(0, 0, 0, 3)),
        at(single("4", "number@a"), 0, 0));
    assertClose(at(single("4", "number@a"), 0, 0), at(single("4", "raise@a * lower@a"), 0, 0));
    assertEquals(0, single("4", "number@a").terms().get(Monomial.ONE).radius());
    double radius = lower.terms().get(Monomial.ONE).radius();
    // [closed form] half units in the last place of sqrt(2) and sqrt(3)
    assertTrue(radius >= Math.ulp(r2) / 2 * Math.sqrt(2) && radius < 1e-15);
    assertEquals(0, single("[g, e]", "lower@a").terms().get(Monomial.ONE).radius(), "sqrt(1)");
  }

  @Test
  void firstSiteIsMostSignificant() throws CaseFaultException {
    DesignCase read =
        CaseText.dimensionless()
            .set("sites", "{a: {levels: [g, e]}, b: {levels: 3}}")
            .without("hamiltonian")
            .set("jumps", "[{operator: \"|e,2><g,1|\"}, {operator: \"|2><0|@b\"}]")
            .read();
    // [closed form] index = 3 * level of a + level of b
    assertEquals(ComplexMatrix.unit(6, 5, 1), at(read.device().jumps().get(0).operator(), 0, 0));
    assertEquals(
        ComplexMatrix.unit(6, 2, 0).plus(ComplexMatrix.unit(6, 5, 3)),
        at(read.device().jumps().get(1).operator(), 0, 0));
  }

  @Test
  void atBindsTightestThenPower() throws CaseFaultException {
    ComplexMatrix unit = ComplexMatrix.identity(4);
    assertClose(unit, at(operator("X@a^2"), 0, 0));
    assertClose(unit.scale(-1), at(operator("-X@a^2"), 0, 0));
    assertClose(unit, at(operator("X@a^0"), 0, 0));
    assertClose(unit.scale(2), at(operator("x * X@a^2"), 2, 0));
  }

  @Test
  void numbersAreMultiplesOfTheIdentity() throws CaseFaultException {
    ComplexMatrix unit = ComplexMatrix.identity(4);
    assertClose(unit.scale(3), at(operator("3"), 0, 0));
    assertClose(unit.scale(2.5), at(operator("x + y"), 2, 0.5));
    assertClose(at(operator("Z@a + 1"), 0, 0), at(operator("2 * |g><g|@a"), 0, 0));
  }

  @Test
  void adjointTurnsLowerIntoRaise() throws CaseFaultException {
    assertClose(
        at(operator("raise@a * Z@b * -i * x"), 2, 0),
        at(operator("adj(i * x * lower@a * Z@b)"), 2, 0));
  }

  @Test
  void namedOperatorsStandForTheirValue() throws CaseFaultException {
    DesignCase read =
        CaseText.dimensionless()
            .set("operators", "{half: 1/2, odd: half * (1 - Z@a * Z@b), both: odd + half}")
            .set("jumps", "[{rate: half, operator: both}]")
            .read();
    assertEquals(
        Scalar.constant(new ExactNumber(new BigFraction(1, 2), 0)),
        read.device().jumps().get(0).rate());
    // [closed form] diag(0, 1, 1, 0) + 1/2
    assertClose(
        real(row(.5, 0, 0, 0), row(0, 1.5, 0, 0), row(0, 0, 1.5, 0), row(0, 0, 0, .5)),
        at(read.device().jumps().get(0).operator(), 0, 0));
  }

  @Test
  void imaginaryCouplingsMakeAHermitianHamiltonian() throws CaseFaultException {
    OperatorForm h =
        CaseText.dimensionless()
            .set("hamiltonian", "i*x*(raise@a*lower@b - lower@a*raise@b)")
            .read()
            .device()
            .hamiltonian();
    // [closed form] i x |e,g><g,e| and its adjoint
    ComplexMatrix m = at(h, 3, 0);
    assertEquals(3, m.im(2, 1));
    assertEquals(-3, m.im(1, 2));
    assertEquals(0, m.re(1, 2));
  }

  @Test
  void spacesAndLineBreaksDoNotMatter() throws CaseFaultException {
    String folded = ">\n  x * | g , e >< e , g |\n   + x *\n   |e,g><g,e|";
    OperatorForm h =
        CaseText.dimensionless().set("hamiltonian", folded).read().device().hamiltonian();
    assertClose(
        ComplexMatrix.unit(4, 1, 2).plus(ComplexMatrix.unit(4, 2, 1)).scale(2), at(h, 2, 0));
  }
}
