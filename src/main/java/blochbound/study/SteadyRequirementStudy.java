package blochbound.study;

import blochbound.bound.BranchAndBound;
import blochbound.bound.BranchOptions;
import blochbound.bound.BranchOutcome;
import blochbound.bound.SteadyCellBound;
import blochbound.generator.BlochGenerator;
import blochbound.interval.Interval;
import blochbound.measure.LocatedMeasure;
import blochbound.model.Requirement;
import blochbound.model.Requirement.Sense;
import blochbound.sample.MeasureSample;
import blochbound.sample.SampleResult;
import blochbound.search.Objective;
import blochbound.search.SearchOptions;
import blochbound.search.WorstCaseSearch;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.concurrent.atomic.AtomicBoolean;

/**
 * One requirement on the steady state: search, branch and bound, verification, verdict.
 *
 * <p>Inside, the measure is multiplied by the sign of the sense, so that small is always bad.
 */
final class SteadyRequirementStudy {
  private final BlochGenerator generator;
  private final Requirement requirement;
  private final LocatedMeasure located;
  private final CertificationOptions options;
  private final AtomicBoolean stop;
  private final int sign;
  private final Interval unit;
  private final Interval limit;
  private final Devices devices;
  private final List<String> remarks = new ArrayList<>();

  SteadyRequirementStudy(
      BlochGenerator generator,
      Requirement requirement,
      LocatedMeasure located,
      CertificationOptions options,
      AtomicBoolean stop) {
    this.generator = generator;
    this.requirement = requirement;
    this.located = located;
    this.options = options;
    this.stop = stop;
    sign = requirement.sense().sign();
    unit = requirement.unit().factor().enclosure();
    limit = signed(requirement.limitEnclosure());
    devices = new Devices(generator, located, requirement.sense());
  }

  private Interval signed(Interval value) {
    return sign > 0 ? value : value.negate();
  }

  /**
   * Runs the study.
   *
   * @param samples the samples of the whole case
   * @param measure this measure's samples; empty when no device was evaluated
   */
  RequirementResult run(SampleResult samples, Optional<MeasureSample> measure) {
    Devices.Candidate nominal = devices.nominal();
    List<double[]> starts =
        measure.stream()
            .flatMap(m -> m.worst().stream())
            .map(d -> d.z().stream().mapToDouble(Double::doubleValue).toArray())
            .toList();
    Optional<Devices.Candidate> sampled =
        starts.stream().findFirst().map(devices::candidate).filter(c -> !Double.isNaN(c.signed()));
    Devices.Candidate worst = devices.worse(nominal, sampled.orElse(nominal));
    worst = devices.worse(worst, search(starts));
    BranchOutcome outcome = branch(nominal, worst);
    if (outcome.point().length == generator.space().coordinates()) {
      worst = devices.worse(worst, devices.candidate(outcome.point()));
    }
    Devices.Verified verified = devices.verify(worst, outcome.certifiedLower());
    if (verified.enclosure().isEmpty() && isFarBelow(worst.signed(), outcome.certifiedLower())) {
      remarks.add(
          "An unverified value at a device without a proved unique steady state lies beyond the"
              + " guarantee and was left out; please report this case.");
    }
    Verdict verdict = verdict(outcome, verified);
    return new RequirementResult(
        requirement,
        Double.isNaN(nominal.signed())
            ? OptionalDouble.empty()
            : OptionalDouble.of(inUnit(devices.clamp(nominal, verified))),
        Optional.of(foundPoint(verified)),
        Optional.of(guarantee(outcome)),
        sampledTruth(samples, measure, sampled, verified),
        verdict,
        remarks);
  }

  private static boolean isFarBelow(double value, double certifiedLower) {
    return value < certifiedLower - 1e-6 * (1 + Math.abs(certifiedLower));
  }

  private Devices.Candidate search(List<double[]> starts) {
    SearchOptions how =
        SearchOptions.withDefaults()
            .withSeed(options.seed())
            .withThreads(options.threads())
            .withExtraStarts(starts)
            .withTime(options.time().dividedBy(4));
    Sense sense = requirement.sense();
    double[] z =
        WorstCaseSearch.run(
                () -> Objective.stationary(generator, located, sense),
                generator.space().coordinates(),
                generator.space().norm(),
                how)
            .z();
    return devices.candidate(z);
  }

