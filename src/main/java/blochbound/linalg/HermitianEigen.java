package blochbound.linalg;

import blochbound.interval.Interval;
import blochbound.interval.Rounding;

/**
 * Eigenvalues and eigenvectors of a Hermitian matrix by cyclic Jacobi rotations, with proved error
 * bounds on request.
 *
 * <p>Method: G. H. Golub, C. F. Van Loan, <i>Matrix Computations</i>, section 8.5, with the phase
 * of the complex off-diagonal entry taken into the rotation. Cost O(N^3) for each sweep; meant for
 * N up to a few dozen.
 */
public final class HermitianEigen {
  private static final int MOST_SWEEPS = 60;

  private final Hermitian source;
  private final double[] values;
  private final ComplexMatrix vectors;

  private HermitianEigen(Hermitian source, double[] values, ComplexMatrix vectors) {
    this.source = source;
    this.values = values;
    this.vectors = vectors;
  }

  /** Decomposes a Hermitian matrix. */
  public static HermitianEigen of(Hermitian matrix) {
    int n = matrix.size();
    double[] re = matrix.matrix().realParts();
    double[] im = matrix.matrix().imaginaryParts();
    double[] vRe = ComplexMatrix.identity(n).realParts();
    double[] vIm = new double[n * n];
    for (int sweep = 0; sweep < MOST_SWEEPS && !isDiagonal(re, im, n); sweep++) {
      for (int p = 0; p < n; p++) {
        for (int q = p + 1; q < n; q++) {
          rotate(re, im, vRe, vIm, n, p, q);
        }
      }
    }
    return sorted(matrix, re, vRe, vIm, n);
  }

  private static boolean isDiagonal(double[] re, double[] im, int n) {
    double off = 0;
    double all = 0;
    for (int i = 0; i < n; i++) {
      for (int j = 0; j < n; j++) {
        double square = re[i * n + j] * re[i * n + j] + im[i * n + j] * im[i * n + j];
        all += square;
        off += i == j ? 0 : square;
      }
    }
    return off <= 1e-34 * all;
  }

  /** One rotation that makes entry (p, q) zero, applied to the matrix and to the vectors. */
  private static void rotate(
      double[] re, double[] im, double[] vRe, double[] vIm, int n, int p, int q) {
    double aRe = re[p * n + q];
    double aIm = im[p * n + q];
    double size = Math.hypot(aRe, aIm);
    if (size == 0) {
      return;
    }
    double theta = (re[q * n + q] - re[p * n + p]) / (2 * size);
    double t = Math.copySign(1, theta) / (Math.abs(theta) + Math.hypot(theta, 1));
    double c = 1 / Math.sqrt(t * t + 1);
    double s = t * c;
    double eRe = aRe / size;
    double eIm = aIm / size;
    // Columns: x_p' = c x_p - s conj(e) x_q, x_q' = s e x_p + c x_q, with e the phase of (p, q).
    rotateColumns(re, im, n, p, q, c, s, eRe, eIm);
    rotateColumns(vRe, vIm, n, p, q, c, s, eRe, eIm);
    for (int k = 0; k < n; k++) {
      int kp = p * n + k;
      int kq = q * n + k;
      double pRe = re[kp];
      double pIm = im[kp];
      double qRe = re[kq];
      double qIm = im[kq];
      re[kp] = c * pRe - s * (eRe * qRe - eIm * qIm);
      im[kp] = c * pIm - s * (eRe * qIm + eIm * qRe);
      re[kq] = s * (eRe * pRe + eIm * pIm) + c * qRe;
      im[kq] = s * (eRe * pIm - eIm * pRe) + c * qIm;
    }
    re[p * n + q] = 0;
    im[p * n + q] = 0;
    re[q * n + p] = 0;
    im[q * n + p] = 0;
    im[p * n + p] = 0;
    im[q * n + q] = 0;
  }

  private static void rotateColumns(
      double[] re, double[] im, int n, int p, int q, double c, double s, double eRe, double eIm) {
    for (int k = 0; k < n; k++) {
      int kp = k * n + p;
      int kq = k * n + q;
      double pRe = re[kp];
      double pIm = im[kp];
      double qRe = re[kq];
      double qIm = im[kq];
      re[kp] = c * pRe - s * (eRe * qRe + eIm * qIm);
      im[kp] = c * pIm - s * (eRe * qIm - eIm * qRe);
      re[kq] = s * (eRe * pRe - eIm * pIm) + c * qRe;
      im[kq] = s * (eRe * pIm + eIm * pRe) + c * qIm;
    }
  }

