package blochbound.casefile;

import blochbound.model.Unit;
import java.math.BigDecimal;

/**
 * A decimal with a unit, exactly as written.
 *
 * @param value the decimal
 * @param unit its unit; per cent has the symbol {@code %}
 * @param at offset of its first character
 */
record Quantity(BigDecimal value, Unit unit, int at) {
  /** Symbol of the relative unit of tolerances. */
  static final String PERCENT_SYMBOL = "%";

  /** Tells whether it is relative. */
  boolean isPercent() {
    return unit.symbol().equals(PERCENT_SYMBOL);
  }
}
