package blochbound.search;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;

/**
 * Descends where the objective has kinks, from the gradients of several nearby points.
 *
 * <p>A step goes to the minimiser over the ball of max_i g_i'(y - x) + |y - x|^2/(2 a): a proximal
 * bundle step without linearisation errors, as in gradient sampling (Kiwiel, Math. Program. 46
 * (1990) 105; Burke, Lewis, Overton, SIAM J. Optim. 15 (2005) 751; recalled from memory). A step
 * that fails adds the gradient at its end; when no direction is left the step length shrinks.
 *
 * @param ball projection onto the ball
 */
record BundleDescent(BallProjection ball) {
  private static final double FIRST_RADIUS = 0.1;
  private static final double LAST_RADIUS = 1e-9;
  private static final double ACCEPTED_SHARE = 0.1;
  private static final int DUAL_ITERATIONS = 200;

  /** Runs until no direction within the last radius descends. */
  void run(Evaluator evaluator, Iterate start) {
    Iterate at = start;
    double radius = FIRST_RADIUS;
    while (radius > LAST_RADIUS && !evaluator.isExhausted()) {
      Iterate next = step(evaluator, at, radius);
      radius = next == at ? radius * 0.2 : Math.min(FIRST_RADIUS, radius * 1.5);
      at = next;
    }
  }

  /** A point with a smaller value about a radius away, or the same one. */
  private Iterate step(Evaluator evaluator, Iterate at, double radius) {
    List<double[]> bundle = new ArrayList<>();
    bundle.add(at.gradient());
    int most = at.x().length + 2;
    double length = radius / Math.max(Double.MIN_NORMAL, Iterate.largest(at.gradient()));
    while (bundle.size() <= most && !evaluator.isExhausted()) {
      double[] y = minimiser(at.x(), bundle, length);
      double[] d = Iterate.difference(y, at.x());
      double predicted = bundle.stream().mapToDouble(g -> Iterate.inner(g, d)).max().orElse(0);
      if (Iterate.largest(d) <= 1e-3 * radius || predicted >= 0) {
        return at;
      }
      Iterate trial = Iterate.at(evaluator, y);
      if (trial.value() <= at.value() + ACCEPTED_SHARE * predicted && trial.value() < at.value()) {
        return trial;
      }
      bundle.add(trial.gradient());
    }
    return at;
  }

  /** The y = P(x - a sum_i l_i g_i) for the weights l that maximise the dual function. */
  private double[] minimiser(double[] x, List<double[]> bundle, double length) {
    double[] weights = new double[bundle.size()];
    Arrays.fill(weights, 1.0 / weights.length);
    double[] ahead = weights.clone();
    double squares = bundle.stream().mapToDouble(g -> Iterate.inner(g, g)).sum();
    double[] y = nearest(x, bundle, weights, length);
    double momentum = 1;
    for (int i = 0; i < DUAL_ITERATIONS && weights.length > 1 && squares > 0; i++) {
      // Nesterov's accelerated ascent; the dual gradient has the Lipschitz constant a sum |g|^2.
      double[] d = Iterate.difference(nearest(x, bundle, ahead, length), x);
      double[] next = ahead.clone();
      Arrays.setAll(next, k -> next[k] + Iterate.inner(bundle.get(k), d) / (length * squares));
      BallProjection.projectOntoSimplex(next);
      double grown = 0.5 * (1 + Math.sqrt(1 + 4 * momentum * momentum));
      double carry = (momentum - 1) / grown;
      double[] before = weights;
      Arrays.setAll(ahead, k -> next[k] + carry * (next[k] - before[k]));
      momentum = grown;
      weights = next;
    }
    return weights.length > 1 ? nearest(x, bundle, weights, length) : y;
  }

  private double[] nearest(double[] x, List<double[]> bundle, double[] weights, double length) {
    double[] y = x.clone();
    for (int k = 0; k < weights.length; k++) {
      double factor = length * weights[k];
      double[] g = bundle.get(k);
      for (int j = 0; j < y.length; j++) {
        y[j] -= factor * g[j];
      }
    }
    return ball.project(y);
  }
}
