package blochbound.linalg;

import blochbound.check.Check;

/**
 * A matrix that is exactly Hermitian in its stored entries: observables, states and witnesses.
 *
 * @param matrix the square matrix, equal to its own adjoint to the last bit
 */
public record Hermitian(ComplexMatrix matrix) {
  /** Checks that the matrix equals its adjoint. */
  public Hermitian {
    Check.that(matrix.rows() == matrix.columns(), "a Hermitian matrix is square");
    for (int i = 0; i < matrix.rows(); i++) {
      for (int j = i; j < matrix.rows(); j++) {
        Check.that(
            matrix.re(i, j) == matrix.re(j, i) && matrix.im(i, j) == -matrix.im(j, i),
            "matrix differs from its adjoint");
      }
    }
  }

  /** The Hermitian part (M + M^+)/2 of a square matrix; each entry is rounded once. */
  public static Hermitian part(ComplexMatrix matrix) {
    int n = matrix.rows();
    double[] re = new double[n * n];
    double[] im = new double[n * n];
    for (int i = 0; i < n; i++) {
      for (int j = i; j < n; j++) {
        double real = 0.5 * matrix.re(i, j) + 0.5 * matrix.re(j, i);
        double imaginary = i == j ? 0 : 0.5 * matrix.im(i, j) - 0.5 * matrix.im(j, i);
        re[i * n + j] = real;
        re[j * n + i] = real;
        im[i * n + j] = imaginary;
        im[j * n + i] = -imaginary;
      }
    }
    return new Hermitian(ComplexMatrix.of(n, n, re, im));
  }

  /** Unit matrix of {@code size} rows. */
  public static Hermitian identity(int size) {
    return new Hermitian(ComplexMatrix.identity(size));
  }

  /** Number of rows. */
  public int size() {
    return matrix.rows();
  }

  /** Real part of an entry. */
  public double re(int row, int column) {
    return matrix.re(row, column);
  }

  /** Imaginary part of an entry. */
  public double im(int row, int column) {
    return matrix.im(row, column);
  }

  /** Trace. */
  public double trace() {
    return matrix.traceRe();
  }

  /** The real number tr(this * other). */
  public double inner(Hermitian other) {
    return matrix.traceOfProduct(other.matrix);
  }

  /** The combination a * this + b * other with real factors. */
  public Hermitian combine(double a, Hermitian other, double b) {
    return new Hermitian(matrix.combine(a, other.matrix, b));
  }

  /** Real multiple. */
  public Hermitian scale(double factor) {
    return new Hermitian(matrix.scale(factor));
  }

  /** This matrix plus a multiple of the unit matrix. */
  public Hermitian shift(double multiple) {
    return combine(1, identity(size()), multiple);
  }

  /** Eigenvalues in ascending order and orthonormal eigenvectors, to rounding. */
  public HermitianEigen eigen() {
    return HermitianEigen.of(this);
  }
}
