package blochbound.search;

import java.util.Arrays;
import java.util.function.ToDoubleFunction;

/**
 * Test functions of global optimisation on boxes, scaled to the cube [-1, 1]^m.
 *
 * <p>The formulas are recalled from memory; Dixon and Szego, Towards Global Optimisation 2 (1978),
 * Trefethen's fourth challenge problem (2002), Jamil and Yang (2013).
 */
record StandardFunction(
    String name, double[] lower, double[] upper, double minimum, ToDoubleFunction<double[]> value) {

  /** A function on a cube with equal sides. */
  static StandardFunction onCube(
      String name,
      int m,
      double lower,
      double upper,
      double minimum,
      ToDoubleFunction<double[]> f) {
    double[] low = new double[m];
    double[] high = new double[m];
    Arrays.fill(low, lower);
    Arrays.fill(high, upper);
    return new StandardFunction(name, low, high, minimum, f);
  }

  int dimension() {
    return lower.length;
  }

  double[] point(double[] z) {
    double[] x = new double[z.length];
    Arrays.setAll(x, j -> 0.5 * (lower[j] + upper[j]) + 0.5 * (upper[j] - lower[j]) * z[j]);
    return x;
  }

  /** The function over z with gradients by central differences. */
  Objective objective() {
    return new DifferenceObjective(z -> value.applyAsDouble(point(z)), 1e-6);
  }

  @Override
  public String toString() {
    return name;
  }

  static double sixHumpCamel(double[] p) {
    double x = p[0];
    double y = p[1];
    return (4 - 2.1 * x * x + Math.pow(x, 4) / 3) * x * x + x * y + 4 * (y * y - 1) * y * y;
  }

  static double branin(double[] p) {
    double bend = p[1] - 5.1 / (4 * Math.PI * Math.PI) * p[0] * p[0] + 5 / Math.PI * p[0] - 6;
    return bend * bend + 10 * (1 - 1 / (8 * Math.PI)) * Math.cos(p[0]) + 10;
  }

  static double goldsteinPrice(double[] p) {
    double x = p[0];
    double y = p[1];
    double a = 19 - 14 * x + 3 * x * x - 14 * y + 6 * x * y + 3 * y * y;
    double b = 18 - 32 * x + 12 * x * x + 48 * y - 36 * x * y + 27 * y * y;
    double s = x + y + 1;
    double d = 2 * x - 3 * y;
    return (1 + s * s * a) * (30 + d * d * b);
  }

  static double mccormick(double[] p) {
    double d = p[0] - p[1];
    return Math.sin(p[0] + p[1]) + d * d - 1.5 * p[0] + 2.5 * p[1] + 1;
  }

  private static final double[] HARTMANN_WEIGHTS = {1, 1.2, 3, 3.2};
  private static final double[][] HARTMANN_3_SCALES = {
    {3, 10, 30}, {0.1, 10, 35}, {3, 10, 30}, {0.1, 10, 35}
  };
  private static final double[][] HARTMANN_3_CENTRES = {
    {0.3689, 0.1170, 0.2673},
    {0.4699, 0.4387, 0.7470},
    {0.1091, 0.8732, 0.5547},
    {0.0381, 0.5743, 0.8828}
  };
  private static final double[][] HARTMANN_6_SCALES = {
    {10, 3, 17, 3.5, 1.7, 8},
    {0.05, 10, 17, 0.1, 8, 14},
    {3, 3.5, 1.7, 10, 17, 8},
    {17, 8, 0.05, 10, 0.1, 14}
  };
  private static final double[][] HARTMANN_6_CENTRES = {
    {0.1312, 0.1696, 0.5569, 0.0124, 0.8283, 0.5886},
    {0.2329, 0.4135, 0.8307, 0.3736, 0.1004, 0.9991},
    {0.2348, 0.1451, 0.3522, 0.2883, 0.3047, 0.6650},
    {0.4047, 0.8828, 0.8732, 0.5743, 0.1091, 0.0381}
  };

  static double hartmann3(double[] x) {
    return hartmann(x, HARTMANN_3_SCALES, HARTMANN_3_CENTRES);
  }

  static double hartmann6(double[] x) {
    return hartmann(x, HARTMANN_6_SCALES, HARTMANN_6_CENTRES);
  }

  private static double hartmann(double[] x, double[][] scales, double[][] centres) {
    double sum = 0;
    for (int i = 0; i < 4; i++) {
      double exponent = 0;
      for (int j = 0; j < x.length; j++) {
        double d = x[j] - centres[i][j];
        exponent += scales[i][j] * d * d;
      }
      sum -= HARTMANN_WEIGHTS[i] * Math.exp(-exponent);
    }
    return sum;
  }

  private static final double[][] SHEKEL_CENTRES = {
    {4, 4, 4, 4}, {1, 1, 1, 1}, {8, 8, 8, 8}, {6, 6, 6, 6}, {3, 7, 3, 7},
    {2, 9, 2, 9}, {5, 5, 3, 3}, {8, 1, 8, 1}, {6, 2, 6, 2}, {7, 3.6, 7, 3.6}
  };
  private static final double[] SHEKEL_FLOORS = {.1, .2, .2, .4, .4, .6, .3, .7, .5, .5};

  static double shekel(double[] x, int terms) {
    double sum = 0;
    for (int i = 0; i < terms; i++) {
      double square = SHEKEL_FLOORS[i];
      for (int j = 0; j < x.length; j++) {
        double d = x[j] - SHEKEL_CENTRES[i][j];
        square += d * d;
      }
      sum -= 1 / square;
    }
    return sum;
  }

  static double trid(double[] x) {
    double sum = 0;
    for (int i = 0; i < x.length; i++) {
      sum += (x[i] - 1) * (x[i] - 1) - (i > 0 ? x[i] * x[i - 1] : 0);
    }
    return sum;
  }

  static double schwefel(double[] x) {
    return Arrays.stream(x).map(t -> -t * Math.sin(Math.sqrt(Math.abs(t)))).sum();
  }

  static double styblinskiTang(double[] x) {
    return Arrays.stream(x).map(t -> 0.5 * (Math.pow(t, 4) - 16 * t * t + 5 * t)).sum();
  }

  static double michalewicz(double[] x) {
    double sum = 0;
    for (int i = 0; i < x.length; i++) {
      sum -= Math.sin(x[i]) * Math.pow(Math.sin((i + 1) * x[i] * x[i] / Math.PI), 20);
    }
    return sum;
  }

  static double easom(double[] p) {
    double a = p[0] - Math.PI;
    double b = p[1] - Math.PI;
    return -Math.cos(p[0]) * Math.cos(p[1]) * Math.exp(-a * a - b * b);
  }

  static double trefethen(double[] p) {
    double x = p[0];
    double y = p[1];
    return Math.exp(Math.sin(50 * x))
        + Math.sin(60 * Math.exp(y))
        + Math.sin(70 * Math.sin(x))
        + Math.sin(Math.sin(80 * y))
        - Math.sin(10 * (x + y))
        + (x * x + y * y) / 4;
  }
}
