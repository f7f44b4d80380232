package blochbound.linalg;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import blochbound.interval.Interval;
import java.math.BigDecimal;
import java.util.SplittableRandom;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;

/** [invariant] Results for members of the arguments are members of the result. */
class ComplexBallTest {
  /** Scales at which nothing, something or everything underflows. */
  private static int exponent(SplittableRandom random) {
    return random.nextInt(4) == 0 ? random.nextInt(-1074, 400) : random.nextInt(-20, 20);
  }

  private static void assertIn(BigMatrix exact, ComplexBall ball) {
    assertTrue(
        exact.isIn(ball),
        () -> exact + "is outside radius " + ball.radius() + " of\n" + ball.centre());
  }

  @ParameterizedTest(name = "seed {0}")
  @MethodSource("blochbound.Draws#seeds")
  void sumsAndDifferencesAreMembers(long seed) {
    SplittableRandom random = new SplittableRandom(seed);
    ComplexBall a = Matrices.ball(random, 2, 3, exponent(random));
    ComplexBall b = Matrices.ball(random, 2, 3, exponent(random));
    BigMatrix x = BigMatrix.memberOf(a, random);
    BigMatrix y = BigMatrix.memberOf(b, random);
    assertIn(x.plus(y), a.plus(b));
    assertIn(x.plus(y.times(BigDecimal.valueOf(-1))), a.minus(b));
  }

  @ParameterizedTest(name = "seed {0}")
  @MethodSource("blochbound.Draws#seeds")
  void productsAreMembers(long seed) {
    SplittableRandom random = new SplittableRandom(seed);
    int inner = random.nextInt(1, 5);
    ComplexBall a = Matrices.ball(random, random.nextInt(1, 4), inner, exponent(random));
    ComplexBall b = Matrices.ball(random, inner, random.nextInt(1, 4), exponent(random));
    BigMatrix x = BigMatrix.memberOf(a, random);
    BigMatrix y = BigMatrix.memberOf(b, random);
    assertIn(x.times(y), a.times(b));
    assertIn(x.kron(y), a.kron(b));
  }

  @ParameterizedTest(name = "seed {0}")
  @MethodSource("blochbound.Draws#seeds")
  void multiplesAreMembers(long seed) {
    SplittableRandom random = new SplittableRandom(seed);
    ComplexBall a = Matrices.ball(random, 2, 2, exponent(random));
    BigMatrix x = BigMatrix.memberOf(a, random);
    double low = Math.scalb(random.nextDouble(-1, 1), random.nextInt(-30, 30));
    Interval factor = Interval.of(low, low + random.nextInt(3) * random.nextDouble());
    for (double f : new double[] {factor.lower(), factor.middle(), factor.upper()}) {
      assertIn(x.times(new BigDecimal(f)), a.times(factor));
    }
    double power = Math.scalb(random.nextBoolean() ? 1.0 : -1.0, random.nextInt(-600, 600));
    assertIn(x.times(new BigDecimal(power)), a.times(Interval.of(power)));
  }

  @ParameterizedTest(name = "seed {0}")
  @MethodSource("blochbound.Draws#seeds")
  void negativesAdjointsAndTurnsAreMembers(long seed) {
    SplittableRandom random = new SplittableRandom(seed);
    ComplexBall a = Matrices.ball(random, 2, 3, exponent(random));
    BigMatrix x = BigMatrix.memberOf(a, random);
    assertIn(x.times(BigDecimal.valueOf(-1)), a.negate());
    assertIn(x.adjoint(), a.adjoint());
    assertIn(x.timesI(), a.timesI());
    BigDecimal norm = new BigDecimal(a.normUp());
    assertTrue(x.squaredNorm().compareTo(norm.pow(2)) <= 0);
  }

  @Test
  void powersOfTwoKeepAnExactMatrixExact() {
    ComplexBall x = ComplexBall.exact(ComplexMatrix.real(new double[][] {{0.1, -3}, {0, 7}}));
    assertEquals(0, x.times(Interval.of(0.5)).radius());
    assertEquals(0, x.times(Interval.of(-4)).radius());
    assertEquals(0, x.times(Interval.ZERO).radius());
    assertTrue(x.times(Interval.of(3)).radius() > 0);
    // Underflow loses bits even of a halved number.
    ComplexMatrix least = ComplexMatrix.real(new double[][] {{Double.MIN_VALUE}});
    assertTrue(ComplexBall.exact(least).times(Interval.of(0.5)).radius() > 0);
  }

  @Test
  void zeroTimesAnythingIsExactlyZero() {
    ComplexBall zero = ComplexBall.exact(ComplexMatrix.zero(2, 2));
    ComplexBall one = ComplexBall.exact(ComplexMatrix.identity(2));
    assertEquals(zero, zero.times(one));
    assertEquals(zero, one.times(Interval.ZERO));
    assertTrue(zero.mayBeZero());
    assertFalse(one.mayBeZero());
  }

  @Test
  void aBallKnowsWhetherItMayBeHermitian() {
    ComplexMatrix m = ComplexMatrix.of(2, 2, new double[] {1, 2, 2, 1}, new double[] {0, 1, -1, 0});
    assertTrue(ComplexBall.exact(m).mayBeHermitian());
    ComplexMatrix skew = m.scale(0, 1);
    assertFalse(ComplexBall.exact(skew).mayBeHermitian());
    // [closed form] the nearest Hermitian matrix to i m is 0, at the distance |m| = sqrt(12)
    assertTrue(new ComplexBall(skew, 3.5).mayBeHermitian());
    assertFalse(new ComplexBall(skew, 3.4).mayBeHermitian());
  }

  @Test
  void aRadiusIsNeverNegativeNorNaN() {
    ComplexMatrix m = ComplexMatrix.identity(1);
    assertThrows(IllegalArgumentException.class, () -> new ComplexBall(m, -1));
    assertThrows(IllegalArgumentException.class, () -> new ComplexBall(m, Double.NaN));
  }
}
