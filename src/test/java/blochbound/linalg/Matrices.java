package blochbound.linalg;

import java.util.SplittableRandom;

/** Random matrices for tests. */
public final class Matrices {
  private Matrices() {}

  /** Complex matrix with entries of the size 2^exponent, a quarter of them zero. */
  public static ComplexMatrix random(SplittableRandom random, int rows, int columns, int exponent) {
    double[] re = new double[rows * columns];
    double[] im = new double[rows * columns];
    for (int k = 0; k < re.length; k++) {
      re[k] = random.nextInt(4) == 0 ? 0 : Math.scalb(random.nextDouble(-1, 1), exponent);
      im[k] = random.nextInt(4) == 0 ? 0 : Math.scalb(random.nextDouble(-1, 1), exponent);
    }
    return ComplexMatrix.of(rows, columns, re, im);
  }

  /** Hermitian matrix with entries of the size 2^exponent. */
  public static Hermitian hermitian(SplittableRandom random, int size, int exponent) {
    return Hermitian.part(random(random, size, size, exponent));
  }

  /** Ball with entries of the size 2^exponent, exact in one of three cases. */
  public static ComplexBall ball(SplittableRandom random, int rows, int columns, int exponent) {
    double radius =
        random.nextInt(3) == 0 ? 0 : Math.scalb(random.nextDouble(), exponent - random.nextInt(60));
    return new ComplexBall(random(random, rows, columns, exponent), radius);
  }
}
