package blochbound.casefile;

import blochbound.casefile.Conditions.Condition;
import blochbound.model.Parameter;
import blochbound.model.ParameterSpace;
import blochbound.model.SignProof;
import blochbound.model.SignProof.Claim;
import blochbound.model.SignProof.Outcome;
import java.math.BigDecimal;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;

/** Proves on the whole ball that all rates, roots and divisors of a case are defined. */
final class ConditionProver {
  private final ParameterSpace space;
  private final FaultLog log;
  private final String timeUnit;

  ConditionProver(ParameterSpace space, FaultLog log, String timeUnit) {
    this.space = space;
    this.log = log;
    this.timeUnit = timeUnit;
  }

  /** Logs every condition that is not proved, with a point of the ball. */
  void prove(Conditions conditions) {
    for (Condition c : conditions.all()) {
      if (log.isFull()) {
        return;
      }
      Outcome outcome = SignProof.of(c.expression(), space, c.claim());
      if (outcome instanceof Outcome.NotProved failure) {
        log.add(c.passage().scalar().fault(c.at(), message(c, failure)));
      }
    }
  }

  private String message(Condition c, Outcome.NotProved failure) {
    String wanted = c.claim() == Claim.NONNEGATIVE ? "stay at or above 0" : "stay away from 0";
    return c.what()
        + " is not proved to "
        + wanted
        + " inside the ball: it is about "
        + String.format(Locale.ROOT, "%.4g", failure.value())
        + (timeUnit.equals(UnitTable.NO_UNIT) ? "" : " (with time in " + timeUnit + ")")
        + point(c, failure.coordinates().stream().mapToDouble(Double::doubleValue).toArray())
        + "; narrow the tolerance or move the nominal value";
  }

  private String point(Condition c, double[] coordinates) {
    List<BigDecimal> values = space.decimalPointInside(coordinates);
    List<String> parts = new ArrayList<>();
    for (int i = 0; i < values.size(); i++) {
      if (c.expression().dependsOn(i)) {
        Parameter p = space.parameters().get(i);
        parts.add((p.name() + " = " + text(values.get(i)) + " " + p.unit().symbol()).trim());
      }
    }
    return parts.isEmpty() ? "" : " at " + String.join(", ", parts);
  }

  private static String text(BigDecimal value) {
    BigDecimal stripped = value.stripTrailingZeros();
    String plain = stripped.toPlainString();
    return plain.length() <= 24 ? plain : stripped.toString();
  }
}
