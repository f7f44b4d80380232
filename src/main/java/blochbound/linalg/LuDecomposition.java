package blochbound.linalg;

/**
 * Reusable LU factorisation with partial pivoting on separate row arrays, the layout that the
 * compiler vectorises; two pivots are eliminated at a time.
 *
 * <p>Solutions are approximate: callers that certify something account for the residual.
 */
public final class LuDecomposition {
  private final int n;
  private final double[][] rows;
  private final int[] permutation;
  private boolean regular;
  private final double[] rowSize;
  private double smallestRelativePivot;

  /** Workspace for matrices of {@code size} rows. */
  public LuDecomposition(int size) {
    this.n = size;
    this.rows = new double[size][size];
    this.permutation = new int[size];
    this.rowSize = new double[size];
  }

  /** Rows to be filled with the matrix before {@link #factor()}, which overwrites them. */
  public double[][] rows() {
    return rows;
  }

  /** Sets all entries to zero. */
  public void clear() {
    for (double[] row : rows) {
      java.util.Arrays.fill(row, 0);
    }
  }

  /** Factors the matrix in {@link #rows()}; afterwards {@link #isRegular()} tells the outcome. */
  public void factor() {
    for (int i = 0; i < n; i++) {
      permutation[i] = i;
      rowSize[i] = largestEntry(rows[i]);
    }
    regular = true;
    smallestRelativePivot = 1;
    int k = 0;
    while (k < n && regular) {
      pivot(k);
      boolean pair = k + 1 < n && regular;
      if (pair) {
        eliminateEntry(k, k + 1, n);
        pairPivot(k);
      }
      if (pair && regular) {
        eliminatePair(k);
        k += 2;
      } else {
        k++;
      }
    }
  }

  /** Brings the row with the largest entry of column k to position k. */
  private void pivot(int k) {
    int best = k;
    for (int i = k + 1; i < n; i++) {
      if (Math.abs(rows[i][k]) > Math.abs(rows[best][k])) {
        best = i;
      }
    }
    swap(k, best);
    note(k);
  }

  private static double largestEntry(double[] row) {
    double most = 0;
    for (double entry : row) {
      most = Math.max(most, Math.abs(entry));
    }
    return most;
  }

  /** Multiplier of one column for all rows below, applied to the next column only. */
  private void eliminateEntry(int k, int from, int until) {
    double inverse = 1 / rows[k][k];
    double next = rows[k][k + 1];
    for (int i = from; i < until; i++) {
      double[] row = rows[i];
      row[k] *= inverse;
      row[k + 1] -= row[k] * next;
    }
  }

  private void pairPivot(int k) {
    int best = k + 1;
    for (int i = k + 2; i < n; i++) {
      if (Math.abs(rows[i][k + 1]) > Math.abs(rows[best][k + 1])) {
        best = i;
      }
    }
    swap(k + 1, best);
    axpy(rows[k + 1], rows[k], rows[k + 1][k], k + 2);
    note(k + 1);
  }

  private void eliminatePair(int k) {
    double[] first = rows[k];
    double[] second = rows[k + 1];
    double inverse = 1 / second[k + 1];
    int i = k + 2;
    for (; i + 1 < n; i += 2) {
      double[] a = rows[i];
      double[] b = rows[i + 1];
      a[k + 1] *= inverse;
      b[k + 1] *= inverse;
      update(a, b, first, second, k);
    }
    if (i < n) {
      double[] a = rows[i];
      a[k + 1] *= inverse;
      axpy(a, first, a[k], k + 2);
      axpy(a, second, a[k + 1], k + 2);
    }
  }

  /** Subtracts both pivot rows from two rows at once. */
  private void update(double[] a, double[] b, double[] first, double[] second, int k) {
    double a0 = a[k];
    double a1 = a[k + 1];
    double b0 = b[k];
    double b1 = b[k + 1];
    for (int j = k + 2; j < n; j++) {
      a[j] -= a0 * first[j] + a1 * second[j];
      b[j] -= b0 * first[j] + b1 * second[j];
    }
  }

  private void axpy(double[] target, double[] source, double factor, int from) {
    for (int j = from; j < n; j++) {
      target[j] -= factor * source[j];
    }
  }

  private void swap(int a, int b) {
    double[] row = rows[a];
    rows[a] = rows[b];
    rows[b] = row;
    int index = permutation[a];
    permutation[a] = permutation[b];
    permutation[b] = index;
  }

  private void note(int k) {
    double size = Math.abs(rows[k][k]);
    regular &= size > 0 && Double.isFinite(size);
    smallestRelativePivot = Math.min(smallestRelativePivot, size / rowSize[permutation[k]]);
  }

  /** Tells whether all pivots were finite and not zero. */
  public boolean isRegular() {
    return regular;
  }

  /**
   * Smallest ratio of a pivot to the largest entry of its own row before elimination; near the unit
   * roundoff when the matrix is singular to rounding, whatever the scale of the rows. An estimate.
   */
  public double smallestRelativePivot() {
    return regular ? smallestRelativePivot : 0;
  }

  /** Writes an approximate solution of A x = right to {@code x}; no allocation. */
  public void solve(double[] right, double[] x) {
    for (int i = 0; i < n; i++) {
      x[i] = right[permutation[i]];
    }
    for (int i = 1; i < n; i++) {
      x[i] -= dot(rows[i], x, 0, i);
    }
    for (int i = n - 1; i >= 0; i--) {
      x[i] = (x[i] - dot(rows[i], x, i + 1, n)) / rows[i][i];
    }
  }

  private static double dot(double[] a, double[] b, int from, int until) {
    double s0 = 0;
    double s1 = 0;
    double s2 = 0;
    double s3 = 0;
    int j = from;
    for (; j + 3 < until; j += 4) {
      s0 += a[j] * b[j];
      s1 += a[j + 1] * b[j + 1];
      s2 += a[j + 2] * b[j + 2];
      s3 += a[j + 3] * b[j + 3];
    }
    for (; j < until; j++) {
      s0 += a[j] * b[j];
    }
    return (s0 + s1) + (s2 + s3);
  }

  /**
   * Writes an approximate solution of A' x = right to {@code x}; {@code scratch} has the same
   * length and is overwritten; no allocation.
   */
  public void solveTransposed(double[] right, double[] x, double[] scratch) {
    System.arraycopy(right, 0, scratch, 0, n);
    // U' w = right, by rows of U: each solved entry is taken out of all later ones.
    for (int i = 0; i < n; i++) {
      double[] row = rows[i];
      double wi = scratch[i] / row[i];
      scratch[i] = wi;
      if (wi != 0) {
        for (int j = i + 1; j < n; j++) {
          scratch[j] -= wi * row[j];
        }
      }
    }
    for (int i = n - 1; i > 0; i--) {
      double[] row = rows[i];
      double wi = scratch[i];
      if (wi != 0) {
        for (int j = 0; j < i; j++) {
          scratch[j] -= wi * row[j];
        }
      }
    }
    for (int i = 0; i < n; i++) {
      x[permutation[i]] = scratch[i];
    }
  }

  /** Approximate inverse as separate rows, new at each call. */
  public double[][] inverse() {
    double[][] inverse = new double[n][n];
    double[] unit = new double[n];
    double[] column = new double[n];
    for (int j = 0; j < n; j++) {
      unit[j] = 1;
      solve(unit, column);
      unit[j] = 0;
      for (int i = 0; i < n; i++) {
        inverse[i][j] = column[i];
      }
    }
    return inverse;
  }
}
