package blochbound.bound;

import blochbound.certificate.RegionCertificate;
import blochbound.interval.Interval;
import blochbound.model.Ball.Norm;
import blochbound.model.Region;
import java.util.Optional;
import java.util.function.Function;

/** A cell bound for textbook functions: the natural interval extension on the region. */
final class FunctionCell implements CellBound {
  private final Function<Interval[], Interval> function;
  private final double[] low;
  private final double[] high;
  private final BallConstraint ball;

  /**
   * A function on a box, whose coordinates are scaled to [-1, 1].
   *
   * @param function natural extension
   * @param low lower ends
   * @param high upper ends
   * @param norm norm of the ball, for candidates
   */
  FunctionCell(Function<Interval[], Interval> function, double[] low, double[] high, Norm norm) {
    this.function = function;
    this.low = low.clone();
    this.high = high.clone();
    ball = new BallConstraint(norm);
  }

  private Interval scaled(int j, Interval z) {
    Interval half = Interval.of(high[j]).minus(Interval.of(low[j])).times(Interval.of(0.5));
    return Interval.of(low[j]).plus(half.times(z.plus(Interval.ONE)));
  }

  /** Value at a point, rounded. */
  double value(double[] z) {
    Interval[] x = new Interval[z.length];
    for (int j = 0; j < z.length; j++) {
      x[j] = scaled(j, Interval.of(z[j]));
    }
    return function.apply(x).middle();
  }

  @Override
  public Cell bound(Region region, double enough) {
    int m = region.coordinates();
    Interval[] x = new Interval[m];
    int split = 0;
    for (int j = 0; j < m; j++) {
      double c = region.centre(j);
      double h = region.halfWidth(j);
      x[j] = scaled(j, Interval.of(Math.nextDown(c - h), Math.nextUp(c + h)));
      split =
          h * (high[j] - low[j]) > region.halfWidth(split) * (high[split] - low[split]) ? j : split;
    }
    double lower = function.apply(x).lower();
    double[] candidate = ball.project(region.centre());
    return new Cell(
        lower,
        candidate,
        value(candidate),
        split,
        Optional.of(new RegionCertificate(region, 0, Optional.empty(), lower)));
  }
}
