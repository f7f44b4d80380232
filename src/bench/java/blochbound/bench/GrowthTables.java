package blochbound.bench;

import blochbound.bench.BoundBenchmark.Problem;
import blochbound.bound.BranchOutcome;
import blochbound.model.DesignCase;
import java.util.Locale;

/** Prints regions and seconds against parameters, tolerance scale and size, as Markdown tables. */
public final class GrowthTables {
  private static final int THREADS = 2;
  private static final int WARM_UP = 3;

  private GrowthTables() {}

  /** Prints all tables to standard output. */
  public static void main(String[] arguments) {
    header("Parameters (pair, concurrence to 1e-3)", "parameters");
    for (int m : new int[] {2, 4, 6, 8, 10, 12}) {
      row(Integer.toString(m), BenchCases.pair(m, 1), 1e-3, 0);
    }
    header("Tolerance scale (pair, 10 parameters, concurrence to 1e-3)", "scale");
    for (double scale : new double[] {0.25, 0.5, 1, 1.5, 2}) {
      row(Double.toString(scale), BenchCases.pair(10, scale), 1e-3, 0);
    }
    header("Size (driven chain, 4 parameters at 10 %, to 1 % of the loss)", "levels N");
    for (int sites = 1; sites <= 4; sites++) {
      row(Integer.toString(1 << sites), BenchCases.chain(sites, 4), Double.POSITIVE_INFINITY, 0.01);
    }
    header("Five sites (3 parameters at 10 %, to 1 % of the loss)", "levels N");
    row("32", BenchCases.chain(5, 3), Double.POSITIVE_INFINITY, 0.01);
  }

  private static void header(String title, String first) {
    System.out.printf(
        Locale.ROOT,
        "%n%s%n%n| %s | order K | regions | seconds | guaranteed | found |%n| --- | --- | --- | --- | --- | --- |%n",
        title,
        first);
  }

  private static void row(String first, DesignCase designCase, double gap, double relativeGap) {
    Problem problem = new Problem(designCase);
    int order = problem.suitableOrder();
    BranchOutcome outcome = problem.bracket(gap, relativeGap, order, THREADS);
    for (int k = 0; k < WARM_UP && outcome.seconds() < 5; k++) {
      outcome = problem.bracket(gap, relativeGap, order, THREADS);
    }
    System.out.printf(
        Locale.ROOT,
        "| %s | %d | %d | %.3f | %.6f | %.6f |%n",
        first,
        order,
        outcome.regions(),
        outcome.seconds(),
        outcome.certifiedLower(),
        outcome.attained());
  }
}
