package blochbound.measure;

import blochbound.interval.Rounding;
import blochbound.linalg.Hermitian;
import blochbound.linalg.HermitianEigen;

/**
 * An exact unitary U and exact numbers L with |X - U diag(L) U^+|_F at most {@link #residual()}.
 *
 * <p>L are the computed eigenvalues of X. U is the unitary polar factor of the computed
 * eigenvectors V: it is never formed, but |V - U|_F &lt;= |V^+ V - 1|_F, because every singular
 * value v of V has |v - 1| &lt;= |v^2 - 1|. Functions and projectors made with U are therefore
 * exact ones, known up to a proved error, and no computed projector has to be repaired.
 */
final class SpectralFrame {
  private final HermitianEigen eigen;
  private final double[] values;
  private final double defect;
  private final double residual;

  private SpectralFrame(HermitianEigen eigen) {
    this.eigen = eigen;
    this.values = eigen.values();
    this.defect = eigen.orthogonalityDefect();
    // errorBound >= |X - V L V^+| + defect max|L|, and |V L V^+ - U L U^+| <= defect max|L| (2 +
    // defect).
    this.residual =
        Rounding.timesUp(Rounding.timesUp(2, Rounding.addUp(1, defect)), eigen.errorBound());
  }

  static SpectralFrame of(Hermitian matrix) {
    return new SpectralFrame(matrix.eigen());
  }

  int size() {
    return values.length;
  }

  /** The numbers L, ascending. */
  double value(int k) {
    return values[k];
  }

  /** Bound of |X - U diag(L) U^+| in the Frobenius norm. */
  double residual() {
    return residual;
  }

  /** Bound of |V - U| in the Frobenius norm. */
  double defect() {
    return defect;
  }

  /** The computed decomposition. */
  HermitianEigen eigen() {
    return eigen;
  }

  /** The operator U diag(f) U^+. */
  ApproximateOperator withValues(double[] f) {
    double sum = 0;
    double most = 0;
    for (double x : f) {
      sum += Math.abs(x);
      most = Math.max(most, Math.abs(x));
    }
    // Entries of V f V^+: n + 5 roundings, moduli sum to at most |f|_1 (1 + defect)^2 in the norm.
    double spread = Rounding.addUp(1, defect);
    double rounding =
        Rounding.timesUp(
            Rounding.timesUp(Rounding.gamma(2L * size() + 10), Rounding.inflate(sum, size())),
            Rounding.timesUp(spread, spread));
    double turning = Rounding.timesUp(Rounding.timesUp(defect, Rounding.addUp(2, defect)), most);
    return new ApproximateOperator(eigen.withValues(f), Rounding.addUp(rounding, turning));
  }
}
