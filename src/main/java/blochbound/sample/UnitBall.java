package blochbound.sample;

import blochbound.model.Ball.Norm;
import org.apache.commons.math3.special.Gamma;

/** The unit ball of one of the three norms in m coordinates z. */
record UnitBall(Norm norm, int dimension) {
  /** Tells whether a point lies in the ball, to rounding of its norm. */
  boolean contains(double[] z) {
    double size = 0;
    for (double zj : z) {
      size =
          switch (norm) {
            case BOX -> Math.max(size, Math.abs(zj));
            case ELLIPSOID -> size + zj * zj;
            case DIAMOND -> size + Math.abs(zj);
          };
    }
    return size <= 1;
  }

  /**
   * Volume: 2^m, pi^(m/2) / Gamma(m/2 + 1) or 2^m / m!.
   *
   * <p>By logarithms, so that it stays accurate to about 1e-14 m.
   */
  double volume() {
    double m = dimension;
    return switch (norm) {
      case BOX -> Math.pow(2, m);
      case ELLIPSOID -> Math.exp(0.5 * m * Math.log(Math.PI) - Gamma.logGamma(0.5 * m + 1));
      case DIAMOND -> Math.exp(m * Math.log(2) - Gamma.logGamma(m + 1));
    };
  }

  /**
   * Writes a point equally likely anywhere in the ball, from m + 1 numbers equally likely in (0,
   * 1).
   *
   * <p>Norm 2: a normal vector gives the direction, the last number to the power 1/m the radius.
   * Norm 1: two-sided exponential coordinates over the sum of their sizes and one more exponential
   * (the gaps of uniform order statistics; L. Devroye, Non-Uniform Random Variate Generation, 1986,
   * chapter V, from memory).
   */
  void point(double[] u, double[] z) {
    switch (norm) {
      case BOX -> {
        for (int j = 0; j < dimension; j++) {
          z[j] = 2 * u[j] - 1;
        }
      }
      case ELLIPSOID -> {
        double squares = 0;
        for (int j = 0; j < dimension; j++) {
          z[j] = Marginal.Normal.standardQuantile(u[j]);
          squares += z[j] * z[j];
        }
        scale(z, Math.pow(u[dimension], 1.0 / dimension) / Math.sqrt(squares));
      }
      case DIAMOND -> {
        double sum = -Math.log(u[dimension]);
        for (int j = 0; j < dimension; j++) {
          double side = 2 * u[j] - 1;
          z[j] = -Math.copySign(Math.log1p(-Math.abs(side)), side);
          sum += Math.abs(z[j]);
        }
        scale(z, 1 / sum);
      }
    }
  }

  private void scale(double[] z, double factor) {
    for (int j = 0; j < dimension; j++) {
      z[j] *= factor;
    }
  }
}
