package blochbound.search;

import blochbound.check.Check;
import java.time.Duration;
import java.util.List;

/**
 * How far {@link WorstCaseSearch} goes.
 *
 * @param seed seed of all random draws
 * @param extraStarts more starts, such as the nominal device and the worst samples; points outside
 *     the ball are moved to the nearest point inside
 * @param threads worker threads; the result does not depend on them unless the time runs out
 * @param time most time; a run in progress ends after its present evaluation
 * @param evaluations most evaluations; 0 to choose by the number of coordinates and the effort
 * @param effort which methods are used
 */
public record SearchOptions(
    long seed,
    List<double[]> extraStarts,
    int threads,
    Duration time,
    int evaluations,
    Effort effort) {
  /** Which methods are used. */
  public enum Effort {
    /** Local searches from the centre, the given starts, a gradient vertex and a few others. */
    QUICK(100),
    /** Also many random starts, and covariance matrix adaptation where the runs disagree. */
    THOROUGH(4000);

    private final int evaluationsPerCoordinate;

    Effort(int evaluationsPerCoordinate) {
      this.evaluationsPerCoordinate = evaluationsPerCoordinate;
    }
  }

  /** Copies the starts and checks the ranges. */
  public SearchOptions {
    extraStarts = extraStarts.stream().map(double[]::clone).toList();
    Check.atLeast(threads, 1, "threads");
    Check.atLeast(evaluations, 0, "evaluations");
    Check.that(!time.isNegative() && !time.isZero(), "time must be positive");
  }

  /** Seed 1, no extra starts, one thread, ten seconds, evaluations by size, quick. */
  public static SearchOptions withDefaults() {
    return new SearchOptions(1, List.of(), 1, Duration.ofSeconds(10), 0, Effort.QUICK);
  }

  /** Copies of the extra starts. */
  @Override
  public List<double[]> extraStarts() {
    return extraStarts.stream().map(double[]::clone).toList();
  }

  /** Most evaluations for a number of coordinates: as given, or chosen by size. */
  public int evaluationsFor(int coordinates) {
    int chosen = effort.evaluationsPerCoordinate * (coordinates + 4);
    return evaluations > 0 ? evaluations : chosen;
  }

  /** The same with another seed. */
  public SearchOptions withSeed(long value) {
    return new SearchOptions(value, extraStarts, threads, time, evaluations, effort);
  }

  /** The same with other extra starts. */
  public SearchOptions withExtraStarts(List<double[]> value) {
    return new SearchOptions(seed, value, threads, time, evaluations, effort);
  }

  /** The same with another number of threads. */
  public SearchOptions withThreads(int value) {
    return new SearchOptions(seed, extraStarts, value, time, evaluations, effort);
  }

  /** The same with another time limit. */
  public SearchOptions withTime(Duration value) {
    return new SearchOptions(seed, extraStarts, threads, value, evaluations, effort);
  }

  /** The same with another evaluation budget. */
  public SearchOptions withEvaluations(int value) {
    return new SearchOptions(seed, extraStarts, threads, time, value, effort);
  }

  /** The same with another effort. */
  public SearchOptions withEffort(Effort value) {
    return new SearchOptions(seed, extraStarts, threads, time, evaluations, value);
  }
}
