package blochbound.model;

import blochbound.interval.ExactNumber;
import blochbound.interval.Interval;
import java.math.BigDecimal;
import java.util.Optional;

/**
 * One line of a specification: a measure must stay on one side of a limit.
 *
 * @param name name in the case file
 * @param measureText the measure as written
 * @param measure the measure
 * @param sense which side is allowed
 * @param limit the limit in {@code unit}
 * @param unit unit of the limit, in which results are reported
 * @param when at which moment
 * @param start initial state, for requirements at a time
 */
public record Requirement(
    String name,
    String measureText,
    MeasureSpec measure,
    Sense sense,
    BigDecimal limit,
    Unit unit,
    When when,
    Optional<StateSpec> start) {
  /** Side of the limit that is allowed. */
  public enum Sense {
    /** The measure must not fall below the limit; the guarantee is a lower bound. */
    AT_LEAST("atLeast"),
    /** The measure must not exceed the limit; the guarantee is an upper bound. */
    AT_MOST("atMost");

    private final String key;

    Sense(String key) {
      this.key = key;
    }

    /** The key of the case file. */
    public String key() {
      return key;
    }

    /** Factor 1 for {@link #AT_LEAST} and -1 for {@link #AT_MOST}. */
    public int sign() {
      return this == AT_LEAST ? 1 : -1;
    }
  }

  /** Enclosure of the limit in internal units. */
  public Interval limitEnclosure() {
    return ExactNumber.of(limit).times(unit.factor()).enclosure();
  }
}
