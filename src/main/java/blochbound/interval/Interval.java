package blochbound.interval;

import java.math.BigDecimal;
import java.math.MathContext;
import java.math.RoundingMode;
import org.apache.commons.math3.fraction.BigFraction;

/**
 * Closed interval of real numbers with outward-rounded double ends: every operation returns an
 * enclosure of all its exact results.
 *
 * <p>The empty set has NaN ends; functions act on the part of an argument inside their domain (IEEE
 * Std 1788-2015). Sums, products, quotients and square roots of doubles are correctly rounded and
 * are widened by one unit in the last place; {@link Math#exp}, {@link Math#sin} and {@link
 * Math#cos} err by at most one unit in the last place (their specification) and are widened by two.
 *
 * @param lower lower end, perhaps -infinity
 * @param upper upper end, perhaps +infinity
 */
public record Interval(double lower, double upper) {
  /** The empty set. */
  public static final Interval EMPTY = new Interval(Double.NaN, Double.NaN);

  /** All real numbers. */
  public static final Interval ENTIRE =
      new Interval(Double.NEGATIVE_INFINITY, Double.POSITIVE_INFINITY);

  /** Zero. */
  public static final Interval ZERO = new Interval(0, 0);

  /** One. */
  public static final Interval ONE = new Interval(1, 1);

  /** Enclosure of the number pi. */
  public static final Interval PI = new Interval(Math.PI, Math.nextUp(Math.PI));

  /** Checks the order of the ends and gives zero one form, without a sign. */
  public Interval {
    lower += 0.0;
    upper += 0.0;
    if (Double.isNaN(lower) != Double.isNaN(upper)) {
      throw new IllegalArgumentException("both ends of the empty interval are NaN");
    }
    if (lower > upper || lower == Double.POSITIVE_INFINITY || upper == Double.NEGATIVE_INFINITY) {
      throw new IllegalArgumentException("interval ends out of order: " + lower + ", " + upper);
    }
  }

  /**
   * The single number {@code value}, exactly.
   *
   * @throws IllegalArgumentException when the value is NaN or infinite
   */
  public static Interval of(double value) {
    return of(value, value);
  }

  /**
   * The numbers between {@code lower} and {@code upper}.
   *
   * @throws IllegalArgumentException when an end is NaN (a failed computation is not the empty set)
   *     or the ends are out of order
   */
  public static Interval of(double lower, double upper) {
    if (Double.isNaN(lower) || Double.isNaN(upper)) {
      throw new IllegalArgumentException("an interval end is not a number");
    }
    return new Interval(lower, upper);
  }

  /** Tightest enclosure of a decimal number. */
  public static Interval fromDecimal(BigDecimal value) {
    double nearest = value.doubleValue();
    if (Double.isInfinite(nearest)) {
      return nearest > 0
          ? new Interval(Double.MAX_VALUE, nearest)
          : new Interval(nearest, -Double.MAX_VALUE);
    }
    int side = new BigDecimal(nearest).compareTo(value);
    return new Interval(
        side > 0 ? Math.nextDown(nearest) : nearest, side < 0 ? Math.nextUp(nearest) : nearest);
  }

  /** Tightest enclosure of a fraction, up to one unit in the last place. */
  public static Interval fromFraction(BigFraction value) {
    BigDecimal numerator = new BigDecimal(value.getNumerator());
    BigDecimal denominator = new BigDecimal(value.getDenominator());
    MathContext down = new MathContext(40, RoundingMode.FLOOR);
    MathContext up = new MathContext(40, RoundingMode.CEILING);
    return new Interval(
        fromDecimal(numerator.divide(denominator, down)).lower,
        fromDecimal(numerator.divide(denominator, up)).upper);
  }

  /** Tells whether this is the empty set. */
  public boolean isEmpty() {
    return Double.isNaN(lower);
  }

  /** Tells whether {@code value} lies inside, ends included. */
  public boolean contains(double value) {
    return lower <= value && value <= upper;
  }

  /** Tells whether every number of {@code other} lies inside. */
  public boolean contains(Interval other) {
    return other.isEmpty() || (lower <= other.lower && other.upper <= upper);
  }

  /** A finite number inside, near the middle of a bounded interval; NaN for the empty set. */
  public double middle() {
    if (lower == upper) {
      return lower;
    }
    boolean openBelow = lower == Double.NEGATIVE_INFINITY;
    boolean openAbove = upper == Double.POSITIVE_INFINITY;
    if (openBelow || openAbove) {
      return openBelow && openAbove ? 0 : openAbove ? Math.max(0, lower) : Math.min(0, upper);
    }
    return 0.5 * lower + 0.5 * upper;
  }

  /** Upper bound of the distance of any member from {@link #middle()}. */
  public double radius() {
    return lower == upper
        ? 0
        : Math.max(Math.nextUp(upper - middle()), Math.nextUp(middle() - lower));
  }

  /** Largest absolute value of a member. */
  public double magnitude() {
    return Math.max(Math.abs(lower), Math.abs(upper));
  }

  /** Smallest absolute value of a member. */
  public double mignitude() {
    return contains(0) ? 0 : Math.min(Math.abs(lower), Math.abs(upper));
  }

  /** Sum. */
  public Interval plus(Interval other) {
    return isEmpty() || other.isEmpty()
        ? EMPTY
        : new Interval(sumDown(lower, other.lower), -sumDown(-upper, -other.upper));
  }

