package blochbound.model;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertNotEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import blochbound.interval.ExactNumber;
import blochbound.interval.Interval;
import blochbound.model.Atom.Function;
import blochbound.model.Scalar.Condition;
import blochbound.model.Scalar.Domain;
import java.math.BigDecimal;
import java.util.List;
import java.util.Optional;
import org.junit.jupiter.api.Test;

/** Exact algebra of scalar expressions. */
class ScalarTest {
  private static final Scalar X = Scalar.parameter(0);
  private static final Scalar Y = Scalar.parameter(1);
  private static final Scalar TWO = number("2");

  private static Scalar number(String decimal) {
    return Scalar.constant(ExactNumber.of(new BigDecimal(decimal)));
  }

  private static Scalar sqrt(Scalar argument) {
    return argument.apply(Function.SQRT);
  }

  @Test
  void sumsAndProductsAreExact() {
    // [closed form] (x + y)(x - y) = x^2 - y^2
    assertEquals(X.power(2).minus(Y.power(2)), X.plus(Y).times(X.minus(Y)));
    // [closed form] 0.1 + 0.2 - 0.3 = 0
    assertTrue(number("0.1").plus(number("0.2")).minus(number("0.3")).isZero());
    assertTrue(X.minus(X).isZero());
    assertEquals(Scalar.ONE, X.power(0));
    assertEquals(X, X.times(Scalar.ONE));
  }

  @Test
  void aSquareRootTimesItselfIsItsArgument() {
    assertEquals(X, sqrt(X).times(sqrt(X)));
    assertEquals(X.plus(Y), sqrt(X.plus(Y)).power(2));
    // [closed form] sqrt(x)^3 = x sqrt(x), sqrt(x)^-2 = 1/x, sqrt(x)^-3 = 1/(x sqrt(x))
    assertEquals(X.times(sqrt(X)), sqrt(X).power(3));
    assertEquals(X.reciprocal(), sqrt(X).power(-2));
    assertEquals(X.times(sqrt(X)).reciprocal(), sqrt(X).power(-3));
    // [closed form] (sqrt(x) + sqrt(y))^2 = x + y + 2 sqrt(x) sqrt(y)
    Scalar square = sqrt(X).plus(sqrt(Y)).power(2);
    assertEquals(X.plus(Y).plus(TWO.times(sqrt(X)).times(sqrt(Y))), square);
  }

  @Test
  void aNestedSquareRootUnfoldsToo() {
    Scalar nested = sqrt(X.plus(sqrt(Y)));
    assertEquals(X.plus(sqrt(Y)), nested.times(nested));
    // [closed form] sqrt(x + sqrt(y))^4 = x^2 + 2 x sqrt(y) + y
    Scalar expected = X.power(2).plus(TWO.times(X).times(sqrt(Y))).plus(Y);
    assertEquals(expected, nested.power(4));
  }

  @Test
  void reciprocalsOfProductsCancelAndOfSumsUndo() {
    assertEquals(Scalar.ONE, X.times(X.reciprocal()));
    assertEquals(Y, X.times(Y).dividedBy(X));
    Scalar sum = X.plus(Y);
    assertEquals(sum, sum.reciprocal().reciprocal());
    assertEquals(sum.power(2), sum.reciprocal().power(2).reciprocal());
    assertEquals(Scalar.ONE.dividedBy(sum), sum.power(-1));
  }

  @Test
  void divisionByAConstantThatMayBeZeroIsRefused() {
    assertThrows(ArithmeticException.class, () -> X.dividedBy(Scalar.ZERO));
    assertThrows(ArithmeticException.class, () -> X.dividedBy(number("0.1").minus(number("0.1"))));
    // A sine of pi is enclosed, never known to be exactly zero.
    Scalar maybe = Scalar.constant(ExactNumber.PI).apply(Function.SIN);
    assertThrows(ArithmeticException.class, maybe::reciprocal);
  }

  @Test
  void functionsOfConstantsAreEnclosed() {
    // [closed form] sqrt(2)^2 = 2 lies in the enclosure
    Scalar root = sqrt(TWO);
    assertTrue(root.isConstant());
    assertTrue(root.times(root).constantTerm().enclosure().contains(2));
    assertThrows(IllegalArgumentException.class, () -> sqrt(number("-1")));
    assertTrue(sqrt(Scalar.ZERO).isZero());
  }

