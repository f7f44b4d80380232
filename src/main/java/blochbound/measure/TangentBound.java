package blochbound.measure;

import blochbound.interval.Rounding;
import blochbound.linalg.Hermitian;
import java.util.ArrayList;
import java.util.List;

/**
 * Tangents of the square root: sqrt(y) &lt;= h y + 1/(4 h) for every y &gt;= 0 and h &gt; 0, since
 * (sqrt(h y) - 1/(2 sqrt h))^2 &gt;= 0; best at y = 1/(4 h^2).
 */
final class TangentBound {
  /** Where the tangent becomes steep, flatter ones are offered beside it. */
  private static final double[] FLOORS = {1e-8, 1e-4};

  private TangentBound() {}

  /** Places y to touch the square root at: the given one, unless it is too near zero. */
  static List<Double> places(double y) {
    List<Double> places = new ArrayList<>();
    places.add(Math.max(y, FLOORS[0]));
    for (double floor : FLOORS) {
      if (floor > places.get(0)) {
        places.add(floor);
      }
    }
    return places;
  }

  /** Global bound of sqrt(1 - tr(O rho)) from above, for an observable 0 &lt;= O &lt;= 1. */
  static AffineBound sqrtOneMinus(ApproximateOperator observable, double place) {
    double h = 0.5 / Math.sqrt(place);
    double constant = Rounding.addUp(h, Rounding.divideUp(0.25, h));
    Hermitian scaled = observable.centre().scale(-h);
    double slack =
        Rounding.addUp(
            Rounding.timesUp(h, observable.error()),
            OperatorArithmetic.scalingError(observable.centre(), h));
    return AffineBound.global(OperatorArithmetic.shiftedUp(scaled, constant), slack);
  }
}
