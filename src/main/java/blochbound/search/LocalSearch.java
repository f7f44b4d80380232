package blochbound.search;

import java.util.Arrays;

/**
 * Descends from a start to a stationary point of the objective on the ball.
 *
 * <p>Spectral projected gradients: the direction d = P(x - a g) - x with the Barzilai-Borwein step
 * a, accepted when the value falls below the largest of the last few (Birgin, Martinez, Raydan,
 * Nonmonotone spectral projected gradient methods on convex sets, SIAM J. Optim. 10 (2000) 1196,
 * algorithm SPG2; recalled from memory). Where that stalls at a point that is not stationary, the
 * objective has a kink there and {@link BundleDescent} goes on.
 *
 * @param ball projection onto the ball
 */
record LocalSearch(BallProjection ball) {
  private static final int MEMORY = 6;
  private static final int MOST_ITERATIONS = 2000;
  private static final int MOST_BACKTRACKS = 12;
  private static final int WINDOW = 12;

  /** Trials for each accepted step, over a window, beyond which a kink is suspected. */
  private static final int MOST_TRIALS = 3;

  private static final double SUFFICIENT_DECREASE = 1e-4;

  /** Steps below this length, in coordinates of the unit ball, count as none. */
  private static final double SHORTEST_STEP = 1e-10;

  /** Share of the steepest slope below which a projected gradient counts as zero. */
  private static final double FLAT = 1e-6;

  /** Slopes below this one count as zero, so that its inverse is a number. */
  private static final double SMALLEST_SLOPE = 1e-300;

  /** Decrease over a window, as a share of the values' size, that counts as none. */
  private static final double NO_PROGRESS = 1e-14;

  /** Runs from the start, moved into the ball; the evaluator holds the best point. */
  void run(Evaluator evaluator, double[] start) {
    Iterate at = Iterate.at(evaluator, ball.project(start));
    if (!Double.isFinite(at.value()) || Iterate.largest(at.gradient()) < SMALLEST_SLOPE) {
      return;
    }
    Iterate end = spectralDescent(evaluator, at);
    if (!isStationary(end, evaluator.steepestSlope())) {
      new BundleDescent(ball).run(evaluator, end);
    }
  }

  private Iterate spectralDescent(Evaluator evaluator, Iterate start) {
    Iterate at = start;
    double step = 1 / Iterate.largest(at.gradient());
    double[] recent = new double[MEMORY];
    Arrays.fill(recent, at.value());
    Progress progress = new Progress(evaluator.count(), at.value());
    for (int i = 1; i <= MOST_ITERATIONS && !evaluator.isExhausted(); i++) {
      Iterate next = advance(evaluator, at, step, Arrays.stream(recent).max().orElseThrow());
      if (next == at) {
        break;
      }
      step = spectralStep(at, next);
      at = next;
      recent[i % MEMORY] = at.value();
      if (i % WINDOW == 0) {
        if (progress.isPoorUntil(evaluator)) {
          break;
        }
        progress = new Progress(evaluator.count(), evaluator.bestValue());
      }
    }
    return at;
  }

  /** Where a window of iterations began. */
  private record Progress(int count, double best) {
    /** Whether nothing was gained, or only by many short steps as at a kink. */
    boolean isPoorUntil(Evaluator evaluator) {
      double gain = best - evaluator.bestValue();
      return gain <= NO_PROGRESS * Math.abs(evaluator.bestValue())
          || evaluator.count() - count > MOST_TRIALS * WINDOW;
    }
  }

  /** The next accepted point, or the same one when no step helps. */
  private Iterate advance(Evaluator evaluator, Iterate at, double step, double ceiling) {
    double[] d = Iterate.difference(ball.project(at.descended(step)), at.x());
    double length = Iterate.largest(d);
    double descent = Iterate.inner(at.gradient(), d);
    // Values carry rounding errors of their own size; a fall below them cannot be asked for.
    double noise = 0x1p-51 * Math.abs(at.value());
    double share = 1;
    for (int k = 0; k < MOST_BACKTRACKS && share * length > SHORTEST_STEP; k++) {
      Iterate trial = Iterate.at(evaluator, moved(at.x(), d, share));
      if (trial.value() <= ceiling + SUFFICIENT_DECREASE * share * descent + noise) {
        return trial;
      }
      share = shorter(share, at.value(), descent, trial.value());
    }
    return at;
  }

  /** Minimiser of the parabola through the values and the slope, kept within [0.1, 0.5]. */
  private static double shorter(double share, double value, double descent, double trialValue) {
    double rise = trialValue - value - share * descent;
    double best = -descent * share * share / (2 * rise);
    return Double.isFinite(best) ? Math.max(0.1 * share, Math.min(0.5 * share, best)) : 0.1 * share;
  }

  private double[] moved(double[] x, double[] d, double share) {
    double[] y = new double[x.length];
    Arrays.setAll(y, j -> x[j] + share * d[j]);
    return ball.project(y);
  }

  private static double spectralStep(Iterate at, Iterate next) {
    double[] s = Iterate.difference(next.x(), at.x());
    double[] y = Iterate.difference(next.gradient(), at.gradient());
    double curvature = Iterate.inner(s, y);
    double longest = 1e3 / Math.max(SMALLEST_SLOPE, Iterate.largest(next.gradient()));
    if (!(curvature > 0)) {
      return longest;
    }
    return Math.min(longest, Iterate.inner(s, s) / curvature);
  }

  /** Whether a gradient step, scaled to length 1 where it is steepest, hardly moves the point. */
  private boolean isStationary(Iterate at, double slope) {
    double[] moved = ball.project(at.descended(1 / slope));
    return Iterate.largest(Iterate.difference(moved, at.x())) <= FLAT;
  }
}
