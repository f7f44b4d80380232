package blochbound.search;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import blochbound.model.Ball.Norm;
import java.util.SplittableRandom;
import java.util.stream.Stream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.Arguments;
import org.junit.jupiter.params.provider.EnumSource;
import org.junit.jupiter.params.provider.MethodSource;

class LocalSearchTest {
  @ParameterizedTest(name = "{0}, seed 21")
  @EnumSource(Norm.class)
  void convexQuadraticsEndWhereNoFeasibleDirectionDescends(Norm norm) {
    BallProjection ball = new BallProjection(norm);
    SplittableRandom random = new SplittableRandom(21);
    for (int draw = 0; draw < 50; draw++) {
      int m = 1 + draw % 8;
      double[] h = random.doubles(m, 0.1, 10).toArray();
      double[] g = random.doubles(m, -6, 6).toArray();
      Objective objective = QuadraticObjective.diagonal(h, g);
      Evaluator evaluator = new Evaluator(objective, BoxSearchTest.unlimited());
      new LocalSearch(ball).run(evaluator, ball.random(random, m));
      double[] end = evaluator.bestPoint();
      double[] gradient = new double[m];
      double value = objective.value(end, gradient);
      // [invariant] for a convex function, value - minimum <= g'x + dual norm of g (Frank-Wolfe).
      double gap = Iterate.inner(gradient, end) + dualNorm(norm, gradient);
      assertTrue(gap <= 1e-6, norm + " " + gap);
      assertEquals(value, evaluator.bestValue());
      assertTrue(evaluator.count() < 400, "" + evaluator.count());
    }
  }

  /** Functions with kinks, their norm, start and minimum. */
  static Stream<Arguments> kinks() {
    return Stream.of(
        // [closed form] max(|x - 0.3|, 5 |y - x^2|) is 0 at (0.3, 0.09).
        Arguments.of(
            "bent valley",
            Norm.BOX,
            new double[] {-0.8, 0.7},
            0.0,
            function(z -> Math.abs(z[0] - 0.3) + 5 * Math.abs(z[1] - z[0] * z[0]))),
        // [closed form] the largest of x, y and -x - y is smallest at 0.
        Arguments.of(
            "three planes",
            Norm.ELLIPSOID,
            new double[] {0.5, -0.4},
            0.0,
            function(z -> Math.max(Math.max(z[0], z[1]), -z[0] - z[1]))),
        // [closed form] |x - y| - (x + y)/10 is smallest on x = y at the edge of the set.
        Arguments.of(
            "valley to a corner",
            Norm.BOX,
            new double[] {-0.5, 0.3},
            -0.2,
            function(z -> Math.abs(z[0] - z[1]) - 0.1 * (z[0] + z[1]))),
        Arguments.of(
            "valley to the circle",
            Norm.ELLIPSOID,
            new double[] {-0.5, 0.3},
            -0.1 * Math.sqrt(2),
            function(z -> Math.abs(z[0] - z[1]) - 0.1 * (z[0] + z[1]))),
        Arguments.of(
            "valley to an edge",
            Norm.DIAMOND,
            new double[] {-0.5, 0.3},
            -0.1,
            function(z -> Math.abs(z[0] - z[1]) - 0.1 * (z[0] + z[1]))),
        // [closed form] sum of |z_j - c_j| with c inside is 0 at c.
        Arguments.of(
            "distance in five coordinates",
            Norm.BOX,
            new double[5],
            0.0,
            function(
                z -> {
                  double sum = 0;
                  for (int j = 0; j < 5; j++) {
                    sum += (j + 1) * Math.abs(z[j] - 0.15 * (j + 1));
                  }
                  return sum;
                })),
        // [closed form] a value cut off at zero, as a concurrence is, ends at the cut.
        Arguments.of(
            "cut at zero",
            Norm.BOX,
            new double[] {1, 1},
            0.0,
            function(z -> Math.max(0, z[0] * z[0] + z[1] * z[1] + z[0] * z[1] - 0.1))));
  }

  @ParameterizedTest(name = "{0}")
  @MethodSource("kinks")
  void descentGoesOnAlongKinks(
      String name, Norm norm, double[] start, double minimum, Objective objective) {
    Evaluator evaluator = new Evaluator(objective, BoxSearchTest.unlimited());
    new LocalSearch(new BallProjection(norm)).run(evaluator, start);
    assertEquals(minimum, evaluator.bestValue(), 1e-7, evaluator.count() + " evaluations");
    assertTrue(evaluator.count() < 1000, "" + evaluator.count());
  }

  @Test
  void startIsMovedIntoTheBallAndNothingIsDoneWhereTheGradientVanishes() {
    Objective flat = function(z -> 1);
    Evaluator evaluator = new Evaluator(flat, BoxSearchTest.unlimited());
    new LocalSearch(new BallProjection(Norm.ELLIPSOID)).run(evaluator, new double[] {3, 4});
    assertEquals(1, evaluator.count());
    assertArrayEquals(new double[] {0.6, 0.8}, evaluator.bestPoint(), 1e-15);
  }

  @Test
  void scaleOfTheObjectiveDoesNotMatter() {
    for (double scale : new double[] {1e-200, 1e-12, 1, 1e12, 1e200}) {
      Objective objective =
          QuadraticObjective.diagonal(
              new double[] {3 * scale, scale}, new double[] {-scale, -0.5 * scale});
      Evaluator evaluator = new Evaluator(objective, BoxSearchTest.unlimited());
      new LocalSearch(new BallProjection(Norm.BOX)).run(evaluator, new double[] {-1, 1});
      // [closed form] minimum at (1/3, 1/2).
      assertArrayEquals(new double[] {1.0 / 3, 0.5}, evaluator.bestPoint(), 1e-7);
    }
  }

  private static Objective function(java.util.function.ToDoubleFunction<double[]> f) {
    return new DifferenceObjective(f, 1e-9);
  }

  private static double dualNorm(Norm norm, double[] g) {
    double sum = 0;
    for (double x : g) {
      sum += Math.abs(x);
    }
    return switch (norm) {
      case BOX -> sum;
      case ELLIPSOID -> Math.sqrt(Iterate.inner(g, g));
      case DIAMOND -> Iterate.largest(g);
    };
  }
}
