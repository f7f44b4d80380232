package blochbound.search;

import blochbound.search.SearchResult.Ending;
import java.util.Arrays;

/**
 * An objective under a budget, with the best point seen. Values that are not finite become plus
 * infinity, and so does every value once the budget is spent; one thread only.
 */
final class Evaluator {
  private final Objective objective;
  private final Budget budget;
  private int count;
  private double firstValue = Double.NaN;
  private double bestValue = Double.POSITIVE_INFINITY;
  private double[] bestPoint = {};
  private double steepestSlope;
  private Ending ending = Ending.SETTLED;

  Evaluator(Objective objective, Budget budget) {
    this.objective = objective;
    this.budget = budget;
  }

  /** Value at a point of the ball. */
  double value(double[] z) {
    return isExhausted() ? Double.POSITIVE_INFINITY : record(z, objective.value(z));
  }

  /** Value at a point of the ball with the gradient; entries that are not finite become zero. */
  double value(double[] z, double[] gradient) {
    if (isExhausted()) {
      Arrays.fill(gradient, 0);
      return Double.POSITIVE_INFINITY;
    }
    double value = record(z, objective.value(z, gradient));
    for (int j = 0; j < gradient.length; j++) {
      gradient[j] = Double.isFinite(gradient[j]) && Double.isFinite(value) ? gradient[j] : 0;
      steepestSlope = Math.max(steepestSlope, Math.abs(gradient[j]));
    }
    return value;
  }

  private double record(double[] z, double computed) {
    count++;
    double value = Double.isFinite(computed) ? computed : Double.POSITIVE_INFINITY;
    if (count == 1) {
      firstValue = value;
    }
    if (count == 1 || value < bestValue) {
      bestValue = value;
      bestPoint = z.clone();
    }
    return value;
  }

  /** Tells whether the budget is spent; the run that asks is then cut short. */
  boolean isExhausted() {
    return isExhausted(0);
  }

  /**
   * Tells whether the budget but for some evaluations is spent; notes that the run is cut short.
   */
  boolean isExhausted(int kept) {
    if (count >= budget.evaluations() - kept) {
      ending = Ending.OUT_OF_EVALUATIONS;
    }
    if (count > 0 && budget.isOutOfTime()) {
      ending = Ending.OUT_OF_TIME;
    }
    return ending == Ending.OUT_OF_TIME || count >= budget.evaluations() - kept;
  }

  /** Whether the run was cut short. */
  Ending ending() {
    return ending;
  }

  /** Number of evaluations. */
  int count() {
    return count;
  }

  /** Evaluations left. */
  int left() {
    return budget.evaluations() - count;
  }

  /** Largest size of a gradient entry seen. */
  double steepestSlope() {
    return steepestSlope;
  }

  /** Value at the first point. */
  double firstValue() {
    return firstValue;
  }

  /** Smallest value seen, plus infinity when there is none. */
  double bestValue() {
    return bestValue;
  }

  /** Copy of the point with the smallest value, empty before the first evaluation. */
  double[] bestPoint() {
    return bestPoint.clone();
  }
}
