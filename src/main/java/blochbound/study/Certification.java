package blochbound.study;

import blochbound.bound.UniquenessProof;
import blochbound.generator.BlochGenerator;
import blochbound.measure.LocatedMeasure;
import blochbound.measure.Measures;
import blochbound.model.DesignCase;
import blochbound.model.MeasureSpec;
import blochbound.model.Parameter;
import blochbound.model.ParameterSpace;
import blochbound.model.Requirement;
import blochbound.model.When;
import blochbound.sample.MeasureSample;
import blochbound.sample.SampleOptions;
import blochbound.sample.SampleResult;
import blochbound.sample.SampleStudy;
import java.math.BigDecimal;
import java.time.Duration;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.concurrent.atomic.AtomicBoolean;

/**
 * The main study: for every requirement nominal value, worst found, guarantee, samples, verdict.
 *
 * <p>Samples of all measures are drawn together; then each requirement is searched, bounded and
 * decided on its own.
 */
public final class Certification {
  private static final long UNIQUENESS_REGIONS = 4000;

  private final DesignCase designCase;
  private final CertificationOptions options;
  private final AtomicBoolean stop;
  private final BlochGenerator generator;

  private Certification(DesignCase designCase, CertificationOptions options, AtomicBoolean stop) {
    this.designCase = designCase;
    this.options = options;
    this.stop = stop;
    generator = BlochGenerator.stationary(designCase.device());
  }

  /**
   * Runs the study.
   *
   * @param designCase the case
   * @param options how far to go
   * @param stop set from outside to end early with the brackets so far
   */
  public static CertificationResult run(
      DesignCase designCase, CertificationOptions options, AtomicBoolean stop) {
    return new Certification(designCase, options, stop).run();
  }

  private CertificationResult run() {
    List<Requirement> steady = new ArrayList<>();
    List<LocatedMeasure> measures = new ArrayList<>();
    for (Requirement requirement : designCase.requirements()) {
      if (isSteadyMeasure(requirement)) {
        steady.add(requirement);
        measures.add(Measures.of(requirement.measure(), designCase.device().space()));
      }
    }
    Optional<SteadyStateStatus> status =
        steady.isEmpty() ? Optional.empty() : Optional.of(uniqueness());
    Optional<SampleResult> samples =
        steady.isEmpty() ? Optional.empty() : Optional.of(sample(steady, measures));
    List<RequirementResult> results = new ArrayList<>();
    for (Requirement requirement : designCase.requirements()) {
      int k = steady.indexOf(requirement);
      results.add(
          k < 0
              ? notCovered(requirement)
              : new SteadyRequirementStudy(generator, requirement, measures.get(k), options, stop)
                  .run(samples.orElseThrow(), measureSample(samples.orElseThrow(), k)));
    }
    return new CertificationResult(
        designCase, options.seed(), status, results, overall(results), stop.get());
  }

  private static Optional<MeasureSample> measureSample(SampleResult samples, int k) {
    return samples.count() == 0 ? Optional.empty() : Optional.of(samples.measures().get(k));
  }

  private static boolean isSteadyMeasure(Requirement requirement) {
    MeasureSpec measure = requirement.measure();
    boolean ofState =
        !(measure instanceof MeasureSpec.Gap)
            && !(measure instanceof MeasureSpec.Settling)
            && !(measure instanceof MeasureSpec.GateFidelity);
    return ofState && requirement.when() instanceof When.Steady;
  }

  private static RequirementResult notCovered(Requirement requirement) {
    return new RequirementResult(
        requirement,
        OptionalDouble.empty(),
        Optional.empty(),
        Optional.empty(),
        Optional.empty(),
        Verdict.UNDECIDED,
        List.of(
            "This version bounds measures of the steady state only: it makes no statement on "
                + requirement.measureText()
                + (requirement.when() instanceof When.Steady ? "." : " at a time.")));
  }

  private SampleResult sample(List<Requirement> requirements, List<LocatedMeasure> measures) {
    return SampleStudy.run(
        generator,
        measures,
        requirements.stream().map(Requirement::sense).toList(),
        SampleOptions.withDefaults()
            .withSeed(options.seed())
            .withCount(options.samples())
            .withThreads(options.threads())
            .withTime(options.time()),
        stop);
  }

  private SteadyStateStatus uniqueness() {
    Duration budget = options.time().dividedBy(10);
    Duration most = Duration.ofSeconds(6);
    UniquenessProof.Outcome outcome =
        UniquenessProof.run(
            generator, UNIQUENESS_REGIONS, budget.compareTo(most) < 0 ? budget : most);
    ParameterSpace space = generator.space();
    if (outcome instanceof UniquenessProof.Outcome.Singular singular) {
      List<BigDecimal> point = space.decimalPointInside(singular.point());
      return new SteadyStateStatus(
          SteadyStateStatus.Kind.NOT_UNIQUE, Optional.of(point), severalStates(point));
    }
    if (outcome instanceof UniquenessProof.Outcome.Unproved unproved) {
      return new SteadyStateStatus(
          SteadyStateStatus.Kind.UNPROVED,
          Optional.of(space.decimalPointInside(unproved.near())),
          "No proof of a unique steady state near this device within the budget; every guarantee"
              + " holds for all stationary states.");
    }
    return new SteadyStateStatus(SteadyStateStatus.Kind.UNIQUE, Optional.empty(), "");
  }

  private String severalStates(List<BigDecimal> point) {
    List<Parameter> parameters = designCase.device().parameters();
    List<String> atZero = new ArrayList<>();
    for (int i = 0; i < point.size(); i++) {
      if (point.get(i).signum() == 0 && parameters.get(i).nominal().signum() != 0) {
        atZero.add(parameters.get(i).name());
      }
    }
    return "There are several stationary states at this device (to rounding); every guarantee holds"
        + " for all of them. "
        + (atZero.isEmpty()
            ? "Where that is not meant, add the loss that makes the steady state unique,"
            : "Where that is not meant, move the range of "
                + String.join(" and ", atZero)
                + " off zero,")
        + " or state 'start:' and 'at:'.";
  }

  private static Verdict overall(List<RequirementResult> results) {
    boolean refuted = results.stream().anyMatch(r -> r.verdict() == Verdict.REFUTED);
    boolean undecided = results.stream().anyMatch(r -> r.verdict() == Verdict.UNDECIDED);
    return refuted ? Verdict.REFUTED : undecided ? Verdict.UNDECIDED : Verdict.CERTIFIED;
  }
}
