package blochbound.linalg;

import blochbound.check.Check;
import blochbound.interval.Rounding;
import java.util.Arrays;

/**
 * Immutable dense complex matrix, row-major: operators and states of N levels.
 *
 * <p>Entries are plain doubles; results carry the usual rounding of their sums. For results with an
 * error bound see {@link ComplexBall}.
 */
public final class ComplexMatrix {
  private final int rows;
  private final int columns;
  private final double[] re;
  private final double[] im;

  private ComplexMatrix(int rows, int columns, double[] re, double[] im) {
    this.rows = rows;
    this.columns = columns;
    this.re = re;
    this.im = im;
  }

  /** Matrix of the given row-major real and imaginary parts, which are copied. */
  public static ComplexMatrix of(int rows, int columns, double[] re, double[] im) {
    Check.that(
        re.length == rows * columns && im.length == re.length, "entry counts must fit the shape");
    return new ComplexMatrix(rows, columns, re.clone(), im.clone());
  }

  /** Real matrix of the given rows. */
  public static ComplexMatrix real(double[][] entries) {
    double[] re = new double[entries.length * entries[0].length];
    for (int i = 0; i < entries.length; i++) {
      System.arraycopy(entries[i], 0, re, i * entries[0].length, entries[0].length);
    }
    return new ComplexMatrix(entries.length, entries[0].length, re, new double[re.length]);
  }

  /** Matrix of zeros. */
  public static ComplexMatrix zero(int rows, int columns) {
    return new ComplexMatrix(rows, columns, new double[rows * columns], new double[rows * columns]);
  }

  /** Unit matrix of {@code size} rows. */
  public static ComplexMatrix identity(int size) {
    double[] re = new double[size * size];
    for (int i = 0; i < size; i++) {
      re[i * size + i] = 1;
    }
    return new ComplexMatrix(size, size, re, new double[size * size]);
  }

  /** The matrix {@code |row><column|} with a single entry one. */
  public static ComplexMatrix unit(int size, int row, int column) {
    double[] re = new double[size * size];
    re[row * size + column] = 1;
    return new ComplexMatrix(size, size, re, new double[size * size]);
  }

  /** The outer product {@code |a><b|} of two column vectors. */
  public static ComplexMatrix outer(ComplexMatrix a, ComplexMatrix b) {
    return a.times(b.adjoint());
  }

  /** Number of rows. */
  public int rows() {
    return rows;
  }

  /** Number of columns. */
  public int columns() {
    return columns;
  }

  /** Real part of an entry. */
  public double re(int row, int column) {
    return re[row * columns + column];
  }

  /** Imaginary part of an entry. */
  public double im(int row, int column) {
    return im[row * columns + column];
  }

  /** Copy of the real parts, row-major. */
  public double[] realParts() {
    return re.clone();
  }

  /** Copy of the imaginary parts, row-major. */
  public double[] imaginaryParts() {
    return im.clone();
  }

  /** Sum. */
  public ComplexMatrix plus(ComplexMatrix other) {
    return combine(1, other, 1);
  }

  /** Difference. */
  public ComplexMatrix minus(ComplexMatrix other) {
    return combine(1, other, -1);
  }

  /** The combination a * this + b * other with real factors. */
  public ComplexMatrix combine(double a, ComplexMatrix other, double b) {
    Check.that(rows == other.rows && columns == other.columns, "matrices must have one shape");
    double[] sumRe = new double[re.length];
    double[] sumIm = new double[re.length];
    for (int k = 0; k < re.length; k++) {
      sumRe[k] = a * re[k] + b * other.re[k];
      sumIm[k] = a * im[k] + b * other.im[k];
    }
    return new ComplexMatrix(rows, columns, sumRe, sumIm);
  }

  /** Real multiple. */
  public ComplexMatrix scale(double factor) {
    return scale(factor, 0);
  }

  /** Complex multiple. */
  public ComplexMatrix scale(double factorRe, double factorIm) {
    double[] outRe = new double[re.length];
    double[] outIm = new double[re.length];
    for (int k = 0; k < re.length; k++) {
      outRe[k] = factorRe * re[k] - factorIm * im[k];
      outIm[k] = factorRe * im[k] + factorIm * re[k];
    }
    return new ComplexMatrix(rows, columns, outRe, outIm);
  }

