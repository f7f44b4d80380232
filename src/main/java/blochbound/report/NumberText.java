package blochbound.report;

import blochbound.check.Check;
import java.math.BigDecimal;
import java.math.MathContext;
import java.math.RoundingMode;

/**
 * Numbers as text, the same on every machine: plain decimals where they stay short, otherwise a
 * mantissa with an exponent such as {@code 1.5e-7}; both are also valid JSON numbers.
 */
final class NumberText {
  private static final int LEAST_PLAIN_EXPONENT = -5;
  private static final int GREATEST_PLAIN_EXPONENT = 8;
  private static final int DOUBLE_DIGITS = 17;

  private NumberText() {}

  /** The decimal itself, with all its digits. */
  static String exact(BigDecimal value) {
    if (value.signum() == 0) {
      boolean isShort = value.scale() >= 0 && value.scale() <= -LEAST_PLAIN_EXPONENT * 2;
      return isShort ? value.toPlainString() : "0";
    }
    int exponent = exponent(value);
    if (exponent >= LEAST_PLAIN_EXPONENT && exponent <= GREATEST_PLAIN_EXPONENT) {
      return value.toPlainString();
    }
    return value.movePointLeft(exponent).toPlainString() + "e" + exponent;
  }

  /**
   * Decimal with the fewest digits that reads back as the same double (one more may stand beside a
   * power of two).
   *
   * @throws IllegalArgumentException when the value is not finite
   */
  static String shortest(double value) {
    BigDecimal whole = new BigDecimal(Check.finite(value, "a number to print"));
    BigDecimal rounded = whole;
    for (int digits = 1; digits <= DOUBLE_DIGITS; digits++) {
      rounded = whole.round(new MathContext(digits, RoundingMode.HALF_EVEN));
      if (rounded.doubleValue() == value) {
        break;
      }
    }
    return exact(strip(rounded));
  }

  /** The value rounded to a number of significant digits, without trailing zeros. */
  static String significant(double value, int digits, RoundingMode mode) {
    return Double.isFinite(value)
        ? significant(new BigDecimal(value), digits, mode)
        : notFinite(value);
  }

  /** The value rounded to a number of significant digits, without trailing zeros. */
  static String significant(BigDecimal value, int digits, RoundingMode mode) {
    return exact(strip(value.round(new MathContext(digits, mode))));
  }

  /** The value rounded to {@code scale} decimals, which may be negative. */
  static String rounded(double value, int scale, RoundingMode mode) {
    return Double.isFinite(value)
        ? exact(new BigDecimal(value).setScale(scale, mode))
        : notFinite(value);
  }

  /** The decimal exponent: 2 for 123.4, -1 for 0.5; the value must not be zero. */
  static int exponent(BigDecimal value) {
    return value.precision() - value.scale() - 1;
  }

  private static BigDecimal strip(BigDecimal value) {
    return value.signum() == 0 ? BigDecimal.ZERO : value.stripTrailingZeros();
  }

  private static String notFinite(double value) {
    if (Double.isNaN(value)) {
      return "undefined";
    }
    return value > 0 ? "infinity" : "-infinity";
  }
}
