package blochbound.model;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertInstanceOf;
import static org.junit.jupiter.api.Assertions.assertTrue;

import blochbound.interval.ExactNumber;
import blochbound.model.Atom.Function;
import blochbound.model.Ball.Norm;
import blochbound.model.SignProof.Claim;
import blochbound.model.SignProof.Outcome;
import blochbound.model.SignProof.Outcome.NotProved;
import blochbound.model.SignProof.Outcome.Proved;
import java.math.BigDecimal;
import java.util.List;
import java.util.SplittableRandom;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;

/** Signs over the whole ball: what is true and decidable is proved, what is false never. */
class SignProofTest {
  private static final Scalar X = Scalar.parameter(0);
  private static final Scalar Y = Scalar.parameter(1);

  private static Scalar number(String decimal) {
    return Scalar.constant(ExactNumber.of(new BigDecimal(decimal)));
  }

  private static ParameterSpace line(String lower, String nominal, String upper) {
    return ParameterSpace.of(List.of(Parameters.of("x", lower, nominal, upper)), Ball.unitBox());
  }

  /** Two parameters 1 +- 1 in a ball of the given norm. */
  private static ParameterSpace pair(Norm norm, String radius, String correlation) {
    List<Ball.Correlation> correlations =
        correlation.isEmpty()
            ? List.of()
            : List.of(new Ball.Correlation(0, 1, new BigDecimal(correlation)));
    return ParameterSpace.of(
        List.of(Parameters.of("x", "0", "1", "2"), Parameters.of("y", "0", "1", "2")),
        new Ball(norm, new BigDecimal(radius), correlations));
  }

  private static void assertProved(Scalar expression, ParameterSpace space, Claim claim) {
    assertInstanceOf(Proved.class, SignProof.of(expression, space, claim));
  }

  private static NotProved assertNotProved(Scalar expression, ParameterSpace space, Claim claim) {
    return assertInstanceOf(NotProved.class, SignProof.of(expression, space, claim));
  }

  @Test
  void aRateWhoseRangeTouchesZeroIsProved() {
    assertProved(X, line("0", "0.1", "0.2"), Claim.NONNEGATIVE);
    // 0.1 + 0.2 - 0.3 is not zero in doubles
    assertProved(X.minus(number("0.3")), line("0.3", "0.4", "0.5"), Claim.NONNEGATIVE);
    assertProved(Scalar.ZERO, line("0", "0.1", "0.2"), Claim.NONNEGATIVE);
    ParameterSpace cycles =
        ParameterSpace.of(
            List.of(Parameters.of("x", "0", "0.3", "0.6", Parameters.KILOHERTZ)), Ball.unitBox());
    assertProved(X, cycles, Claim.NONNEGATIVE);
  }

  @Test
  void aRateThatIsSlightlyNegativeSomewhereIsNotProvedAndThePointIsNamed() {
    ParameterSpace space = line("-1e-30", "0.1", "0.2");
    NotProved failure = assertNotProved(X, space, Claim.NONNEGATIVE);
    assertEquals(List.of(-1.0), failure.coordinates());
    assertEquals(List.of(new BigDecimal("-1E-30")), space.decimalPointInside(new double[] {-1}));
    // The rate 0.2 - x - y at the corner of the box that is worst for it.
    NotProved corner =
        assertNotProved(
            number("3.9").minus(X).minus(Y), pair(Norm.BOX, "1", ""), Claim.NONNEGATIVE);
    assertEquals(List.of(1.0, 1.0), corner.coordinates());
    // [closed form] 3.9 - 2 - 2
    assertEquals(-0.1, corner.value(), 1e-15);
  }

  @Test
  void touchingZeroIsNotNonzero() {
    assertNotProved(X, line("0", "0.1", "0.2"), Claim.NONZERO);
    assertNotProved(Scalar.ZERO, line("0", "0.1", "0.2"), Claim.NONZERO);
    assertNotProved(X, line("-1", "0", "1"), Claim.NONZERO);
    assertEquals(new Proved(1), SignProof.of(X, line("1e-30", "0.1", "0.2"), Claim.NONZERO));
    assertEquals(
        new Proved(-1), SignProof.of(X.negate(), line("1e-30", "0.1", "0.2"), Claim.NONZERO));
  }

  @Test
  void theShapeOfTheBallDecidesAffineRates() {
    // [closed form] 2 - x + ... : x + y - c over |t| <= 1 about (1, 1) is at least 2 - c - reach,
    // reach 2, sqrt(2), 1 for the norms inf, 2, 1
    assertProved(X.plus(Y), pair(Norm.BOX, "1", ""), Claim.NONNEGATIVE);
    assertNotProved(X.plus(Y).minus(number("0.001")), pair(Norm.BOX, "1", ""), Claim.NONNEGATIVE);
    assertProved(
        X.plus(Y).minus(number("0.585")), pair(Norm.ELLIPSOID, "1", ""), Claim.NONNEGATIVE);
    assertNotProved(
        X.plus(Y).minus(number("0.586")), pair(Norm.ELLIPSOID, "1", ""), Claim.NONNEGATIVE);
    assertProved(X.plus(Y).minus(number("1")), pair(Norm.DIAMOND, "1", ""), Claim.NONNEGATIVE);
    assertNotProved(
        X.plus(Y).minus(number("1.001")), pair(Norm.DIAMOND, "1", ""), Claim.NONNEGATIVE);
  }

