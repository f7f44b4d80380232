package blochbound.search;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import blochbound.model.Ball.Norm;
import java.util.stream.Stream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.Arguments;
import org.junit.jupiter.params.provider.MethodSource;

/** Quick searches over the Euclidean and the sum-norm ball. */
class BallSearchTest {
  private static final SearchOptions QUICK = SearchOptions.withDefaults();

  /**
   * [closed form] trust-region subproblems by the secular equation: theory of More and Sorensen,
   * SIAM J. Sci. Stat. Comput. 4 (1983) 553, from memory.
   */
  static Stream<Arguments> trustRegionProblems() {
    return Stream.of(
        Arguments.of(
            "convex, active", new double[] {1, 2}, new double[] {1, 1}, 0.5, -0.530258659278092),
        Arguments.of(
            "indefinite", new double[] {-1, 2}, new double[] {1, 1}, 1.0, -1.62450403220698),
        Arguments.of("hard case", new double[] {-2, 1}, new double[] {0, 1}, 1.0, -7.0 / 6),
        Arguments.of("interior", new double[] {2, 3}, new double[] {-1, -1}, 10.0, -5.0 / 12),
        Arguments.of("pure eigenvalue", new double[] {-2, -1, 3}, new double[3], 1.0, -1.0));
  }

  @ParameterizedTest(name = "{0}")
  @MethodSource("trustRegionProblems")
  void trustRegionMinimumIsAttained(
      String name, double[] h, double[] g, double radius, double minimum) {
    Objective objective = QuadraticObjective.diagonal(h, g).scaled(radius);
    SearchResult found = WorstCaseSearch.run(() -> objective, h.length, Norm.ELLIPSOID, QUICK);
    assertEquals(minimum, found.value(), 1e-12);
    assertEquals(SearchResult.Ending.SETTLED, found.ending());
  }

  @Test
  void convexTrustRegionMinimiserIsFound() {
    Objective objective =
        QuadraticObjective.diagonal(new double[] {1, 2}, new double[] {1, 1}).scaled(0.5);
    double[] z = WorstCaseSearch.run(() -> objective, 2, Norm.ELLIPSOID, QUICK).z();
    // [closed form] (H + lambda I) x = -g with lambda = 1.45332625271906.
    assertEquals(-0.407609872063158, 0.5 * z[0], 1e-7);
    assertEquals(-0.289575883313263, 0.5 * z[1], 1e-7);
  }

  @Test
  void rosenbrockOnTheDiscIsMinimal() {
    Objective objective = new Rosenbrock();
    SearchResult found = WorstCaseSearch.run(() -> objective, 2, Norm.ELLIPSOID, QUICK);
    // [closed form] root on the circle for the function of Rosenbrock, Comput. J. 3 (1960) 175.
    assertEquals(0.0456748087195002, found.value(), 1e-12);
    assertEquals(0.786415154168428, found.z()[0], 1e-6);
    assertEquals(0.617698312523393, found.z()[1], 1e-6);
  }

  @Test
  void linearFunctionsEndAtTheDualNorm() {
    double[] g = {0.3, -2, 1.1, 0};
    Objective objective = QuadraticObjective.diagonal(new double[4], g);
    // [closed form] min of g'z is minus the dual norm: sum, Euclidean length, largest entry.
    assertEquals(-3.4, quick(objective, 4, Norm.BOX), 1e-14);
    assertEquals(-Math.sqrt(0.09 + 4 + 1.21), quick(objective, 4, Norm.ELLIPSOID), 1e-14);
    assertEquals(-2, quick(objective, 4, Norm.DIAMOND), 1e-14);
  }

  @Test
  void concaveFunctionsOnTheDiamondEndAtTheBestCorner() {
    double[] h = {-1, -2, -1.9, -0.5, -1.5, -1, -1, -1};
    Objective objective = QuadraticObjective.diagonal(h, new double[] {0, 0, .1, 0, 0, 0, 0, 0});
    // [closed form] a concave function is smallest at a corner: here -1.9/2 - 0.1 at -e_3.
    assertEquals(-1.05, quick(objective, 8, Norm.DIAMOND), 1e-14);
  }

  @Test
  void diamondMinimumOnAnEdgeIsMet() {
    // [closed form] |z - (1, 1)|^2/2 on |z|_1 <= 1 is smallest at (1/2, 1/2): 1/4 (minus 1 here).
    Objective objective =
        QuadraticObjective.diagonal(new double[] {1, 1, 1}, new double[] {-1, -1, 0});
    assertEquals(0.25 - 1, quick(objective, 3, Norm.DIAMOND), 1e-14);
  }

  @Test
  void worstValueGrowsWithTheBall() {
    Objective objective = new Rosenbrock();
    double diamond = quick(objective, 2, Norm.DIAMOND);
    double disc = quick(objective, 2, Norm.ELLIPSOID);
    // [invariant] the balls are nested; the box holds the global minimum 0 at (1, 1).
    assertTrue(diamond >= disc);
    assertEquals(0, quick(objective, 2, Norm.BOX), 1e-12);
  }

  private static double quick(Objective objective, int m, Norm norm) {
    return WorstCaseSearch.run(() -> objective, m, norm, QUICK).value();
  }

  private record Rosenbrock() implements Objective {
    @Override
    public double value(double[] z) {
      return value(z, new double[2]);
    }

    @Override
    public double value(double[] z, double[] gradientOut) {
      double bend = z[1] - z[0] * z[0];
      gradientOut[0] = -400 * bend * z[0] - 2 * (1 - z[0]);
      gradientOut[1] = 200 * bend;
      return 100 * bend * bend + (1 - z[0]) * (1 - z[0]);
    }
  }
}
