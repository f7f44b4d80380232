package blochbound.bound;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.math.BigDecimal;
import java.util.SplittableRandom;
import java.util.stream.Stream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;
import org.junit.jupiter.params.provider.ValueSource;

class TrustRegionTest {
  /** min (1/2) x'Hx + g'x over |x| at most {@code radius}, H diagonal. */
  private record Instance(double[] h, double[] g, double radius, double value) {}

  // [published] theory More, Sorensen, SIAM J. Sci. Stat. Comput. 4 (1983) 553, from memory; the
  // values from the optimality conditions (H + lambda) x = -g, |x| = radius or lambda = 0
  static Stream<Instance> instances() {
    return Stream.of(
        new Instance(new double[] {1, 2}, new double[] {1, 1}, 0.5, -0.530258659278092),
        new Instance(new double[] {-1, 2}, new double[] {1, 1}, 1, -1.62450403220698),
        new Instance(new double[] {-2, 1}, new double[] {0, 1}, 1, -7.0 / 6),
        new Instance(new double[] {2, 3}, new double[] {-1, -1}, 10, -5.0 / 12),
        new Instance(new double[] {-2, -1, 3}, new double[] {0, 0, 0}, 1, -1));
  }

  private static double bound(Instance instance) {
    int m = instance.g.length;
    double[][] q = new double[m][m];
    double[] g = new double[m];
    for (int i = 0; i < m; i++) {
      // x = radius y turns the ball into the unit ball; the kernel has no factor 1/2.
      q[i][i] = 0.5 * instance.h[i] * instance.radius * instance.radius;
      g[i] = instance.g[i] * instance.radius;
    }
    return TrustRegion.certifiedMinimum(q, g);
  }

  @ParameterizedTest
  @MethodSource("instances")
  void knownInstancesAreMetFromBelow(Instance instance) {
    assertEquals(instance.value, bound(instance), 1e-9);
    // The published digits end after the fifteenth.
    assertTrue(bound(instance) <= instance.value + 1e-14);
  }

  private static BigDecimal value(double[][] q, double[] g, BigDecimal[] x) {
    BigDecimal sum = BigDecimal.ZERO;
    for (int i = 0; i < g.length; i++) {
      BigDecimal row = new BigDecimal(g[i]);
      for (int j = 0; j < g.length; j++) {
        row = row.add(new BigDecimal(q[i][j]).multiply(x[j]));
      }
      sum = sum.add(x[i].multiply(row));
    }
    return sum;
  }

  /** A point of the unit ball, exactly inside. */
  private static BigDecimal[] inside(double[] x) {
    double size = 0;
    for (double v : x) {
      size += v * v;
    }
    double scale = size > 1 - 1e-14 ? (1 - 1e-14) / Math.sqrt(size) : 1;
    BigDecimal[] exact = new BigDecimal[x.length];
    BigDecimal squares = BigDecimal.ZERO;
    for (int i = 0; i < x.length; i++) {
      exact[i] = new BigDecimal(x[i] * scale);
      squares = squares.add(exact[i].pow(2));
    }
    assertTrue(squares.compareTo(BigDecimal.ONE) <= 0);
    return exact;
  }

  @ParameterizedTest(name = "seed {0}")
  @MethodSource("blochbound.Draws#seeds")
  void theBoundIsBelowEveryPointOfTheBallAndNearTheBest(long seed) {
    SplittableRandom random = new SplittableRandom(seed);
    int m = random.nextInt(1, 6);
    double size = Math.scalb(1.0, random.nextInt(-40, 41));
    double[][] q = new double[m][m];
    double[] g = new double[m];
    for (int i = 0; i < m; i++) {
      g[i] = random.nextInt(4) == 0 ? 0 : size * random.nextDouble(-1, 1);
      for (int j = 0; j <= i; j++) {
        q[i][j] = random.nextInt(4) == 0 ? 0 : size * random.nextDouble(-1, 1);
        q[j][i] = q[i][j];
      }
    }
    double bound = TrustRegion.certifiedMinimum(q, g);
    BigDecimal exactBound = new BigDecimal(bound);
    double best = Double.POSITIVE_INFINITY;
    for (int k = 0; k < 20; k++) {
      double[] x = descend(q, g, random.doubles(m, -2, 2).toArray(), size);
      BigDecimal value = value(q, g, inside(x));
      assertTrue(value.compareTo(exactBound) >= 0);
      best = Math.min(best, value.doubleValue());
    }
    // [closed form] strong duality holds for one quadratic constraint: the bound is the minimum
    assertEquals(best, bound, 1e-4 * size);
  }

  /** Projected gradient descent: an attained point, however good. */
  private static double[] descend(double[][] q, double[] g, double[] start, double size) {
    double[] x = start;
    for (int k = 0; k < 400; k++) {
      double[] next = new double[x.length];
      double square = 0;
      for (int i = 0; i < x.length; i++) {
        double slope = g[i];
        for (int j = 0; j < x.length; j++) {
          slope += 2 * q[i][j] * x[j];
        }
        next[i] = x[i] - 0.1 * slope / size;
        square += next[i] * next[i];
      }
      double scale = square > 1 ? 1 / Math.sqrt(square) : 1;
      for (int i = 0; i < x.length; i++) {
        next[i] *= scale;
      }
      x = next;
    }
    return x;
  }

  @Test
  void noVariablesAndNoTermsGiveZero() {
    // [closed form] the empty and the zero form have the minimum 0
    assertEquals(0, TrustRegion.certifiedMinimum(new double[0][0], new double[0]), 0);
    assertEquals(0, TrustRegion.certifiedMinimum(new double[2][2], new double[2]), 1e-12);
  }

  @ParameterizedTest
  @ValueSource(doubles = {1e-300, 1e-160, 1e-9, 1e9, 1e160})
  void formsOfAnySizeHaveABound(double size) {
    double[][] q = {{-size, 0}, {0, size}};
    double bound = TrustRegion.certifiedMinimum(q, new double[] {0, 0});
    assertFalse(Double.isNaN(bound));
    // [closed form] the smallest eigenvalue is the minimum over the unit ball
    assertTrue(bound <= -size);
  }
}
