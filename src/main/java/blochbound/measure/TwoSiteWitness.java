package blochbound.measure;

import blochbound.interval.Rounding;
import blochbound.linalg.ComplexMatrix;
import blochbound.linalg.Hermitian;

/**
 * A 2 x 2 matrix A and the concurrence witness W = -(|A&gt;&lt;A|)^PT / |det A| it makes.
 *
 * <p>C(rho) &gt;= tr(W rho) for every state and every A with det A != 0 (F. Verstraete, K.
 * Audenaert, J. Dehaene, B. De Moor, and others, 2001/2002; see notes/measures.md; cited from
 * memory). <i>Proof.</i> C is a convex roof, so pure states suffice. For |psi&gt; with the 2 x 2
 * matrix M and Y = A M^T, &lt;psi|(|A&gt;&lt;A|)^PT|psi&gt; = sum_ik Y_ik conj(Y_ki) = |Y_11|^2 +
 * |Y_22|^2 + 2 Re Y_12 conj(Y_21) &gt;= 2 |Y_11 Y_22| - 2 |Y_12 Y_21| &gt;= -2 |det Y| = -|det A|
 * C, as C = 2 |det M|. A factor 0 &lt;= t &lt;= 1/|det A| in place of 1/|det A| keeps the
 * inequality, since C &gt;= 0: rounding it down is safe.
 */
final class TwoSiteWitness {
  final double[] re = new double[4];
  final double[] im = new double[4];

  /** Takes the dominant eigenvector of -G^PT; false when that has no positive diagonal. */
  boolean takeFrom(ConcurrenceKernel kernel) {
    int column = 0;
    for (int i = 1; i < 4; i++) {
      column = kernel.witnessRe(i, i) > kernel.witnessRe(column, column) ? i : column;
    }
    if (!(kernel.witnessRe(column, column) > 0)) {
      return false;
    }
    for (int i = 0; i < 4; i++) {
      re[i] = kernel.witnessRe(i, column);
      im[i] = kernel.witnessIm(i, column);
    }
    return normalise();
  }

  /** Scales A to |det A| = 1; false when the determinant is lost in rounding. */
  boolean normalise() {
    double size = 0;
    for (int i = 0; i < 4; i++) {
      size += re[i] * re[i] + im[i] * im[i];
    }
    double det = Math.sqrt(detSquare());
    if (!(det > 1e-15 * size) || !Double.isFinite(size)) {
      return false;
    }
    double scale = 1 / Math.sqrt(det);
    for (int i = 0; i < 4; i++) {
      re[i] *= scale;
      im[i] *= scale;
    }
    return true;
  }

  private double detSquare() {
    double dRe = re[0] * re[3] - im[0] * im[3] - (re[1] * re[2] - im[1] * im[2]);
    double dIm = re[0] * im[3] + im[0] * re[3] - (re[1] * im[2] + im[1] * re[2]);
    return dRe * dRe + dIm * dIm;
  }

  /** Certified lower bound of 1/|det A|. */
  private double inverseDeterminantDown() {
    double products =
        Math.sqrt((re[0] * re[0] + im[0] * im[0]) * (re[3] * re[3] + im[3] * im[3]))
            + Math.sqrt((re[1] * re[1] + im[1] * im[1]) * (re[2] * re[2] + im[2] * im[2]));
    // det is a sum of two complex products: gamma_3 of the moduli in each part.
    double error = Rounding.timesUp(Rounding.gamma(8), Rounding.inflate(products, 12));
    double det =
        Rounding.addUp(Rounding.inflate(Math.sqrt(detSquare()), 6), error) + 8 * Rounding.TINY;
    return Math.max(0, Math.nextDown(1 / det));
  }

  /** The witness as a bound for all states, all rounding in its slack. */
  AffineBound bound() {
    double t = inverseDeterminantDown();
    double[] outRe = new double[16];
    double[] outIm = new double[16];
    double size = 0;
    for (int i = 0; i < 4; i++) {
      size += re[i] * re[i] + im[i] * im[i];
      for (int j = i; j < 4; j++) {
        double pRe = -t * (re[i] * re[j] + im[i] * im[j]);
        double pIm = i == j ? 0 : -t * (im[i] * re[j] - re[i] * im[j]);
        int at = ConcurrenceKernel.transposed(i, j);
        int mirrored = ConcurrenceKernel.transposed(j, i);
        outRe[at] = pRe;
        outIm[at] = pIm;
        outRe[mirrored] = pRe;
        outIm[mirrored] = -pIm;
      }
    }
    // Each part of an entry: three roundings, moduli at most t |A_i| |A_j|; sqrt(2) for the
    // modulus.
    double slack = Rounding.timesUp(Rounding.gamma(6), Rounding.inflate(t * size, 10));
    return AffineBound.global(
        new Hermitian(ComplexMatrix.of(4, 4, outRe, outIm)), slack + Rounding.TINY * 64);
  }
}
