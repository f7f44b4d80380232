package blochbound.casefile;

import blochbound.interval.Interval;
import blochbound.interval.Rounding;
import blochbound.linalg.ComplexBall;
import blochbound.linalg.ComplexMatrix;
import java.util.Optional;

/**
 * Divides a ket by its length with a proved error bound.
 *
 * <p>For a ket k within the distance r of the computed c, and u the computed quotient: |k/|k| - u|
 * is at most 2 r/|c| + |c/|c| - u|. First part: k/|k| - c/|c| = (k - c)/|c| + k (1/|k| - 1/|c|),
 * and | |c| - |k| | is at most r. The second part is enclosed entry by entry.
 */
final class KetNormaliser {
  private KetNormaliser() {}

  /** The normalised ket, or empty when it may be zero. */
  static Optional<ComplexBall> normalised(ComplexBall ket) {
    double largest = largestEntry(ket.centre());
    if (largest == 0) {
      return Optional.empty();
    }
    // A power of two scales exactly and keeps the squares in range.
    double scale = Math.scalb(1.0, -Math.getExponent(largest));
    ComplexMatrix c = ket.centre().scale(scale);
    double r = Rounding.timesUp(ket.radius(), scale);
    if (!c.scale(1 / scale).equals(ket.centre())) {
      r = Rounding.addUp(r, Rounding.TINY);
    }
    Interval square = Interval.ZERO;
    for (int k = 0; k < c.rows(); k++) {
      square = square.plus(Interval.of(c.re(k, 0)).square());
      square = square.plus(Interval.of(c.im(k, 0)).square());
    }
    Interval length = square.sqrt();
    if (!(length.lower() > r)) {
      return Optional.empty();
    }
    return Optional.of(isSinglePart(c) ? signs(c, length, r) : divided(c, length, r));
  }

  /** Tells whether one real or imaginary part alone is not zero. */
  private static boolean isSinglePart(ComplexMatrix c) {
    int parts = 0;
    for (int k = 0; k < c.rows(); k++) {
      parts += (c.re(k, 0) == 0 ? 0 : 1) + (c.im(k, 0) == 0 ? 0 : 1);
    }
    return parts == 1;
  }

  /** The quotient of a single part is its sign, exactly. */
  private static ComplexBall signs(ComplexMatrix c, Interval length, double r) {
    int n = c.rows();
    double[] re = new double[n];
    double[] im = new double[n];
    for (int k = 0; k < n; k++) {
      re[k] = Math.signum(c.re(k, 0)) + 0.0;
      im[k] = Math.signum(c.im(k, 0)) + 0.0;
    }
    double error = r == 0 ? 0 : Rounding.divideUp(Rounding.timesUp(2, r), length.lower());
    return new ComplexBall(ComplexMatrix.of(n, 1, re, im), error);
  }

  private static ComplexBall divided(ComplexMatrix c, Interval length, double r) {
    int n = c.rows();
    double[] re = new double[n];
    double[] im = new double[n];
    double[] errors = new double[2 * n];
    for (int k = 0; k < n; k++) {
      Interval real = Interval.of(c.re(k, 0)).dividedBy(length);
      Interval imaginary = Interval.of(c.im(k, 0)).dividedBy(length);
      re[k] = real.middle();
      im[k] = imaginary.middle();
      errors[2 * k] = real.radius();
      errors[2 * k + 1] = imaginary.radius();
    }
    double fromKet = Rounding.divideUp(Rounding.timesUp(2, r), length.lower());
    double error = Rounding.addUp(fromKet, Rounding.normUp(errors));
    return new ComplexBall(ComplexMatrix.of(n, 1, re, im), error);
  }

  private static double largestEntry(ComplexMatrix ket) {
    double largest = 0;
    for (int k = 0; k < ket.rows(); k++) {
      largest = Math.max(largest, Math.max(Math.abs(ket.re(k, 0)), Math.abs(ket.im(k, 0))));
    }
    return largest;
  }
}
