package blochbound.search;

import blochbound.check.Check;
import blochbound.model.Ball.Norm;
import java.util.Arrays;
import java.util.SplittableRandom;

/**
 * The nearest point, in the Euclidean distance, of the unit ball of a norm: exact up to rounding,
 * and always inside as {@link #contains} computes it.
 *
 * <p>Box: each coordinate is cut at -1 and 1. Ellipsoid: division by the length. Diamond:
 * projection of the absolute values onto the simplex by sorting (Duchi, Shalev-Shwartz, Singer,
 * Chandra, Efficient projections onto the l1-ball, ICML 2008, algorithm of figure 1; recalled from
 * memory).
 *
 * @param norm norm of the ball
 */
public record BallProjection(Norm norm) {
  /** Tells whether the norm of z, as computed in floating point, is at most 1. */
  public boolean contains(double[] z) {
    double size = 0;
    for (double x : z) {
      size =
          switch (norm) {
            case BOX -> Math.max(size, Math.abs(x));
            case ELLIPSOID -> size + x * x;
            case DIAMOND -> size + Math.abs(x);
          };
    }
    return size <= 1;
  }

  /**
   * The nearest point of the ball; a copy of z when z is inside. Its error is some units in the
   * last place of the largest coordinate of z.
   *
   * @throws IllegalArgumentException when a coordinate is not finite
   */
  public double[] project(double[] z) {
    double[] nearest = z.clone();
    if (contains(z)) {
      return nearest;
    }
    for (double x : z) {
      Check.finite(x, "coordinate");
    }
    switch (norm) {
      case BOX -> Arrays.setAll(nearest, j -> Math.max(-1, Math.min(1, z[j])));
      case ELLIPSOID -> divideByLength(nearest);
      case DIAMOND -> shrinkTowardsZero(nearest);
    }
    while (!contains(nearest)) {
      // Rounding left the point outside by some units in the last place.
      Arrays.setAll(nearest, j -> nearest[j] * (1 - 0x1p-52));
    }
    return nearest;
  }

  private static void divideByLength(double[] z) {
    double largest = 0;
    for (double x : z) {
      largest = Math.max(largest, Math.abs(x));
    }
    double sum = 0;
    for (double x : z) {
      // Scaled by the largest, so that squares neither overflow nor vanish.
      sum += (x / largest) * (x / largest);
    }
    double root = Math.sqrt(sum);
    for (int j = 0; j < z.length; j++) {
      z[j] = z[j] / largest / root;
    }
  }

  private static void shrinkTowardsZero(double[] z) {
    double[] sizes = new double[z.length];
    Arrays.setAll(sizes, j -> Math.abs(z[j]));
    projectOntoSimplex(sizes);
    Arrays.setAll(z, j -> Math.copySign(sizes[j], z[j]));
  }

  /**
   * Replaces v by the nearest vector with nonnegative entries of sum 1: the positive parts of v -
   * theta. Entries are taken relative to the largest, so that large ones do not swallow the 1.
   */
  static void projectOntoSimplex(double[] v) {
    double largest = Arrays.stream(v).max().orElse(0);
    Arrays.setAll(v, j -> v[j] - largest);
    double[] sorted = v.clone();
    Arrays.sort(sorted);
    double sum = 0;
    double theta = 0;
    for (int count = 1; count <= sorted.length; count++) {
      double entry = sorted[sorted.length - count];
      sum += entry;
      double candidate = (sum - 1) / count;
      if (entry > candidate) {
        theta = candidate;
      }
    }
    double threshold = theta;
    Arrays.setAll(v, j -> Math.max(0, v[j] - threshold));
  }

  /** A point drawn uniformly from the ball. */
  public double[] random(SplittableRandom random, int coordinates) {
    double[] z = new double[coordinates];
    switch (norm) {
      case BOX -> Arrays.setAll(z, j -> random.nextDouble(-1, 1));
      case ELLIPSOID -> fillEllipsoid(random, z);
      case DIAMOND -> fillDiamond(random, z);
    }
    return project(z);
  }

  private static void fillEllipsoid(SplittableRandom random, double[] z) {
    double sum = 0;
    for (int j = 0; j < z.length; j++) {
      z[j] = random.nextGaussian();
      sum += z[j] * z[j];
    }
    double length = Math.pow(random.nextDouble(), 1.0 / z.length) / Math.sqrt(sum);
    Arrays.setAll(z, j -> z[j] * length);
  }

  /** Spacings of a Poisson process: the first m of m + 1 exponential draws over their sum. */
  private static void fillDiamond(SplittableRandom random, double[] z) {
    double sum = random.nextExponential();
    for (int j = 0; j < z.length; j++) {
      double draw = random.nextExponential();
      sum += draw;
      z[j] = random.nextBoolean() ? draw : -draw;
    }
    double total = sum;
    Arrays.setAll(z, j -> z[j] / total);
  }
}
