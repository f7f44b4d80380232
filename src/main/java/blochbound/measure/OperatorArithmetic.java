package blochbound.measure;

import blochbound.interval.Interval;
import blochbound.interval.Rounding;
import blochbound.linalg.ComplexBall;
import blochbound.linalg.ComplexMatrix;
import blochbound.linalg.Hermitian;

/** Certified sums, norms and shifts of Hermitian matrices that are taken as exact. */
final class OperatorArithmetic {
  private OperatorArithmetic() {}

  /** Certified enclosure of tr(a b). */
  static Interval traceOfProduct(Hermitian a, Hermitian b) {
    long n = a.size();
    // n^2 terms of two products each: n^2 + 1 roundings, sum of moduli at most |a|_F |b|_F.
    double error =
        Rounding.timesUp(
            Rounding.gamma(n * n + 2), Rounding.timesUp(frobeniusUp(a), frobeniusUp(b)));
    return around(a.inner(b), Rounding.addUp(error, n * n * Rounding.TINY));
  }

  /** Certified enclosure of the trace. */
  static Interval trace(Hermitian a) {
    Interval sum = Interval.ZERO;
    for (int i = 0; i < a.size(); i++) {
      sum = sum.plus(Interval.of(a.re(i, i)));
    }
    return sum;
  }

  /** Upper bound of the Frobenius norm. */
  static double frobeniusUp(Hermitian a) {
    return ComplexBall.exact(a.matrix()).normUp();
  }

  /** The numbers within {@code error} of {@code value}. */
  static Interval around(double value, double error) {
    return Interval.of(Rounding.addDown(value, -error), Rounding.addUp(value, error));
  }

  /** A matrix that is at most {@code a + c 1} as an operator and differs by rounding only. */
  static Hermitian shiftedDown(Hermitian a, double c) {
    return shiftedUp(a.scale(-1), -c).scale(-1);
  }

  /** A matrix that is at least {@code a + c 1} as an operator and differs by rounding only. */
  static Hermitian shiftedUp(Hermitian a, double c) {
    int n = a.size();
    double[] re = a.matrix().realParts();
    for (int i = 0; i < n; i++) {
      double sum = re[i * n + i] + c;
      // A sum with a zero term is exact.
      re[i * n + i] = c == 0 || re[i * n + i] == 0 ? sum : Math.nextUp(sum);
    }
    return new Hermitian(ComplexMatrix.of(n, n, re, a.matrix().imaginaryParts()));
  }

  /** Rounding error bound, in the Frobenius norm, of {@code a.scale(factor)}. */
  static double scalingError(Hermitian a, double factor) {
    return Rounding.timesUp(Rounding.UNIT, Rounding.timesUp(Math.abs(factor), frobeniusUp(a)));
  }

  /** Upper bound of |x|_1 for a d by d matrix with |x|_F at most {@code frobenius}. */
  static double traceNormUp(double frobenius, int d) {
    return Rounding.timesUp(Rounding.sqrtUp(d), frobenius);
  }
}
