package blochbound.measure;

import blochbound.check.Check;
import blochbound.linalg.ComplexBall;
import blochbound.linalg.ComplexMatrix;
import blochbound.model.HilbertSpace;
import blochbound.model.MeasureSpec;
import blochbound.model.StateSpec;
import java.util.List;
import java.util.stream.IntStream;

/** Makes the measures that a case file names. */
public final class Measures {
  private Measures() {}

  /**
   * The measure of a specification, on the reduced state of its sites for a population or a
   * concurrence and on all sites otherwise.
   *
   * @throws IllegalArgumentException when the specification is no measure of a state (gap,
   *     settling, gate fidelity) or does not fit the sites
   */
  public static LocatedMeasure of(MeasureSpec spec, HilbertSpace space) {
    if (spec instanceof MeasureSpec.Population population) {
      return population(population, space);
    }
    if (spec instanceof MeasureSpec.Concurrence concurrence) {
      return concurrence(concurrence, space);
    }
    Measure measure = global(spec, space);
    Check.that(
        measure.dimension() == space.dimension(),
        "the measure is on "
            + measure.dimension()
            + " levels, the device has "
            + space.dimension());
    return new LocatedMeasure(measure, IntStream.range(0, space.sites().size()).boxed().toList());
  }

  private static Measure global(MeasureSpec spec, HilbertSpace space) {
    if (spec instanceof MeasureSpec.Mean mean) {
      Check.that(mean.observable().mayBeHermitian(), "the observable is not Hermitian");
      return AffineMeasure.mean(ApproximateOperator.from(mean.observable()));
    }
    if (spec instanceof MeasureSpec.Fidelity fidelity) {
      return fidelity(fidelity.state());
    }
    if (spec instanceof MeasureSpec.Negativity negativity) {
      return negativity(negativity, space);
    }
    if (spec instanceof MeasureSpec.TraceDistance distance) {
      return new TraceDistance(distance.state());
    }
    if (spec instanceof MeasureSpec.Purity) {
      return new Purity(space.dimension());
    }
    if (spec instanceof MeasureSpec.Entropy) {
      return new Entropy(space.dimension());
    }
    throw new IllegalArgumentException(
        spec.getClass().getSimpleName() + " is a property of the generator, not of a state");
  }

  private static Measure fidelity(StateSpec state) {
    return state instanceof StateSpec.Mixed mixed
        ? new MixedFidelity(mixed)
        : AffineMeasure.probability(ApproximateOperator.from(state));
  }

  private static LocatedMeasure population(MeasureSpec.Population spec, HilbertSpace space) {
    checkSite(spec.site(), space);
    int d = space.sites().get(spec.site()).dimension();
    double[] re = new double[d * d];
    for (int level : spec.levels()) {
      Check.that(level >= 0 && level < d, "level " + level + " is not one of 0 to " + (d - 1));
      re[level * (d + 1)] = 1;
    }
    ComplexBall projector = ComplexBall.exact(ComplexMatrix.of(d, d, re, new double[d * d]));
    return new LocatedMeasure(
        AffineMeasure.probability(ApproximateOperator.from(projector)), List.of(spec.site()));
  }

  private static LocatedMeasure concurrence(MeasureSpec.Concurrence spec, HilbertSpace space) {
    checkSite(spec.first(), space);
    checkSite(spec.second(), space);
    Check.that(spec.first() != spec.second(), "concurrence needs two different sites");
    Check.that(
        space.sites().get(spec.first()).dimension() == 2
            && space.sites().get(spec.second()).dimension() == 2,
        "concurrence needs two-level sites");
    return new LocatedMeasure(
        new Concurrence(),
        List.of(Math.min(spec.first(), spec.second()), Math.max(spec.first(), spec.second())));
  }

  private static Measure negativity(MeasureSpec.Negativity spec, HilbertSpace space) {
    boolean[] side = new boolean[space.sites().size()];
    for (int site : spec.sites()) {
      checkSite(site, space);
      side[site] = true;
    }
    long count = IntStream.range(0, side.length).filter(i -> side[i]).count();
    Check.that(count > 0 && count < side.length, "a cut needs at least one site on either side");
    return new Negativity(space.dimensions(), side);
  }

  private static void checkSite(int site, HilbertSpace space) {
    Check.that(site >= 0 && site < space.sites().size(), "there is no site at position " + site);
  }
}
