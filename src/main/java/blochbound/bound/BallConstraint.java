package blochbound.bound;

import blochbound.generator.MultiIndexTable;
import blochbound.interval.Rounding;
import blochbound.model.Ball.Norm;
import blochbound.model.Region;
import java.util.Optional;

/**
 * The constraint |z| at most 1 on boxes that may reach beyond the ball.
 *
 * @param norm norm of the ball
 */
record BallConstraint(Norm norm) {
  /**
   * The smallest box around the part of a region inside the ball, rounded outwards; empty when no
   * part is inside.
   */
  Optional<Region> tighten(Region region) {
    if (norm == Norm.BOX) {
      return Optional.of(region);
    }
    int m = region.coordinates();
    double[] nearest = new double[m];
    double sum = 0;
    for (int j = 0; j < m; j++) {
      nearest[j] = power(Math.max(0, Math.abs(region.centre(j)) - region.halfWidth(j)));
      sum += nearest[j];
    }
    double slack = 1e-14 * (m + 1);
    if (sum > 1 + slack) {
      return Optional.empty();
    }
    double[] centre = region.centre();
    double[] half = new double[m];
    for (int j = 0; j < m; j++) {
      double room = Math.max(0, 1 - (sum - nearest[j])) + slack;
      double reach = (norm == Norm.ELLIPSOID ? Math.sqrt(room) : room) + slack;
      half[j] = region.halfWidth(j);
      double low = Math.max(centre[j] - half[j], -reach);
      double high = Math.min(centre[j] + half[j], reach);
      if (high - low < 2 * half[j] * (1 - 1e-3)) {
        centre[j] = 0.5 * (low + high);
        half[j] = 0.5 * Math.max(0, high - low) + 4 * Math.ulp(Math.abs(low) + Math.abs(high));
      }
    }
    return Optional.of(new Region(centre, half));
  }

  private double power(double distance) {
    return norm == Norm.ELLIPSOID ? distance * distance : distance;
  }

  /** Tells whether a box reaches beyond the ball, so that the constraint says something new. */
  boolean cuts(Region region) {
    double sum = 0;
    for (int j = 0; norm != Norm.BOX && j < region.coordinates(); j++) {
      sum += power(Math.abs(region.centre(j)) + region.halfWidth(j));
    }
    return sum > 1;
  }

  /** The point itself, or the nearest one on its ray inside the ball. */
  double[] project(double[] z) {
    double size = 0;
    double[] inside = z.clone();
    for (int j = 0; j < z.length; j++) {
      inside[j] = norm == Norm.BOX ? Math.max(-1, Math.min(1, z[j])) : z[j];
      size += norm == Norm.BOX ? 0 : power(Math.abs(z[j]));
    }
    double length = norm == Norm.ELLIPSOID ? Math.sqrt(size) : size;
    for (int j = 0; j < z.length && length > 1; j++) {
      inside[j] /= length;
    }
    return inside;
  }

  /** Multipliers worth trying for a polynomial with the given linear terms in x. */
  double[] multipliers(double[] polynomial, Region region) {
    double squares = 0;
    double most = 0;
    for (int j = 0; j < region.coordinates(); j++) {
      if (region.halfWidth(j) > 0) {
        double slope = Math.abs(polynomial[j + 1]) / region.halfWidth(j);
        squares += slope * slope;
        most = Math.max(most, slope);
      }
    }
    double scale = norm == Norm.ELLIPSOID ? 0.5 * Math.sqrt(squares) : most;
    return new double[] {0.5 * scale, 0.75 * scale, scale, 1.3 * scale};
  }

  /**
   * Adds lambda times the constraint to a polynomial in x; where the ball is met the added part is
   * not positive, so a lower bound of the sum over the box is one of the polynomial over the part
   * inside the ball (weak duality).
   *
   * @param polynomial coefficients up to degree 2 at least, changed in place
   * @return how far rounding may have raised the polynomial anywhere in the box
   */
  double add(double[] polynomial, MultiIndexTable table, Region region, double lambda) {
    double size = 1;
    polynomial[0] -= lambda;
    for (int j = 0; j < region.coordinates(); j++) {
      double c = region.centre(j);
      double h = region.halfWidth(j);
      size += (Math.abs(c) + h) * (Math.abs(c) + h + 1);
      if (norm == Norm.ELLIPSOID) {
        polynomial[0] += lambda * c * c;
        polynomial[j + 1] += 2 * lambda * c * h;
        polynomial[table.plus(j + 1, j)] += lambda * h * h;
      } else {
        // |z_j| is at least sign * z_j for either sign.
        double sign = c != 0 ? Math.signum(c) : -Math.signum(polynomial[j + 1]);
        polynomial[0] += lambda * sign * c;
        polynomial[j + 1] += lambda * sign * h;
      }
    }
    double before = 0;
    for (int a = 0; a <= region.coordinates(); a++) {
      before += Math.abs(polynomial[a]);
    }
    for (int j = 0; norm == Norm.ELLIPSOID && j < region.coordinates(); j++) {
      before += Math.abs(polynomial[table.plus(j + 1, j)]);
    }
    return Rounding.gamma(8L * region.coordinates() + 16) * 2 * (lambda * size + before);
  }
}
