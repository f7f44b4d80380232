package blochbound.bound;

import blochbound.certificate.RegionCertificate;
import blochbound.generator.BlochGenerator;
import blochbound.generator.MultiIndexTable;
import blochbound.generator.RegionExpansion;
import blochbound.interval.Interval;
import blochbound.linalg.Hermitian;
import blochbound.measure.AffineBound;
import blochbound.measure.LocatedMeasure;
import blochbound.measure.StationaryMeasure;
import blochbound.model.Region;
import blochbound.model.Requirement.Sense;
import java.util.List;
import java.util.Optional;

/**
 * Dual-observable bound of a measure of the steady state on one region (method sections 3 to 5).
 *
 * <p>Bounds sign * measure from below, sign being 1 for lower and -1 for upper limits. The affine
 * bounds of the measure are taken at the state of the region's centre and again at the state of the
 * predicted worst point; the best result counts, and never less than the range of the measure.
 */
public final class SteadyCellBound implements CellBound {
  private static final int MOST_CANDIDATES = 4;

  /** Smallest ratio of two sides of a region that losses may bring about. */
  private static final double NEEDLE = 0x1p-6;

  /** Share of the bracket that a new affine bound must promise to be worth its cost. */
  private static final double WORTHWHILE_MISMATCH = 0.5;

  private final BlochGenerator generator;
  private final LocatedMeasure located;
  private final int sign;
  private final BallConstraint ball;
  private final StationaryMeasure attained;
  private final AffineRegionBound affine;
  private final AffineRegionBound distances;
  private final DualKernel kernel;
  private final MultiIndexTable table;
  private final int order;
  private final double[] centreState;
  private final double trivial;

  /**
   * Workspace for one thread.
   *
   * @param generator generator with the stationary states in question
   * @param located the measure
   * @param sense which side is bounded
   * @param order order K of the trial observable
   */
  public SteadyCellBound(BlochGenerator generator, LocatedMeasure located, Sense sense, int order) {
    this.generator = generator;
    this.located = located;
    this.order = order;
    sign = sense.sign();
    ball = new BallConstraint(generator.space().norm());
    attained = new StationaryMeasure(generator, located, sense);
    kernel = new DualKernel(generator);
    table = MultiIndexTable.of(generator.space().coordinates(), order + generator.degree());
    affine = new AffineRegionBound(kernel, table, order, ball);
    // Distances enter squared or only as a fallback: first order is enough.
    distances =
        new AffineRegionBound(
            kernel,
            MultiIndexTable.of(generator.space().coordinates(), 1 + generator.degree()),
            1,
            ball);
    centreState = new double[generator.basis().size()];
    Interval range = located.measure().range();
    trivial = sign > 0 ? range.lower() : -range.upper();
  }

  /** An order K that suits the size: higher orders pay when the factorisation is the main cost. */
  public static int suitableOrder(BlochGenerator generator) {
    int m = generator.space().coordinates();
    double work = 6e5 * Math.max(1, generator.basis().size() / 256.0);
    int order = 1;
    while (order < 4
        && MultiIndexTable.count(m, order + 1 + generator.degree())
                * (generator.terms().size() + 4.0)
                * generator.basis().size()
            < work) {
      order++;
    }
    return order;
  }

  @Override
  public Cell bound(Region region, double enough) {
    RegionExpansion expansion = RegionExpansion.over(generator, region, table);
    kernel.prepare(expansion);
    Hermitian near = attained.reduced(centreState());
    Best best = new Best(region);
    best.tryAll(near, enough);
    double[] candidate = ball.project(region.at(best.minimiser));
    double value = sign * attained.value(candidate);
    if (best.lower < enough && attained.wasUnique()) {
      Hermitian worst = attained.reduced(attained.state());
      if (best.mismatch(worst, value) > WORTHWHILE_MISMATCH * (value - best.lower)) {
        best.tryAll(worst, enough);
      }
    }
    return best.cell(candidate, value);
  }

