package blochbound.bound;

import blochbound.certificate.RegionCertificate;
import java.util.List;

/**
 * Bracket of the minimum of a function over the ball, with the reason why the work ended.
 *
 * @param certifiedLower the function is nowhere smaller in the ball
 * @param attained smallest value found, rounded; infinite when none was
 * @param point where it was found; empty when none was
 * @param regions number of regions bounded
 * @param seconds time spent
 * @param reason why the work ended
 * @param certificates regions that together cover the ball, with what proves the bound on each
 */
public record BranchOutcome(
    double certifiedLower,
    double attained,
    double[] point,
    long regions,
    double seconds,
    Reason reason,
    List<RegionCertificate> certificates) {
  /** Why branch and bound ended. */
  public enum Reason {
    /** The bracket is as narrow as asked. */
    NARROW,
    /** The bound clears the limit. */
    CERTIFIED,
    /** A point beyond the limit was found. */
    REFUTED,
    /** The time is over. */
    TIME,
    /** The region budget is used up. */
    REGIONS,
    /** Stopped from outside. */
    STOPPED,
    /** No region can be split any further in double precision. */
    RESOLUTION
  }
}
