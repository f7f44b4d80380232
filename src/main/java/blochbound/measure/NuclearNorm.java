package blochbound.measure;

import blochbound.interval.Interval;
import blochbound.linalg.ComplexBall;
import blochbound.linalg.ComplexMatrix;
import blochbound.linalg.Hermitian;
import blochbound.linalg.HermitianEigen;

/** The sum of singular values |T|_1: an estimate, and a certified enclosure. */
final class NuclearNorm {
  private NuclearNorm() {}

  /** Sum of the singular values, rounded. */
  static double estimate(ComplexMatrix t) {
    // The adjoint's real parts, row-major, are the columns of conj(T).
    double[] re = t.adjoint().realParts();
    double[] im = t.adjoint().imaginaryParts();
    OneSidedJacobi.orthogonalise(re, im, t.rows(), t.columns(), new double[0], new double[0]);
    double sum = 0;
    for (int k = 0; k < t.columns(); k++) {
      sum += OneSidedJacobi.length(re, im, t.rows(), k);
    }
    return sum;
  }

  /** Certified enclosure of the sum for all members of a ball. */
  static Interval enclosure(ComplexBall t) {
    Interval norm = signedSum(t, 1);
    return Interval.of(Math.max(0, norm.lower()), Math.max(0, norm.upper()));
  }

  /**
   * Certified enclosure of the largest singular value plus or minus all others, for all members of
   * a ball.
   *
   * <p>The Hermitian matrix [[0, T], [T^+, 0]] has the eigenvalues plus and minus the singular
   * values; each of the r computed ones misses by at most its error bound, and within the ball the
   * sum of all changes is at most sqrt(r) times the radius (L. Mirsky, Quart. J. Math. 11 (1960)
   * 50).
   *
   * @param others weight of all but the largest singular value, 1 or -1
   */
  static Interval signedSum(ComplexBall t, int others) {
    int m = t.centre().rows();
    int n = t.centre().columns();
    HermitianEigen eigen = augmented(t.centre()).eigen();
    int r = Math.min(m, n);
    double error = eigen.errorBound();
    Interval sum = OperatorArithmetic.around(eigen.value(m + n - 1), error);
    for (int k = 1; k < r; k++) {
      Interval value = OperatorArithmetic.around(eigen.value(m + n - 1 - k), error);
      sum = others > 0 ? sum.plus(value) : sum.minus(value);
    }
    double spread = OperatorArithmetic.traceNormUp(t.radius(), r);
    return sum.plus(Interval.of(-spread, spread));
  }

  private static Hermitian augmented(ComplexMatrix t) {
    int m = t.rows();
    int size = m + t.columns();
    double[] re = new double[size * size];
    double[] im = new double[size * size];
    for (int i = 0; i < m; i++) {
      for (int j = 0; j < t.columns(); j++) {
        re[i * size + m + j] = t.re(i, j);
        im[i * size + m + j] = t.im(i, j);
        re[(m + j) * size + i] = t.re(i, j);
        im[(m + j) * size + i] = -t.im(i, j);
      }
    }
    return new Hermitian(ComplexMatrix.of(size, size, re, im));
  }
}
