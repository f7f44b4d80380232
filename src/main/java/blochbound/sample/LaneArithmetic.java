package blochbound.sample;

/**
 * Sums of products of lanes, four products in a loop body over separate arrays at the same index:
 * the shape that the compiler turns into vector instructions.
 */
final class LaneArithmetic {
  /**
   * Number of lanes: the length of every array of lanes.
   *
   * <p>A constant, not a field: only with a known trip count does the compiler unroll these loops
   * to full vectors. Measured beside 64 and 256 lanes, see notes/benchmarks-sampling.md.
   */
  static final int LANES = 128;

  private final double[][] left;
  private final double[][] right;
  private int count;

  /** Workspace for sums of up to {@code most} products. */
  LaneArithmetic(int most) {
    left = new double[most][];
    right = new double[most][];
  }

  /** Starts a new sum. */
  void clear() {
    count = 0;
  }

  /** Puts a product into the sum. */
  void add(double[] a, double[] b) {
    left[count] = a;
    right[count++] = b;
  }

  /** Writes {@code source} plus all products to {@code target}, which may be the source itself. */
  void sumInto(double[] target, double[] source) {
    if (target != source) {
      System.arraycopy(source, 0, target, 0, LANES);
    }
    int k = 0;
    for (; k + 3 < count; k += 4) {
      addFour(target, k);
    }
    for (; k < count; k++) {
      addProduct(target, left[k], right[k]);
    }
  }

  private void addFour(double[] target, int k) {
    double[] a0 = left[k];
    double[] a1 = left[k + 1];
    double[] a2 = left[k + 2];
    double[] a3 = left[k + 3];
    double[] b0 = right[k];
    double[] b1 = right[k + 1];
    double[] b2 = right[k + 2];
    double[] b3 = right[k + 3];
    // In place: with one more array for the source the body is too large to be unrolled enough.
    for (int l = 0; l < LANES; l++) {
      target[l] += (a0[l] * b0[l] + a1[l] * b1[l]) + (a2[l] * b2[l] + a3[l] * b3[l]);
    }
  }

  /** Adds the product of two arrays of lanes. */
  static void addProduct(double[] target, double[] a, double[] b) {
    for (int l = 0; l < LANES; l++) {
      target[l] += a[l] * b[l];
    }
  }

  /** Adds a multiple of an array of lanes. */
  static void addMultiple(double[] target, double[] a, double factor) {
    for (int l = 0; l < LANES; l++) {
      target[l] += factor * a[l];
    }
  }

  /** Multiplies by an array of lanes. */
  static void multiply(double[] target, double[] factor) {
    for (int l = 0; l < LANES; l++) {
      target[l] *= factor[l];
    }
  }
}
