package blochbound.casefile;

import blochbound.interval.ExactNumber;
import blochbound.model.Unit;
import java.math.BigDecimal;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;

/**
 * The units that a case may use, with exact factors into its internal unit of time.
 *
 * <p>Hz, kHz, MHz and GHz count cycles: their factor holds 2 pi.
 */
final class UnitTable {
  /** Symbol of cases without a unit of time. */
  static final String NO_UNIT = "none";

  /** Units of time, longest first, with their decimal exponent in seconds. */
  private static final Map<String, Integer> TIMES = orderedTimes();

  /** Units of frequency in cycles with their decimal exponent per second. */
  private static final Map<String, Integer> CYCLES = orderedCycles();

  /** All words that occur in units; none of them may be a name. */
  static final List<String> WORDS =
      List.of("Hz", "kHz", "MHz", "GHz", "s", "ms", "us", "ns", "rad");

  private final Map<String, Unit> units = new LinkedHashMap<>();
  private final String timeUnit;

  /**
   * The units of a case.
   *
   * @param timeUnit s, ms, us, ns or none
   */
  UnitTable(String timeUnit) {
    this.timeUnit = timeUnit;
    if (isDimensionless()) {
      return;
    }
    int internal = java.util.Objects.requireNonNull(TIMES.get(timeUnit), timeUnit);
    ExactNumber turn = ExactNumber.of(2).times(ExactNumber.PI);
    TIMES.forEach(
        (name, exponent) -> {
          ExactNumber factor = powerOfTen(exponent - internal);
          units.put(name, new Unit(name, factor, 1));
          ExactNumber rate = ExactNumber.ONE.dividedBy(factor);
          for (String prefix : List.of("/", "1/", "rad/")) {
            units.put(prefix + name, new Unit(prefix + name, rate, -1));
          }
        });
    CYCLES.forEach(
        (name, exponent) ->
            units.put(name, new Unit(name, turn.times(powerOfTen(exponent + internal)), -1)));
  }

  /** The words that may stand as {@code timeUnit}. */
  static List<String> timeUnits() {
    return List.of("s", "ms", "us", "ns", NO_UNIT);
  }

  /** Tells whether a word is a unit of time. */
  static boolean isTime(String word) {
    return TIMES.containsKey(word);
  }

  /** Tells whether the case has no unit of time, so that everything is a pure number. */
  boolean isDimensionless() {
    return timeUnit.equals(NO_UNIT);
  }

  /** The unit of that symbol, written without blanks. */
  Optional<Unit> find(String symbol) {
    return symbol.isEmpty() ? Optional.of(Unit.NONE) : Optional.ofNullable(units.get(symbol));
  }

  /** Says that a symbol is no unit of this case, and what is. */
  String unknown(String symbol) {
    if (isDimensionless()) {
      return "the unit `" + symbol + "` in a case with timeUnit none; leave the unit out";
    }
    return "unknown unit `"
        + symbol
        + "`"
        + Vocabulary.nearest(symbol, units.keySet())
        + "; units are Hz kHz MHz GHz (cycles), /s /ms /us /ns, rad/s rad/ms rad/us rad/ns, s ms us"
        + " ns";
  }

  private static ExactNumber powerOfTen(int exponent) {
    return ExactNumber.of(BigDecimal.ONE.scaleByPowerOfTen(exponent));
  }

  private static Map<String, Integer> orderedTimes() {
    Map<String, Integer> times = new LinkedHashMap<>();
    times.put("s", 0);
    times.put("ms", -3);
    times.put("us", -6);
    times.put("ns", -9);
    return times;
  }

  private static Map<String, Integer> orderedCycles() {
    Map<String, Integer> cycles = new LinkedHashMap<>();
    cycles.put("Hz", 0);
    cycles.put("kHz", 3);
    cycles.put("MHz", 6);
    cycles.put("GHz", 9);
    return cycles;
  }
}
