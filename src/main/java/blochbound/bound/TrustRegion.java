package blochbound.bound;

import blochbound.interval.Rounding;
import blochbound.linalg.ComplexMatrix;
import blochbound.linalg.Hermitian;
import blochbound.linalg.HermitianEigen;

/**
 * Certified lower bound of g'x + x'Qx over the unit ball |x|_2 at most 1.
 *
 * <p>For lambda at least 0 with P = Q + lambda I &gt;= mu &gt; 0 the Lagrangian g'x + x'Px - lambda
 * is at least its value at any x minus |g + 2 P x|^2 / (4 mu). mu is an eigenvalue enclosure, so an
 * inexact lambda or x never breaks the bound. Source: J. J. More, D. C. Sorensen, SIAM J. Sci.
 * Stat. Comput. 4 (1983) 553 (from memory).
 */
final class TrustRegion {
  private final double[][] q;
  private final double[] g;
  private final HermitianEigen eigen;
  private final int m;

  private TrustRegion(double[][] q, double[] g) {
    this.q = q;
    this.g = g;
    m = g.length;
    eigen = HermitianEigen.of(Hermitian.part(ComplexMatrix.real(q)));
  }

  /**
   * The bound.
   *
   * @param q symmetric matrix, m by m
   * @param g vector of length m
   */
  static double certifiedMinimum(double[][] q, double[] g) {
    if (g.length == 0) {
      return 0;
    }
    TrustRegion problem = new TrustRegion(q, g);
    double lambda = problem.multiplier();
    // |g'x + x'Qx| is at most |g| + |Q|_F on the ball, whatever the multipliers give.
    double best = -Rounding.addUp(Rounding.normUp(g), frobeniusUp(q));
    double spread = Math.abs(problem.eigen.value(0)) + Math.abs(problem.eigen.value(problem.m - 1));
    for (double extra : new double[] {0, 1e-14, 1e-12, 1e-10, 1e-7, 1e-4}) {
      best = Math.max(best, problem.lagrangian(lambda + extra * (spread + lambda)));
    }
    return best;
  }

  private static double frobeniusUp(double[][] q) {
    double[] rows = new double[q.length];
    for (int i = 0; i < q.length; i++) {
      rows[i] = Rounding.normUp(q[i]);
    }
    return Rounding.normUp(rows);
  }

  /** Multiplier at which the minimiser of the Lagrangian reaches the rim, by bisection. */
  private double multiplier() {
    double low = Math.max(0, -eigen.value(0));
    double norm = Rounding.normUp(g);
    double high = low + norm + 1e-300;
    if (length(low) <= 1) {
      return low;
    }
    for (int k = 0; k < 200 && low < high; k++) {
      double middle = 0.5 * (low + high);
      if (middle == low || middle == high) {
        break;
      }
      if (length(middle) > 1) {
        low = middle;
      } else {
        high = middle;
      }
    }
    return high;
  }

  /** Length of the minimiser -(Q + lambda)^-1 g / 2. */
  private double length(double lambda) {
    double sum = 0;
    for (int k = 0; k < m; k++) {
      double part = component(k) / (2 * (eigen.value(k) + lambda));
      sum += Double.isNaN(part) ? 0 : part * part;
    }
    return Math.sqrt(sum);
  }

  private double component(int k) {
    double sum = 0;
    for (int i = 0; i < m; i++) {
      sum += eigen.vectors().re(i, k) * g[i];
    }
    return sum;
  }

  private double lagrangian(double lambda) {
    double mu = Rounding.addDown(Rounding.addDown(eigen.value(0), -eigen.errorBound()), lambda);
    if (!(mu > 0) || !(lambda >= 0)) {
      return Double.NEGATIVE_INFINITY;
    }
    double[] x = new double[m];
    for (int k = 0; k < m; k++) {
      double part = -component(k) / (2 * (eigen.value(k) + lambda));
      for (int i = 0; i < m; i++) {
        x[i] += part * eigen.vectors().re(i, k);
      }
    }
    double value = -lambda;
    double size = lambda;
    double residual = 0;
    for (int i = 0; i < m; i++) {
      double row = lambda * x[i];
      double rowSize = Math.abs(row);
      for (int j = 0; j < m; j++) {
        row += q[i][j] * x[j];
        rowSize += Math.abs(q[i][j] * x[j]);
      }
      value += x[i] * (g[i] + row);
      size += Math.abs(x[i]) * (Math.abs(g[i]) + rowSize);
      double slope =
          Math.abs(g[i] + 2 * row) + Rounding.gamma(m + 8L) * (Math.abs(g[i]) + 2 * rowSize);
      residual += slope * slope;
    }
    double lost = Rounding.divideUp(Rounding.inflate(residual, 4L * m + 8), 4 * mu);
    double rounding = Rounding.gamma(4L * m + 16) * size * 2;
    return Rounding.addDown(value, -Rounding.addUp(lost, rounding));
  }
}
