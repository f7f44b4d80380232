package blochbound.interval;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import blochbound.BigReference;
import blochbound.Draws;
import java.math.BigDecimal;
import java.math.MathContext;
import java.math.RoundingMode;
import java.util.Arrays;
import java.util.SplittableRandom;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.MethodSource;

/** Directed rounding and a-priori error constants against decimals of many digits. */
class RoundingTest {
  private static final MathContext UP = new MathContext(60, RoundingMode.CEILING);

  private static void assertAtLeast(BigDecimal exact, double bound) {
    assertTrue(
        bound == Double.POSITIVE_INFINITY || new BigDecimal(bound).compareTo(exact) >= 0,
        () -> bound + " is below " + exact);
  }

  private static void assertAtMost(BigDecimal exact, double bound) {
    assertAtLeast(exact.negate(), -bound);
  }

  @Test
  void theUnitRoundoffIsHalfTheSpacingAboveOne() {
    // [published] IEEE 754: u = 2^-53 = 1.1102230246251565e-16
    assertEquals(1.1102230246251565e-16, Rounding.UNIT);
    assertEquals(Math.ulp(1.0), 2 * Rounding.UNIT);
  }

  // [published] Higham, Accuracy and Stability (2002), section 3.1, gamma_n = n u / (1 - n u);
  // citation from memory, digits evaluated from the formula
  @ParameterizedTest
  @CsvSource({
    "10, 1.1102230246251578e-15",
    "100, 1.1102230246251689e-14",
    "1000, 1.1102230246252798e-13"
  })
  void gammaIsAnUpperBoundAndTight(long n, double published) {
    BigDecimal nu = new BigDecimal(Rounding.UNIT).multiply(BigDecimal.valueOf(n));
    BigDecimal exact = nu.divide(BigDecimal.ONE.subtract(nu), UP);
    assertTrue(new BigDecimal(Rounding.gamma(n)).compareTo(exact.round(new MathContext(40))) >= 0);
    assertEquals(published, Rounding.gamma(n), 3 * Math.ulp(published));
  }

  @Test
  void zeroStaysExact() {
    // [closed form] 0 x = 0, 0 / x = 0, sqrt(0) = 0
    assertEquals(0, Rounding.timesUp(0, 3) + Rounding.timesDown(3, 0));
    assertEquals(0, Rounding.divideUp(0, 3));
    assertEquals(0, Rounding.sqrtUp(0));
  }

  @Test
  void gammaEndsWhereItsFormulaDoes() {
    assertEquals(Double.POSITIVE_INFINITY, Rounding.gamma(1L << 52));
    assertTrue(Double.isFinite(Rounding.gamma((1L << 52) - 1)));
  }

  @ParameterizedTest(name = "seed {0}")
  @MethodSource("blochbound.Draws#seeds")
  void directedOperationsStayOnTheirSide(long seed) {
    SplittableRandom random = new SplittableRandom(seed);
    double a = Draws.number(random);
    double b = Draws.number(random);
    BigDecimal x = new BigDecimal(a);
    BigDecimal y = new BigDecimal(b);
    assertAtLeast(x.add(y), Rounding.addUp(a, b));
    assertAtMost(x.add(y), Rounding.addDown(a, b));
    assertAtLeast(x.multiply(y), Rounding.timesUp(a, b));
    assertAtMost(x.multiply(y), Rounding.timesDown(a, b));
    if (b != 0) {
      assertAtLeast(x.divide(y, BigReference.DIGITS), Rounding.divideUp(a, b));
    }
    if (a >= 0) {
      assertAtLeast(x, new BigDecimal(Rounding.sqrtUp(a)).pow(2));
    }
  }

  private static void assertAtLeast(BigDecimal exact, BigDecimal bound) {
    assertTrue(bound.compareTo(exact) >= 0);
  }

  @ParameterizedTest(name = "seed {0}")
  @MethodSource("blochbound.Draws#seeds")
  void aComputedInnerProductStaysWithinGammaOfTheExactOne(long seed) {
    SplittableRandom random = new SplittableRandom(seed);
    int n = random.nextInt(1, 60);
    double computed = 0;
    BigDecimal exact = BigDecimal.ZERO;
    BigDecimal sizes = BigDecimal.ZERO;
    for (int i = 0; i < n; i++) {
      double a = random.nextDouble(-1, 1);
      double b = random.nextDouble(-1, 1);
      computed += a * b;
      BigDecimal product = new BigDecimal(a).multiply(new BigDecimal(b));
      exact = exact.add(product);
      sizes = sizes.add(product.abs());
    }
    BigDecimal error = new BigDecimal(computed).subtract(exact).abs();
    // [published] Higham (2002), section 3.1, inequality for inner products; from memory
    assertTrue(error.compareTo(sizes.multiply(new BigDecimal(Rounding.gamma(n)))) <= 0);
  }

  private static void assertBoundsTheNorm(double[] vector) {
    BigDecimal square =
        Arrays.stream(vector)
            .mapToObj(v -> new BigDecimal(v).pow(2))
            .reduce(BigDecimal.ZERO, BigDecimal::add);
    double bound = Rounding.normUp(vector);
    assertTrue(
        bound == Double.POSITIVE_INFINITY || new BigDecimal(bound).pow(2).compareTo(square) >= 0,
        () -> bound + " is no bound of the norm of " + Arrays.toString(vector));
  }

  @ParameterizedTest(name = "seed {0}")
  @MethodSource("blochbound.Draws#seeds")
  void theNormIsBoundedAtEveryScale(long seed) {
    SplittableRandom random = new SplittableRandom(seed);
    double[] vector = new double[random.nextInt(1, 40)];
    int scale = random.nextInt(-1074, 1023);
    for (int i = 0; i < vector.length; i++) {
      vector[i] = random.nextDouble(-1, 1) * Math.scalb(1.0, scale - random.nextInt(40));
    }
    assertBoundsTheNorm(vector);
  }

  @Test
  void theNormSurvivesUnderflowAndOverflowOfItsSquares() {
    // [closed form] the norm of (x) is |x|
    for (double x : new double[] {Double.MIN_VALUE, 1e-310, 1e-200, 1e-163, 1e-150, 1e160, 1e308}) {
      assertBoundsTheNorm(new double[] {x});
      assertTrue(Rounding.normUp(new double[] {x}) <= x * (1 + 1e-14) + 4 * Double.MIN_VALUE);
    }
    // [closed form] 3, 4, 5
    assertEquals(5, Rounding.normUp(new double[] {3, 4}), 1e-14);
    assertEquals(0, Rounding.normUp(new double[3]));
    assertEquals(
        Double.POSITIVE_INFINITY, Rounding.normUp(new double[] {Double.POSITIVE_INFINITY}));
  }

  @ParameterizedTest(name = "seed {0}")
  @MethodSource("blochbound.Draws#seeds")
  void inflatedSumsBoundTheExactOnes(long seed) {
    SplittableRandom random = new SplittableRandom(seed);
    int n = random.nextInt(1, 200);
    double computed = 0;
    BigDecimal exact = BigDecimal.ZERO;
    for (int i = 0; i < n; i++) {
      double term = random.nextDouble() * Math.scalb(1.0, -random.nextInt(60));
      computed += term;
      exact = exact.add(new BigDecimal(term));
    }
    assertAtLeast(exact, Rounding.inflate(computed, n));
  }
}
