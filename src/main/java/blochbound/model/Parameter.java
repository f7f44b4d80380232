package blochbound.model;

import blochbound.check.Check;
import java.math.BigDecimal;

/**
 * A device parameter with its nominal value and its tolerance range, in exact decimals of its unit.
 *
 * @param name name in the case file
 * @param nominal nominal value
 * @param lower lower end of the range at ball radius 1, at most the nominal value
 * @param upper upper end of the range at ball radius 1, at least the nominal value
 * @param unit unit of the three numbers
 * @param distribution scatter for sampling
 */
public record Parameter(
    String name,
    BigDecimal nominal,
    BigDecimal lower,
    BigDecimal upper,
    Unit unit,
    Distribution distribution) {
  /** Checks that the range holds the nominal value. */
  public Parameter {
    Check.that(
        lower.compareTo(nominal) <= 0 && nominal.compareTo(upper) <= 0,
        "the range of " + name + " must hold its nominal value");
  }

  /** Tells whether the parameter has no tolerance. */
  public boolean isConstant() {
    return lower.compareTo(upper) == 0;
  }

  /** Tells whether the nominal value is the middle of the range. */
  public boolean isCentred() {
    return nominal.subtract(lower).compareTo(upper.subtract(nominal)) == 0;
  }
}
