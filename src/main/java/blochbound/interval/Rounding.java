package blochbound.interval;

/**
 * A-priori rounding-error budgets in round-to-nearest double precision.
 *
 * <p>Source: N. J. Higham, <i>Accuracy and Stability of Numerical Algorithms</i>, 2nd ed. (2002),
 * section 3.1: every sum of products of length n, in any order, has a relative error of at most
 * gamma_n = n u / (1 - n u) with respect to the sum of the absolute values. Underflow adds at most
 * {@link #TINY} for each operation.
 */
public final class Rounding {
  /** Unit roundoff u = 2^-53 of IEEE 754 double precision. */
  public static final double UNIT = 0x1p-53;

  /** Bounds the absolute error that underflow adds to one operation (with a wide margin). */
  public static final double TINY = 0x1p-1000;

  // A sum of squares in this range has lost less than 2^-100 of itself to underflow, even for 2^30
  // entries, and nothing to overflow.
  private static final double LEAST_SAFE_SQUARE = 0x1p-940;
  private static final double MOST_SAFE_SQUARE = 0x1p1000;

  private Rounding() {}

  /** Upper bound of gamma_n = n u / (1 - n u); infinite when n u reaches one half. */
  public static double gamma(long n) {
    double nu = n * UNIT;
    return nu >= 0.5 ? Double.POSITIVE_INFINITY : Math.nextUp(nu / Math.nextDown(1 - nu));
  }

  /** Sum rounded upwards. */
  public static double addUp(double a, double b) {
    return Math.nextUp(a + b);
  }

  /** Sum rounded downwards. */
  public static double addDown(double a, double b) {
    return Math.nextDown(a + b);
  }

  /** Product rounded upwards; zero stays zero when a factor is zero. */
  public static double timesUp(double a, double b) {
    return a == 0 || b == 0 ? 0 : Math.nextUp(a * b);
  }

  /** Product rounded downwards; zero stays zero when a factor is zero. */
  public static double timesDown(double a, double b) {
    return a == 0 || b == 0 ? 0 : Math.nextDown(a * b);
  }

  /** Quotient rounded upwards. */
  public static double divideUp(double a, double b) {
    return a == 0 && b != 0 ? 0 : Math.nextUp(a / b);
  }

  /** Square root of a number that is not negative, rounded upwards. */
  public static double sqrtUp(double a) {
    return a == 0 ? 0 : Math.nextUp(Math.sqrt(a));
  }

  /** Upper bound of the Euclidean norm of a vector. */
  public static double normUp(double[] vector) {
    return normUp(vector, 0, vector.length);
  }

  /** Upper bound of the Euclidean norm of {@code length} entries from {@code offset} on. */
  public static double normUp(double[] vector, int offset, int length) {
    double sum = 0;
    for (int i = offset; i < offset + length; i++) {
      sum += vector[i] * vector[i];
    }
    if (sum >= LEAST_SAFE_SQUARE && sum <= MOST_SAFE_SQUARE) {
      return inflate(Math.sqrt(inflate(sum, length + 2)), 2) + length * TINY;
    }
    return scaledNormUp(vector, offset, length);
  }

  /** The same for vectors whose squares may underflow or overflow. */
  private static double scaledNormUp(double[] vector, int offset, int length) {
    double most = 0;
    for (int i = offset; i < offset + length; i++) {
      most = Math.max(most, Math.abs(vector[i]));
    }
    if (most == 0 || !(most < Double.POSITIVE_INFINITY)) {
      return most;
    }
    // Largest entry between 1 and 2; what underflows here is smaller than 2^-1000 of it.
    int exponent = Math.getExponent(most);
    double sum = 0;
    for (int i = offset; i < offset + length; i++) {
      double scaled = Math.scalb(vector[i], -exponent);
      sum += scaled * scaled;
    }
    double norm = inflate(Math.sqrt(inflate(sum, length + 2)), 2) + length * TINY;
    return Math.nextUp(Math.scalb(norm, exponent));
  }

  /**
   * Enlarges a sum of non-negative terms, computed with {@code operations} roundings, to a bound.
   */
  public static double inflate(double value, long operations) {
    return Math.nextUp(value * (1 + 2 * gamma(operations + 2)));
  }
}
