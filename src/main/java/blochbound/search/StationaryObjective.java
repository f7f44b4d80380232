package blochbound.search;

import blochbound.measure.StationaryMeasure;

/**
 * A steady-state measure times the sign of its requirement.
 *
 * @param measure the measure with its workspace
 * @param sign 1 when small values are bad, -1 when large ones are
 */
record StationaryObjective(StationaryMeasure measure, int sign) implements Objective {
  @Override
  public double value(double[] z) {
    return sign * measure.value(z);
  }

  @Override
  public double value(double[] z, double[] gradientOut) {
    double value = sign * measure.value(z, gradientOut);
    for (int j = 0; j < gradientOut.length; j++) {
      gradientOut[j] *= sign;
    }
    return value;
  }
}
