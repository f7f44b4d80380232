package blochbound.search;

/** The function z'Hz/2 + g'z with a symmetric H. */
record QuadraticObjective(double[][] h, double[] g) implements Objective {
  static QuadraticObjective diagonal(double[] h, double[] g) {
    double[][] matrix = new double[h.length][h.length];
    for (int i = 0; i < h.length; i++) {
      matrix[i][i] = h[i];
    }
    return new QuadraticObjective(matrix, g);
  }

  /** The same over the ball of another radius, in coordinates of the unit ball. */
  QuadraticObjective scaled(double radius) {
    double[][] matrix = new double[g.length][g.length];
    double[] linear = new double[g.length];
    for (int i = 0; i < g.length; i++) {
      linear[i] = radius * g[i];
      for (int j = 0; j < g.length; j++) {
        matrix[i][j] = radius * radius * h[i][j];
      }
    }
    return new QuadraticObjective(matrix, linear);
  }

  @Override
  public double value(double[] z) {
    return value(z, new double[z.length]);
  }

  @Override
  public double value(double[] z, double[] gradientOut) {
    double sum = 0;
    for (int i = 0; i < g.length; i++) {
      double product = 0;
      for (int j = 0; j < g.length; j++) {
        product += h[i][j] * z[j];
      }
      sum += z[i] * (0.5 * product + g[i]);
      gradientOut[i] = product + g[i];
    }
    return sum;
  }
}
