package blochbound.model;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import blochbound.BigReference;
import blochbound.Draws;
import blochbound.interval.ExactNumber;
import blochbound.interval.Interval;
import blochbound.model.Atom.Function;
import java.math.BigDecimal;
import java.util.SplittableRandom;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;

/** [invariant] Random expressions have the value of the same expression in many digits. */
class ScalarRandomTest {
  private static final int PARAMETERS = 3;

  /** An expression and its value in about 90 digits at one point. */
  private record Pair(Scalar scalar, BigDecimal value) {}

  private static Pair draw(SplittableRandom random, double[] point, int depth) {
    if (depth == 0) {
      if (random.nextBoolean()) {
        int i = random.nextInt(PARAMETERS);
        return new Pair(Scalar.parameter(i), new BigDecimal(point[i]));
      }
      BigDecimal decimal = Draws.decimal(random, 300);
      return new Pair(Scalar.constant(ExactNumber.of(decimal)), decimal);
    }
    Pair a = draw(random, point, depth - 1);
    Pair b = draw(random, point, depth - 1);
    return switch (random.nextInt(7)) {
      case 0 -> new Pair(a.scalar.plus(b.scalar), a.value.add(b.value, BigReference.DIGITS));
      case 1 -> new Pair(a.scalar.minus(b.scalar), a.value.subtract(b.value, BigReference.DIGITS));
      case 2, 3 ->
          new Pair(a.scalar.times(b.scalar), a.value.multiply(b.value, BigReference.DIGITS));
      case 4 -> quotient(a, b);
      case 5 -> new Pair(a.scalar.power(2), a.value.pow(2, BigReference.DIGITS));
      default -> root(a);
    };
  }

  private static Pair quotient(Pair a, Pair b) {
    boolean isSafe = b.value.abs().compareTo(new BigDecimal("1e-3")) > 0;
    return isSafe
        ? new Pair(a.scalar.dividedBy(b.scalar), a.value.divide(b.value, BigReference.DIGITS))
        : a;
  }

  /** Square root of 1 + a^2, which is defined everywhere. */
  private static Pair root(Pair a) {
    Scalar argument = Scalar.ONE.plus(a.scalar.power(2));
    BigDecimal value = BigDecimal.ONE.add(a.value.pow(2, BigReference.DIGITS));
    return new Pair(argument.apply(Function.SQRT), value.sqrt(BigReference.DIGITS));
  }

  @ParameterizedTest(name = "seed {0}")
  @MethodSource("blochbound.Draws#seeds")
  void theEnclosureHoldsTheValueAtEveryPointOfTheRanges(long seed) {
    SplittableRandom random = new SplittableRandom(seed);
    double[] point = new double[PARAMETERS];
    Interval[] ranges = new Interval[PARAMETERS];
    for (int i = 0; i < PARAMETERS; i++) {
      point[i] = random.nextDouble(-2, 2);
      double width = random.nextBoolean() ? 0 : random.nextDouble(0.2);
      ranges[i] = Interval.of(point[i] - width * random.nextDouble(), point[i] + width);
    }
    Pair pair = draw(random, point, 3);
    Interval enclosure = pair.scalar.enclosure(ranges);
    // The reference itself is rounded in about the 90th digit.
    BigDecimal slack = BigDecimal.ONE.add(pair.value.abs()).movePointLeft(70);
    assertTrue(isBelow(enclosure.lower(), pair.value.add(slack)), () -> enclosure + " " + pair);
    assertTrue(
        isBelow(-enclosure.upper(), pair.value.negate().add(slack)), () -> enclosure + " " + pair);
  }

  private static boolean isBelow(double end, BigDecimal value) {
    return end == Double.NEGATIVE_INFINITY || new BigDecimal(end).compareTo(value) <= 0;
  }

  @ParameterizedTest(name = "seed {0}")
  @MethodSource("blochbound.Draws#seeds")
  void theDerivativeIsTheLimitOfDifferences(long seed) {
    SplittableRandom random = new SplittableRandom(seed);
    double[] point = new double[PARAMETERS];
    for (int i = 0; i < PARAMETERS; i++) {
      point[i] = random.nextDouble(0.5, 2);
    }
    Scalar scalar = draw(random, point, 2).scalar;
    int i = random.nextInt(PARAMETERS);
    double step = 1e-5;
    double[] above = point.clone();
    double[] below = point.clone();
    above[i] += step;
    below[i] -= step;
    double difference = (scalar.value(above) - scalar.value(below)) / (above[i] - below[i]);
    double derivative = scalar.derivative(point, i);
    double size = 1 + Math.abs(derivative) + Math.abs(scalar.value(point));
    // [common practice, no source] central differences of step 1e-5 err by about 1e-10 of the size
    // of the third derivative, which quotients by small numbers raise
    assertEquals(difference, derivative, 1e-4 * size * size);
  }

  @ParameterizedTest(name = "seed {0}")
  @MethodSource("blochbound.Draws#seeds")
  void theTextNamesAnExpressionUniquely(long seed) {
    double[] point = {0.3, 0.8, -1.1};
    Pair a = draw(new SplittableRandom(seed), point, 3);
    Pair again = draw(new SplittableRandom(seed), point, 3);
    Pair other = draw(new SplittableRandom(seed + 1_000_000), point, 3);
    assertEquals(a.scalar, again.scalar);
    assertEquals(a.scalar.hashCode(), again.scalar.hashCode());
    if (a.scalar.equals(other.scalar)) {
      BigDecimal difference = a.value.subtract(other.value).abs();
      assertTrue(difference.compareTo(new BigDecimal("1e-60")) < 0);
    }
  }
}
