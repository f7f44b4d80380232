package blochbound.report;

import blochbound.model.Ball;
import blochbound.model.Distribution;
import blochbound.model.Parameter;
import java.math.BigDecimal;
import java.math.MathContext;
import java.math.RoundingMode;

/**
 * A parameter's range over the ball in decimals of its unit, and its tolerance in words.
 *
 * @param parameter the parameter
 * @param lower exact lower end of its range at the ball's radius
 * @param upper exact upper end of its range at the ball's radius
 */
record ParameterText(Parameter parameter, BigDecimal lower, BigDecimal upper) {
  private static final BigDecimal HUNDRED = BigDecimal.valueOf(100);
  private static final int SHARE_DIGITS = 4;

  /** A parameter in a ball. */
  static ParameterText of(Parameter parameter, Ball ball) {
    BigDecimal nominal = parameter.nominal();
    BigDecimal down = nominal.subtract(parameter.lower()).multiply(ball.radius());
    BigDecimal up = parameter.upper().subtract(nominal).multiply(ball.radius());
    return new ParameterText(parameter, nominal.subtract(down), nominal.add(up));
  }

  /** The range as a share of the nominal value, such as {@code +-20 %} or {@code -5 % +10 %}. */
  String share() {
    if (lower.compareTo(upper) == 0) {
      return "constant";
    }
    if (parameter.nominal().signum() == 0) {
      return "-";
    }
    String down = percent(parameter.nominal().subtract(lower));
    String up = percent(upper.subtract(parameter.nominal()));
    return down.equals(up) ? "+-" + up : "-" + down + " +" + up;
  }

  private String percent(BigDecimal width) {
    BigDecimal share =
        width.multiply(HUNDRED).divide(parameter.nominal().abs(), MathContext.DECIMAL64);
    return NumberText.significant(share, SHARE_DIGITS, RoundingMode.HALF_EVEN) + " %";
  }

  /** The declared scatter; a dash for constants. */
  String distribution() {
    Distribution distribution = parameter.distribution();
    if (parameter.isConstant()) {
      return "-";
    }
    if (distribution instanceof Distribution.Normal normal) {
      return "normal, sigma " + NumberText.shortest(normal.sigma());
    }
    return distribution instanceof Distribution.Triangular ? "triangular" : "uniform";
  }
}
