package blochbound.generator;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import blochbound.BigReference;
import blochbound.interval.Interval;
import blochbound.model.Atom.Function;
import java.math.BigDecimal;
import java.util.ArrayList;
import java.util.List;
import java.util.SplittableRandom;
import java.util.function.UnaryOperator;
import java.util.stream.LongStream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;

class TaylorModelTest {
  static LongStream seeds() {
    return LongStream.range(0, Integer.getInteger("blochbound.soak", 60));
  }

  /** A model and the values of the same function at fixed points, in decimals. */
  private record Pair(TaylorModel model, List<BigDecimal> values) {
    Pair with(TaylorModel changed, UnaryOperator<BigDecimal> f) {
      return new Pair(changed, values.stream().map(f).toList());
    }
  }

  private final List<double[]> points = new ArrayList<>();

  private void drawPoints(SplittableRandom random, int m) {
    points.clear();
    for (int k = 0; k < 6; k++) {
      boolean isVertex = k < 2;
      double[] x = random.doubles(m, -1, 1).map(v -> isVertex ? Math.copySign(1, v) : v).toArray();
      points.add(x);
    }
  }

  private Pair variable(MultiIndexTable table, int degree, SplittableRandom random) {
    int m = table.variables();
    double[] slopes = random.doubles(m, -1, 1).toArray();
    slopes[random.nextInt(m)] = 0;
    double constant = random.nextDouble(-2, 2);
    List<BigDecimal> values = new ArrayList<>();
    for (double[] x : points) {
      BigDecimal sum = new BigDecimal(constant);
      for (int i = 0; i < m; i++) {
        sum = sum.add(new BigDecimal(slopes[i]).multiply(new BigDecimal(x[i])));
      }
      values.add(sum);
    }
    return new Pair(TaylorModel.affine(table, degree, slopes, constant, 0), values);
  }

  private static Pair step(Pair a, Pair b, SplittableRandom random) {
    return switch (random.nextInt(7)) {
      case 0 -> combine(a, b, true);
      case 1 -> combine(a, b, false);
      case 2 -> compose(shifted(a), Function.SQRT);
      case 3 -> compose(shifted(a), Function.RECIPROCAL);
      case 4 -> compose(a, Function.SIN);
      case 5 -> compose(a, Function.COS);
      default -> a.model.range().magnitude() < 8 ? compose(a, Function.EXP) : combine(a, b, true);
    };
  }

  private static Pair combine(Pair a, Pair b, boolean isSum) {
    List<BigDecimal> values = new ArrayList<>();
    for (int k = 0; k < a.values.size(); k++) {
      BigDecimal x = a.values.get(k);
      BigDecimal y = b.values.get(k);
      values.add(isSum ? x.add(y) : x.multiply(y, BigReference.DIGITS));
    }
    return new Pair(isSum ? a.model.plus(b.model) : a.model.times(b.model), values);
  }

  /** The function plus a number that makes it positive. */
  private static Pair shifted(Pair a) {
    double c = Math.max(0, -a.model.range().lower()) + 0.25;
    Pair constant = a.with(a.model.times(Interval.ZERO), v -> BigDecimal.ZERO);
    TaylorModel sum = a.model.plus(constant.model.compose(Function.EXP).times(Interval.of(c)));
    return a.with(sum, v -> v.add(new BigDecimal(c)));
  }

  private static Pair compose(Pair a, Function function) {
    return a.with(
        a.model.compose(function),
        x ->
            switch (function) {
              case SQRT -> x.sqrt(BigReference.DIGITS);
              case EXP -> BigReference.exp(x);
              case SIN -> BigReference.sin(x);
              case COS -> BigReference.cos(x);
              case RECIPROCAL -> BigDecimal.ONE.divide(x, BigReference.DIGITS);
            });
  }

