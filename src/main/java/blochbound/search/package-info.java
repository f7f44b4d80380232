/**
 * The worst value that a search attains inside the tolerance ball: never a guarantee, always a
 * point that can be evaluated again.
 *
 * <p>Imports check, interval, linalg, model, generator and measure; never bound. Read {@link
 * blochbound.search.WorstCaseSearch} first, then {@code LocalSearch} with {@code BundleDescent} for
 * kinks, {@code VertexFlips} and {@code CmaEs}. Invariants: every point evaluated lies in the ball
 * as computed in floating point, values that are not finite are never reported, and a search that
 * was cut short says so.
 */
@NullMarked
package blochbound.search;

import org.jspecify.annotations.NullMarked;
