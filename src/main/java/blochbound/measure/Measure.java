package blochbound.measure;

import blochbound.interval.Interval;
import blochbound.linalg.Hermitian;
import java.util.List;

/**
 * A real function of a state of d levels, with certified affine bounds on both sides.
 *
 * <p>All states are density matrices of the measure's own space, which may be a part of the device
 * (see {@link LocatedMeasure}).
 */
public interface Measure {
  /** Number d of levels of the measure's own space. */
  int dimension();

  /** Value at a state, rounded: an estimate. The argument may miss being a state by rounding. */
  double value(Hermitian state);

  /**
   * An operator G with value(state + D) = value(state) + tr(G D) + o(D) where the measure is
   * differentiable, and a one-sided choice elsewhere: an estimate for searches.
   */
  Hermitian gradient(Hermitian state);

  /** All values that states can have: a certified enclosure. */
  Interval range();

  /**
   * Affine functions that stay below the measure, best near {@code near}; the caller tries each.
   *
   * @param near any Hermitian matrix, usually a state up to rounding; taken as the exact matrix it
   *     is
   */
  List<AffineBound> lowerBounds(Hermitian near);

  /** Affine functions that stay above the measure, best near {@code near}. */
  List<AffineBound> upperBounds(Hermitian near);

  /**
   * Certified enclosure of the measure over all states within a Frobenius distance of a matrix.
   *
   * @param near a Hermitian matrix, usually a computed state
   * @param distance bound of |rho - near| in the Frobenius norm
   */
  Interval enclosure(Hermitian near, double distance);
}
