package blochbound.bound;

import blochbound.check.Check;
import java.time.Duration;

/**
 * When branch and bound ends.
 *
 * @param gap width of the bracket at which it is narrow enough; infinite when any will do
 * @param relativeGap the same as a share of the loss {@code reference - attained}; 0 to leave out
 * @param reference value of the nominal device, for the relative gap
 * @param limit bound that decides the requirement from below; NaN when nothing is to be decided
 * @param time most time
 * @param regions most regions
 * @param threads worker threads
 */
public record BranchOptions(
    double gap,
    double relativeGap,
    double reference,
    double limit,
    Duration time,
    long regions,
    int threads) {
  /** Checks the ranges. */
  public BranchOptions {
    Check.that(gap >= 0 && relativeGap >= 0, "gaps must not be negative");
    Check.atLeast(threads, 1, "threads");
  }

  /** Runs until the bracket has the given width; one thread, a minute. */
  public static BranchOptions toGap(double gap) {
    return new BranchOptions(
        gap, 0, Double.NaN, Double.NaN, Duration.ofMinutes(1), Long.MAX_VALUE, 1);
  }

  /** The same with other threads. */
  public BranchOptions withThreads(int value) {
    return new BranchOptions(gap, relativeGap, reference, limit, time, regions, value);
  }

  /** The same with another time limit. */
  public BranchOptions withTime(Duration value) {
    return new BranchOptions(gap, relativeGap, reference, limit, value, regions, threads);
  }

  /** The same with another region budget. */
  public BranchOptions withRegions(long value) {
    return new BranchOptions(gap, relativeGap, reference, limit, time, value, threads);
  }
}
