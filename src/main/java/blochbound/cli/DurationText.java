package blochbound.cli;

import java.math.BigDecimal;
import java.math.RoundingMode;
import java.time.Duration;
import java.util.Map;
import java.util.regex.Matcher;
import java.util.regex.Pattern;

/** Reads durations such as {@code 60 s}, {@code 1ms} or {@code 2 min}. */
final class DurationText {
  /** What is allowed. */
  static final String ALLOWED = "a positive number with ms, s, min or h, such as 20s or \"2 min\"";

  private static final Pattern FORM =
      Pattern.compile("(\\d{1,15}(?:\\.\\d{0,15})?|\\.\\d{1,15})\\s*([a-z]+)");
  private static final Map<String, Long> NANOSECONDS =
      Map.of(
          "ms", 1_000_000L, "s", 1_000_000_000L, "min", 60_000_000_000L, "h", 3_600_000_000_000L);
  private static final BigDecimal MOST_NANOSECONDS =
      BigDecimal.valueOf(Duration.ofDays(365).toNanos());

  private DurationText() {}

  /**
   * The duration, to the nanosecond.
   *
   * @throws IllegalArgumentException when the text is none; the message says what is allowed
   */
  static Duration parse(String text) {
    Matcher form = FORM.matcher(text.strip());
    Long unit = form.matches() ? NANOSECONDS.get(form.group(2)) : null;
    if (unit == null) {
      throw new IllegalArgumentException("`" + text + "` is no duration; allowed is " + ALLOWED);
    }
    BigDecimal nanoseconds =
        new BigDecimal(form.group(1))
            .multiply(BigDecimal.valueOf(unit))
            .setScale(0, RoundingMode.FLOOR);
    if (nanoseconds.signum() == 0 || nanoseconds.compareTo(MOST_NANOSECONDS) > 0) {
      throw new IllegalArgumentException(
          "`" + text + "` is out of range; allowed is more than 0 and at most 8760 h");
    }
    return Duration.ofNanos(nanoseconds.longValueExact());
  }
}
