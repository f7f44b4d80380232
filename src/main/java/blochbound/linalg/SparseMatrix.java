package blochbound.linalg;

import blochbound.check.Check;
import blochbound.interval.Rounding;
import java.util.Arrays;

/** Immutable real matrix in compressed column form: a constant block of the Bloch generator. */
public final class SparseMatrix {
  private final int rows;
  private final int[] columnStart;
  private final int[] rowIndex;
  private final int[] columnIndex;
  private final double[] value;

  private SparseMatrix(int rows, int[] columnStart, int[] rowIndex, double[] value) {
    this.rows = rows;
    this.columnStart = columnStart;
    this.rowIndex = rowIndex;
    this.value = value;
    columnIndex = new int[value.length];
    for (int j = 0; j + 1 < columnStart.length; j++) {
      Arrays.fill(columnIndex, columnStart[j], columnStart[j + 1], j);
    }
  }

  /** Collects the columns of a sparse matrix from left to right. */
  public static final class Builder {
    private final int rows;
    private int[] columnStart;
    private int[] rowIndex = new int[64];
    private double[] value = new double[64];
    private int columns;
    private int count;

    /** Starts a matrix of {@code rows} rows and no column. */
    public Builder(int rows) {
      this.rows = rows;
      this.columnStart = new int[rows + 1];
    }

    /** Puts an entry into the column that is being filled. */
    public void add(int row, double entry) {
      if (count == value.length) {
        rowIndex = Arrays.copyOf(rowIndex, 2 * count);
        value = Arrays.copyOf(value, 2 * count);
      }
      rowIndex[count] = row;
      value[count++] = entry;
    }

    /** Ends the column that is being filled. */
    public void endColumn() {
      columns++;
      if (columns >= columnStart.length) {
        columnStart = Arrays.copyOf(columnStart, 2 * columns);
      }
      columnStart[columns] = count;
    }

    /** The finished matrix. */
    public SparseMatrix build() {
      return new SparseMatrix(
          rows,
          Arrays.copyOf(columnStart, columns + 1),
          Arrays.copyOf(rowIndex, count),
          Arrays.copyOf(value, count));
    }
  }

  /** Number of rows. */
  public int rows() {
    return rows;
  }

  /** Number of columns. */
  public int columns() {
    return columnStart.length - 1;
  }

  /** Number of stored entries. */
  public int entries() {
    return value.length;
  }

  /** Largest number of stored entries in a column. */
  public int longestColumn() {
    int most = 0;
    for (int j = 0; j < columns(); j++) {
      most = Math.max(most, columnStart[j + 1] - columnStart[j]);
    }
    return most;
  }

  /** Upper bound of the Frobenius norm. */
  public double frobeniusUp() {
    return Rounding.normUp(value);
  }

  /** Receives the entries of a matrix. */
  @FunctionalInterface
  public interface EntryVisitor {
    /** Takes one stored entry. */
    void visit(int row, int column, double entry);
  }

  /** Visits all stored entries, column by column. */
  public void forEach(EntryVisitor visitor) {
    for (int j = 0; j < columns(); j++) {
      for (int k = columnStart[j]; k < columnStart[j + 1]; k++) {
        visitor.visit(rowIndex[k], j, value[k]);
      }
    }
  }

  /** Writes the product of the transpose with {@code x} to {@code out}; no allocation. */
  public void transposeTimes(double[] x, double[] out) {
    Check.that(x.length == rows && out.length == columns(), "vector lengths must fit the matrix");
    for (int j = 0; j < out.length; j++) {
      double sum = 0;
      for (int k = columnStart[j]; k < columnStart[j + 1]; k++) {
        sum += value[k] * x[rowIndex[k]];
      }
      out[j] = sum;
    }
  }

  /** Adds {@code factor} times the product of the transpose with {@code x} to {@code out}. */
  public void addTransposeTimes(double factor, double[] x, double[] out) {
    for (int k = 0; k < value.length; k++) {
      out[columnIndex[k]] += factor * value[k] * x[rowIndex[k]];
    }
  }

  /** Writes the product with {@code x} to {@code out}; no allocation. */
  public void times(double[] x, double[] out) {
    Check.that(x.length == columns() && out.length == rows, "vector lengths must fit the matrix");
    Arrays.fill(out, 0);
    for (int j = 0; j < x.length; j++) {
      double xj = x[j];
      if (xj != 0) {
        for (int k = columnStart[j]; k < columnStart[j + 1]; k++) {
          out[rowIndex[k]] += value[k] * xj;
        }
      }
    }
  }

  /** Adds {@code factor} times the part without first row and first column to rows of a matrix. */
  public void addInnerTo(double[][] target, double factor) {
    for (int j = 1; j < columns(); j++) {
      for (int k = columnStart[j]; k < columnStart[j + 1]; k++) {
        if (rowIndex[k] > 0) {
          target[rowIndex[k] - 1][j - 1] += factor * value[k];
        }
      }
    }
  }

  /** Adds {@code factor} times the first column without its first entry to a vector. */
  public void addFirstColumnTo(double[] target, double factor) {
    for (int k = columnStart[0]; k < columnStart[1]; k++) {
      if (rowIndex[k] > 0) {
        target[rowIndex[k] - 1] += factor * value[k];
      }
    }
  }
}
