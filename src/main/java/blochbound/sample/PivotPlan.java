package blochbound.sample;

import java.util.Arrays;
import java.util.Optional;

/**
 * A pivot order for one matrix, and the entries that elimination in that order can fill for every
 * matrix with the same pattern.
 *
 * <p>Among the entries of at least {@link #THRESHOLD} times the largest of their column, the pivot
 * is the one that can fill fewest others. Source: H. M. Markowitz, Management Science 3 (1957) 255;
 * threshold as in I. S. Duff, A. M. Erisman, J. K. Reid, Direct Methods for Sparse Matrices (1986),
 * both from memory.
 */
final class PivotPlan {
  /** Least size of a pivot relative to its column: multipliers are at most the inverse. */
  static final double THRESHOLD = 0.1;

  /** Pivots below this share of the largest entry count as zero. */
  private static final double NEGLIGIBLE = 1e-12;

  private final int n;
  private final double[][] work;
  private final boolean[][] pattern;
  private final int[] rowOrder;
  private final int[] columnOrder;
  private final boolean[] rowDone;
  private final boolean[] columnDone;
  private final int[] rowCount;
  private final int[] columnCount;
  private final double[] columnMax;

  private PivotPlan(double[][] matrix, boolean[][] pattern) {
    n = matrix.length;
    work = Arrays.stream(matrix).map(double[]::clone).toArray(double[][]::new);
    this.pattern = Arrays.stream(pattern).map(boolean[]::clone).toArray(boolean[][]::new);
    rowOrder = new int[n];
    columnOrder = new int[n];
    rowDone = new boolean[n];
    columnDone = new boolean[n];
    rowCount = new int[n];
    columnCount = new int[n];
    columnMax = new double[n];
  }

  /**
   * Order and fill for a matrix; empty when the matrix is singular to rounding.
   *
   * @param matrix the matrix that decides the order
   * @param pattern which entries any matrix to be factored may have
   */
  static Optional<PivotPlan> of(double[][] matrix, boolean[][] pattern) {
    PivotPlan plan = new PivotPlan(matrix, pattern);
    double largest =
        Arrays.stream(matrix).flatMapToDouble(Arrays::stream).map(Math::abs).max().orElse(0);
    for (int k = 0; k < plan.n; k++) {
      if (!plan.choose(k, NEGLIGIBLE * largest)) {
        return Optional.empty();
      }
      plan.eliminate(plan.rowOrder[k], plan.columnOrder[k]);
    }
    return Optional.of(plan);
  }

  /** Picks the pivot of step k; false when no entry is left that is not negligible. */
  private boolean choose(int k, double negligible) {
    countEntries();
    long leastFill = Long.MAX_VALUE;
    double bestShare = 0;
    for (int i = 0; i < n; i++) {
      for (int j = 0; j < n; j++) {
        if (!isActive(i, j) || !(Math.abs(work[i][j]) > negligible)) {
          continue;
        }
        double share = Math.abs(work[i][j]) / columnMax[j];
        long fill = (rowCount[i] - 1L) * (columnCount[j] - 1L);
        if (share >= THRESHOLD && (fill < leastFill || (fill == leastFill && share > bestShare))) {
          leastFill = fill;
          bestShare = share;
          rowOrder[k] = i;
          columnOrder[k] = j;
        }
      }
    }
    return leastFill < Long.MAX_VALUE;
  }

  private boolean isActive(int row, int column) {
    return !rowDone[row] && !columnDone[column] && pattern[row][column];
  }

  /** Entries in each row and column that are left, and the largest of each column. */
  private void countEntries() {
    Arrays.fill(rowCount, 0);
    Arrays.fill(columnCount, 0);
    Arrays.fill(columnMax, 0);
    for (int i = 0; i < n; i++) {
      for (int j = 0; j < n; j++) {
        if (isActive(i, j)) {
          rowCount[i]++;
          columnCount[j]++;
          columnMax[j] = Math.max(columnMax[j], Math.abs(work[i][j]));
        }
      }
    }
  }

  private void eliminate(int row, int column) {
    rowDone[row] = true;
    columnDone[column] = true;
    for (int i = 0; i < n; i++) {
      if (rowDone[i] || !pattern[i][column]) {
        continue;
      }
      double factor = work[i][column] / work[row][column];
      for (int j = 0; j < n; j++) {
        if (!columnDone[j] && pattern[row][j]) {
          pattern[i][j] = true;
          work[i][j] -= factor * work[row][j];
        }
      }
    }
  }

  /** Number of unknowns. */
  int size() {
    return n;
  }

  /** Matrix row of each pivot. */
  int[] rowOrder() {
    return rowOrder.clone();
  }

  /** Matrix column of each pivot. */
  int[] columnOrder() {
    return columnOrder.clone();
  }

  /** Whether the factors may have an entry at a row and a column, both counted in pivot order. */
  boolean mayHave(int row, int column) {
    return pattern[rowOrder[row]][columnOrder[column]];
  }
}
