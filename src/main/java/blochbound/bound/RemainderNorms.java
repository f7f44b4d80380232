package blochbound.bound;

import blochbound.generator.BlochBasis;
import blochbound.interval.Rounding;
import blochbound.linalg.SpectralNorm;

/**
 * Certified bounds kappa of what a Hermitian matrix S, given by Bloch coordinates, can contribute
 * to a mean value. Workspace for one thread.
 */
final class RemainderNorms {
  private final BlochBasis basis;
  private final int levels;
  private final double[] scaled;
  private final double[] re;
  private final double[] im;
  private final double[] scratch;
  private final double transformError;

  RemainderNorms(BlochBasis basis) {
    this.basis = basis;
    levels = basis.levels();
    scaled = new double[basis.size()];
    re = new double[basis.size()];
    im = new double[basis.size()];
    scratch = new double[SpectralNorm.scratchLength(levels)];
    transformError = basis.transformError();
  }

  /** Upper bound of the Frobenius norm, which is never below the spectral norm. */
  double frobeniusUp(double[] coordinates) {
    return Rounding.normUp(coordinates);
  }

  /** Upper bound of the spectral norm: |tr(S rho)| for all states. */
  double spectralUp(double[] coordinates, double frobenius) {
    basis.matrix(coordinates, scaled, re, im);
    double bound = SpectralNorm.upperBound(re, im, levels, scratch) + transformError * frobenius;
    return Math.min(frobenius, Rounding.inflate(bound, 2));
  }

  /** Upper bound of max(0, -lambda_min): -tr(S rho) for all states. */
  double negativePartUp(double[] coordinates, double frobenius) {
    basis.matrix(coordinates, scaled, re, im);
    double plain = SpectralNorm.upperBound(re, im, levels, scratch);
    // S >= c - |S - c| for any number c; the mean eigenvalue is a good one.
    double c = 0;
    double size = 0;
    for (int i = 0; i < levels; i++) {
      c += re[i * (levels + 1)] / levels;
      size = Math.max(size, Math.abs(re[i * (levels + 1)]));
    }
    for (int i = 0; i < levels; i++) {
      re[i * (levels + 1)] -= c;
    }
    double shifted = SpectralNorm.upperBound(re, im, levels, scratch) - c;
    // Each subtraction on the diagonal, and the last one, errs by at most 2 u times the sizes.
    double rounding = 4 * Rounding.UNIT * (levels * (size + Math.abs(c)) + Math.abs(shifted));
    double best = Math.min(plain, Math.max(0, shifted + rounding)) + transformError * frobenius;
    return Math.min(frobenius, Rounding.inflate(best, 4));
  }

  /** Lower bound of the smallest eigenvalue, from a full decomposition: sharp, but slower. */
  double smallestEigenvalueDown(double[] coordinates, double frobenius) {
    double smallest = basis.matrix(coordinates).eigen().smallest().lower();
    return Rounding.addDown(smallest, -Rounding.timesUp(transformError, frobenius));
  }
}
