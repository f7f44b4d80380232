package blochbound.sample;

import blochbound.check.Check;
import java.time.Duration;

/**
 * How many devices {@link SampleStudy} evaluates, and how.
 *
 * @param seed seed of all random draws
 * @param count number of devices; 0 to choose by size, see {@link SampleStudy#defaultCount}
 * @param threads worker threads; results do not depend on them
 * @param kind where the points come from
 * @param time most time from the call; then the study stops with the devices it has, but never
 *     before its first batch
 */
public record SampleOptions(long seed, int count, int threads, SamplePoints kind, Duration time) {
  /** Checks the ranges. */
  public SampleOptions {
    Check.atLeast(count, 0, "count");
    Check.atLeast(threads, 1, "threads");
    Check.that(!time.isNegative(), "time must not be negative");
  }

  /** Seed 1, Monte Carlo, count by size, all cores, 60 s. */
  public static SampleOptions withDefaults() {
    return new SampleOptions(
        1,
        0,
        Runtime.getRuntime().availableProcessors(),
        SamplePoints.MONTE_CARLO,
        Duration.ofSeconds(60));
  }

  /** The same with another seed. */
  public SampleOptions withSeed(long value) {
    return new SampleOptions(value, count, threads, kind, time);
  }

  /** The same with another number of devices. */
  public SampleOptions withCount(int value) {
    return new SampleOptions(seed, value, threads, kind, time);
  }

  /** The same with another number of threads. */
  public SampleOptions withThreads(int value) {
    return new SampleOptions(seed, count, value, kind, time);
  }

  /** The same with other points. */
  public SampleOptions withKind(SamplePoints value) {
    return new SampleOptions(seed, count, threads, value, time);
  }

  /** The same with another time limit. */
  public SampleOptions withTime(Duration value) {
    return new SampleOptions(seed, count, threads, kind, value);
  }
}
