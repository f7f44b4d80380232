package blochbound.linalg;

import blochbound.BigReference;
import java.math.BigDecimal;
import java.math.RoundingMode;
import java.util.SplittableRandom;

/** Exact complex matrices of decimals: the reference for everything with an error bound. */
public final class BigMatrix {
  private final BigDecimal[][] re;
  private final BigDecimal[][] im;

  private BigMatrix(int rows, int columns) {
    re = new BigDecimal[rows][columns];
    im = new BigDecimal[rows][columns];
    for (int i = 0; i < rows; i++) {
      for (int j = 0; j < columns; j++) {
        re[i][j] = BigDecimal.ZERO;
        im[i][j] = BigDecimal.ZERO;
      }
    }
  }

  /** The same entries, exactly. */
  public static BigMatrix of(ComplexMatrix matrix) {
    BigMatrix out = new BigMatrix(matrix.rows(), matrix.columns());
    for (int i = 0; i < matrix.rows(); i++) {
      for (int j = 0; j < matrix.columns(); j++) {
        out.re[i][j] = new BigDecimal(matrix.re(i, j));
        out.im[i][j] = new BigDecimal(matrix.im(i, j));
      }
    }
    return out;
  }

  /** A member of a ball: somewhere inside or (nearly) on its rim. */
  public static BigMatrix memberOf(ComplexBall ball, SplittableRandom random) {
    ComplexMatrix direction =
        Matrices.random(random, ball.centre().rows(), ball.centre().columns(), 0);
    BigMatrix step = of(direction);
    BigDecimal size = step.squaredNorm().sqrt(BigReference.DIGITS);
    if (ball.radius() == 0 || size.signum() == 0) {
      return of(ball.centre());
    }
    double share = random.nextInt(3) == 0 ? random.nextDouble() : 1;
    BigDecimal factor =
        new BigDecimal(ball.radius() * share)
            .divide(size, BigReference.DIGITS)
            .multiply(BigDecimal.ONE.subtract(BigDecimal.ONE.movePointLeft(60)));
    return of(ball.centre()).plus(step.times(factor));
  }

  private int rows() {
    return re.length;
  }

  private int columns() {
    return re[0].length;
  }

  /** Sum. */
  public BigMatrix plus(BigMatrix other) {
    BigMatrix out = new BigMatrix(rows(), columns());
    for (int i = 0; i < rows(); i++) {
      for (int j = 0; j < columns(); j++) {
        out.re[i][j] = re[i][j].add(other.re[i][j]);
        out.im[i][j] = im[i][j].add(other.im[i][j]);
      }
    }
    return out;
  }

  /** Real multiple. */
  public BigMatrix times(BigDecimal factor) {
    BigMatrix out = new BigMatrix(rows(), columns());
    for (int i = 0; i < rows(); i++) {
      for (int j = 0; j < columns(); j++) {
        out.re[i][j] = re[i][j].multiply(factor);
        out.im[i][j] = im[i][j].multiply(factor);
      }
    }
    return out;
  }

  /** Multiple with the imaginary unit. */
  public BigMatrix timesI() {
    BigMatrix out = new BigMatrix(rows(), columns());
    for (int i = 0; i < rows(); i++) {
      for (int j = 0; j < columns(); j++) {
        out.re[i][j] = im[i][j].negate();
        out.im[i][j] = re[i][j];
      }
    }
    return out;
  }

  /** Matrix product. */
  public BigMatrix times(BigMatrix other) {
    BigMatrix out = new BigMatrix(rows(), other.columns());
    for (int i = 0; i < rows(); i++) {
      for (int j = 0; j < other.columns(); j++) {
        for (int k = 0; k < columns(); k++) {
          out.addProduct(i, j, this, i, k, other, k, j);
        }
      }
    }
    return out;
  }

