package blochbound.study;

import blochbound.check.Check;
import java.time.Duration;
import java.util.OptionalDouble;

/**
 * How far {@link Certification} goes.
 *
 * @param seed seed of all random draws
 * @param gap absolute width to which each bracket is narrowed even after the decision, in the
 *     requirement's unit; empty to stop at the decision
 * @param relativeGap the same as a share of the worst loss found
 * @param time most time for one requirement's bound
 * @param threads worker threads
 * @param samples number of random devices; 0 to choose by size
 */
public record CertificationOptions(
    long seed,
    OptionalDouble gap,
    OptionalDouble relativeGap,
    Duration time,
    int threads,
    int samples) {
  /** Checks the ranges. */
  public CertificationOptions {
    gap.ifPresent(g -> Check.that(g > 0, "gap must be positive"));
    relativeGap.ifPresent(g -> Check.that(g > 0 && g < 1, "relative gap must be between 0 and 1"));
    Check.atLeast(threads, 1, "threads");
    Check.atLeast(samples, 0, "samples");
    Check.that(!time.isNegative() && !time.isZero(), "time must be positive");
  }

  /** Seed 1, stop at the decision, 60 s, all cores. */
  public static CertificationOptions withDefaults() {
    return new CertificationOptions(
        1,
        OptionalDouble.empty(),
        OptionalDouble.empty(),
        Duration.ofSeconds(60),
        Runtime.getRuntime().availableProcessors(),
        0);
  }

  /** The same with another seed. */
  public CertificationOptions withSeed(long value) {
    return new CertificationOptions(value, gap, relativeGap, time, threads, samples);
  }

  /** The same with an absolute gap. */
  public CertificationOptions withGap(double value) {
    return new CertificationOptions(
        seed, OptionalDouble.of(value), relativeGap, time, threads, samples);
  }

  /** The same with a gap relative to the worst loss. */
  public CertificationOptions withRelativeGap(double value) {
    return new CertificationOptions(seed, gap, OptionalDouble.of(value), time, threads, samples);
  }

  /** The same with another time limit. */
  public CertificationOptions withTime(Duration value) {
    return new CertificationOptions(seed, gap, relativeGap, value, threads, samples);
  }

  /** The same with another number of threads. */
  public CertificationOptions withThreads(int value) {
    return new CertificationOptions(seed, gap, relativeGap, time, value, samples);
  }

  /** The same with another number of samples. */
  public CertificationOptions withSamples(int value) {
    return new CertificationOptions(seed, gap, relativeGap, time, threads, value);
  }
}
