package blochbound.sample;

import blochbound.model.Requirement.Sense;
import java.math.BigDecimal;
import java.math.RoundingMode;
import java.util.Arrays;
import java.util.List;
import java.util.stream.Stream;

/**
 * What the sampled devices showed about one measure: estimates in internal units.
 *
 * @param worst the devices with the worst values, worst first: up to {@link SampleStudy#WORST_KEPT}
 * @param mean mean value
 * @param quantiles values at the probabilities {@link SampleStudy#PROBABILITIES}
 */
public record MeasureSample(List<SampledDevice> worst, double mean, List<Quantile> quantiles) {
  /** Copies the lists. */
  public MeasureSample {
    worst = List.copyOf(worst);
    quantiles = List.copyOf(quantiles);
  }

  /**
   * A quantile of the sampled values: the smallest value that at least this share of the devices
   * does not exceed, an order statistic without interpolation (definition 1 of R. J. Hyndman, Y.
   * Fan, The American Statistician 50 (1996) 361, from memory).
   *
   * @param probability share of the devices
   * @param value the value
   */
  public record Quantile(double probability, double value) {}

  /**
   * Statistics of values.
   *
   * @param values at least one, in the order of the sequence
   * @param candidates devices among which the worst ones are
   */
  static MeasureSample of(double[] values, Stream<SampledDevice> candidates, Sense sense) {
    double mean = Arrays.stream(values).average().orElseThrow();
    double[] sorted = values.clone();
    Arrays.sort(sorted);
    List<Quantile> quantiles =
        SampleStudy.PROBABILITIES.stream()
            .map(p -> new Quantile(p, sorted[rank(p, sorted.length) - 1]))
            .toList();
    List<SampledDevice> worst =
        candidates.sorted(SampledDevice.worstFirst(sense)).limit(SampleStudy.WORST_KEPT).toList();
    return new MeasureSample(worst, mean, quantiles);
  }

  /** Smallest rank that is at least p times count, for the decimal p and not its rounded double. */
  private static int rank(double p, int count) {
    return BigDecimal.valueOf(p)
        .multiply(BigDecimal.valueOf(count))
        .setScale(0, RoundingMode.CEILING)
        .intValueExact();
  }

  /** Worst value. */
  public double worstValue() {
    return worst.get(0).value();
  }
}
