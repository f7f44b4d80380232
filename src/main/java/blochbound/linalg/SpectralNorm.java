package blochbound.linalg;

import blochbound.check.Check;
import blochbound.interval.Rounding;

/**
 * Certified upper bounds of the spectral norm of Hermitian matrices, without eigenvalues.
 *
 * <p>With T_0 = S and T_{k+1} = T_k^2 the norm is at most (tr S^16)^(1/16) = |T_3|_F^(1/8): too
 * large by a factor of at most n^(1/16) (1.09 for n = 4), and exact up to rounding when one
 * eigenvalue dominates. Rounding is counted on the way back: the computed T_{k+1} misses the exact
 * square of the computed T_k by at most gamma |T_k|_F^2, so |T_k|^2 &lt;= |T_{k+1}| + gamma
 * |T_k|_F^2 in the spectral norm (Higham, <i>Accuracy and Stability</i>, 2nd ed., sections 3.5 and
 * 3.6).
 */
public final class SpectralNorm {
  private SpectralNorm() {}

  /** Number of doubles that {@link #upperBound(double[], double[], int, double[])} needs. */
  public static int scratchLength(int n) {
    return 4 * n * n;
  }

  /**
   * Certified upper bound of the spectral norm of a Hermitian matrix; infinite when an entry is not
   * finite.
   *
   * @param re real parts, row-major, symmetric
   * @param im imaginary parts, row-major, antisymmetric
   * @param n number of rows
   * @param scratch work space of {@link #scratchLength} doubles, overwritten
   */
  public static double upperBound(double[] re, double[] im, int n, double[] scratch) {
    Check.that(scratch.length >= scratchLength(n), "scratch is too short");
    double largest = largestEntry(re, im, n * n);
    if (largest == 0) {
      return 0;
    }
    if (!Double.isFinite(largest)) {
      return Double.POSITIVE_INFINITY;
    }
    // Scaled so that the largest entry is between 1 and 2: no overflow, no harmful underflow.
    int exponent = Math.getExponent(largest);
    double scale = Math.scalb(1.0, -exponent);
    for (int k = 0; k < n * n; k++) {
      scratch[k] = re[k] * scale;
      scratch[n * n + k] = im[k] * scale;
    }
    return Math.nextUp(Math.scalb(scaledBound(n, scratch), exponent));
  }

  /** Certified upper bound of the spectral norm of a Hermitian matrix. */
  public static double upperBound(Hermitian matrix) {
    int n = matrix.size();
    return upperBound(
        matrix.matrix().realParts(),
        matrix.matrix().imaginaryParts(),
        n,
        new double[scratchLength(n)]);
  }

  private static double scaledBound(int n, double[] scratch) {
    int square = n * n;
    double norm0 = frobeniusUp(scratch, 0, square);
    square(scratch, 0, 2 * square, n);
    double norm1 = frobeniusUp(scratch, 2 * square, square);
    square(scratch, 2 * square, 0, n);
    double norm2 = frobeniusUp(scratch, 0, square);
    square(scratch, 0, 2 * square, n);
    double bound = frobeniusUp(scratch, 2 * square, square);
    bound = rootUp(bound, norm2, n);
    bound = rootUp(bound, norm1, n);
    bound = rootUp(bound, norm0, n);
    return Math.min(bound, norm0);
  }

  /** Bound of |T| from one of |fl(T^2)| and from the Frobenius norm of T. */
  private static double rootUp(double squareNorm, double frobenius, int n) {
    // Each part of an entry of T^2 takes n + 1 roundings; the modulus at most sqrt(2) as much.
    double rounding =
        Rounding.timesUp(Rounding.gamma(2L * n + 2), Rounding.timesUp(frobenius, frobenius));
    double underflow = 4.0 * n * n * n * Rounding.TINY;
    return Rounding.sqrtUp(Rounding.addUp(squareNorm, Rounding.addUp(rounding, underflow)));
  }

  private static double frobeniusUp(double[] entries, int offset, int square) {
    return Rounding.normUp(entries, offset, 2 * square);
  }

  /** Writes the square of the Hermitian matrix at one offset to another offset. */
  private static void square(double[] data, int from, int to, int n) {
    int half = n * n;
    for (int i = 0; i < n; i++) {
      for (int j = i; j < n; j++) {
        double sumRe = 0;
        double sumIm = 0;
        // (T^2)_ij = sum_k T_ik conj(T_jk) for Hermitian T.
        for (int k = 0; k < n; k++) {
          double aRe = data[from + i * n + k];
          double aIm = data[from + half + i * n + k];
          double bRe = data[from + j * n + k];
          double bIm = data[from + half + j * n + k];
          sumRe += aRe * bRe + aIm * bIm;
          sumIm += aIm * bRe - aRe * bIm;
        }
        data[to + i * n + j] = sumRe;
        data[to + j * n + i] = sumRe;
        data[to + half + i * n + j] = i == j ? 0 : sumIm;
        data[to + half + j * n + i] = i == j ? 0 : -sumIm;
      }
    }
  }

  private static double largestEntry(double[] re, double[] im, int length) {
    double largest = 0;
    for (int k = 0; k < length; k++) {
      largest = Math.max(largest, Math.max(Math.abs(re[k]), Math.abs(im[k])));
    }
    return largest;
  }
}
