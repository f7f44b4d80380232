package blochbound.model;

/**
 * A jump g (V . V^+ - {V^+ V, .}/2) of the GKSL generator.
 *
 * @param rate the rate g, not negative on the ball; one when the case leaves it out
 * @param operator the operator V
 */
public record Jump(Scalar rate, OperatorForm operator) {}
