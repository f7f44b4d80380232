/**
 * Numbers that are known for certain: exact fractions with powers of pi, intervals with outward
 * rounding, and a-priori bounds of rounding errors.
 *
 * <p>Imports check only, and the fractions of commons-math3. Read {@link
 * blochbound.interval.Interval}, then {@link blochbound.interval.Rounding}, which the kernels of
 * other packages use where intervals would be too slow, then {@link
 * blochbound.interval.ExactNumber}. Both the prover and the independent checker of proofs rest on
 * this package, so it is tested against decimals of many digits.
 *
 * <p>Invariants: an interval returned by an operation holds every exact result for members of its
 * arguments; the suffixes Up and Down name the side to which a result is rounded; a failed
 * computation (NaN) never becomes an interval.
 */
@NullMarked
package blochbound.interval;

import org.jspecify.annotations.NullMarked;
