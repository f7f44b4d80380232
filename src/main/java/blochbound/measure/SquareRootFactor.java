package blochbound.measure;

import blochbound.interval.Interval;
import blochbound.interval.Rounding;
import blochbound.linalg.ComplexBall;
import blochbound.linalg.ComplexMatrix;
import blochbound.linalg.Hermitian;
import blochbound.linalg.HermitianEigen;

/**
 * A floating-point matrix S, taken as exact, with S S^+ near a given matrix: the positive
 * semidefinite neighbour that square-root continuity bounds start from.
 */
final class SquareRootFactor {
  private final ComplexMatrix factor;
  private final double error;
  private final double leastEigenvalue;
  private final double largestEigenvalue;

  private SquareRootFactor(ComplexMatrix factor, double error, Interval least, Interval largest) {
    this.factor = factor;
    this.error = error;
    this.leastEigenvalue = Rounding.addDown(least.lower(), -error);
    this.largestEigenvalue = Rounding.addUp(largest.upper(), error);
  }

  /** Factor from the eigenvalues above {@code cut}, as d by r columns, r at least one. */
  static SquareRootFactor of(Hermitian matrix, double cut) {
    HermitianEigen eigen = matrix.eigen();
    return of(columns(eigen, cut), matrix, eigen);
  }

  /** The factor alone, an estimate. */
  static ComplexMatrix estimate(Hermitian matrix, double cut) {
    return columns(matrix.eigen(), cut);
  }

  private static ComplexMatrix columns(HermitianEigen eigen, double cut) {
    int d = eigen.values().length;
    int r = 1;
    while (r < d && eigen.value(d - 1 - r) > cut) {
      r++;
    }
    ComplexMatrix vectors = eigen.vectors();
    double[] re = new double[d * r];
    double[] im = new double[d * r];
    for (int k = 0; k < r; k++) {
      double root = Math.sqrt(Math.max(0, eigen.value(d - 1 - k)));
      for (int i = 0; i < d; i++) {
        re[i * r + k] = root * vectors.re(i, d - 1 - k);
        im[i * r + k] = root * vectors.im(i, d - 1 - k);
      }
    }
    return ComplexMatrix.of(d, r, re, im);
  }

  /** Takes a computed factor and proves how near its square is. */
  static SquareRootFactor of(ComplexMatrix factor, Hermitian matrix, HermitianEigen eigen) {
    ComplexBall s = ComplexBall.exact(factor);
    double error = s.times(s.adjoint()).minus(ComplexBall.exact(matrix.matrix())).normUp();
    return new SquareRootFactor(factor, error, eigen.smallest(), eigen.largest());
  }

  /** The matrix S. */
  ComplexMatrix factor() {
    return factor;
  }

  /** Bound of |S S^+ - matrix| in the Frobenius norm. */
  double error() {
    return error;
  }

  /** Lower bound of the smallest eigenvalue of S S^+; at most zero means nothing is known. */
  double leastEigenvalue() {
    return leastEigenvalue;
  }

  /** Upper bound of the largest eigenvalue of S S^+. */
  double largestEigenvalue() {
    return largestEigenvalue;
  }

  /** Upper bound of |S|_F. */
  double normUp() {
    return ComplexBall.exact(factor).normUp();
  }

  /**
   * Bound of |sqrt(rho) - sqrt(S S^+)|_F for all rho &gt;= 0 within a Frobenius distance of the
   * matrix: sqrt(|rho - S S^+|_1) (R. T. Powers, E. Stormer, Commun. Math. Phys. 16 (1970) 1), or
   * |rho - S S^+|_F / sqrt(m) with m the smallest eigenvalue of S S^+. The second follows from A^2
   * - B^2 = A (A - B) + (A - B) B and A &gt;= 0, B &gt;= sqrt(m).
   */
  double rootDistanceUp(double distance) {
    double reach = Rounding.addUp(distance, error);
    double general = Rounding.sqrtUp(OperatorArithmetic.traceNormUp(reach, factor.rows()));
    return leastEigenvalue > 0
        ? Math.min(general, Rounding.divideUp(reach, Math.nextDown(Math.sqrt(leastEigenvalue))))
        : general;
  }
}
