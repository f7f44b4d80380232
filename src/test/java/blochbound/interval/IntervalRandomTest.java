package blochbound.interval;

import static org.junit.jupiter.api.Assertions.assertTrue;

import blochbound.BigReference;
import blochbound.Draws;
import java.math.BigDecimal;
import java.math.MathContext;
import java.math.RoundingMode;
import java.util.SplittableRandom;
import org.apache.commons.math3.fraction.BigFraction;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;

/** [invariant] The exact result for every pair of members lies in the computed interval. */
class IntervalRandomTest {
  private static final MathContext DOWN = new MathContext(60, RoundingMode.FLOOR);
  private static final MathContext UP = new MathContext(60, RoundingMode.CEILING);

  /** An interval with one of its members. */
  private record Case(Interval interval, double member) {
    BigDecimal exact() {
      return new BigDecimal(member);
    }
  }

  private static Case draw(SplittableRandom random) {
    double a = Draws.number(random);
    double b = random.nextInt(3) == 0 ? a : Draws.number(random);
    Interval interval = Interval.of(Math.min(a, b), Math.max(a, b));
    double inside =
        switch (random.nextInt(3)) {
          case 0 -> a;
          case 1 -> b;
          default -> interval.middle();
        };
    return new Case(interval, inside);
  }

  private static void assertContains(Interval interval, BigDecimal low, BigDecimal high) {
    boolean fromBelow =
        interval.lower() == Double.NEGATIVE_INFINITY
            || new BigDecimal(interval.lower()).compareTo(low) <= 0;
    boolean fromAbove =
        interval.upper() == Double.POSITIVE_INFINITY
            || new BigDecimal(interval.upper()).compareTo(high) >= 0;
    assertTrue(fromBelow && fromAbove, () -> interval + " misses " + low + " .. " + high);
  }

  private static void assertContains(Interval interval, BigDecimal exact) {
    assertContains(interval, exact, exact);
  }

  @ParameterizedTest(name = "seed {0}")
  @MethodSource("blochbound.Draws#seeds")
  void sumsDifferencesAndProductsAreEnclosed(long seed) {
    SplittableRandom random = new SplittableRandom(seed);
    for (int i = 0; i < 20; i++) {
      Case x = draw(random);
      Case y = draw(random);
      assertContains(x.interval.plus(y.interval), x.exact().add(y.exact()));
      assertContains(x.interval.minus(y.interval), x.exact().subtract(y.exact()));
      assertContains(x.interval.times(y.interval), x.exact().multiply(y.exact()));
      assertContains(x.interval.square(), x.exact().pow(2));
    }
  }

  @ParameterizedTest(name = "seed {0}")
  @MethodSource("blochbound.Draws#seeds")
  void quotientsAreEnclosed(long seed) {
    SplittableRandom random = new SplittableRandom(seed);
    for (int i = 0; i < 20; i++) {
      Case x = draw(random);
      Case y = draw(random);
      if (y.member != 0) {
        assertContains(
            x.interval.dividedBy(y.interval),
            x.exact().divide(y.exact(), DOWN),
            x.exact().divide(y.exact(), UP));
      }
    }
  }

  @ParameterizedTest(name = "seed {0}")
  @MethodSource("blochbound.Draws#seeds")
  void powersAreEnclosed(long seed) {
    SplittableRandom random = new SplittableRandom(seed);
    Case x = draw(random);
    for (int exponent = 0; exponent <= 9; exponent++) {
      BigDecimal power = x.exact().pow(exponent);
      assertContains(x.interval.power(exponent), power);
      if (x.member != 0) {
        assertContains(
            x.interval.power(-exponent),
            BigDecimal.ONE.divide(power, DOWN),
            BigDecimal.ONE.divide(power, UP));
      }
    }
  }

  @ParameterizedTest(name = "seed {0}")
  @MethodSource("blochbound.Draws#seeds")
  void squareRootsAreEnclosed(long seed) {
    Case x = draw(new SplittableRandom(seed));
    if (x.member >= 0) {
      Interval root = x.interval.sqrt();
      // Both ends are compared through their exact squares.
      assertTrue(root.lower() >= 0);
      assertTrue(new BigDecimal(root.lower()).pow(2).compareTo(x.exact()) <= 0);
      assertTrue(new BigDecimal(root.upper()).pow(2).compareTo(x.exact()) >= 0);
    }
  }

  @ParameterizedTest(name = "seed {0}")
  @MethodSource("blochbound.Draws#seeds")
  void exponentialSineAndCosineAreEnclosed(long seed) {
    SplittableRandom random = new SplittableRandom(seed);
    double a = random.nextDouble(-30, 30);
    double width = random.nextInt(2) == 0 ? 0 : Math.scalb(1.0, random.nextInt(-50, 4));
    Interval x = Interval.of(a, a + width);
    for (double member : new double[] {x.lower(), x.middle(), x.upper()}) {
      BigDecimal exact = new BigDecimal(member);
      assertContains(x.exp(), BigReference.exp(exact));
      assertContains(x.sin(), BigReference.sin(exact));
      assertContains(x.cos(), BigReference.cos(exact));
    }
  }

  @ParameterizedTest(name = "seed {0}")
  @MethodSource("blochbound.Draws#seeds")
  void decimalsAndFractionsAreEnclosedAsTightlyAsDoublesAllow(long seed) {
    SplittableRandom random = new SplittableRandom(seed);
    BigDecimal decimal =
        BigDecimal.valueOf(random.nextLong(), random.nextInt(40))
            .multiply(BigDecimal.valueOf(random.nextLong(), random.nextInt(10)));
    Interval fromDecimal = Interval.fromDecimal(decimal);
    assertContains(fromDecimal, decimal);
    assertTrue(fromDecimal.upper() <= Math.nextUp(fromDecimal.lower()));
    long denominator = random.nextLong(1, Long.MAX_VALUE);
    BigFraction fraction =
        new BigFraction(
            java.math.BigInteger.valueOf(random.nextLong()),
            java.math.BigInteger.valueOf(denominator));
    Interval fromFraction = Interval.fromFraction(fraction);
    BigDecimal numerator = new BigDecimal(fraction.getNumerator());
    BigDecimal divisor = new BigDecimal(fraction.getDenominator());
    assertContains(fromFraction, numerator.divide(divisor, DOWN), numerator.divide(divisor, UP));
    assertTrue(fromFraction.upper() <= Math.nextUp(fromFraction.lower()));
  }

  @ParameterizedTest(name = "seed {0}")
  @MethodSource("blochbound.Draws#seeds")
  void middleAndRadiusCoverTheInterval(long seed) {
    Interval x = draw(new SplittableRandom(seed)).interval;
    BigDecimal middle = new BigDecimal(x.middle());
    BigDecimal radius = new BigDecimal(x.radius());
    assertTrue(x.contains(x.middle()));
    assertTrue(middle.subtract(radius).compareTo(new BigDecimal(x.lower())) <= 0);
    assertTrue(middle.add(radius).compareTo(new BigDecimal(x.upper())) >= 0);
  }
}
