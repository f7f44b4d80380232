package blochbound.casefile;

import blochbound.model.Scalar;
import blochbound.model.SignProof.Claim;
import java.util.LinkedHashMap;
import java.util.Map;

/** What must hold on the whole ball for the expressions of a case to be defined. */
final class Conditions {
  /** Most distinct conditions of one case. */
  static final int MOST = 1000;

  /**
   * A condition with the place it comes from.
   *
   * @param claim what must hold
   * @param expression of which expression
   * @param passage the text it comes from
   * @param at offset of the expression in that text
   * @param what names the expression in messages, such as {@code the divisor}
   */
  record Condition(Claim claim, Scalar expression, Passage passage, int at, String what) {}

  private final Map<String, Condition> found = new LinkedHashMap<>();

  /** Adds a condition unless the same one is known from another place. */
  void add(Condition condition) {
    if (found.size() >= MOST) {
      throw condition
          .passage()
          .fault(
              condition.at(),
              "the case has over " + MOST + " divisors, roots and rates, which is the limit");
    }
    found.putIfAbsent(condition.claim() + " " + condition.expression().key(), condition);
  }

  /** All conditions in the order of their appearance. */
  Iterable<Condition> all() {
    return found.values();
  }
}