  /** Matrix product; zero entries of the left factor are skipped. */
  public ComplexMatrix times(ComplexMatrix other) {
    Check.that(columns == other.rows, "inner dimensions must agree");
    int n = other.columns;
    double[] outRe = new double[rows * n];
    double[] outIm = new double[rows * n];
    for (int i = 0; i < rows; i++) {
      for (int k = 0; k < columns; k++) {
        double aRe = re[i * columns + k];
        double aIm = im[i * columns + k];
        if (aRe == 0 && aIm == 0) {
          continue;
        }
        for (int j = 0; j < n; j++) {
          double bRe = other.re[k * n + j];
          double bIm = other.im[k * n + j];
          outRe[i * n + j] += aRe * bRe - aIm * bIm;
          outIm[i * n + j] += aRe * bIm + aIm * bRe;
        }
      }
    }
    return new ComplexMatrix(rows, n, outRe, outIm);
  }

  /** Kronecker product: this matrix acts on the more significant factor. */
  public ComplexMatrix kron(ComplexMatrix other) {
    int r = rows * other.rows;
    int c = columns * other.columns;
    double[] outRe = new double[r * c];
    double[] outIm = new double[r * c];
    for (int i = 0; i < r; i++) {
      for (int j = 0; j < c; j++) {
        int a = (i / other.rows) * columns + j / other.columns;
        int b = (i % other.rows) * other.columns + j % other.columns;
        outRe[i * c + j] = re[a] * other.re[b] - im[a] * other.im[b];
        outIm[i * c + j] = re[a] * other.im[b] + im[a] * other.re[b];
      }
    }
    return new ComplexMatrix(r, c, outRe, outIm);
  }

  /** Conjugate transpose. */
  public ComplexMatrix adjoint() {
    return transpose().conjugate();
  }

  /** Transpose. */
  public ComplexMatrix transpose() {
    double[] outRe = new double[re.length];
    double[] outIm = new double[re.length];
    for (int i = 0; i < rows; i++) {
      for (int j = 0; j < columns; j++) {
        outRe[j * rows + i] = re[i * columns + j];
        outIm[j * rows + i] = im[i * columns + j];
      }
    }
    return new ComplexMatrix(columns, rows, outRe, outIm);
  }

  /** Entrywise complex conjugate. */
  public ComplexMatrix conjugate() {
    double[] outIm = new double[im.length];
    for (int k = 0; k < im.length; k++) {
      outIm[k] = -im[k];
    }
    return new ComplexMatrix(rows, columns, re.clone(), outIm);
  }

  /** Real part of the trace. */
  public double traceRe() {
    double sum = 0;
    for (int i = 0; i < Math.min(rows, columns); i++) {
      sum += re[i * columns + i];
    }
    return sum;
  }

  /** Imaginary part of the trace. */
  public double traceIm() {
    double sum = 0;
    for (int i = 0; i < Math.min(rows, columns); i++) {
      sum += im[i * columns + i];
    }
    return sum;
  }

  /** Real part of tr(this * other), without forming the product. */
  public double traceOfProduct(ComplexMatrix other) {
    Check.that(
        columns == other.rows && rows == other.columns, "shapes must allow a square product");
    double sum = 0;
    for (int i = 0; i < rows; i++) {
      for (int j = 0; j < columns; j++) {
        sum +=
            re[i * columns + j] * other.re[j * rows + i]
                - im[i * columns + j] * other.im[j * rows + i];
      }
    }
    return sum;
  }

  /** Frobenius norm, rounded to nearest. */
  public double frobeniusNorm() {
    double sum = 0;
    for (int k = 0; k < re.length; k++) {
      sum += re[k] * re[k] + im[k] * im[k];
    }
    return Math.sqrt(sum);
  }

  /** Certified upper bound of the Frobenius norm. */
  public double frobeniusNormUp() {
    return Rounding.normUp(new double[] {Rounding.normUp(re), Rounding.normUp(im)});
  }

  /** Tells whether all entries are finite. */
  public boolean isFinite() {
    for (int k = 0; k < re.length; k++) {
      if (!Double.isFinite(re[k]) || !Double.isFinite(im[k])) {
        return false;
      }
    }
    return true;
  }

  @Override
  public boolean equals(Object other) {
    return other instanceof ComplexMatrix that
        && rows == that.rows
        && columns == that.columns
        && Arrays.equals(re, that.re)
        && Arrays.equals(im, that.im);
  }

  @Override
  public int hashCode() {
    return 31 * Arrays.hashCode(re) + Arrays.hashCode(im);
  }

  @Override
  public String toString() {
    StringBuilder text = new StringBuilder();
    for (int i = 0; i < rows; i++) {
      for (int j = 0; j < columns; j++) {
        text.append(
            String.format(
                java.util.Locale.ROOT, "%s%.6g%+.6gi", j == 0 ? "" : " ", re(i, j), im(i, j)));
      }
      text.append('\n');
    }
    return text.toString();
  }
}
