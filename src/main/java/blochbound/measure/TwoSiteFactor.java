package blochbound.measure;

import blochbound.linalg.Hermitian;

/**
 * Factor S with S S^+ = (1 - eps) s + eps tr(s)/4 for a state s of two two-level sites, by pivoted
 * Cholesky, and the symmetric matrix tau = S^T YY S whose singular values give the concurrence.
 *
 * <p>Plain arrays, row-major, reused; not for several threads. Estimates: no error bound is given.
 */
final class TwoSiteFactor {
  /** YY = sigma_y x sigma_y has the entries sign(i) at (i, 3 - i). */
  static int sign(int i) {
    return i == 0 || i == 3 ? -1 : 1;
  }

  /** Pivots below this part of the trace are rounding noise of a singular state. */
  private static final double NOISE = 1e-15;

  final double[] sRe = new double[16];
  final double[] sIm = new double[16];
  final double[] inverseRe = new double[16];
  final double[] inverseIm = new double[16];

  /** tau, column by column: rank by rank. */
  final double[] tauRe = new double[16];

  final double[] tauIm = new double[16];
  private final double[] workRe = new double[16];
  private final double[] workIm = new double[16];
  private final int[] order = new int[4];
  private int rank;

  /** Number of columns of S that are not zero. */
  int rank() {
    return rank;
  }

  /** Factorises the mixture of a state with the maximally mixed one. */
  void factorise(Hermitian state, double eps) {
    double trace = 0;
    for (int i = 0; i < 4; i++) {
      trace += state.re(i, i);
    }
    for (int i = 0; i < 4; i++) {
      for (int j = 0; j < 4; j++) {
        workRe[4 * i + j] = (1 - eps) * state.re(i, j) + (i == j ? eps * trace / 4 : 0);
        workIm[4 * i + j] = (1 - eps) * state.im(i, j);
        sRe[4 * i + j] = 0;
        sIm[4 * i + j] = 0;
      }
    }
    rank = 0;
    int done = 0;
    while (rank < 4) {
      int pivot = largestPivot(done);
      if (!(workRe[5 * pivot] > NOISE * trace)) {
        return;
      }
      done |= 1 << pivot;
      order[rank] = pivot;
      eliminate(pivot, done);
      rank++;
    }
  }

  private int largestPivot(int done) {
    int best = -1;
    for (int i = 0; i < 4; i++) {
      if ((done >> i & 1) == 0 && (best < 0 || workRe[5 * i] > workRe[5 * best])) {
        best = i;
      }
    }
    return best;
  }

  /** Writes the next column of S and subtracts its square. */
  private void eliminate(int pivot, int done) {
    double root = Math.sqrt(workRe[5 * pivot]);
    sRe[4 * pivot + rank] = root;
    for (int i = 0; i < 4; i++) {
      if ((done >> i & 1) == 0) {
        sRe[4 * i + rank] = workRe[4 * i + pivot] / root;
        sIm[4 * i + rank] = workIm[4 * i + pivot] / root;
      }
    }
    for (int i = 0; i < 4; i++) {
      if ((done >> i & 1) != 0) {
        continue;
      }
      double aRe = sRe[4 * i + rank];
      double aIm = sIm[4 * i + rank];
      for (int j = 0; j < 4; j++) {
        double bRe = sRe[4 * j + rank];
        double bIm = sIm[4 * j + rank];
        workRe[4 * i + j] -= aRe * bRe + aIm * bIm;
        workIm[4 * i + j] -= aIm * bRe - aRe * bIm;
      }
    }
  }

  /** Forms tau = S^T YY S on the columns that are not zero. */
  void formTau() {
    for (int a = 0; a < rank; a++) {
      for (int b = a; b < rank; b++) {
        double sumRe = 0;
        double sumIm = 0;
        for (int i = 0; i < 4; i++) {
          int ia = 4 * i + a;
          int ib = 4 * (3 - i) + b;
          sumRe += sign(i) * (sRe[ia] * sRe[ib] - sIm[ia] * sIm[ib]);
          sumIm += sign(i) * (sRe[ia] * sIm[ib] + sIm[ia] * sRe[ib]);
        }
        tauRe[a * rank + b] = sumRe;
        tauRe[b * rank + a] = sumRe;
        tauIm[a * rank + b] = sumIm;
        tauIm[b * rank + a] = sumIm;
      }
    }
  }

  /** Forms S^-1 for full rank and returns |S^-1|_F^2 = tr s^-1, at least 1/lambda_min. */
  double invert() {
    double sum = 0;
    for (int column = 0; column < 4; column++) {
      // Row order[k] of S ends at its k-th entry: forward substitution in that order.
      for (int k = 0; k < 4; k++) {
        int row = order[k];
        double xRe = row == column ? 1 : 0;
        double xIm = 0;
        for (int l = 0; l < k; l++) {
          double yRe = inverseRe[4 * l + column];
          double yIm = inverseIm[4 * l + column];
          xRe -= sRe[4 * row + l] * yRe - sIm[4 * row + l] * yIm;
          xIm -= sRe[4 * row + l] * yIm + sIm[4 * row + l] * yRe;
        }
        double pivot = sRe[4 * row + k];
        inverseRe[4 * k + column] = xRe / pivot;
        inverseIm[4 * k + column] = xIm / pivot;
        sum += (xRe * xRe + xIm * xIm) / (pivot * pivot);
      }
    }
    return sum;
  }
}
