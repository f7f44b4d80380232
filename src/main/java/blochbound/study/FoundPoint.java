package blochbound.study;

import java.math.BigDecimal;
import java.util.List;

/**
 * A device inside the tolerances and the value it attains.
 *
 * @param value attained value in the requirement's unit
 * @param point all parameters in the order of the case, as decimals of their own units, inside the
 *     ball exactly as written
 * @param shares deviation of each parameter from nominal as a share of its tolerance at radius 1 on
 *     that side, between -radius and radius; 0 for constants
 * @param verified whether the value is enclosed with proved error bounds at this very point
 */
public record FoundPoint(
    double value, List<BigDecimal> point, List<Double> shares, boolean verified) {
  /** Copies the lists. */
  public FoundPoint {
    point = List.copyOf(point);
    shares = List.copyOf(shares);
  }
}