  /** State at the centre; the maximally mixed one where the centre is singular to rounding. */
  private double[] centreState() {
    if (kernel.isRegular()) {
      kernel.steadyState(centreState);
    } else {
      java.util.Arrays.fill(centreState, 0);
      centreState[0] = 1 / Math.sqrt(generator.basis().levels());
    }
    return centreState;
  }

  /** The best bound so far on a region, with what splitting needs to know. */
  private final class Best {
    private final Region region;
    private final double[] minimiser;
    private final double[] loss;
    private double lower = trivial;
    private Optional<Hermitian> witness = Optional.empty();
    private Optional<Hermitian> lastTried = Optional.empty();

    Best(Region region) {
      this.region = region;
      minimiser = new double[region.coordinates()];
      loss = new double[region.coordinates()];
    }

    void tryAll(Hermitian near, double enough) {
      List<AffineBound> candidates =
          sign > 0 ? located.measure().lowerBounds(near) : located.measure().upperBounds(near);
      for (AffineBound candidate :
          candidates.subList(0, Math.min(MOST_CANDIDATES, candidates.size()))) {
        if (lower >= enough || isKnown(candidate) || isConstant(candidate.operator())) {
          continue;
        }
        double slack = candidate.excess().applyAsDouble(candidate.isGlobal() ? 0 : distance(near));
        double[] w =
            attained.lifted(sign > 0 ? candidate.operator() : candidate.operator().scale(-1));
        double value = affine.certifiedLower(w, candidate.operator(), slack, region);
        boolean isBetter = value > lower;
        if (isBetter) {
          lower = value;
          witness = Optional.of(candidate.operator());
        }
        if (isBetter || lastTried.isEmpty()) {
          System.arraycopy(affine.minimiser(), 0, minimiser, 0, minimiser.length);
          System.arraycopy(affine.loss(), 0, loss, 0, loss.length);
          if (!candidate.isGlobal()) {
            shareOut(slack);
          }
        }
        lastTried = Optional.of(candidate.operator());
      }
    }

    /** By how much the affine bound misses the measure at a state: an estimate. */
    double mismatch(Hermitian state, double value) {
      return witness.map(w -> value - sign * w.inner(state)).orElse(Double.POSITIVE_INFINITY);
    }

    /**
     * Adds the slack of a local bound to the losses, by how far each coordinate moves the state.
     */
    private void shareOut(double slack) {
      double sum = java.util.Arrays.stream(distances.reach()).sum();
      double weight = Double.isFinite(slack) ? slack : 1;
      for (int j = 0; j < loss.length && sum > 0; j++) {
        loss[j] += weight * distances.reach()[j] / sum;
      }
    }

    /** Constant bounds say no more than the range of the measure. */
    private boolean isConstant(Hermitian operator) {
      return operator.equals(Hermitian.identity(operator.size()).scale(operator.re(0, 0)));
    }

    /** Measures that are affine themselves offer the same operator everywhere. */
    private boolean isKnown(AffineBound candidate) {
      return lastTried.isPresent() && lastTried.get().equals(candidate.operator());
    }

    /** Bound of the distance of every stationary reduced state of the region from {@code near}. */
    private double distance(Hermitian near) {
      return distances.distanceUp(attained, near, region);
    }

    Cell cell(double[] candidate, double value) {
      int split = -1;
      int widest = -1;
      double most = -1;
      for (int j = 0; j < loss.length; j++) {
        if (region.halfWidth(j) == 0) {
          continue;
        }
        // Without a finite loss the widest side is halved.
        double gain = Double.isFinite(loss[j]) ? loss[j] : region.halfWidth(j);
        if (gain > most) {
          split = j;
          most = gain;
        }
        if (widest < 0 || region.halfWidth(j) > region.halfWidth(widest)) {
          widest = j;
        }
      }
      // Losses are estimates: no side may become a needle while another one stays wide.
      if (split >= 0 && region.halfWidth(split) < NEEDLE * region.halfWidth(widest)) {
        split = widest;
      }
      return new Cell(
          lower,
          candidate,
          value,
          split,
          Optional.of(new RegionCertificate(region, order, witness, lower)));
    }
  }
}
