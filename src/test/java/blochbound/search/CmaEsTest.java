package blochbound.search;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import blochbound.model.Ball.Norm;
import java.util.SplittableRandom;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.EnumSource;

class CmaEsTest {
  @ParameterizedTest(name = "{0}")
  @EnumSource(Norm.class)
  void minimumAtTheEdgeIsMetWithoutGradients(Norm norm) {
    Objective objective =
        QuadraticObjective.diagonal(new double[] {1, 4, 2}, new double[] {-3, 1, -1});
    Evaluator evaluator = evaluator(objective, 5000);
    new CmaEs(new BallProjection(norm), 10)
        .run(evaluator, new double[3], 0, new SplittableRandom(4));
    // [independent] the projected gradient search, which is proved right on convex quadratics by
    // its
    // duality gap in LocalSearchTest.
    Evaluator byGradients = evaluator(objective, 5000);
    new LocalSearch(new BallProjection(norm)).run(byGradients, new double[3]);
    assertEquals(byGradients.bestValue(), evaluator.bestValue(), 1e-6);
  }

  @Test
  void oneCoordinateIsEnough() {
    Evaluator evaluator = evaluator(new DifferenceObjective(z -> Math.abs(z[0] - 0.3), 1e-6), 2000);
    new CmaEs(new BallProjection(Norm.BOX), CmaEs.smallestPopulation(1))
        .run(evaluator, new double[1], 0, new SplittableRandom(4));
    assertEquals(0, evaluator.bestValue(), 1e-6);
  }

  @Test
  void sameRandomNumbersGiveTheSameRun() {
    double[][] ends = new double[2][];
    for (int k = 0; k < 2; k++) {
      Evaluator evaluator =
          evaluator(new DifferenceObjective(z -> Math.sin(9 * z[0]) + z[1], 1), 500);
      new CmaEs(new BallProjection(Norm.ELLIPSOID), 8)
          .run(evaluator, new double[2], 0, new SplittableRandom(77));
      ends[k] = evaluator.bestPoint();
    }
    assertArrayEquals(ends[0], ends[1], 0.0);
  }

  @Test
  void keptEvaluationsAreLeftOver() {
    Evaluator evaluator = evaluator(new DifferenceObjective(z -> z[0] * z[0] + z[1], 1e-6), 100);
    new CmaEs(new BallProjection(Norm.DIAMOND), 8)
        .run(evaluator, new double[2], 40, new SplittableRandom(1));
    assertEquals(40, evaluator.left());
    assertEquals(SearchResult.Ending.OUT_OF_EVALUATIONS, evaluator.ending());
    assertTrue(evaluator.bestValue() < 0);
  }

  private static Evaluator evaluator(Objective objective, int evaluations) {
    return new Evaluator(
        objective, new Budget(evaluations, System.nanoTime() + Long.MAX_VALUE / 4));
  }
}
