package blochbound.search;

import java.util.List;

/**
 * The smallest value that a search attained, and where.
 *
 * <p>The value is the objective at the point, as computed: attained, not guaranteed to be smallest.
 */
public final class SearchResult {
  /** Why a search ended. */
  public enum Ending {
    /** Every run came to its own end. */
    SETTLED,
    /** At least one run was cut short by the evaluation budget. */
    OUT_OF_EVALUATIONS,
    /** At least one run was cut short by the time budget. */
    OUT_OF_TIME
  }

  private final double[] z;
  private final double value;
  private final int evaluations;
  private final List<SearchStart> reachedFrom;
  private final int runs;
  private final Ending ending;

  SearchResult(
      Outcome best, int evaluations, List<SearchStart> reachedFrom, int runs, Ending ending) {
    this.z = best.point();
    this.value = best.value();
    this.evaluations = evaluations;
    this.reachedFrom = List.copyOf(reachedFrom);
    this.runs = runs;
    this.ending = ending;
  }

  /** Copy of the best point, inside the ball. */
  public double[] z() {
    return z.clone();
  }

  /** Objective at the best point; plus infinity when no value was finite. */
  public double value() {
    return value;
  }

  /** Number of evaluations of the objective, with or without gradient. */
  public int evaluations() {
    return evaluations;
  }

  /** Starts whose runs ended at the best value up to a millionth of the spread of all values. */
  public List<SearchStart> reachedFrom() {
    return reachedFrom;
  }

  /** Number of runs, of which {@link #reachedFrom} names those that ended at the best value. */
  public int runs() {
    return runs;
  }

  /** Why the search ended. */
  public Ending ending() {
    return ending;
  }
}
