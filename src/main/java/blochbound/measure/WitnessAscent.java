package blochbound.measure;

import blochbound.linalg.Hermitian;

/**
 * Newton steps on the value -&lt;A|s^PT|A&gt;/|det A| of a concurrence witness over all A of unit
 * determinant: a search, whose result is an ordinary A.
 *
 * <p>Steps are A B with B = (1 + X/2)(1 - X/2)^-1, X = sum_i (x_i + i y_i) sigma_i, which has unit
 * determinant and agrees with exp(X) to second order. With M = s^PT, w_i = A sigma_i, w_(i+3) = i
 * w_i and F0 = &lt;A|M|A&gt;, the form F is F0 + 2 Re&lt;A|M|w&gt; + &lt;w|M|w&gt; + F0 (|x|^2 -
 * |y|^2) to second order.
 */
final class WitnessAscent {
  private static final int MOST_STEPS = 3;
  private static final double FLAT = 1e-9;

  private final double[] mRe = new double[16];
  private final double[] mIm = new double[16];
  private final double[][] wRe = new double[7][4];
  private final double[][] wIm = new double[7][4];
  private final double[][] mwRe = new double[7][4];
  private final double[][] mwIm = new double[7][4];
  private final double[][] hessian = new double[6][6];
  private final double[] step = new double[6];
  private final double[] backRe = new double[4];
  private final double[] backIm = new double[4];

  /** Takes the state whose witness is sought. */
  void prepare(Hermitian state) {
    for (int i = 0; i < 4; i++) {
      for (int j = 0; j < 4; j++) {
        int at = ConcurrenceKernel.transposed(i, j);
        mRe[at] = state.re(i, j);
        mIm[at] = state.im(i, j);
      }
    }
  }

  /** Improves A, which must have unit determinant, and returns the value it reaches. */
  double improve(TwoSiteWitness a) {
    double form = form(a);
    for (int k = 0; k < MOST_STEPS; k++) {
      fillDirections(a);
      if (gradientSize() <= FLAT || !factorise(form)) {
        break;
      }
      solve();
      System.arraycopy(a.re, 0, backRe, 0, 4);
      System.arraycopy(a.im, 0, backIm, 0, 4);
      double next = move(a) ? form(a) : Double.POSITIVE_INFINITY;
      if (!(next < form)) {
        System.arraycopy(backRe, 0, a.re, 0, 4);
        System.arraycopy(backIm, 0, a.im, 0, 4);
        break;
      }
      form = next;
    }
    return -form;
  }

  private double form(TwoSiteWitness a) {
    System.arraycopy(a.re, 0, wRe[6], 0, 4);
    System.arraycopy(a.im, 0, wIm[6], 0, 4);
    applyMatrix(6);
    return inner(6, 6);
  }

  /** A sigma_i for the three Pauli matrices, times one and times i; column order of A kept. */
  private void fillDirections(TwoSiteWitness a) {
    for (int row = 0; row < 4; row += 2) {
      int p = row;
      int q = row + 1;
      // (p, q) sigma_x = (q, p); (p, q) sigma_y = (i q, -i p); (p, q) sigma_z = (p, -q).
      set(0, p, a.re[q], a.im[q]);
      set(0, q, a.re[p], a.im[p]);
      set(1, p, -a.im[q], a.re[q]);
      set(1, q, a.im[p], -a.re[p]);
      set(2, p, a.re[p], a.im[p]);
      set(2, q, -a.re[q], -a.im[q]);
    }
    for (int k = 0; k < 6; k++) {
      applyMatrix(k);
    }
  }

  private void set(int k, int at, double x, double y) {
    wRe[k][at] = x;
    wIm[k][at] = y;
    wRe[k + 3][at] = -y;
    wIm[k + 3][at] = x;
  }

  private void applyMatrix(int k) {
    for (int i = 0; i < 4; i++) {
      double sumRe = 0;
      double sumIm = 0;
      for (int j = 0; j < 4; j++) {
        sumRe += mRe[4 * i + j] * wRe[k][j] - mIm[4 * i + j] * wIm[k][j];
        sumIm += mRe[4 * i + j] * wIm[k][j] + mIm[4 * i + j] * wRe[k][j];
      }
      mwRe[k][i] = sumRe;
      mwIm[k][i] = sumIm;
    }
  }

  /** Re of the inner product of w_k with M w_l. */
  private double inner(int k, int l) {
    double sum = 0;
    for (int i = 0; i < 4; i++) {
      sum += wRe[k][i] * mwRe[l][i] + wIm[k][i] * mwIm[l][i];
    }
    return sum;
  }

  /** Fills half the negative gradient into the step and returns its largest entry. */
  private double gradientSize() {
    double size = 0;
    for (int k = 0; k < 6; k++) {
      step[k] = -inner(k, 6);
      size = Math.max(size, Math.abs(step[k]));
    }
    return size;
  }

  /** Factorises the Hessian by Cholesky; false when the form is not convex here. */
  private boolean factorise(double form) {
    for (int k = 0; k < 6; k++) {
      for (int l = 0; l <= k; l++) {
        double sum = inner(k, l) + (k == l ? (k < 3 ? form : -form) : 0);
        for (int r = 0; r < l; r++) {
          sum -= hessian[k][r] * hessian[l][r];
        }
        if (k == l) {
          if (!(sum > 0)) {
            return false;
          }
          hessian[k][k] = Math.sqrt(sum);
        } else {
          hessian[k][l] = sum / hessian[l][l];
        }
      }
    }
    return true;
  }

  /** Turns half the negative gradient into the Newton step. */
  private void solve() {
    for (int k = 0; k < 6; k++) {
      for (int r = 0; r < k; r++) {
        step[k] -= hessian[k][r] * step[r];
      }
      step[k] /= hessian[k][k];
    }
    for (int k = 5; k >= 0; k--) {
      for (int r = k + 1; r < 6; r++) {
        step[k] -= hessian[r][k] * step[r];
      }
      step[k] /= hessian[k][k];
    }
  }

  /** Replaces A by A B for the step, cut to length one. */
  private boolean move(TwoSiteWitness a) {
    double length = 0;
    for (double x : step) {
      length += x * x;
    }
    double cut = length > 1 ? 1 / Math.sqrt(length) : 1;
    double squareRe = 0;
    double squareIm = 0;
    for (int k = 0; k < 3; k++) {
      double x = cut * step[k];
      double y = cut * step[k + 3];
      squareRe += x * x - y * y;
      squareIm += 2 * x * y;
    }
    // B = (1 + z/4 + X) / (1 - z/4) with z = X^2; the scalar divisor is left to normalise().
    for (int i = 0; i < 4; i++) {
      double moveRe = (1 + squareRe / 4) * backRe[i] - squareIm / 4 * backIm[i];
      double moveIm = (1 + squareRe / 4) * backIm[i] + squareIm / 4 * backRe[i];
      for (int k = 0; k < 6; k++) {
        moveRe += cut * step[k] * wRe[k][i];
        moveIm += cut * step[k] * wIm[k][i];
      }
      a.re[i] = moveRe;
      a.im[i] = moveIm;
    }
    return a.normalise();
  }
}
