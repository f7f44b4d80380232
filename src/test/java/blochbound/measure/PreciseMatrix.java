package blochbound.measure;

import blochbound.linalg.ComplexMatrix;
import blochbound.linalg.Hermitian;
import java.math.BigDecimal;
import java.math.MathContext;

/**
 * Complex matrices of 50-digit decimals, for reference values that rounding in double precision
 * does not reach. Written for the tests alone: it shares no code with what is tested.
 */
final class PreciseMatrix {
  static final MathContext DIGITS = new MathContext(50);
  private static final BigDecimal TWO = BigDecimal.valueOf(2);
  private static final BigDecimal NOTHING = new BigDecimal("1e-70");
  private static final BigDecimal SMALL = new BigDecimal("1e-45");

  final int rows;
  final int columns;
  final BigDecimal[][] re;
  final BigDecimal[][] im;

  PreciseMatrix(int rows, int columns) {
    this.rows = rows;
    this.columns = columns;
    this.re = new BigDecimal[rows][columns];
    this.im = new BigDecimal[rows][columns];
    for (int i = 0; i < rows; i++) {
      java.util.Arrays.fill(re[i], BigDecimal.ZERO);
      java.util.Arrays.fill(im[i], BigDecimal.ZERO);
    }
  }

  /** The exact value of a matrix of doubles. */
  static PreciseMatrix of(ComplexMatrix matrix) {
    PreciseMatrix exact = new PreciseMatrix(matrix.rows(), matrix.columns());
    for (int i = 0; i < exact.rows; i++) {
      for (int j = 0; j < exact.columns; j++) {
        exact.re[i][j] = new BigDecimal(matrix.re(i, j));
        exact.im[i][j] = new BigDecimal(matrix.im(i, j));
      }
    }
    return exact;
  }

  static PreciseMatrix of(Hermitian matrix) {
    return of(matrix.matrix());
  }

  PreciseMatrix minus(PreciseMatrix other) {
    PreciseMatrix out = new PreciseMatrix(rows, columns);
    for (int i = 0; i < rows; i++) {
      for (int j = 0; j < columns; j++) {
        out.re[i][j] = re[i][j].subtract(other.re[i][j]);
        out.im[i][j] = im[i][j].subtract(other.im[i][j]);
      }
    }
    return out;
  }

  PreciseMatrix times(PreciseMatrix other) {
    PreciseMatrix out = new PreciseMatrix(rows, other.columns);
    for (int i = 0; i < rows; i++) {
      for (int j = 0; j < other.columns; j++) {
        for (int k = 0; k < columns; k++) {
          BigDecimal a = re[i][k];
          BigDecimal b = im[i][k];
          BigDecimal c = other.re[k][j];
          BigDecimal d = other.im[k][j];
          out.re[i][j] = out.re[i][j].add(a.multiply(c).subtract(b.multiply(d)), DIGITS);
          out.im[i][j] = out.im[i][j].add(a.multiply(d).add(b.multiply(c)), DIGITS);
        }
      }
    }
    return out;
  }

  PreciseMatrix conjugate() {
    PreciseMatrix out = new PreciseMatrix(rows, columns);
    for (int i = 0; i < rows; i++) {
      for (int j = 0; j < columns; j++) {
        out.re[i][j] = re[i][j];
        out.im[i][j] = im[i][j].negate();
      }
    }
    return out;
  }

  /** Real part of tr(this * other). */
  BigDecimal inner(PreciseMatrix other) {
    BigDecimal sum = BigDecimal.ZERO;
    for (int i = 0; i < rows; i++) {
      for (int k = 0; k < columns; k++) {
        sum =
            sum.add(re[i][k].multiply(other.re[k][i])).subtract(im[i][k].multiply(other.im[k][i]));
      }
    }
    return sum;
  }

  BigDecimal frobeniusNorm() {
    BigDecimal sum = BigDecimal.ZERO;
    for (int i = 0; i < rows; i++) {
      for (int k = 0; k < columns; k++) {
        sum = sum.add(re[i][k].pow(2)).add(im[i][k].pow(2));
      }
    }
    return sum.sqrt(DIGITS);
  }

  /** Eigenvalues of a Hermitian matrix by cyclic Jacobi rotations, in no order. */
  BigDecimal[] eigenvalues() {
    return jacobi(new PreciseMatrix(0, rows));
  }

