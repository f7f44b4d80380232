package blochbound.search;

import java.util.Arrays;
import java.util.SplittableRandom;
import org.apache.commons.math3.optim.InitialGuess;
import org.apache.commons.math3.optim.MaxEval;
import org.apache.commons.math3.optim.SimpleBounds;
import org.apache.commons.math3.optim.SimplePointChecker;
import org.apache.commons.math3.optim.nonlinear.scalar.GoalType;
import org.apache.commons.math3.optim.nonlinear.scalar.ObjectiveFunction;
import org.apache.commons.math3.optim.nonlinear.scalar.noderiv.CMAESOptimizer;
import org.apache.commons.math3.random.Well19937c;

/**
 * Covariance matrix adaptation for objectives that gradients do not guide (Hansen and Ostermeier,
 * Evolutionary Computation 9 (2001) 159), by the optimiser of commons-math3.
 *
 * <p>Candidates are drawn in the box around the ball; outside the ball the objective is that of the
 * nearest point inside plus a small charge for the distance.
 *
 * @param ball projection onto the ball
 * @param population number of candidates in a generation
 */
record CmaEs(BallProjection ball, int population) {
  /** Stands for values that are not finite: ranks last, and stays finite in sums. */
  private static final double WORST = 1e150;

  /**
   * Runs from a start until the spread is small or the budget is spent.
   *
   * @param kept evaluations of the budget that are left over for others
   */
  void run(Evaluator evaluator, double[] start, int kept, SplittableRandom random) {
    int m = start.length;
    try {
      optimizer(random.nextLong())
          .optimize(
              new MaxEval(Integer.MAX_VALUE),
              GoalType.MINIMIZE,
              new ObjectiveFunction(z -> charged(evaluator, z, kept)),
              new InitialGuess(start),
              new SimpleBounds(filled(m, -1), filled(m, 1)),
              new CMAESOptimizer.Sigma(filled(m, 0.5)),
              new CMAESOptimizer.PopulationSize(population));
    } catch (BudgetSpent end) {
      // The evaluator holds the best point, so nothing is lost.
      return;
    }
  }

  private static CMAESOptimizer optimizer(long seed) {
    // Full covariances, adapted actively; a draw outside the box is drawn once more, then cut.
    return new CMAESOptimizer(
        Integer.MAX_VALUE,
        Double.NEGATIVE_INFINITY,
        true,
        0,
        1,
        new Well19937c(seed),
        false,
        new SimplePointChecker<>(1e-9, 1e-9));
  }

  /** Population size that Hansen recommends as the smallest for m coordinates. */
  static int smallestPopulation(int m) {
    return 4 + (int) (3 * Math.log(m));
  }

  private double charged(Evaluator evaluator, double[] z, int kept) {
    if (evaluator.isExhausted(kept)) {
      throw new BudgetSpent();
    }
    double[] inside = ball.project(z);
    double distance = 0;
    for (int j = 0; j < z.length; j++) {
      distance = Math.max(distance, Math.abs(z[j] - inside[j]));
    }
    double value = Math.min(evaluator.value(inside), WORST);
    double spread = evaluator.firstValue() - evaluator.bestValue();
    return value + (Double.isFinite(spread) ? distance * spread : 0);
  }

  private static double[] filled(int length, double value) {
    double[] array = new double[length];
    Arrays.fill(array, value);
    return array;
  }

  /** Ends the optimiser from within the objective, the only place that it always asks. */
  private static final class BudgetSpent extends RuntimeException {
    private static final long serialVersionUID = 1L;

    BudgetSpent() {
      super("evaluation or time budget spent", null, false, false);
    }
  }
}
