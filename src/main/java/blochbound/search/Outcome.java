package blochbound.search;

import blochbound.search.SearchResult.Ending;

/** What one run of a search came to. */
final class Outcome {
  private final SearchStart start;
  private final double[] point;
  private final double firstValue;
  private final double value;
  private final int evaluations;
  private final Ending ending;

  Outcome(SearchStart start, Evaluator evaluator) {
    this.start = start;
    point = evaluator.bestPoint();
    firstValue = evaluator.firstValue();
    value = evaluator.bestValue();
    evaluations = evaluator.count();
    ending = evaluator.ending();
  }

  SearchStart start() {
    return start;
  }

  /** Copy of the best point. */
  double[] point() {
    return point.clone();
  }

  /** Value at the first point of the run. */
  double firstValue() {
    return firstValue;
  }

  /** Smallest value of the run. */
  double value() {
    return value;
  }

  int evaluations() {
    return evaluations;
  }

  Ending ending() {
    return ending;
  }
}
