/**
 * The device, its parameters and tolerances, and its requirements, as exact data.
 *
 * <p>Imports check, interval and linalg. Read {@link blochbound.model.DesignCase} from the top
 * ({@link blochbound.model.Device}, {@link blochbound.model.Requirement}); then expressions from
 * the bottom: {@link blochbound.model.Coefficient}, {@link blochbound.model.Atom}, {@link
 * blochbound.model.Monomial}, {@link blochbound.model.Scalar}, {@link
 * blochbound.model.OperatorForm}; then the tolerance ball: {@link blochbound.model.Ball}, {@link
 * blochbound.model.ParameterSpace}, {@link blochbound.model.Region}, {@link
 * blochbound.model.SignProof}.
 *
 * <p>Invariants: decimals of the case are kept exactly, in the unit in which they were written;
 * sums and products of expressions are exact, and only equal constants cancel; membership in the
 * ball is decided in exact arithmetic for the decimals that are printed; coordinates z have norm at
 * most one.
 */
@NullMarked
package blochbound.model;

import org.jspecify.annotations.NullMarked;