  private BranchOutcome branch(Devices.Candidate nominal, Devices.Candidate worst) {
    boolean toGap = options.gap().isPresent() || options.relativeGap().isPresent();
    double gap = toGap ? options.gap().orElse(Double.POSITIVE_INFINITY) : Double.POSITIVE_INFINITY;
    BranchOptions how =
        new BranchOptions(
            gap * unit.lower(),
            options.relativeGap().orElse(0),
            nominal.signed(),
            limit.upper(),
            options.time(),
            Long.MAX_VALUE,
            options.threads());
    int order = SteadyCellBound.suitableOrder(generator);
    return BranchAndBound.minimise(
        () -> new SteadyCellBound(generator, located, requirement.sense(), order),
        generator.space().coordinates(),
        generator.space().norm(),
        how,
        new BranchAndBound.Start(worst.coordinates(), worst.signed()),
        stop);
  }

  private Verdict verdict(BranchOutcome outcome, Devices.Verified worst) {
    if (outcome.certifiedLower() >= limit.upper()) {
      return Verdict.CERTIFIED;
    }
    if (worst.enclosure().isPresent() && worst.enclosure().get().upper() < limit.lower()) {
      return Verdict.REFUTED;
    }
    remarks.add(whyUndecided(outcome, worst));
    return Verdict.UNDECIDED;
  }

  private String whyUndecided(BranchOutcome outcome, Devices.Verified worst) {
    double width = 1e-8 * (1 + Math.abs(limit.middle()));
    if (worst.signed() < limit.lower()) {
      return worst.enclosure().isEmpty()
          ? "The worst device found violates the limit, but its value could not be verified: it has"
              + " no proved unique steady state."
          : "The worst device found violates the limit by less than its verified error.";
    }
    if (worst.signed() - outcome.certifiedLower() < width) {
      return "The limit lies within rounding of the true worst case.";
    }
    return switch (outcome.reason()) {
      case TIME -> "The time limit was reached before a decision; more --time narrows the bracket.";
      case STOPPED -> "Stopped before a decision.";
      case NARROW -> "The limit lies inside the bracket; a smaller --gap may decide.";
      default -> "The bracket could not be narrowed any further in double precision.";
    };
  }

  private Guarantee guarantee(BranchOutcome outcome) {
    String method = outcome.regions() == 1 ? "dual observable" : "dual-observable branch and bound";
    // The bound is rounded to the safe side on its way into the requirement's unit.
    Interval inUnit = Interval.of(sign * outcome.certifiedLower()).dividedBy(unit);
    double value = sign > 0 ? inUnit.lower() : inUnit.upper();
    if (unit.lower() == 1 && unit.upper() == 1) {
      value = sign * outcome.certifiedLower();
    }
    return new Guarantee(
        value, method, outcome.regions(), outcome.seconds(), outcome.certificates());
  }

  private FoundPoint foundPoint(Devices.Verified worst) {
    return new FoundPoint(
        inUnit(worst.signed()),
        worst.point(),
        devices.shares(worst.point()),
        worst.enclosure().isPresent());
  }

  private double inUnit(double signedValue) {
    return sign * signedValue / unit.middle();
  }

  private Optional<SampledTruth> sampledTruth(
      SampleResult samples,
      Optional<MeasureSample> measure,
      Optional<Devices.Candidate> worstSample,
      Devices.Verified worst) {
    double factor = unit.middle();
    return measure.flatMap(
        m ->
            worstSample.map(
                candidate ->
                    new SampledTruth(
                        samples.count(),
                        samples.acceptance(),
                        inUnit(devices.clamp(candidate, worst)),
                        m.mean() / factor,
                        m.quantiles().stream()
                            .map(
                                q -> new SampledTruth.Quantile(q.probability(), q.value() / factor))
                            .toList())));
  }
}
