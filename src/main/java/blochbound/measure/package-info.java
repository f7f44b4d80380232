/**
 * Measures of a state and the affine functions that bound them with a guarantee.
 *
 * <p>May import check, interval, linalg and model. Read {@link blochbound.measure.Measure} and
 * {@link blochbound.measure.AffineBound} first, then {@link blochbound.measure.Measures}, then
 * Purity (the shortest implementation), PositivePart with Negativity and TraceDistance, Entropy,
 * MixedFidelity, and Concurrence with its kernel. The proofs stand in the Javadoc and, on one page,
 * in notes/measures.md.
 *
 * <p>Invariants: every bound holds for all density matrices (or all within the stated distance), as
 * real arithmetic would have it; rounding is inside the slack. A matrix handed in as {@code near}
 * is the exact matrix of its doubles and need not be a state. Values and gradients are estimates.
 */
@NullMarked
package blochbound.measure;

import org.jspecify.annotations.NullMarked;
