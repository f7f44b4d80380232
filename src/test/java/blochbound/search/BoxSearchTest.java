package blochbound.search;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import blochbound.model.Ball.Norm;
import java.util.SplittableRandom;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

/** Quick searches for quadratic forms over the box, and the coordinate flips. */
class BoxSearchTest {
  private static final int[][] FIVE_CYCLE = {{0, 1}, {1, 2}, {2, 3}, {3, 4}, {4, 0}};
  private static final int[][] PETERSEN = {
    {0, 1}, {1, 2}, {2, 3}, {3, 4}, {4, 0}, {0, 5}, {1, 6}, {2, 7}, {3, 8}, {4, 9}, {5, 7}, {7, 9},
    {9, 6}, {6, 8}, {8, 5}
  };

  @Test
  void maximumCutsAreFound() {
    // [closed form] maximum cuts by enumeration; the relaxation to the box is exact.
    assertEquals(4, cut(5, FIVE_CYCLE), 1e-12);
    assertEquals(12, cut(10, PETERSEN), 1e-12);
    // [closed form] floor(n^2/4) for the complete graphs.
    assertEquals(4, cut(4, complete(4)), 1e-12);
    assertEquals(12, cut(7, complete(7)), 1e-12);
    assertEquals(16, cut(8, complete(8)), 1e-12);
  }

  @Test
  void localHiddenVariablesReachTwoOnTheBoxAndLessOnTheBall() {
    // -(a1 b1 + a1 b2 + a2 b1 - a2 b2) in the order a1, a2, b1, b2.
    double[][] h = {{0, 0, -1, -1}, {0, 0, -1, 1}, {-1, -1, 0, 0}, {-1, 1, 0, 0}};
    Objective objective = new QuadraticObjective(h, new double[4]);
    // [published] Clauser, Horne, Shimony, Holt, PRL 23 (1969) 880: at most 2; from memory.
    assertEquals(-2, quick(objective, 4, Norm.BOX).value(), 1e-12);
    // [closed form] half the spectral norm sqrt(2) when |a|^2 + |b|^2 <= 1.
    assertEquals(-Math.sqrt(0.5), quick(objective, 4, Norm.ELLIPSOID).value(), 1e-12);
  }

  @ParameterizedTest(name = "seed {0}")
  @ValueSource(longs = {1, 2, 3, 4, 5, 6})
  void concaveQuadraticsEndAtTheBestOfAllVertices(long seed) {
    int m = 7;
    SplittableRandom random = new SplittableRandom(seed);
    double[][] h = new double[m][m];
    double[] g = random.doubles(m, -3, 3).toArray();
    for (int i = 0; i < m; i++) {
      for (int j = 0; j < i; j++) {
        h[i][j] = random.nextDouble(-1, 1);
        h[j][i] = h[i][j];
      }
      h[i][i] = -m;
    }
    Objective objective = new QuadraticObjective(h, g);
    double least = Double.POSITIVE_INFINITY;
    for (int vertex = 0; vertex < 1 << m; vertex++) {
      double[] z = new double[m];
      for (int j = 0; j < m; j++) {
        z[j] = (vertex >> j & 1) == 0 ? -1 : 1;
      }
      least = Math.min(least, objective.value(z));
    }
    // [closed form] a concave function is smallest at a vertex; all 128 are enumerated.
    assertEquals(least, quick(objective, m, Norm.BOX).value(), 1e-12);
  }

  @Test
  void noSingleFlipImprovesTheEndOfTheFlips() {
    SplittableRandom random = new SplittableRandom(17);
    Objective objective = negatedCut(10, PETERSEN);
    for (int draw = 0; draw < 40; draw++) {
      double[] start = new double[10];
      for (int j = 0; j < 10; j++) {
        start[j] = j == draw % 10 ? random.nextDouble(-0.9, 0.9) : random.nextBoolean() ? 1 : -1;
      }
      Evaluator evaluator = new Evaluator(objective, unlimited());
      double[] end = VertexFlips.run(evaluator, start);
      double value = objective.value(end);
      assertTrue(value <= objective.value(start));
      assertEquals(value, evaluator.bestValue());
      assertEquals(start[draw % 10], end[draw % 10], "coordinates inside stay");
      for (int j = 0; j < 10; j++) {
        double[] flipped = end.clone();
        flipped[j] = j == draw % 10 ? flipped[j] : -flipped[j];
        assertTrue(objective.value(flipped) >= value);
      }
    }
  }

  @Test
  void downhillVertexOfALinearFunctionIsItsMinimiser() {
    Objective objective = QuadraticObjective.diagonal(new double[3], new double[] {0.2, -1e-9, 0});
    Iterate at = Iterate.at(new Evaluator(objective, unlimited()), new double[] {0.9, 0.9, -0.3});
    double[] vertex = VertexFlips.downhill(at);
    // [closed form] minus the signs of the gradient; the side of the point where it is zero.
    assertEquals(-1, vertex[0]);
    assertEquals(1, vertex[1]);
    assertEquals(-1, vertex[2]);
  }

  static Budget unlimited() {
    return new Budget(Integer.MAX_VALUE, System.nanoTime() + Long.MAX_VALUE / 4);
  }

  private static double cut(int nodes, int[][] edges) {
    Objective objective = negatedCut(nodes, edges);
    return -quick(objective, nodes, Norm.BOX).value() + 0.5 * edges.length;
  }

  /** Minus the sum of -x_i x_j / 2 over the edges: the cut but for its constant part. */
  private static Objective negatedCut(int nodes, int[][] edges) {
    double[][] h = new double[nodes][nodes];
    for (int[] edge : edges) {
      h[edge[0]][edge[1]] += 0.5;
      h[edge[1]][edge[0]] += 0.5;
    }
    return new QuadraticObjective(h, new double[nodes]);
  }

  private static int[][] complete(int nodes) {
    int[][] edges = new int[nodes * (nodes - 1) / 2][];
    int count = 0;
    for (int i = 0; i < nodes; i++) {
      for (int j = 0; j < i; j++) {
        edges[count++] = new int[] {i, j};
      }
    }
    return edges;
  }

  private static SearchResult quick(Objective objective, int m, Norm norm) {
    return WorstCaseSearch.run(() -> objective, m, norm, SearchOptions.withDefaults());
  }
}