  /** Difference. */
  public Interval minus(Interval other) {
    return plus(other.negate());
  }

  /** The negative. */
  public Interval negate() {
    return isEmpty() ? EMPTY : new Interval(-upper, -lower);
  }

  /** Product; a zero factor gives zero even with an unbounded one. */
  public Interval times(Interval other) {
    if (isEmpty() || other.isEmpty()) {
      return EMPTY;
    }
    return new Interval(
        least(
            Rounding.timesDown(lower, other.lower),
            Rounding.timesDown(lower, other.upper),
            Rounding.timesDown(upper, other.lower),
            Rounding.timesDown(upper, other.upper)),
        -least(
            Rounding.timesDown(-lower, other.lower),
            Rounding.timesDown(-lower, other.upper),
            Rounding.timesDown(-upper, other.lower),
            Rounding.timesDown(-upper, other.upper)));
  }

  /** Quotient; a divisor with zero inside gives all reals, with zero at an end a half line. */
  public Interval dividedBy(Interval other) {
    if (isEmpty() || other.isEmpty() || (other.lower == 0 && other.upper == 0)) {
      return EMPTY;
    }
    if (lower == 0 && upper == 0) {
      return ZERO;
    }
    if (other.lower < 0 && other.upper > 0) {
      return ENTIRE;
    }
    if (other.upper <= 0) {
      return negate().dividedBy(other.negate());
    }
    double low = lower >= 0 ? quotientDown(lower, other.upper) : quotientDown(lower, other.lower);
    double high =
        upper <= 0 ? -quotientDown(-upper, other.upper) : -quotientDown(-upper, other.lower);
    return new Interval(low, high);
  }

  /** Square, which knows that both factors are the same number. */
  public Interval square() {
    if (isEmpty()) {
      return EMPTY;
    }
    double least = mignitude();
    double most = magnitude();
    return new Interval(
        Math.max(0, Rounding.timesDown(least, least)), Rounding.timesUp(most, most));
  }

  /** Integer power, also negative; the zeroth power is one. */
  public Interval power(int exponent) {
    if (isEmpty()) {
      return EMPTY;
    }
    if (exponent < 0) {
      return ONE.dividedBy(power(-exponent));
    }
    if (exponent == 0) {
      return ONE;
    }
    if (exponent == 1) {
      return this;
    }
    Interval half = power(exponent / 2).square();
    if (exponent % 2 == 0) {
      return half;
    }
    if (lower == upper) {
      return half.times(this);
    }
    // An odd power is monotone: each end is enclosed on its own.
    return new Interval(
        Double.isInfinite(lower) ? lower : of(lower).power(exponent).lower,
        Double.isInfinite(upper) ? upper : of(upper).power(exponent).upper);
  }

  /** Square root of the part that is not negative. */
  public Interval sqrt() {
    if (isEmpty() || upper < 0) {
      return EMPTY;
    }
    double low = Math.max(0, lower);
    return new Interval(
        low == 0 ? 0 : Math.nextDown(Math.sqrt(low)), Rounding.sqrtUp(Math.max(0, upper)));
  }

  /** Exponential. */
  public Interval exp() {
    return isEmpty()
        ? EMPTY
        : new Interval(Math.max(0, down2(Math.exp(lower))), up2(Math.exp(upper)));
  }

  /** Sine. */
  public Interval sin() {
    return minus(PI.times(of(0.5))).cos();
  }

  /** Cosine. */
  public Interval cos() {
    if (isEmpty()) {
      return EMPTY;
    }
    Interval turns = dividedBy(PI);
    if (!(turns.upper - turns.lower < 2) || turns.magnitude() > 1e9) {
      return new Interval(-1, 1);
    }
    // Extremes at whole multiples of pi that the enclosure may contain.
    double low = Math.min(Math.cos(lower), Math.cos(upper));
    double high = Math.max(Math.cos(lower), Math.cos(upper));
    for (double k = Math.ceil(turns.lower); k <= turns.upper; k++) {
      if (k % 2 == 0) {
        high = 1;
      } else {
        low = -1;
      }
    }
    return new Interval(Math.max(-1, down2(low)), Math.min(1, up2(high)));
  }

  /** Smallest interval with all members of both. */
  public Interval hull(Interval other) {
    if (isEmpty() || other.isEmpty()) {
      return isEmpty() ? other : this;
    }
    return new Interval(Math.min(lower, other.lower), Math.max(upper, other.upper));
  }

  private static double least(double a, double b, double c, double d) {
    return Math.min(Math.min(a, b), Math.min(c, d));
  }

  private static double sumDown(double a, double b) {
    if (a == 0 || b == 0 || Double.isInfinite(a) || Double.isInfinite(b)) {
      return a + b;
    }
    return Math.nextDown(a + b);
  }

  private static double quotientDown(double a, double b) {
    if (a == 0) {
      return 0;
    }
    return Double.isInfinite(a) || b == 0
        ? Math.copySign(Double.POSITIVE_INFINITY, a)
        : Math.nextDown(a / b);
  }

  private static double down2(double value) {
    return Math.nextDown(Math.nextDown(value));
  }

  private static double up2(double value) {
    return Math.nextUp(Math.nextUp(value));
  }
}