  @Test
  void onlyEqualConstantsCancel() {
    // The two constants differ by 1e-22, so that their enclosures in doubles are the same.
    Scalar a = sqrt(number("2.0000000000000000000001"));
    Scalar b = sqrt(number("2.0000000000000000000002"));
    assertEquals(a.constantTerm().enclosure(), b.constantTerm().enclosure());
    assertFalse(sqrt(a.times(X)).minus(sqrt(b.times(X))).isZero());
    assertTrue(sqrt(a.times(X)).minus(sqrt(a.times(X))).isZero());
    assertEquals(sqrt(a.times(b).times(X)), sqrt(b.times(a).times(X)));
    assertNotEquals(sqrt(a.negate().times(X)), sqrt(a.times(X)));
  }

  @Test
  void conditionsTellWhereAnExpressionIsDefined() {
    assertEquals(List.of(), X.plus(Y.power(2)).conditions());
    assertEquals(List.of(new Domain(Condition.NONZERO, X)), X.reciprocal().conditions());
    assertEquals(List.of(new Domain(Condition.NONNEGATIVE, X)), sqrt(X).conditions());
    assertEquals(
        List.of(new Domain(Condition.NONNEGATIVE, X), new Domain(Condition.NONZERO, X)),
        sqrt(X).reciprocal().conditions());
    assertEquals(
        List.of(new Domain(Condition.NONZERO, X.plus(Y))), X.plus(Y).reciprocal().conditions());
  }

  @Test
  void aReciprocalOfASineOrCosineMustNotMeetItsZeros() {
    for (Function function : List.of(Function.SIN, Function.COS)) {
      Scalar wave = X.apply(function);
      assertEquals(List.of(new Domain(Condition.NONZERO, wave)), wave.reciprocal().conditions());
    }
    assertEquals(List.of(), X.apply(Function.EXP).reciprocal().conditions());
  }

  @Test
  void innerConditionsComeBeforeOuterOnes() {
    Scalar inner = X.plus(Y).reciprocal();
    Scalar outer = sqrt(Scalar.ONE.plus(inner));
    assertEquals(
        List.of(
            new Domain(Condition.NONZERO, X.plus(Y)),
            new Domain(Condition.NONNEGATIVE, Scalar.ONE.plus(inner))),
        outer.conditions());
  }

  @Test
  void theAffineFormIsExactOrAbsent() {
    Scalar form = number("0.3").plus(TWO.times(Y)).minus(X);
    assertEquals(
        Optional.of(
            List.of(ExactNumber.of(new BigDecimal("0.3")), ExactNumber.of(-1), ExactNumber.of(2))),
        form.affine(2));
    assertEquals(Optional.empty(), X.times(Y).affine(2));
    assertEquals(Optional.empty(), X.reciprocal().affine(2));
    assertEquals(Optional.empty(), sqrt(TWO).times(X).affine(2));
    assertEquals(Optional.empty(), X.apply(Function.EXP).affine(2));
  }

  @Test
  void dependenceReachesIntoFunctions() {
    assertTrue(sqrt(X.plus(Scalar.ONE)).dependsOn(0));
    assertFalse(sqrt(X.plus(Scalar.ONE)).dependsOn(1));
  }

  @Test
  void derivativesAgreeWithClosedForms() {
    double[] p = {0.7, 1.3};
    // [closed form] d/dx (x^3 y) = 3 x^2 y
    assertEquals(3 * 0.49 * 1.3, X.power(3).times(Y).derivative(p, 0), 1e-14);
    // [closed form] d/dx sqrt(x + y) = 1/(2 sqrt(x + y)), d/dx 1/(x + y) = -1/(x + y)^2
    assertEquals(0.5 / Math.sqrt(2), sqrt(X.plus(Y)).derivative(p, 0), 1e-14);
    assertEquals(-0.25, X.plus(Y).reciprocal().derivative(p, 0), 1e-14);
    // [closed form] d/dx sin(x y) = y cos(x y), d/dx exp(cos x) = -sin(x) exp(cos x)
    assertEquals(1.3 * Math.cos(0.91), X.times(Y).apply(Function.SIN).derivative(p, 0), 1e-14);
    assertEquals(
        -Math.sin(0.7) * Math.exp(Math.cos(0.7)),
        X.apply(Function.COS).apply(Function.EXP).derivative(p, 0),
        1e-14);
    assertEquals(0, X.apply(Function.SIN).derivative(p, 1));
  }

  @Test
  void theEnclosureOfATouchingRangeStaysOnItsSide() {
    Interval[] p = {Interval.of(0, 2), Interval.of(1, 3)};
    // [closed form] x^2 y on [0,2] x [1,3] is [0,12]
    Interval range = X.power(2).times(Y).enclosure(p);
    assertTrue(range.contains(Interval.of(0, 12)));
    assertTrue(range.lower() >= 0);
    assertTrue(sqrt(X).enclosure(p).lower() >= 0);
  }
}
