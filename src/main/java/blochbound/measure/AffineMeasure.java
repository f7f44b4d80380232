package blochbound.measure;

import blochbound.check.Check;
import blochbound.interval.Interval;
import blochbound.linalg.Hermitian;
import blochbound.linalg.HermitianEigen;
import java.util.List;

/**
 * The mean value tr(O rho) of an observable: mean, population and fidelity with a pure state.
 *
 * <p>Both bounds are O itself. An observable known up to a Frobenius radius r adds r to the slack,
 * since |rho|_F &lt;= 1.
 */
final class AffineMeasure implements Measure {
  private final ApproximateOperator observable;
  private final Interval range;

  private AffineMeasure(ApproximateOperator observable, Interval range) {
    this.observable = observable;
    this.range = range;
  }

  /** The mean value of an observable, between its extreme eigenvalues. */
  static AffineMeasure mean(ApproximateOperator observable) {
    HermitianEigen eigen = observable.centre().eigen();
    Interval slack = Interval.of(-observable.error(), observable.error());
    return new AffineMeasure(observable, eigen.smallest().hull(eigen.largest()).plus(slack));
  }

  /** The probability of a yes-no observable, between zero and one. */
  static AffineMeasure probability(ApproximateOperator effect) {
    return new AffineMeasure(effect, Interval.of(0, 1));
  }

  @Override
  public int dimension() {
    return observable.centre().size();
  }

  @Override
  public double value(Hermitian state) {
    return observable.centre().inner(state);
  }

  @Override
  public Hermitian gradient(Hermitian state) {
    return observable.centre();
  }

  @Override
  public Interval range() {
    return range;
  }

  @Override
  public List<AffineBound> lowerBounds(Hermitian near) {
    return List.of(AffineBound.global(observable.centre(), observable.error()));
  }

  @Override
  public List<AffineBound> upperBounds(Hermitian near) {
    return lowerBounds(near);
  }

  @Override
  public Interval enclosure(Hermitian near, double distance) {
    Check.nonNegative(distance, "distance");
    Interval value = CertifiedMeasure.overBall(observable.centre(), near, distance);
    Interval slack = Interval.of(-observable.error(), observable.error());
    return CertifiedMeasure.intersection(range, value.plus(slack));
  }
}
