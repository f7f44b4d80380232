package blochbound.sample;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.SplittableRandom;
import java.util.stream.IntStream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

/** Pivot orders: little fill, no tiny pivots, and no fill that was not foreseen. */
class PivotPlanTest {
  private static boolean[][] pattern(double[][] matrix) {
    boolean[][] pattern = new boolean[matrix.length][matrix.length];
    for (int i = 0; i < matrix.length; i++) {
      for (int j = 0; j < matrix.length; j++) {
        pattern[i][j] = matrix[i][j] != 0;
      }
    }
    return pattern;
  }

  private static PivotPlan plan(double[][] matrix) {
    return PivotPlan.of(matrix, pattern(matrix)).orElseThrow();
  }

  /** An arrow that points up left fills completely in natural order and not at all in reverse. */
  @Test
  void arrowMatrixIsNotFilled() {
    int n = 9;
    double[][] arrow = new double[n][n];
    for (int i = 0; i < n; i++) {
      arrow[i][i] = 2;
      arrow[0][i] = 1;
      arrow[i][0] = 1;
    }
    PivotPlan plan = plan(arrow);
    int entries = 0;
    for (int i = 0; i < n; i++) {
      for (int j = 0; j < n; j++) {
        entries += plan.mayHave(i, j) ? 1 : 0;
      }
    }
    // [closed form] diagonal, one row and one column
    assertEquals(3 * n - 2, entries);
  }

  @Test
  void tinyPivotIsAvoidedEvenWhereItFillsLess() {
    double[][] matrix = {{1e-6, 1, 0}, {1, 1, 1}, {0, 1, 1}};
    PivotPlan plan = plan(matrix);
    // [invariant] 1e-6 is far below a tenth of its column
    assertFalse(plan.rowOrder()[0] == 0 && plan.columnOrder()[0] == 0);
  }

  @Test
  void singularMatrixHasNoPlan() {
    double[][] matrix = {{1, 2}, {2, 4}};
    assertTrue(PivotPlan.of(matrix, pattern(matrix)).isEmpty());
  }

  @ParameterizedTest(name = "seed {0}")
  @ValueSource(longs = {1, 2, 3, 4, 5})
  void eliminationFillsOnlyForeseenEntriesWithBoundedMultipliers(long seed) {
    SplittableRandom random = new SplittableRandom(seed);
    int n = 12;
    double[][] matrix = new double[n][n];
    for (int i = 0; i < n; i++) {
      for (int j = 0; j < n; j++) {
        matrix[i][j] = i == j || random.nextInt(4) == 0 ? random.nextDouble(-1, 1) : 0;
      }
    }
    PivotPlan plan = plan(matrix);
    int[] rows = plan.rowOrder();
    int[] columns = plan.columnOrder();
    assertArrayEquals(IntStream.range(0, n).toArray(), IntStream.of(rows).sorted().toArray());
    assertArrayEquals(IntStream.range(0, n).toArray(), IntStream.of(columns).sorted().toArray());
    for (int k = 0; k < n; k++) {
      for (int i = k + 1; i < n; i++) {
        double multiplier = matrix[rows[i]][columns[k]] / matrix[rows[k]][columns[k]];
        // [closed form] threshold pivoting bounds multipliers by the inverse of the threshold
        assertTrue(Math.abs(multiplier) <= (1 + 1e-9) / PivotPlan.THRESHOLD);
        for (int j = k; j < n; j++) {
          matrix[rows[i]][columns[j]] -= multiplier * matrix[rows[k]][columns[j]];
          boolean isEntry = multiplier != 0 && matrix[rows[k]][columns[j]] != 0;
          assertTrue(!isEntry || plan.mayHave(i, j));
        }
        assertTrue(multiplier == 0 || plan.mayHave(i, k));
      }
    }
  }
}
