package blochbound.sample;

import blochbound.model.Requirement.Sense;
import java.util.ArrayList;
import java.util.List;
import java.util.stream.Stream;

/**
 * Sampled truth of one device: estimates, no guarantee.
 *
 * @param measures one entry for each measure in the order asked for; empty when no device was
 *     evaluated
 * @param count devices evaluated
 * @param notUnique devices whose steady state is not unique to rounding; they count with the worst
 *     of their stationary states
 * @param acceptance share of the draws of the declared distributions that lies in the ball; NaN
 *     when none was drawn
 * @param proposal where the candidates came from
 * @param outcome why the study ended
 */
public record SampleResult(
    List<MeasureSample> measures,
    int count,
    int notUnique,
    double acceptance,
    DeviceSampler.Proposal proposal,
    Outcome outcome) {
  /** Why a study ended. */
  public enum Outcome {
    /** All devices asked for were evaluated. */
    COMPLETE,
    /** Time ran out. */
    OUT_OF_TIME,
    /** The caller stopped it. */
    STOPPED,
    /** Too few candidates lay in the ball. */
    OUT_OF_CANDIDATES
  }

  /** Copies the list. */
  public SampleResult {
    measures = List.copyOf(measures);
  }

  /** Puts batches together, which must be in the order of the sequence. */
  static SampleResult of(
      List<BatchEvaluation.Values> batches,
      List<Sense> senses,
      DeviceSampler sampler,
      Outcome outcome) {
    int count = batches.stream().mapToInt(BatchEvaluation.Values::devices).sum();
    List<MeasureSample> measures = new ArrayList<>();
    for (int k = 0; k < senses.size() && count > 0; k++) {
      int measure = k;
      double[] values = batches.stream().flatMapToDouble(b -> b.values(measure)).toArray();
      Stream<SampledDevice> worst = batches.stream().flatMap(b -> b.worst(measure));
      measures.add(MeasureSample.of(values, worst, senses.get(k)));
    }
    return new SampleResult(
        measures,
        count,
        batches.stream().mapToInt(BatchEvaluation.Values::notUnique).sum(),
        sampler.acceptance(),
        sampler.proposal(),
        outcome);
  }
}
