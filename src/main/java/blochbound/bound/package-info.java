/**
 * Guaranteed bounds over the whole tolerance ball.
 *
 * <p>Imports check, interval, linalg, model, generator, measure and certificate; never search. Read
 * {@link blochbound.bound.BranchAndBound} first, then {@code SteadyCellBound}, which bounds one
 * region with {@code DualKernel}, {@code PolynomialRange} and {@code RemainderNorms}. Invariant:
 * everything called certified is proved with its rounding.
 */
@NullMarked
package blochbound.bound;

import org.jspecify.annotations.NullMarked;
