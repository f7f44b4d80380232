package blochbound.measure;

import blochbound.interval.Interval;
import blochbound.interval.Rounding;

/** Certified logarithms and what entropies need of them. */
final class LogBounds {
  private LogBounds() {}

  /**
   * Certified enclosure of the natural logarithm of positive numbers. {@link Math#log} errs by at
   * most one unit in the last place (its specification); the result is widened by two.
   */
  static Interval log(Interval argument) {
    double low = Math.log(Math.max(0, argument.lower()));
    double high = Math.log(argument.upper());
    return Interval.of(Math.nextDown(Math.nextDown(low)), Math.nextUp(Math.nextUp(high)));
  }

  /** Upper bound of log(1 + x) for x &gt;= 0. */
  static double logOnePlusUp(double x) {
    return x < 1e-8 ? x : Math.min(x, log(Interval.of(Rounding.addUp(1, x))).upper());
  }

  /**
   * Upper bound of |S(rho) - S(sigma)| for states of d levels with trace distance at most t: t
   * log(d - 1) + h(t) for t &lt;= 1 - 1/d, and log d beyond (K. M. R. Audenaert, J. Phys. A 40
   * (2007) 8127, eq. 1; the citation is from memory).
   */
  static double continuityUp(double t, int d) {
    double most = log(Interval.of(d)).upper();
    if (d == 1 || t == 0) {
      return 0;
    }
    if (!(t < Math.nextDown(1 - 1.0 / d))) {
      return most;
    }
    Interval x = Interval.of(t);
    Interval rest = Interval.ONE.minus(x);
    Interval binary = x.times(log(x)).plus(rest.times(log(rest))).negate();
    Interval linear = d == 2 ? Interval.ZERO : x.times(log(Interval.of(d - 1)));
    return Math.min(most, binary.plus(linear).upper());
  }
}
