/**
 * Sampled truth: seeded devices inside the tolerance ball and what their steady states show.
 *
 * <p>Imports check, interval, linalg, model, generator and measure. Read {@link
 * blochbound.sample.SampleStudy}, then {@link blochbound.sample.DeviceSampler}, which draws devices
 * from the declared distributions, and {@link blochbound.sample.LaneSolver}, which solves many
 * steady states at once. Invariants: every number here is an estimate, nothing is certified;
 * results depend on the seed and not on the number of threads; every lane that fails a check is
 * solved again with full pivoting of its own or is reported as not unique.
 */
@NullMarked
package blochbound.sample;

import org.jspecify.annotations.NullMarked;
