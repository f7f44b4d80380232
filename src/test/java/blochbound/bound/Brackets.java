package blochbound.bound;

import blochbound.generator.BlochGenerator;
import blochbound.measure.LocatedMeasure;
import blochbound.measure.Measures;
import blochbound.measure.StationaryMeasure;
import blochbound.model.DesignCase;
import blochbound.model.Requirement;
import java.util.concurrent.atomic.AtomicBoolean;

/** Runs branch and bound on the first requirement of a case, without search and samples. */
final class Brackets {
  /** Bracket of the worst value: low and high, whichever the sense. */
  record Bracket(double low, double high, BranchOutcome outcome) {
    boolean contains(double value) {
      return low <= value && value <= high;
    }

    double width() {
      return high - low;
    }
  }

  private Brackets() {}

  static Bracket of(DesignCase designCase, double gap) {
    return of(designCase, BranchOptions.toGap(gap).withRegions(20000));
  }

  static Bracket of(DesignCase designCase, BranchOptions options) {
    Requirement requirement = designCase.requirements().get(0);
    BlochGenerator generator = BlochGenerator.stationary(designCase.device());
    LocatedMeasure located = Measures.of(requirement.measure(), designCase.device().space());
    int order = SteadyCellBound.suitableOrder(generator);
    BranchOutcome outcome =
        BranchAndBound.minimise(
            () -> new SteadyCellBound(generator, located, requirement.sense(), order),
            generator.space().coordinates(),
            generator.space().norm(),
            options,
            BranchAndBound.Start.none(),
            new AtomicBoolean());
    double sign = requirement.sense().sign();
    double certified = sign * outcome.certifiedLower();
    double attained = sign * outcome.attained();
    return new Bracket(Math.min(certified, attained), Math.max(certified, attained), outcome);
  }

  /** Value of the first requirement's measure at coordinates of the ball. */
  static double value(DesignCase designCase, double... z) {
    Requirement requirement = designCase.requirements().get(0);
    return new StationaryMeasure(
            BlochGenerator.stationary(designCase.device()),
            Measures.of(requirement.measure(), designCase.device().space()),
            requirement.sense())
        .value(z);
  }
}