  /** The square root of a Hermitian matrix, its negative eigenvalues taken as zero. */
  PreciseMatrix squareRoot() {
    PreciseMatrix v = new PreciseMatrix(rows, rows);
    for (int i = 0; i < rows; i++) {
      v.re[i][i] = BigDecimal.ONE;
    }
    BigDecimal[] values = jacobi(v);
    PreciseMatrix scaled = new PreciseMatrix(rows, rows);
    PreciseMatrix adjoint = new PreciseMatrix(rows, rows);
    for (int i = 0; i < rows; i++) {
      for (int k = 0; k < rows; k++) {
        BigDecimal root = values[k].max(BigDecimal.ZERO).sqrt(DIGITS);
        scaled.re[i][k] = v.re[i][k].multiply(root, DIGITS);
        scaled.im[i][k] = v.im[i][k].multiply(root, DIGITS);
        adjoint.re[k][i] = v.re[i][k];
        adjoint.im[k][i] = v.im[i][k].negate();
      }
    }
    return scaled.times(adjoint);
  }

  private BigDecimal[] jacobi(PreciseMatrix v) {
    PreciseMatrix a = new PreciseMatrix(rows, rows);
    for (int i = 0; i < rows; i++) {
      System.arraycopy(re[i], 0, a.re[i], 0, rows);
      System.arraycopy(im[i], 0, a.im[i], 0, rows);
    }
    boolean turned = true;
    while (turned) {
      turned = false;
      for (int p = 0; p < rows; p++) {
        for (int q = p + 1; q < rows; q++) {
          turned |= rotate(a, v, p, q);
        }
      }
    }
    BigDecimal[] values = new BigDecimal[rows];
    for (int i = 0; i < rows; i++) {
      values[i] = a.re[i][i];
    }
    return values;
  }

  private static boolean rotate(PreciseMatrix a, PreciseMatrix v, int p, int q) {
    BigDecimal square = a.re[p][q].pow(2, DIGITS).add(a.im[p][q].pow(2, DIGITS));
    if (square.compareTo(SMALL.multiply(SMALL)) < 0) {
      return false;
    }
    BigDecimal size = square.sqrt(DIGITS);
    BigDecimal theta = a.re[q][q].subtract(a.re[p][p]).divide(TWO.multiply(size), DIGITS);
    BigDecimal root = theta.pow(2, DIGITS).add(BigDecimal.ONE).sqrt(DIGITS);
    BigDecimal t = BigDecimal.ONE.divide(theta.abs().add(root), DIGITS);
    t = theta.signum() < 0 ? t.negate() : t;
    BigDecimal c = BigDecimal.ONE.divide(t.pow(2, DIGITS).add(BigDecimal.ONE).sqrt(DIGITS), DIGITS);
    BigDecimal sRe = t.multiply(c).multiply(a.re[p][q]).divide(size, DIGITS);
    BigDecimal sIm = t.multiply(c).multiply(a.im[p][q]).divide(size, DIGITS);
    rotateColumns(a, p, q, c, sRe, sIm);
    rotateColumns(v, p, q, c, sRe, sIm);
    rotateRows(a, p, q, c, sRe, sIm);
    return true;
  }

  /** Rounds to 50 digits; what is below 1e-70 is zero, or its scale would slow every later sum. */
  private static BigDecimal tidy(BigDecimal value) {
    return value.abs().compareTo(NOTHING) < 0 ? BigDecimal.ZERO : value.round(DIGITS);
  }

  private static void rotateColumns(
      PreciseMatrix x, int p, int q, BigDecimal c, BigDecimal sRe, BigDecimal sIm) {
    for (int k = 0; k < x.rows; k++) {
      BigDecimal a = x.re[k][p];
      BigDecimal b = x.im[k][p];
      BigDecimal e = x.re[k][q];
      BigDecimal f = x.im[k][q];
      x.re[k][p] = tidy(c.multiply(a).subtract(sRe.multiply(e)).subtract(sIm.multiply(f)));
      x.im[k][p] = tidy(c.multiply(b).subtract(sRe.multiply(f)).add(sIm.multiply(e)));
      x.re[k][q] = tidy(sRe.multiply(a).subtract(sIm.multiply(b)).add(c.multiply(e)));
      x.im[k][q] = tidy(sRe.multiply(b).add(sIm.multiply(a)).add(c.multiply(f)));
    }
  }

  private static void rotateRows(
      PreciseMatrix x, int p, int q, BigDecimal c, BigDecimal sRe, BigDecimal sIm) {
    for (int k = 0; k < x.columns; k++) {
      BigDecimal a = x.re[p][k];
      BigDecimal b = x.im[p][k];
      BigDecimal e = x.re[q][k];
      BigDecimal f = x.im[q][k];
      x.re[p][k] = tidy(c.multiply(a).subtract(sRe.multiply(e)).add(sIm.multiply(f)));
      x.im[p][k] = tidy(c.multiply(b).subtract(sRe.multiply(f)).subtract(sIm.multiply(e)));
      x.re[q][k] = tidy(sRe.multiply(a).add(sIm.multiply(b)).add(c.multiply(e)));
      x.im[q][k] = tidy(sRe.multiply(b).subtract(sIm.multiply(a)).add(c.multiply(f)));
    }
  }
}
