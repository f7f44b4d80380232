package blochbound.measure;

import blochbound.check.BrokenGuaranteeException;
import blochbound.check.Check;
import blochbound.interval.Interval;
import blochbound.interval.Rounding;
import blochbound.linalg.Hermitian;
import java.util.ArrayList;
import java.util.List;

/** What all measures share: order of the bounds, the constant bound, and enclosures from both. */
abstract class CertifiedMeasure implements Measure {
  private final int dimension;

  CertifiedMeasure(int dimension) {
    this.dimension = dimension;
  }

  /** Bounds from below, in any order, without the constant one. */
  abstract List<AffineBound> lowerWitnesses(Hermitian near);

  /** Bounds from above, in any order, without the constant one. */
  abstract List<AffineBound> upperWitnesses(Hermitian near);

  /** A further certified enclosure over all states within a distance; by default the range. */
  Interval continuity(Hermitian near, double distance) {
    return range();
  }

  @Override
  public final int dimension() {
    return dimension;
  }

  @Override
  public final List<AffineBound> lowerBounds(Hermitian near) {
    checkSize(near);
    List<AffineBound> bounds = sorted(lowerWitnesses(near), near, -1);
    bounds.add(constant(range().lower()));
    return bounds;
  }

  @Override
  public final List<AffineBound> upperBounds(Hermitian near) {
    checkSize(near);
    List<AffineBound> bounds = sorted(upperWitnesses(near), near, 1);
    bounds.add(constant(range().upper()));
    return bounds;
  }

  /**
   * {@inheritDoc}
   *
   * @throws BrokenGuaranteeException when the bounds prove that no state is that near
   */
  @Override
  public final Interval enclosure(Hermitian near, double distance) {
    Check.nonNegative(distance, "distance");
    Interval known = intersection(range(), continuity(near, distance));
    double lower = known.lower();
    for (AffineBound bound : lowerBounds(near)) {
      double value = overBall(bound.operator(), near, distance).lower();
      lower = Math.max(lower, Rounding.addDown(value, -bound.excess().applyAsDouble(distance)));
    }
    double upper = known.upper();
    for (AffineBound bound : upperBounds(near)) {
      double value = overBall(bound.operator(), near, distance).upper();
      upper = Math.min(upper, Rounding.addUp(value, bound.excess().applyAsDouble(distance)));
    }
    return intersection(known, checked(lower, upper));
  }

  /** Enclosure of tr(W rho) over all Hermitian rho within a distance of a matrix. */
  static Interval overBall(Hermitian w, Hermitian near, double distance) {
    Interval middle = OperatorArithmetic.traceOfProduct(w, near);
    double reach = Rounding.timesUp(OperatorArithmetic.frobeniusUp(w), distance);
    return middle.plus(Interval.of(-reach, reach));
  }

  /**
   * The numbers in both intervals.
   *
   * @throws BrokenGuaranteeException when there are none
   */
  static Interval intersection(Interval a, Interval b) {
    return checked(Math.max(a.lower(), b.lower()), Math.min(a.upper(), b.upper()));
  }

  private static Interval checked(double lower, double upper) {
    if (!(lower <= upper)) {
      throw new BrokenGuaranteeException(
          "no state lies that near: the measure would be at least "
              + lower
              + " and at most "
              + upper);
    }
    return Interval.of(lower, upper);
  }

  private AffineBound constant(double value) {
    return AffineBound.global(Hermitian.identity(dimension).scale(value), 0);
  }

  private void checkSize(Hermitian near) {
    // The message is built only when needed: this stands in the innermost loop of the search.
    if (near.size() != dimension) {
      throw new IllegalArgumentException(
          "the matrix has " + near.size() + " rows, the measure is on " + dimension + " levels");
    }
  }

  /** Ascending by sign * tr(W near) + slack at distance zero. */
  private static List<AffineBound> sorted(List<AffineBound> bounds, Hermitian near, int sign) {
    int n = bounds.size();
    List<AffineBound> ordered = new ArrayList<>(n + 1);
    double[] keys = new double[n];
    for (AffineBound bound : bounds) {
      double key = sign * bound.operator().inner(near) + bound.excess().applyAsDouble(0);
      int at = ordered.size();
      while (at > 0 && key < keys[at - 1]) {
        keys[at] = keys[at - 1];
        at--;
      }
      keys[at] = key;
      ordered.add(at, bound);
    }
    return ordered;
  }
}
