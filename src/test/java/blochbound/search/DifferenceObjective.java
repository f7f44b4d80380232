package blochbound.search;

import java.util.function.ToDoubleFunction;

/** A function with gradients by central differences. */
record DifferenceObjective(ToDoubleFunction<double[]> function, double step) implements Objective {
  @Override
  public double value(double[] z) {
    return function.applyAsDouble(z);
  }

  @Override
  public double value(double[] z, double[] gradientOut) {
    for (int j = 0; j < gradientOut.length; j++) {
      double[] up = z.clone();
      double[] down = z.clone();
      up[j] += step;
      down[j] -= step;
      gradientOut[j] =
          (function.applyAsDouble(up) - function.applyAsDouble(down)) / (up[j] - down[j]);
    }
    return value(z);
  }
}
