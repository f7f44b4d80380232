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
  /** Covers the few roundings of one line below, each at most one unit roundoff. */
  private static final double UP = 1 + 16 * Rounding.UNIT;

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
    // |T_k|_F^2 is at most s_k * growth: its sum has fewer than 2 n^2 roundings.
    double growth = 1 + 2 * Rounding.gamma(2L * square + 8);
    double s0 = squares(scratch, 2 * square);
    double s1 = square(scratch, 0, 2 * square, n);
    double s2 = square(scratch, 2 * square, 0, n);
    double s3 = square(scratch, 0, 2 * square, n);
    // |T_k|^2 <= |T_{k+1}| + gamma |T_k|_F^2 + underflow: each part of an entry of T_{k+1} takes
    // n + 1 roundings, the modulus at most sqrt(2) as much.
    double gamma = Rounding.gamma(2L * n + 2) * growth;
    double underflow = 4.0 * n * n * n * Rounding.TINY;
    double bound = Math.sqrt(s3 * growth) * UP;
    bound = Math.sqrt(bound + gamma * s2 + underflow) * UP;
    bound = Math.sqrt(bound + gamma * s1 + underflow) * UP;
    bound = Math.sqrt(bound + gamma * s0 + underflow) * UP;
    return Math.min(bound, Math.sqrt(s0 * growth) * UP);
  }

  private static double squares(double[] data, int length) {
    double sum = 0;
    for (int k = 0; k < length; k++) {
      sum += data[k] * data[k];
    }
    return sum;
  }

  /**
   * Writes the square of the Hermitian matrix at one offset to another offset and returns the sum
   * of its squared entries.
   */
  private static double square(double[] data, int from, int to, int n) {
    int half = n * n;
    double sum = 0;
    for (int i = 0; i < n; i++) {
      int a = from + i * n;
      for (int j = i; j < n; j++) {
        int b = from + j * n;
        double re = 0;
        double im = 0;
        // (T^2)_ij = sum_k T_ik conj(T_jk) for Hermitian T.
        for (int k = 0; k < n; k++) {
          double aRe = data[a + k];
          double aIm = data[a + half + k];
          double bRe = data[b + k];
          double bIm = data[b + half + k];
          re += aRe * bRe + aIm * bIm;
          im += aIm * bRe - aRe * bIm;
        }
        if (i == j) {
          data[to + i * n + i] = re;
          data[to + half + i * n + i] = 0;
          sum += re * re;
        } else {
          data[to + i * n + j] = re;
          data[to + j * n + i] = re;
          data[to + half + i * n + j] = im;
          data[to + half + j * n + i] = -im;
          sum += 2 * (re * re + im * im);
        }
      }
    }
    return sum;
  }

  private static double largestEntry(double[] re, double[] im, int length) {
    double largest = 0;
    for (int k = 0; k < length; k++) {
      largest = Math.max(largest, Math.max(Math.abs(re[k]), Math.abs(im[k])));
    }
    return largest;
  }
}
