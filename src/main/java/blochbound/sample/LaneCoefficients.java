package blochbound.sample;

import static blochbound.sample.LaneArithmetic.LANES;

import blochbound.generator.BlochGenerator;
import blochbound.generator.GeneratorTerm;
import blochbound.model.Atom;
import blochbound.model.Atom.ParameterAtom;
import blochbound.model.ParameterSpace;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;

/**
 * Coefficients mu_j(p) of a generator for many devices at once, one array of lanes for each
 * coefficient: rounded, by the same operations in the same order as {@link
 * ParameterSpace#parametersAt} and {@link BlochGenerator#coefficients}.
 */
final class LaneCoefficients {
  private record Factor(double[] base, int exponent) {}

  private final ParameterSpace space;
  private final double[][] parameters;
  private final double[][] slope;
  private final double[] one;
  private final Map<Atom, double[]> functions = new LinkedHashMap<>();
  private final List<List<Factor>> factors = new ArrayList<>();
  private final double[][] values;

  LaneCoefficients(BlochGenerator generator) {
    this.space = generator.space();
    parameters = new double[space.parameters().size()][LANES];
    int m = space.coordinates();
    slope = new double[m][m];
    for (int i = 0; i < m; i++) {
      for (int j = 0; j < m; j++) {
        slope[i][j] = space.slope(i, j).middle();
      }
    }
    for (GeneratorTerm term : generator.terms()) {
      List<Factor> list = new ArrayList<>();
      term.monomial().powers().forEach((atom, e) -> list.add(new Factor(lanesOf(atom), e)));
      factors.add(list);
    }
    one = new double[LANES];
    Arrays.fill(one, 1);
    values = new double[factors.size()][];
    for (int t = 0; t < values.length; t++) {
      values[t] = factors.get(t).isEmpty() ? one : new double[LANES];
    }
  }

  private double[] lanesOf(Atom atom) {
    return atom instanceof ParameterAtom p
        ? parameters[p.index()]
        : functions.computeIfAbsent(atom, a -> new double[LANES]);
  }

  /** Lanes of each coefficient for the devices set last; not a copy. */
  double[][] values() {
    return values;
  }

  /** Evaluates all coefficients at devices z; lanes without a device repeat the last one. */
  void set(List<double[]> devices) {
    for (int i = 0; i < parameters.length; i++) {
      Arrays.fill(parameters[i], space.centre(i).middle());
    }
    double[] z = new double[LANES];
    for (int j = 0; j < slope.length; j++) {
      for (int l = 0; l < LANES; l++) {
        z[l] = devices.get(Math.min(l, devices.size() - 1))[j];
      }
      for (int i = 0; i < slope.length; i++) {
        if (slope[i][j] != 0) {
          LaneArithmetic.addMultiple(parameters[space.parameterOf(i)], z, slope[i][j]);
        }
      }
    }
    evaluateFunctions();
    for (int t = 0; t < values.length; t++) {
      if (values[t] != one) {
        multiply(factors.get(t), values[t]);
      }
    }
  }

  private void evaluateFunctions() {
    double[] p = new double[parameters.length];
    for (Map.Entry<Atom, double[]> e : functions.entrySet()) {
      for (int l = 0; l < LANES; l++) {
        for (int i = 0; i < p.length; i++) {
          p[i] = parameters[i][l];
        }
        e.getValue()[l] = e.getKey().value(p);
      }
    }
  }

  private static void multiply(List<Factor> factors, double[] product) {
    Arrays.fill(product, 1);
    for (Factor factor : factors) {
      if (factor.exponent == 1) {
        LaneArithmetic.multiply(product, factor.base);
        continue;
      }
      for (int l = 0; l < LANES; l++) {
        product[l] *= Math.pow(factor.base[l], factor.exponent);
      }
    }
  }
}
