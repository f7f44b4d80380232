package blochbound.measure;

import blochbound.interval.Interval;
import blochbound.interval.Rounding;
import blochbound.linalg.Hermitian;
import blochbound.model.StateSpec;
import java.util.ArrayList;
import java.util.List;

/**
 * The trace distance |rho - ref|_1 / 2 to a reference state: tr Y_+ with Y = rho - ref, whose trace
 * is zero.
 *
 * <p>Bounds from {@link PositivePart}; for a pure reference also sqrt(1 - F) from above (C. A.
 * Fuchs, J. van de Graaf, IEEE Trans. Inf. Theory 45 (1999) 1216), which holds for all states.
 */
final class TraceDistance extends CertifiedMeasure {
  private final ApproximateOperator reference;
  private final boolean isPure;

  TraceDistance(StateSpec state) {
    this(ApproximateOperator.from(state), state instanceof StateSpec.Pure);
  }

  private TraceDistance(ApproximateOperator reference, boolean isPure) {
    super(reference.centre().size());
    this.reference = reference;
    this.isPure = isPure;
  }

  @Override
  public double value(Hermitian state) {
    double sum = 0;
    for (double value : difference(state).eigen().values()) {
      sum += Math.max(0, value);
    }
    return sum;
  }

  @Override
  public Hermitian gradient(Hermitian state) {
    return PositivePart.near(difference(state)).projector().centre();
  }

  @Override
  public Interval range() {
    return Interval.of(0, 1);
  }

  private Hermitian difference(Hermitian state) {
    return state.combine(1, reference.centre(), -1);
  }

  /** Bound of how far the computed difference is from near - ref. */
  private double differenceError(Hermitian difference) {
    double rounding =
        Rounding.timesUp(Rounding.gamma(2), OperatorArithmetic.frobeniusUp(difference));
    return Rounding.addUp(rounding, reference.error());
  }

  /** Enclosure of tr(P ref) for the exact projector P. */
  private Interval onReference(ApproximateOperator projector) {
    Interval middle = OperatorArithmetic.traceOfProduct(projector.centre(), reference.centre());
    double fromProjector =
        Rounding.timesUp(projector.error(), OperatorArithmetic.frobeniusUp(reference.centre()));
    // |P|_F is at most sqrt(d).
    double fromReference = OperatorArithmetic.traceNormUp(reference.error(), dimension());
    double error = Rounding.addUp(fromProjector, fromReference);
    return middle.plus(Interval.of(-error, error));
  }

  @Override
  List<AffineBound> lowerWitnesses(Hermitian near) {
    ApproximateOperator p = PositivePart.near(difference(near)).projector();
    double constant = onReference(p).upper();
    return List.of(
        AffineBound.global(OperatorArithmetic.shiftedDown(p.centre(), -constant), p.error()));
  }

  @Override
  List<AffineBound> upperWitnesses(Hermitian near) {
    Hermitian difference = difference(near);
    double offset = differenceError(difference);
    PositivePart part = PositivePart.near(difference);
    ApproximateOperator p = part.projector();
    Hermitian tangent = OperatorArithmetic.shiftedUp(p.centre(), -onReference(p).lower());
    List<AffineBound> bounds = new ArrayList<>();
    bounds.add(
        AffineBound.local(
            tangent,
            distance ->
                Rounding.addUp(p.error(), part.excessUp(Rounding.addUp(distance, offset)))));
    bounds.add(
        AffineBound.local(
            Hermitian.identity(dimension()).scale(0),
            distance -> part.positiveUp(Rounding.addUp(distance, offset), 0)));
    if (isPure) {
      for (double place : TangentBound.places(1 - reference.centre().inner(near))) {
        bounds.add(TangentBound.sqrtOneMinus(reference, place));
      }
    }
    return bounds;
  }
}
