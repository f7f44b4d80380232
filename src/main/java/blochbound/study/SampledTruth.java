package blochbound.study;

import java.util.List;

/**
 * What random devices inside the tolerances showed.
 *
 * @param count devices evaluated
 * @param acceptance share of the draws of the declared distributions that lay inside the ball
 * @param worst worst value in the requirement's unit
 * @param mean mean value
 * @param quantiles some quantiles, ascending in probability
 */
public record SampledTruth(
    int count, double acceptance, double worst, double mean, List<Quantile> quantiles) {
  /** Copies the list. */
  public SampledTruth {
    quantiles = List.copyOf(quantiles);
  }

  /**
   * A quantile of the sampled values.
   *
   * @param probability share of the devices below the value
   * @param value value in the requirement's unit
   */
  public record Quantile(double probability, double value) {}
}
