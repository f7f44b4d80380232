package blochbound.measure;

import blochbound.interval.Interval;
import blochbound.interval.Rounding;
import blochbound.linalg.Hermitian;

/**
 * Bounds of tr Y_+, the sum of the positive eigenvalues, for all Hermitian Y near a matrix X.
 *
 * <p>Let X' = U L U^+ be the exact neighbour of X ({@link SpectralFrame}), P the exact projector on
 * its positive eigenvectors and Y = X' + E with |E|_F &lt;= e. Then
 *
 * <ul>
 *   <li>tr Y_+ &gt;= tr(P Y) for every Y, because 0 &lt;= P &lt;= 1;
 *   <li>tr Y_+ - tr(P Y) &lt;= |E|_1, because tr Y_+ &lt;= tr X'_+ + tr E_+ and tr X'_+ = tr(P X');
 *   <li>if the positive L are at least a, the others at most -b, and e &lt;= min(a, b), then tr Y_+
 *       - tr(P Y) &lt;= e^2 / (2 (max(a, b) - e)). <i>Proof.</i> In blocks of P and 1 - P, Y = [[F,
 *       B], [B^+, -K]] with K &gt;= b - e and F &gt;= a - e &gt;= 0. Since [[B K^-1 B^+, -B],
 *       [-B^+, K]] &gt;= 0 (Schur complement), Y &lt;= [[F + B K^-1 B^+, 0], [0, 0]], and tr of the
 *       positive part is monotone: tr Y_+ &lt;= tr F + |B|_F^2 / (b - e) with |B|_F^2 &lt;= e^2 /
 *       2. The same for -Y, with tr Y_+ = tr Y + tr Y_-, gives a in place of b. A block without
 *       vectors makes B empty and the difference zero.
 * </ul>
 */
final class PositivePart {
  private final SpectralFrame frame;
  private final double leastPositive;
  private final double leastNegative;

  private PositivePart(SpectralFrame frame) {
    this.frame = frame;
    double positive = Double.POSITIVE_INFINITY;
    double negative = Double.POSITIVE_INFINITY;
    for (int k = 0; k < frame.size(); k++) {
      if (frame.value(k) > 0) {
        positive = Math.min(positive, frame.value(k));
      } else {
        negative = Math.min(negative, -frame.value(k));
      }
    }
    this.leastPositive = positive;
    this.leastNegative = negative;
  }

  static PositivePart near(Hermitian matrix) {
    return new PositivePart(SpectralFrame.of(matrix));
  }

  /** The projector P. */
  ApproximateOperator projector() {
    double[] indicator = new double[frame.size()];
    for (int k = 0; k < indicator.length; k++) {
      indicator[k] = frame.value(k) > 0 ? 1 : 0;
    }
    return frame.withValues(indicator);
  }

  /** Bound of tr Y_+ - tr(P Y) for all Y within a Frobenius distance of X. */
  double excessUp(double distance) {
    double e = Rounding.addUp(distance, frame.residual());
    double linear = OperatorArithmetic.traceNormUp(e, frame.size());
    if (e > Math.min(leastPositive, leastNegative)) {
      return linear;
    }
    if (Math.max(leastPositive, leastNegative) == Double.POSITIVE_INFINITY) {
      return 0;
    }
    double gap = Rounding.addDown(Math.max(leastPositive, leastNegative), -e);
    double quadratic =
        gap > 0 ? Rounding.divideUp(Rounding.timesUp(e, e), 2 * gap) : Double.POSITIVE_INFINITY;
    return Math.min(linear, quadratic);
  }

  /**
   * Bound of tr Y_+ for all Y of a given trace within a Frobenius distance of X: tr X'_+ + tr E_+
   * with tr E_+ = (|E|_1 + tr E) / 2.
   */
  double positiveUp(double distance, double trace) {
    Interval positive = Interval.ZERO;
    Interval all = Interval.ZERO;
    for (int k = 0; k < frame.size(); k++) {
      Interval value = Interval.of(frame.value(k));
      all = all.plus(value);
      positive = frame.value(k) > 0 ? positive.plus(value) : positive;
    }
    double e = Rounding.addUp(distance, frame.residual());
    double traceNorm = OperatorArithmetic.traceNormUp(e, frame.size());
    double traceOfError = Interval.of(trace).minus(all).upper();
    return Rounding.addUp(
        positive.upper(), Math.max(0, 0.5 * Rounding.addUp(traceNorm, traceOfError)));
  }
}
