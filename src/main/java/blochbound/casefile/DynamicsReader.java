package blochbound.casefile;

import blochbound.casefile.Value.Numeric;
import blochbound.casefile.Value.Operator;
import blochbound.model.Jump;
import blochbound.model.OperatorForm;
import blochbound.model.Scalar;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;

/** Reads {@code hamiltonian} and {@code jumps}. */
final class DynamicsReader {
  /** Most jumps of one case. */
  static final int MOST_JUMPS = 1024;

  private final Scope scope;
  private final Expressions expressions;

  DynamicsReader(Scope scope) {
    this.scope = scope;
    this.expressions = new Expressions(scope);
  }

  /** The Hamiltonian, which is Hermitian and 1/time. */
  OperatorForm hamiltonian(YamlNode node) {
    Passage passage = node.asScalar("the Hamiltonian as an expression").passage();
    Operator operator = expressions.hermitian(passage, "the Hamiltonian");
    expressions.require(Dimension.RATE, operator, passage, "the Hamiltonian");
    return operator.form();
  }

  /** All jumps that have no fault. */
  List<Jump> jumps(YamlNode node) {
    List<YamlNode> items = node.asSequence("jumps as a list of {rate: ..., operator: ...}").items();
    if (items.size() > MOST_JUMPS) {
      throw FaultSignal.of(
          items
              .get(MOST_JUMPS)
              .fault(
                  "there are "
                      + items.size()
                      + " jumps; this version handles up to "
                      + MOST_JUMPS));
    }
    List<Jump> jumps = new ArrayList<>();
    for (YamlNode item : items) {
      scope.log().attempt(() -> jump(item)).ifPresent(jumps::add);
    }
    return jumps;
  }

  private Jump jump(YamlNode item) {
    Fields fields =
        new Fields(
            item.asMapping("a jump as {rate: kappa, operator: lower@site}"),
            "a jump",
            List.of("rate", "operator"),
            scope.log());
    Optional<Optional<Numeric>> rate =
        scope.log().attempt(() -> fields.scalar("rate", "a rate").map(r -> rate(r.passage())));
    Passage passage = fields.neededScalar("operator", "an operator").passage();
    Operator operator = expressions.operator(passage, "the operator of a jump");
    Numeric factor = rate.orElseThrow(FaultSignal::following).orElse(Numeric.ONE);
    checkDimension(factor, operator, passage);
    return new Jump(factor.re(), operator.form());
  }

  private Numeric rate(Passage passage) {
    Numeric rate = expressions.real(passage, "the rate");
    Scalar value = rate.re();
    if (value.isConstant() && value.constantTerm().enclosure().lower() < 0) {
      throw passage.fault(
          "the rate is negative or cannot be told from negative; it must be 0 or more");
    }
    if (!value.isConstant()) {
      expressions.requireNonNegative(value, passage, "the rate");
    }
    return rate;
  }

  private void checkDimension(Numeric rate, Operator operator, Passage passage) {
    if (scope.units().isDimensionless() || rate.isZero() || operator.isZero()) {
      return;
    }
    Dimension whole = rate.dimension().plus(operator.dimension().times(2));
    if (!whole.equals(Dimension.RATE)) {
      throw passage.fault(
          "rate x operator^2 must be 1/time, not "
              + whole
              + "; the rate is "
              + rate.dimension()
              + ", the operator "
              + operator.dimension());
    }
  }
}
