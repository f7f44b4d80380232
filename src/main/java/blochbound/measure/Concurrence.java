package blochbound.measure;

import blochbound.interval.Interval;
import blochbound.linalg.Hermitian;
import java.util.ArrayList;
import java.util.List;

/**
 * The concurrence of two two-level sites (W. K. Wootters, Phys. Rev. Lett. 80 (1998) 2245), between
 * 0 and 1.
 *
 * <p>From below by {@link TwoSiteWitness} with A from the gradient at the matrix, or at mixtures
 * with a little of the maximally mixed state where it is nearly singular, improved by {@link
 * WitnessAscent}; from above by {@link ConcurrenceCeiling}.
 */
final class Concurrence extends CertifiedMeasure {
  private static final double[] MIXTURES = {1e-5, 1e-7, 1e-9, 1e-11};

  /** The gradient is taken at the matrix itself up to this trace of its inverse. */
  private static final double MOST_INVERSE_TRACE = 1e11;

  /** A later candidate must gain this much on all earlier ones to be offered. */
  private static final double LEAST_GAIN = 1e-10;

  Concurrence() {
    super(4);
  }

  /** One workspace for each thread: values and bounds are asked for in hot loops. */
  private static final ThreadLocal<ConcurrenceKernel> KERNEL =
      ThreadLocal.withInitial(ConcurrenceKernel::new);

  @Override
  public double value(Hermitian state) {
    return Math.max(0, KERNEL.get().signedSum(state));
  }

  /**
   * {@inheritDoc} Zero where the concurrence is zero; at a mixture of 1e-11 for singular states.
   */
  @Override
  public Hermitian gradient(Hermitian state) {
    ConcurrenceKernel kernel = KERNEL.get();
    if (!(kernel.prepare(state, 0) < MOST_INVERSE_TRACE)) {
      kernel.prepare(state, MIXTURES[MIXTURES.length - 1]);
    }
    return kernel.formGradient() > 0 ? kernel.gradient() : Hermitian.identity(4).scale(0);
  }

  @Override
  public Interval range() {
    return Interval.of(0, 1);
  }

  @Override
  List<AffineBound> lowerWitnesses(Hermitian near) {
    ConcurrenceKernel kernel = KERNEL.get();
    WitnessAscent ascent = new WitnessAscent();
    ascent.prepare(near);
    List<AffineBound> bounds = new ArrayList<>(MIXTURES.length + 1);
    double inverseTrace = kernel.prepare(near, 0);
    double best = 0;
    // From the flattest candidate to the sharpest one.
    for (double mixture : MIXTURES) {
      // A mixture well below the smallest eigenvalue changes nothing.
      if (mixture * inverseTrace > 0.1) {
        kernel.prepare(near, mixture);
        best = offer(kernel, ascent, best, bounds);
      }
    }
    if (inverseTrace < MOST_INVERSE_TRACE) {
      kernel.prepare(near, 0);
      offer(kernel, ascent, best, bounds);
    }
    return bounds;
  }

  private static double offer(
      ConcurrenceKernel kernel, WitnessAscent ascent, double best, List<AffineBound> bounds) {
    TwoSiteWitness witness = new TwoSiteWitness();
    if (!(kernel.formGradient() > 0) || !witness.takeFrom(kernel)) {
      return best;
    }
    double value = ascent.improve(witness);
    if (!(value > best + LEAST_GAIN)) {
      return best;
    }
    bounds.add(witness.bound());
    return value;
  }

  @Override
  List<AffineBound> upperWitnesses(Hermitian near) {
    return new ConcurrenceCeiling(near).bounds();
  }

  @Override
  Interval continuity(Hermitian near, double distance) {
    return new ConcurrenceCeiling(near).continuity(distance);
  }
}
