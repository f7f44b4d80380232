package blochbound.measure;

/**
 * Singular values of small complex matrices by one-sided Jacobi rotations, on plain arrays.
 *
 * <p>A matrix of m rows is stored column by column: entry (i, j) at j m + i. After {@link
 * #orthogonalise} its columns are orthogonal to rounding; their lengths are the singular values, of
 * which small ones are as accurate as the columns allow (J. Demmel, K. Veselic, SIAM J. Matrix
 * Anal. Appl. 13 (1992) 1204). Estimates: no error bound is given.
 */
final class OneSidedJacobi {
  private static final int MOST_SWEEPS = 40;
  private static final double TOLERANCE = 1e-32;

  private OneSidedJacobi() {}

  /**
   * Replaces M by M V with orthogonal columns, V unitary.
   *
   * @param m number of rows
   * @param n number of columns
   * @param vRe real parts of an n by n matrix that is multiplied by V too; empty when not wanted
   */
  static void orthogonalise(double[] re, double[] im, int m, int n, double[] vRe, double[] vIm) {
    boolean turned = true;
    for (int sweep = 0; turned && sweep < MOST_SWEEPS; sweep++) {
      turned = false;
      for (int p = 0; p < n; p++) {
        for (int q = p + 1; q < n; q++) {
          turned |= rotatePair(re, im, m, p, q, vRe, vIm, n);
        }
      }
    }
  }

  /** Length of a column. */
  static double length(double[] re, double[] im, int m, int column) {
    double sum = 0;
    for (int i = column * m; i < (column + 1) * m; i++) {
      sum += re[i] * re[i] + im[i] * im[i];
    }
    return Math.sqrt(sum);
  }

  private static boolean rotatePair(
      double[] re, double[] im, int m, int p, int q, double[] vRe, double[] vIm, int n) {
    double a = 0;
    double b = 0;
    double gRe = 0;
    double gIm = 0;
    for (int i = 0; i < m; i++) {
      double pRe = re[p * m + i];
      double pIm = im[p * m + i];
      double qRe = re[q * m + i];
      double qIm = im[q * m + i];
      a += pRe * pRe + pIm * pIm;
      b += qRe * qRe + qIm * qIm;
      gRe += pRe * qRe + pIm * qIm;
      gIm += pRe * qIm - pIm * qRe;
    }
    double square = gRe * gRe + gIm * gIm;
    if (!(square > TOLERANCE * a * b)) {
      return false;
    }
    double g = Math.sqrt(square);
    double zeta = (b - a) / (2 * g);
    double t = Math.copySign(1, zeta) / (Math.abs(zeta) + Math.sqrt(1 + zeta * zeta));
    double c = 1 / Math.sqrt(1 + t * t);
    double sRe = c * t * gRe / g;
    double sIm = c * t * gIm / g;
    rotate(re, im, m, p, q, c, sRe, sIm);
    if (vRe.length > 0) {
      rotate(vRe, vIm, n, p, q, c, sRe, sIm);
    }
    return true;
  }

  /** Columns p, q become c p - conj(s) q and s p + c q. */
  private static void rotate(
      double[] re, double[] im, int m, int p, int q, double c, double sRe, double sIm) {
    for (int i = 0; i < m; i++) {
      int ip = p * m + i;
      int iq = q * m + i;
      double pRe = re[ip];
      double pIm = im[ip];
      double qRe = re[iq];
      double qIm = im[iq];
      re[ip] = c * pRe - (sRe * qRe + sIm * qIm);
      im[ip] = c * pIm - (sRe * qIm - sIm * qRe);
      re[iq] = sRe * pRe - sIm * pIm + c * qRe;
      im[iq] = sRe * pIm + sIm * pRe + c * qIm;
    }
  }
}