  private static HermitianEigen sorted(
      Hermitian matrix, double[] re, double[] vRe, double[] vIm, int n) {
    Integer[] order = new Integer[n];
    for (int i = 0; i < n; i++) {
      order[i] = i;
    }
    java.util.Arrays.sort(order, (a, b) -> Double.compare(re[a * n + a], re[b * n + b]));
    double[] values = new double[n];
    double[] outRe = new double[n * n];
    double[] outIm = new double[n * n];
    for (int k = 0; k < n; k++) {
      values[k] = re[order[k] * n + order[k]];
      for (int i = 0; i < n; i++) {
        outRe[i * n + k] = vRe[i * n + order[k]];
        outIm[i * n + k] = vIm[i * n + order[k]];
      }
    }
    return new HermitianEigen(matrix, values, ComplexMatrix.of(n, n, outRe, outIm));
  }

  /** Computed eigenvalues, ascending; an estimate without {@link #errorBound()}. */
  public double[] values() {
    return values.clone();
  }

  /** The k-th computed eigenvalue, ascending. */
  public double value(int k) {
    return values[k];
  }

  /** Eigenvectors as columns, in the order of the values. */
  public ComplexMatrix vectors() {
    return vectors;
  }

  /** The k-th eigenvector as a column. */
  public ComplexMatrix vector(int k) {
    int n = values.length;
    double[] re = new double[n];
    double[] im = new double[n];
    for (int i = 0; i < n; i++) {
      re[i] = vectors.re(i, k);
      im[i] = vectors.im(i, k);
    }
    return ComplexMatrix.of(n, 1, re, im);
  }

  /** The matrix V f(Lambda) V^+ for new eigenvalues f, Hermitian to the last bit. */
  public Hermitian withValues(double[] f) {
    int n = f.length;
    double[] re = new double[n * n];
    double[] im = new double[n * n];
    for (int k = 0; k < n; k++) {
      if (f[k] == 0) {
        continue;
      }
      for (int i = 0; i < n; i++) {
        double aRe = f[k] * vectors.re(i, k);
        double aIm = f[k] * vectors.im(i, k);
        for (int j = 0; j < n; j++) {
          re[i * n + j] += aRe * vectors.re(j, k) + aIm * vectors.im(j, k);
          im[i * n + j] += aIm * vectors.re(j, k) - aRe * vectors.im(j, k);
        }
      }
    }
    return Hermitian.part(ComplexMatrix.of(n, n, re, im));
  }

  /** Upper bound of |V^+ V - 1| in the Frobenius norm: how far the vectors are from orthonormal. */
  public double orthogonalityDefect() {
    ComplexBall v = ComplexBall.exact(vectors);
    return v.adjoint()
        .times(v)
        .minus(ComplexBall.exact(ComplexMatrix.identity(values.length)))
        .normUp();
  }

  /**
   * Bound of the distance of each computed eigenvalue from the exact one of the same rank.
   *
   * <p>With A = V L V^+ + R and V^+ V = 1 + F, Ostrowski's and Weyl's theorems give |R| + |F|
   * max|L| (R. A. Horn, C. R. Johnson, <i>Matrix Analysis</i>, theorems 4.3.1 and 4.5.9).
   */
  public double errorBound() {
    int n = values.length;
    double[] diagonal = new double[n * n];
    double most = 0;
    for (int k = 0; k < n; k++) {
      diagonal[k * n + k] = values[k];
      most = Math.max(most, Math.abs(values[k]));
    }
    ComplexBall v = ComplexBall.exact(vectors);
    ComplexBall lambda = ComplexBall.exact(ComplexMatrix.of(n, n, diagonal, new double[n * n]));
    double residual =
        ComplexBall.exact(source.matrix()).minus(v.times(lambda).times(v.adjoint())).normUp();
    return Rounding.addUp(residual, Rounding.timesUp(orthogonalityDefect(), most));
  }

  /** Certified enclosure of the smallest exact eigenvalue. */
  public Interval smallest() {
    return around(values[0], errorBound());
  }

  /** Certified enclosure of the largest exact eigenvalue. */
  public Interval largest() {
    return around(values[values.length - 1], errorBound());
  }

  private static Interval around(double value, double error) {
    return Interval.of(Rounding.addDown(value, -error), Rounding.addUp(value, error));
  }
}
