package blochbound.report;

import blochbound.model.Requirement;
import blochbound.model.Requirement.Sense;
import blochbound.study.FoundPoint;
import blochbound.study.Guarantee;
import blochbound.study.RequirementResult;
import java.math.BigDecimal;
import java.math.RoundingMode;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;

/**
 * How many decimals the values of one requirement need, and how each is rounded.
 *
 * <p>All values share the decimals, so that rounding keeps their order: guaranteed, worst found,
 * nominal. There are enough to tell guaranteed and worst found apart with two digits, and to see on
 * which side of the limit each of them lies.
 *
 * @param scale number of decimals, negative for multiples of ten
 * @param sense side of the limit that is allowed
 * @param limit the limit
 */
record BracketDigits(int scale, Sense sense, BigDecimal limit) {
  private static final int LEAST_DIGITS = 4;
  private static final int MOST_DIGITS = 10;
  private static final int MOST_DIGITS_AT_LIMIT = 16;
  private static final int MARGIN_DIGITS = 3;
  private static final int NO_DIFFERENCE = -10_000;

  /** The digits for a result. */
  static BracketDigits of(RequirementResult result) {
    Requirement requirement = result.requirement();
    Optional<BigDecimal> nominal = finite(result.nominal().stream().boxed().findFirst());
    Optional<BigDecimal> found = finite(result.worstFound().map(FoundPoint::value));
    Optional<BigDecimal> certified = finite(result.guaranteed().map(Guarantee::value));
    BigDecimal limit = requirement.limit();
    List<BigDecimal> values = new ArrayList<>(List.of(limit));
    nominal.ifPresent(values::add);
    found.ifPresent(values::add);
    certified.ifPresent(values::add);
    int top =
        values.stream().filter(v -> v.signum() != 0).mapToInt(NumberText::exponent).max().orElse(0);
    int inside = Math.max(separation(certified, found), separation(nominal, found)) + 1;
    int atLimit =
        Math.max(
            limit.stripTrailingZeros().scale(),
            Math.max(
                separation(certified, Optional.of(limit)), separation(found, Optional.of(limit))));
    int scale = LEAST_DIGITS - 1 - top;
    scale = Math.max(scale, Math.min(inside, MOST_DIGITS - 1 - top));
    scale = Math.max(scale, Math.min(atLimit, MOST_DIGITS_AT_LIMIT - 1 - top));
    return new BracketDigits(scale, requirement.sense(), limit);
  }

  /** Decimals at which a step is no larger than the difference; few when there is none. */
  private static int separation(Optional<BigDecimal> a, Optional<BigDecimal> b) {
    return a.flatMap(x -> b.map(x::subtract))
        .filter(difference -> difference.signum() != 0)
        .map(difference -> -NumberText.exponent(difference))
        .orElse(NO_DIFFERENCE);
  }

  private static Optional<BigDecimal> finite(Optional<Double> value) {
    return value.filter(Double::isFinite).map(BigDecimal::new);
  }

  /** A certified value, rounded to the safe side: down for a least value, up for a greatest one. */
  String certified(double value) {
    return NumberText.rounded(value, scale, toSafeSide());
  }

  /** Any other value, rounded to nearest. */
  String estimate(double value) {
    return NumberText.rounded(value, scale, RoundingMode.HALF_EVEN);
  }

  /** How far a certified value lies inside the limit, rounded down; negative beyond the limit. */
  String certifiedMargin(double value) {
    return margin(value, RoundingMode.FLOOR);
  }

  /** How far a value lies inside the limit, rounded to nearest; negative beyond the limit. */
  String margin(double value) {
    return margin(value, RoundingMode.HALF_EVEN);
  }

  private String margin(double value, RoundingMode mode) {
    if (!Double.isFinite(value)) {
      return "-";
    }
    BigDecimal difference = new BigDecimal(value).subtract(limit);
    BigDecimal inside = sense == Sense.AT_LEAST ? difference : difference.negate();
    String text = NumberText.significant(inside, MARGIN_DIGITS, mode);
    return inside.signum() > 0 ? "+" + text : text;
  }

  private RoundingMode toSafeSide() {
    return sense == Sense.AT_LEAST ? RoundingMode.FLOOR : RoundingMode.CEILING;
  }
}