  @Test
  void aCorrelatedEllipsoidIsNarrowAcrossItsDiagonal() {
    ParameterSpace space = pair(Norm.ELLIPSOID, "1", "0.6");
    // [closed form] x - y over the ellipsoid has the reach sqrt(2 - 2 r) = 0.8944...
    assertProved(X.minus(Y).plus(number("0.91")), space, Claim.NONNEGATIVE);
    assertNotProved(X.minus(Y).plus(number("0.89")), space, Claim.NONNEGATIVE);
    // [closed form] x + y has the reach sqrt(2 + 2 r) = 1.7888..., so that x + y > 0.21
    assertProved(X.plus(Y).minus(number("0.19")), space, Claim.NONZERO);
    assertNotProved(X.plus(Y).minus(number("0.22")), space, Claim.NONZERO);
  }

  @Test
  void cornersOutsideACorrelatedEllipsoidAreNoObstacle() {
    // Many small boxes lie wholly outside the ranges of the parameters.
    for (String correlation : List.of("0.95", "-0.95")) {
      ParameterSpace space = pair(Norm.ELLIPSOID, "1", correlation);
      Scalar product = X.times(Y).plus(number("0.3"));
      assertProved(product, space, Claim.NONNEGATIVE);
      assertProved(product.apply(Function.SQRT), space, Claim.NONZERO);
    }
  }

  @Test
  void quadraticsAreDecidedByBisection() {
    ParameterSpace space = line("0", "1", "2");
    // [closed form] x^2 - x + 0.3 has its minimum 0.05 at 1/2
    assertProved(X.power(2).minus(X).plus(number("0.3")), space, Claim.NONNEGATIVE);
    // [closed form] x^2 - x + 0.2 has its minimum -0.05 at 1/2
    NotProved failure =
        assertNotProved(X.power(2).minus(X).plus(number("0.2")), space, Claim.NONNEGATIVE);
    assertTrue(failure.value() < 0);
    double x = space.parametersAt(new double[] {failure.coordinates().get(0)})[0];
    assertTrue(x > 0.27 && x < 0.73, "x^2 - x + 0.2 is not negative at " + x);
    assertProved(X.times(Y), pair(Norm.BOX, "1", ""), Claim.NONNEGATIVE);
    assertProved(X.power(2), line("-1", "0", "1"), Claim.NONNEGATIVE);
  }

  @Test
  void aDoubleZeroInsideIsNeverClaimedToBeAvoided() {
    // [closed form] (x - 0.7)^2 is zero at 0.7
    Scalar square = X.minus(number("0.7")).power(2);
    assertNotProved(square, line("0", "1", "2"), Claim.NONZERO);
    assertProved(square.plus(number("0.01")), line("0", "1", "2"), Claim.NONZERO);
  }

  @Test
  void negativeExpressionsAreNonzeroWithTheirSign() {
    Outcome outcome =
        SignProof.of(X.power(2).negate().minus(Scalar.ONE), line("0", "1", "2"), Claim.NONZERO);
    assertEquals(new Proved(-1), outcome);
  }

  @Test
  void withoutATolerantParameterTheValueDecides() {
    ParameterSpace point = line("2", "2", "2");
    assertProved(X.power(2).minus(number("3")), point, Claim.NONNEGATIVE);
    assertNotProved(X.power(2).minus(number("5")), point, Claim.NONNEGATIVE);
    assertProved(X, point, Claim.NONZERO);
  }

  @ParameterizedTest(name = "seed {0}")
  @MethodSource("blochbound.Draws#seeds")
  void whatIsProvedHoldsAtEveryPointOfTheBall(long seed) {
    SplittableRandom random = new SplittableRandom(seed);
    ParameterSpace space = Parameters.random(random);
    int n = space.parameters().size();
    double[] centre = space.parametersAt(new double[space.coordinates()]);
    Scalar p = Scalar.parameter(random.nextInt(n));
    Scalar q = Scalar.parameter(random.nextInt(n));
    Scalar form = random.nextBoolean() ? p.times(q) : p.plus(q.times(number("0.5")));
    BigDecimal shift =
        BigDecimal.valueOf(form.value(centre) * random.nextDouble(0, 2))
            .setScale(6, java.math.RoundingMode.HALF_EVEN);
    Scalar expression = form.minus(number(shift.toPlainString()));
    Claim claim = random.nextBoolean() ? Claim.NONNEGATIVE : Claim.NONZERO;
    if (SignProof.of(expression, space, claim) instanceof Proved proved) {
      for (int i = 0; i < 20; i++) {
        double[] z = Parameters.coordinates(random, space);
        double value = expression.value(space.parametersAt(z));
        double slack = 1e-11 * (1 + Math.abs(form.value(space.parametersAt(z))));
        assertTrue(proved.sign() * value >= -slack, () -> expression + " is " + value);
      }
    }
  }

  @ParameterizedTest(name = "seed {0}")
  @MethodSource("blochbound.Draws#seeds")
  void affineFormsWithARoomyMarginAreAlwaysDecided(long seed) {
    SplittableRandom random = new SplittableRandom(seed);
    ParameterSpace space = Parameters.random(random);
    Scalar sum = Scalar.ZERO;
    double reach = 0;
    for (int i = 0; i < space.parameters().size(); i++) {
      sum = sum.plus(Scalar.parameter(i));
      reach += space.ranges()[i].magnitude();
    }
    BigDecimal margin = BigDecimal.valueOf(reach * 1.01 + 0.01);
    assertProved(sum.plus(number(margin.toPlainString())), space, Claim.NONNEGATIVE);
    assertEquals(
        new Proved(-1),
        SignProof.of(sum.minus(number(margin.toPlainString())), space, Claim.NONZERO));
  }
}
