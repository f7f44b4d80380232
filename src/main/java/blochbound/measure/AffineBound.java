package blochbound.measure;

import blochbound.check.Check;
import blochbound.linalg.Hermitian;
import java.util.function.DoubleUnaryOperator;

/**
 * An affine function of the state that bounds a measure on one side.
 *
 * <p>As a lower bound: measure(rho) &gt;= tr(W rho) - excess(delta) for all states rho with |rho -
 * near| at most delta in the Frobenius norm, where near is the matrix the bound was made at. As an
 * upper bound: measure(rho) &lt;= tr(W rho) + excess(delta). W is the exact floating-point matrix
 * it is; excess accounts for every rounding in its making and does not decrease with delta.
 *
 * @param operator the witness W on the measure's own space
 * @param excess the slack as a function of the distance bound delta, rounded upwards
 * @param isGlobal whether the slack does not depend on the distance: the bound holds for all states
 */
public record AffineBound(Hermitian operator, DoubleUnaryOperator excess, boolean isGlobal) {
  /** A bound that holds for all states, up to a constant slack. */
  public static AffineBound global(Hermitian operator, double slack) {
    Check.nonNegative(slack, "slack");
    return new AffineBound(operator, distance -> slack, true);
  }

  /** A bound whose slack grows with the distance from the matrix it was made at. */
  public static AffineBound local(Hermitian operator, DoubleUnaryOperator excess) {
    return new AffineBound(operator, excess, false);
  }
}
