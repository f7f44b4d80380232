package blochbound.casefile;

import blochbound.interval.ExactNumber;
import blochbound.model.Unit;
import java.math.BigDecimal;
import java.math.MathContext;
import java.math.RoundingMode;

/**
 * Converts a decimal from one unit into another of the same dimension.
 *
 * <p>Exact between units of one kind. Between cycles and plain rates the factor 2 pi is irrational;
 * the result then has 40 significant digits and is rounded in the direction asked for, so that a
 * range never shrinks.
 */
final class UnitConversion {
  /** Digits of pi: lower and upper end of an enclosure. */
  static final BigDecimal PI_BELOW =
      new BigDecimal("3.14159265358979323846264338327950288419716939937510582097494459");

  static final BigDecimal PI_ABOVE = PI_BELOW.add(PI_BELOW.ulp());

  private static final int DIGITS = 40;

  private UnitConversion() {}

  /**
   * The value in another unit.
   *
   * @param mode FLOOR or CEILING: the side to which an irrational result is rounded
   */
  static BigDecimal convert(BigDecimal value, Unit from, Unit to, RoundingMode mode) {
    if (from.factor().equals(to.factor()) || value.signum() == 0) {
      return value;
    }
    ExactNumber factor = from.factor().dividedBy(to.factor());
    BigDecimal numerator = new BigDecimal(factor.numerator());
    BigDecimal denominator = new BigDecimal(factor.denominator());
    if (factor.piPower() == 0) {
      // Factors between units of one kind are powers of ten, so the quotient ends.
      return value.multiply(numerator).divide(denominator);
    }
    boolean enlarge = (mode == RoundingMode.CEILING) == (value.signum() > 0);
    BigDecimal pi = enlarge == (factor.piPower() > 0) ? PI_ABOVE : PI_BELOW;
    MathContext context = new MathContext(DIGITS, mode);
    return factor.piPower() > 0
        ? value.multiply(numerator).multiply(pi).divide(denominator, context)
        : value.multiply(numerator).divide(denominator.multiply(pi), context);
  }
}
