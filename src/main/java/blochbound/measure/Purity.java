package blochbound.measure;

import blochbound.interval.Interval;
import blochbound.interval.Rounding;
import blochbound.linalg.Hermitian;
import java.util.List;

/**
 * The purity tr(rho^2), between 1/d and 1.
 *
 * <p>Both bounds come from tr(rho^2) = 2 tr(s rho) - tr(s^2) + |rho - s|_F^2, true for all
 * Hermitian s; the constant is carried as a multiple of the unit matrix, since tr rho = 1.
 */
final class Purity extends CertifiedMeasure {
  Purity(int dimension) {
    super(dimension);
  }

  @Override
  public double value(Hermitian state) {
    return state.inner(state);
  }

  @Override
  public Hermitian gradient(Hermitian state) {
    return state.scale(2);
  }

  @Override
  public Interval range() {
    return Interval.of(Interval.ONE.dividedBy(Interval.of(dimension())).lower(), 1);
  }

  @Override
  List<AffineBound> lowerWitnesses(Hermitian near) {
    double square = OperatorArithmetic.traceOfProduct(near, near).upper();
    return List.of(AffineBound.global(OperatorArithmetic.shiftedDown(near.scale(2), -square), 0));
  }

  @Override
  List<AffineBound> upperWitnesses(Hermitian near) {
    double square = OperatorArithmetic.traceOfProduct(near, near).lower();
    return List.of(
        AffineBound.local(
            OperatorArithmetic.shiftedUp(near.scale(2), -square),
            distance -> Rounding.timesUp(distance, distance)));
  }
}
