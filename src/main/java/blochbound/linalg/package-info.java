/**
 * Small dense and sparse matrices: complex operators of N levels, Hermitian ones with proved
 * eigenvalue bounds, and the real solves of the Bloch equations.
 *
 * <p>Imports check and interval; matrix types of other libraries stay inside this package. Read
 * {@link blochbound.linalg.ComplexMatrix}, whose results are rounded, then {@link
 * blochbound.linalg.ComplexBall}, whose results are proved, then {@link
 * blochbound.linalg.Hermitian} with {@link blochbound.linalg.HermitianEigen} and {@link
 * blochbound.linalg.SpectralNorm}; {@link blochbound.linalg.SparseMatrix} and {@link
 * blochbound.linalg.LuDecomposition} serve the generator.
 *
 * <p>Invariants: matrices other than the reusable workspaces are immutable; a ball holds every
 * exact result for members of its arguments; what carries an error bound, or ends in Up, is proved
 * with its rounding and underflow, and everything else is an estimate.
 */
@NullMarked
package blochbound.linalg;

import org.jspecify.annotations.NullMarked;
