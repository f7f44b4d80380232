package blochbound.casefile;

import java.math.BigDecimal;
import java.math.BigInteger;
import java.util.Optional;
import java.util.regex.Matcher;
import java.util.regex.Pattern;

/**
 * Reads decimal numbers exactly, within limits that keep exact arithmetic cheap.
 *
 * <p>Allowed: zero, and sizes from 1e-300 to 1e300, in at most 400 characters. An exponent is
 * checked before any power of ten is formed.
 */
final class DecimalText {
  static final String ALLOWED = "a finite decimal such as 0.5 or 2e-3";

  /** Unsigned decimal at the start of a text. */
  static final Pattern UNSIGNED = Pattern.compile("(\\d+\\.?\\d*|\\.\\d+)([eE]([+-]?\\d+))?");

  private static final int LONGEST = 400;
  private static final int LARGEST_EXPONENT = 300;
  private static final int MOST_EXPONENT_DIGITS = 4;

  private DecimalText() {}

  /** What is wrong with an unsigned decimal of the right form, if anything. */
  static Optional<String> complaint(String text) {
    if (text.length() > LONGEST) {
      return Optional.of("a number of more than " + LONGEST + " characters");
    }
    Matcher m = UNSIGNED.matcher(text);
    if (!m.matches()) {
      return Optional.of("`" + text + "` is no number; allowed is " + ALLOWED);
    }
    String range = "the number " + text + " is out of range; allowed are 0 and 1e-300 to 1e300";
    String exponent = m.group(3) == null ? "0" : m.group(3).replaceFirst("^([+-]?)0+(?=\\d)", "$1");
    if (exponent.replaceFirst("[+-]", "").length() > MOST_EXPONENT_DIGITS) {
      return Optional.of(range);
    }
    BigDecimal digits = new BigDecimal(m.group(1));
    if (digits.signum() == 0) {
      return Optional.empty();
    }
    BigDecimal value = digits.scaleByPowerOfTen(Integer.parseInt(exponent));
    boolean small = value.compareTo(BigDecimal.ONE.scaleByPowerOfTen(-LARGEST_EXPONENT)) < 0;
    boolean large = value.compareTo(BigDecimal.ONE.scaleByPowerOfTen(LARGEST_EXPONENT)) > 0;
    return small || large ? Optional.of(range) : Optional.empty();
  }

  /** The value of a text without {@link #complaint}. */
  static BigDecimal value(String text) {
    Matcher m = UNSIGNED.matcher(text);
    if (!m.matches()) {
      throw new IllegalArgumentException("no number: " + text);
    }
    BigDecimal digits = new BigDecimal(m.group(1));
    if (digits.signum() == 0) {
      return BigDecimal.ZERO;
    }
    String exponent = m.group(3) == null ? "0" : m.group(3);
    return digits.scaleByPowerOfTen(new BigInteger(exponent).intValueExact());
  }
}
