package blochbound.sample;

import blochbound.check.Check;
import java.util.SplittableRandom;
import org.apache.commons.math3.random.SobolSequenceGenerator;

/** A reproducible sequence of points strictly inside the unit cube. */
interface UnitPoints {
  /** Largest dimension of the Sobol direction numbers at hand. */
  int LARGEST_SOBOL_DIMENSION = 1000;

  /** Writes the next point. */
  void next(double[] u);

  /**
   * Points of the given kind.
   *
   * @throws IllegalArgumentException when a Sobol sequence of that dimension is not available
   */
  static UnitPoints of(SamplePoints kind, int dimension, long seed) {
    SplittableRandom random = new SplittableRandom(seed);
    return kind == SamplePoints.MONTE_CARLO
        ? u -> fill(random, u)
        : shiftedSobol(dimension, random);
  }

  private static void fill(SplittableRandom random, double[] u) {
    for (int i = 0; i < u.length; i++) {
      u[i] = inside(random.nextDouble());
    }
  }

  private static UnitPoints shiftedSobol(int dimension, SplittableRandom random) {
    Check.that(
        dimension <= LARGEST_SOBOL_DIMENSION,
        "Sobol points have at most "
            + LARGEST_SOBOL_DIMENSION
            + " dimensions, not "
            + dimension
            + "; take Monte Carlo points");
    SobolSequenceGenerator sobol = new SobolSequenceGenerator(dimension);
    double[] shift = new double[dimension];
    fill(random, shift);
    return u -> {
      double[] point = sobol.nextVector();
      for (int i = 0; i < u.length; i++) {
        double sum = point[i] + shift[i];
        u[i] = inside(sum < 1 ? sum : sum - 1);
      }
    };
  }

  /** Moves the end 0 inside, where every inverse distribution function is finite. */
  private static double inside(double u) {
    return Math.max(u, 0x1p-54);
  }
}