  private static BigDecimal polynomial(TaylorModel model, MultiIndexTable table, double[] x) {
    BigDecimal sum = BigDecimal.ZERO;
    for (int k = 0; k < model.size(); k++) {
      BigDecimal product = new BigDecimal(model.coefficient(k));
      for (int variable : table.factors(model.index(k))) {
        product = product.multiply(new BigDecimal(x[variable]));
      }
      sum = sum.add(product);
    }
    return sum;
  }

  @ParameterizedTest(name = "seed {0}")
  @MethodSource("seeds")
  void randomCompositionsContainTheirValuesInDecimals(long seed) {
    SplittableRandom random = new SplittableRandom(seed);
    int m = random.nextInt(1, 4);
    int degree = random.nextInt(0, 4);
    MultiIndexTable table = MultiIndexTable.of(m, Math.max(1, degree));
    drawPoints(random, m);
    // Degree 0 stands for single points, where a model is a constant.
    Pair a = degree == 0 ? point(table, random) : variable(table, degree, random);
    Pair b = degree == 0 ? point(table, random) : variable(table, degree, random);
    for (int k = 0; k < 6 && a.model.range().magnitude() < 1e6; k++) {
      Pair next = step(a, b, random);
      b = a;
      a = next;
      contains(a, table, seed);
    }
  }

  private Pair point(MultiIndexTable table, SplittableRandom random) {
    double value = random.nextDouble(-2, 2);
    List<BigDecimal> values = points.stream().map(x -> new BigDecimal(value)).toList();
    return new Pair(TaylorModel.constant(table, 0, Interval.of(value)), values);
  }

  private void contains(Pair pair, MultiIndexTable table, long seed) {
    Interval range = pair.model.range();
    for (int k = 0; k < points.size(); k++) {
      BigDecimal value = pair.values.get(k);
      if (Double.isFinite(pair.model.remainder())) {
        BigDecimal distance = value.subtract(polynomial(pair.model, table, points.get(k))).abs();
        assertTrue(
            distance.compareTo(new BigDecimal(pair.model.remainder())) <= 0,
            "seed " + seed + ": " + distance + " above " + pair.model.remainder());
      }
      assertTrue(
          range.contains(value.doubleValue())
              || range.contains(Math.nextUp(value.doubleValue()))
              || range.contains(Math.nextDown(value.doubleValue())));
    }
  }

  @Test
  void theRemainderShrinksLikeTheNextPowerOfTheWidth() {
    MultiIndexTable table = MultiIndexTable.of(1, 2);
    double wide = remainder(table, 0.1);
    double narrow = remainder(table, 0.05);
    // [closed form] Lagrange remainder e^(xi) h^3 / 6: halving h gives an eighth, up to e^h
    assertEquals(8, wide / narrow, 0.5);
    assertEquals(Math.pow(0.1, 3) / 6, wide, 0.12 * wide);
  }

  private static double remainder(MultiIndexTable table, double width) {
    return TaylorModel.affine(table, 2, new double[] {width}, 0, 0)
        .compose(Function.EXP)
        .remainder();
  }

  @Test
  void aSquareRootThatReachesZeroIsAConstantWithItsWholeRange() {
    MultiIndexTable table = MultiIndexTable.of(1, 2);
    TaylorModel model = TaylorModel.affine(table, 2, new double[] {1}, 1, 0).compose(Function.SQRT);
    assertEquals(1, model.size());
    // [closed form] the square root takes [0, 2] to [0, sqrt 2]
    assertTrue(model.range().contains(Interval.of(0, Math.sqrt(2))));
    assertTrue(model.remainder() < 0.71);
  }

  @Test
  void aReciprocalOfARangeWithZeroInsideIsUnbounded() {
    MultiIndexTable table = MultiIndexTable.of(1, 2);
    TaylorModel model =
        TaylorModel.affine(table, 2, new double[] {1}, 0.5, 0).compose(Function.RECIPROCAL);
    assertEquals(Double.POSITIVE_INFINITY, model.remainder());
  }
}
