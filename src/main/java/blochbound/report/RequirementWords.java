package blochbound.report;

import blochbound.model.MeasureSpec;
import blochbound.model.Requirement;
import blochbound.model.Requirement.Sense;
import blochbound.model.Unit;
import blochbound.model.When;
import java.math.BigDecimal;

/** A requirement in words, with its limit exactly as the case states it. */
final class RequirementWords {
  private RequirementWords() {}

  /** Sense and limit for a table, such as {@code >= 0.3 /us}. */
  static String limit(Requirement requirement) {
    String sign = requirement.sense() == Sense.AT_LEAST ? ">= " : "<= ";
    return sign + quantity(requirement.limit(), requirement.unit());
  }

  /** The whole requirement, such as {@code purity at least 0.7 in every steady state}. */
  static String sentence(Requirement requirement) {
    String sense = requirement.sense() == Sense.AT_LEAST ? " at least " : " at most ";
    return requirement.measureText()
        + sense
        + quantity(requirement.limit(), requirement.unit())
        + " "
        + moment(requirement);
  }

  /** The moment at which it must hold. */
  static String moment(Requirement requirement) {
    When when = requirement.when();
    if (isOfDynamics(requirement.measure())) {
      return "in every device";
    }
    if (when instanceof When.At at) {
      return "at " + quantity(at.time(), at.unit());
    }
    if (when instanceof When.During during) {
      return "at all times from "
          + quantity(during.from(), during.fromUnit())
          + " to "
          + quantity(during.until(), during.untilUnit());
    }
    return when instanceof When.AtEnd ? "at the end of the sequence" : "in every steady state";
  }

  /** Tells whether a measure belongs to the dynamics rather than to a state at a moment. */
  private static boolean isOfDynamics(MeasureSpec measure) {
    return measure instanceof MeasureSpec.Gap || measure instanceof MeasureSpec.Settling;
  }

  /** A decimal with its unit. */
  static String quantity(BigDecimal value, Unit unit) {
    return withUnit(NumberText.exact(value), unit);
  }

  /** A number with a unit behind it, unless it is a pure number. */
  static String withUnit(String number, Unit unit) {
    return unit.symbol().isEmpty() ? number : number + " " + unit.symbol();
  }
}
