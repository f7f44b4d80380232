package blochbound.search;

import blochbound.generator.BlochGenerator;
import blochbound.measure.LocatedMeasure;
import blochbound.measure.StationaryMeasure;
import blochbound.model.Requirement.Sense;

/**
 * A function of the coordinates z of the tolerance ball that a search makes small.
 *
 * <p>A value that is not finite counts as plus infinity: the point is not attained. An objective
 * may keep a workspace and serves one thread at a time.
 */
public interface Objective {
  /** Value at z. */
  double value(double[] z);

  /** Value at z; writes the gradient, or one of the one-sided gradients at a kink. */
  double value(double[] z, double[] gradientOut);

  /**
   * A measure of the steady state with its sign turned so that the worst device has the smallest
   * value: the measure itself for at least, its negative for at most.
   */
  static Objective stationary(BlochGenerator generator, LocatedMeasure measure, Sense sense) {
    return new StationaryObjective(new StationaryMeasure(generator, measure, sense), sense.sign());
  }
}
