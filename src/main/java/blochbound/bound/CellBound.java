package blochbound.bound;

import blochbound.certificate.RegionCertificate;
import blochbound.model.Region;
import java.util.Optional;

/** Certified lower bound of a function on one region; one instance serves one thread. */
@FunctionalInterface
public interface CellBound {
  /**
   * Bounds the function on a region.
   *
   * @param region a box that meets the ball
   * @param enough a bound at which the caller has no use for a better one
   */
  Cell bound(Region region, double enough);

  /**
   * What is known of a region.
   *
   * @param certifiedLower the function is nowhere smaller on the part of the region in the ball
   * @param candidate a point of the ball, expected to be bad
   * @param attained value at the candidate, rounded; NaN where there is none
   * @param split coordinate along which the bound gains most by halving
   * @param certificate what proves the bound, where it is to be kept
   */
  record Cell(
      double certifiedLower,
      double[] candidate,
      double attained,
      int split,
      Optional<RegionCertificate> certificate) {}
}