  private void addProduct(int i, int j, BigMatrix a, int ai, int aj, BigMatrix b, int bi, int bj) {
    re[i][j] =
        re[i][j]
            .add(a.re[ai][aj].multiply(b.re[bi][bj]))
            .subtract(a.im[ai][aj].multiply(b.im[bi][bj]));
    im[i][j] =
        im[i][j].add(a.re[ai][aj].multiply(b.im[bi][bj])).add(a.im[ai][aj].multiply(b.re[bi][bj]));
  }

  /** Kronecker product. */
  public BigMatrix kron(BigMatrix other) {
    BigMatrix out = new BigMatrix(rows() * other.rows(), columns() * other.columns());
    for (int i = 0; i < out.rows(); i++) {
      for (int j = 0; j < out.columns(); j++) {
        out.addProduct(
            i,
            j,
            this,
            i / other.rows(),
            j / other.columns(),
            other,
            i % other.rows(),
            j % other.columns());
      }
    }
    return out;
  }

  /** Conjugate transpose. */
  public BigMatrix adjoint() {
    int height = columns();
    int width = rows();
    BigMatrix out = new BigMatrix(height, width);
    for (int i = 0; i < rows(); i++) {
      for (int j = 0; j < columns(); j++) {
        out.re[j][i] = re[i][j];
        out.im[j][i] = im[i][j].negate();
      }
    }
    return out;
  }

  /** Square of the Frobenius norm. */
  public BigDecimal squaredNorm() {
    BigDecimal sum = BigDecimal.ZERO;
    for (int i = 0; i < rows(); i++) {
      for (int j = 0; j < columns(); j++) {
        sum = sum.add(re[i][j].pow(2)).add(im[i][j].pow(2));
      }
    }
    return sum;
  }

  /** Tells whether the matrix lies in a ball. */
  public boolean isIn(ComplexBall ball) {
    BigDecimal distance = plus(of(ball.centre()).times(BigDecimal.valueOf(-1))).squaredNorm();
    return distance.compareTo(new BigDecimal(ball.radius()).pow(2)) <= 0;
  }

  /**
   * Number of eigenvalues below {@code shift} of a Hermitian matrix: the negative pivots of its
   * elimination, by Sylvester's law of inertia.
   */
  public int eigenvaluesBelow(BigDecimal shift) {
    int n = rows();
    BigMatrix a = new BigMatrix(n, n);
    for (int i = 0; i < n; i++) {
      for (int j = 0; j < n; j++) {
        a.re[i][j] = i == j ? re[i][j].subtract(shift) : re[i][j];
        a.im[i][j] = im[i][j];
      }
    }
    int negative = 0;
    for (int k = 0; k < n; k++) {
      BigDecimal pivot = a.re[k][k];
      if (pivot.signum() == 0) {
        throw new ArithmeticException("a pivot is zero; choose another shift");
      }
      negative += pivot.signum() < 0 ? 1 : 0;
      for (int i = k + 1; i < n; i++) {
        a.eliminate(i, k, pivot);
      }
    }
    return negative;
  }

  private void eliminate(int i, int k, BigDecimal pivot) {
    BigDecimal factorRe = re[i][k].divide(pivot, BigReference.DIGITS);
    BigDecimal factorIm = im[i][k].divide(pivot, BigReference.DIGITS);
    for (int j = k + 1; j < columns(); j++) {
      BigDecimal productRe = factorRe.multiply(re[k][j]).subtract(factorIm.multiply(im[k][j]));
      BigDecimal productIm = factorRe.multiply(im[k][j]).add(factorIm.multiply(re[k][j]));
      re[i][j] = re[i][j].subtract(productRe).round(BigReference.DIGITS);
      im[i][j] = im[i][j].subtract(productIm).round(BigReference.DIGITS);
    }
  }

  @Override
  public String toString() {
    StringBuilder text = new StringBuilder();
    for (int i = 0; i < rows(); i++) {
      for (int j = 0; j < columns(); j++) {
        text.append(re[i][j].setScale(20, RoundingMode.HALF_EVEN))
            .append("+i*")
            .append(im[i][j].setScale(20, RoundingMode.HALF_EVEN))
            .append(' ');
      }
      text.append('\n');
    }
    return text.toString();
  }
}
