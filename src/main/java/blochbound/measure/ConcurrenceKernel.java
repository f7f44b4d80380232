package blochbound.measure;

import blochbound.linalg.ComplexMatrix;
import blochbound.linalg.Hermitian;

/**
 * Value and gradient of l1 - l2 - l3 - l4, the signed sum of singular values of tau = S^T YY S with
 * s = S S^+ (W. K. Wootters, Phys. Rev. Lett. 80 (1998) 2245: the concurrence is this number or
 * zero). Estimates on plain arrays; not for several threads.
 *
 * <p>With tau = U diag(l) V^+ and N the symmetric part of sum_k sign_k u_k v_k^+, the change of the
 * number is Re tr(N^+ d tau). For d s = D take d S = D S^-+ / 2; since N and tau are symmetric, the
 * change is tr(G D) with G the Hermitian part of S^-+ conj(N) S^T YY. No Takagi vectors are needed.
 */
final class ConcurrenceKernel {
  private final TwoSiteFactor factor = new TwoSiteFactor();
  private final double[] vRe = new double[16];
  private final double[] vIm = new double[16];
  private final double[] nRe = new double[16];
  private final double[] nIm = new double[16];
  private final double[] leftRe = new double[16];
  private final double[] leftIm = new double[16];
  private final double[] gRe = new double[16];
  private final double[] gIm = new double[16];
  private final double[] lengths = new double[4];
  private static final double[] NONE = new double[0];

  /** The number l1 - l2 - l3 - l4, which may be negative. */
  double signedSum(Hermitian state) {
    factor.factorise(state, 0);
    factor.formTau();
    OneSidedJacobi.orthogonalise(
        factor.tauRe, factor.tauIm, factor.rank(), factor.rank(), NONE, NONE);
    return 2 * lengths[largestLength()] - sumOfLengths();
  }

  private int largestLength() {
    int n = factor.rank();
    int best = 0;
    lengths[0] = 0;
    for (int k = 0; k < n; k++) {
      lengths[k] = OneSidedJacobi.length(factor.tauRe, factor.tauIm, n, k);
      best = lengths[k] > lengths[best] ? k : best;
    }
    return best;
  }

  private double sumOfLengths() {
    double sum = 0;
    for (int k = 0; k < factor.rank(); k++) {
      sum += lengths[k];
    }
    return sum;
  }

  /**
   * Factorises the mixture of a state; the gradient may be asked for afterwards.
   *
   * @return tr of the inverse of the mixture, infinite when it is singular
   */
  double prepare(Hermitian state, double eps) {
    factor.factorise(state, eps);
    return factor.rank() < 4 ? Double.POSITIVE_INFINITY : factor.invert();
  }

  /** Forms the gradient at the mixture prepared last, and returns l1 - l2 - l3 - l4 there. */
  double formGradient() {
    factor.formTau();
    for (int k = 0; k < 16; k++) {
      vRe[k] = k % 5 == 0 ? 1 : 0;
      vIm[k] = 0;
    }
    OneSidedJacobi.orthogonalise(factor.tauRe, factor.tauIm, 4, 4, vRe, vIm);
    int top = largestLength();
    formSignedPolar(top);
    formLeft();
    formProduct();
    return 2 * lengths[top] - sumOfLengths();
  }

  /** The gradient G as a matrix. */
  Hermitian gradient() {
    return Hermitian.part(ComplexMatrix.of(4, 4, gRe, gIm));
  }

  /** Real part of an entry of -G^PT. */
  double witnessRe(int row, int column) {
    return -0.5 * (gRe[transposed(row, column)] + gRe[transposed(column, row)]);
  }

  /** Imaginary part of an entry of -G^PT. */
  double witnessIm(int row, int column) {
    return -0.5 * (gIm[transposed(row, column)] - gIm[transposed(column, row)]);
  }

  /** Index of the entry that the transpose of the second site moves to (row, column). */
  static int transposed(int row, int column) {
    return 4 * ((row & 2) | (column & 1)) + ((column & 2) | (row & 1));
  }

  /** N = symmetric part of sum_k sign_k u_k v_k^+, row-major; u_k l_k are the columns of tau V. */
  private void formSignedPolar(int top) {
    for (int i = 0; i < 4; i++) {
      for (int j = 0; j < 4; j++) {
        double sumRe = 0;
        double sumIm = 0;
        for (int k = 0; k < 4; k++) {
          if (lengths[k] == 0) {
            continue;
          }
          double weight = (k == top ? 1 : -1) / lengths[k];
          double uRe = weight * factor.tauRe[4 * k + i];
          double uIm = weight * factor.tauIm[4 * k + i];
          sumRe += uRe * vRe[4 * k + j] + uIm * vIm[4 * k + j];
          sumIm += uIm * vRe[4 * k + j] - uRe * vIm[4 * k + j];
        }
        leftRe[4 * i + j] = sumRe;
        leftIm[4 * i + j] = sumIm;
      }
    }
    for (int i = 0; i < 4; i++) {
      for (int j = 0; j < 4; j++) {
        nRe[4 * i + j] = 0.5 * (leftRe[4 * i + j] + leftRe[4 * j + i]);
        nIm[4 * i + j] = 0.5 * (leftIm[4 * i + j] + leftIm[4 * j + i]);
      }
    }
  }

  /** S^-+ conj(N) = conj(S^-T N). */
  private void formLeft() {
    for (int i = 0; i < 4; i++) {
      for (int j = 0; j < 4; j++) {
        double sumRe = 0;
        double sumIm = 0;
        for (int k = 0; k < 4; k++) {
          double aRe = factor.inverseRe[4 * k + i];
          double aIm = factor.inverseIm[4 * k + i];
          sumRe += aRe * nRe[4 * k + j] - aIm * nIm[4 * k + j];
          sumIm += aRe * nIm[4 * k + j] + aIm * nRe[4 * k + j];
        }
        leftRe[4 * i + j] = sumRe;
        leftIm[4 * i + j] = -sumIm;
      }
    }
  }

  /** (left) S^T YY, where (S^T YY)_kj = sign(j) S_(3-j)k. */
  private void formProduct() {
    for (int i = 0; i < 4; i++) {
      for (int j = 0; j < 4; j++) {
        double sumRe = 0;
        double sumIm = 0;
        for (int k = 0; k < 4; k++) {
          double bRe = factor.sRe[4 * (3 - j) + k];
          double bIm = factor.sIm[4 * (3 - j) + k];
          sumRe += leftRe[4 * i + k] * bRe - leftIm[4 * i + k] * bIm;
          sumIm += leftRe[4 * i + k] * bIm + leftIm[4 * i + k] * bRe;
        }
        gRe[4 * i + j] = TwoSiteFactor.sign(j) * sumRe;
        gIm[4 * i + j] = TwoSiteFactor.sign(j) * sumIm;
      }
    }
  }
}
