/**
 * The Bloch generator: from a device to r' = A(p) r + b(p).
 *
 * <p>Imports check, interval, linalg and model. Read {@link blochbound.generator.BlochBasis}, then
 * {@link blochbound.generator.BlochGenerator}, then {@link blochbound.generator.RegionExpansion},
 * which rewrites the generator on one region of the ball. Invariant: every stored matrix and
 * coefficient carries a proved bound of its error.
 */
@NullMarked
package blochbound.generator;

import org.jspecify.annotations.NullMarked;
