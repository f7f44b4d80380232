package blochbound.search;

/**
 * A point with its value and gradient; the arrays are shared, not copied, and never changed.
 *
 * <p>A class and not a record, since arrays would break its equality.
 */
final class Iterate {
  private final double[] x;
  private final double value;
  private final double[] gradient;

  private Iterate(double[] x, double value, double[] gradient) {
    this.x = x;
    this.value = value;
    this.gradient = gradient;
  }

  /** Evaluates the objective at a point of the ball. */
  static Iterate at(Evaluator evaluator, double[] x) {
    double[] gradient = new double[x.length];
    double value = evaluator.value(x, gradient);
    return new Iterate(x, value, gradient);
  }

  double[] x() {
    return x;
  }

  double value() {
    return value;
  }

  double[] gradient() {
    return gradient;
  }

  /** The vector x - step * gradient. */
  double[] descended(double step) {
    double[] y = new double[x.length];
    for (int j = 0; j < y.length; j++) {
      y[j] = x[j] - step * gradient[j];
    }
    return y;
  }

  /** Largest size of the entries of a vector. */
  static double largest(double[] v) {
    double largest = 0;
    for (double entry : v) {
      largest = Math.max(largest, Math.abs(entry));
    }
    return largest;
  }

  /** Inner product. */
  static double inner(double[] a, double[] b) {
    double sum = 0;
    for (int j = 0; j < a.length; j++) {
      sum += a[j] * b[j];
    }
    return sum;
  }

  /** The vector a - b. */
  static double[] difference(double[] a, double[] b) {
    double[] d = new double[a.length];
    for (int j = 0; j < d.length; j++) {
      d[j] = a[j] - b[j];
    }
    return d;
  }
}
