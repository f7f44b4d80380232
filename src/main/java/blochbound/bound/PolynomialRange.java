package blochbound.bound;

import blochbound.generator.MultiIndexTable;
import blochbound.interval.Rounding;
import java.util.Arrays;

/**
 * Certified lower bound of a polynomial over the cube [-1, 1]^m.
 *
 * <p>A variable whose derivative keeps its sign over the cube is fixed at its vertex, exactly, and
 * the polynomial is reduced; this repeats until no variable is left to fix. Of the rest, linear and
 * square terms are minimised variable by variable, all other terms count with their absolute value
 * (method section 4, range of phi). Workspace for one thread.
 */
final class PolynomialRange {
  private final int m;
  private final double[] gradient;
  private final double[] square;
  private final double[] swing;
  private final double[] vertex;
  private final boolean[] sure;
  private final double[] minimiser;
  private final double[] loss;
  private double[] reduced = {};
  private double certifiedMinimum;

  PolynomialRange(int variables) {
    m = variables;
    gradient = new double[m];
    square = new double[m];
    swing = new double[m];
    vertex = new double[m];
    sure = new boolean[m];
    minimiser = new double[m];
    loss = new double[m];
  }

  /**
   * Bounds the polynomial sum of c_a x^a over the first {@code count} multi-indices from below.
   *
   * @param c coefficients
   * @param table multi-indices
   * @param count number of coefficients in use
   */
  void minimise(double[] c, MultiIndexTable table, int count) {
    if (reduced.length < count) {
      reduced = new double[count];
    }
    Arrays.fill(sure, false);
    boolean more = true;
    while (more) {
      reduce(c, table, count);
      more = fixSureVariables();
    }
    certifiedMinimum = sumUp(c, count, table);
  }

  /** Sets fixed variables to their vertices and collects what is left by multi-index. */
  private void reduce(double[] c, MultiIndexTable table, int count) {
    Arrays.fill(reduced, 0, count, 0);
    for (int a = 0; a < count; a++) {
      if (c[a] == 0) {
        continue;
      }
      int index = 0;
      double value = c[a];
      for (int variable : table.factors(a)) {
        if (sure[variable]) {
          value *= vertex[variable];
        } else {
          index = table.plus(index, variable);
        }
      }
      reduced[index] += value;
    }
    System.arraycopy(reduced, 1, gradient, 0, Math.min(m, count - 1));
    Arrays.fill(square, 0);
    Arrays.fill(swing, 0);
    for (int a = m + 1; a < count; a++) {
      if (reduced[a] != 0) {
        note(table.factors(a), reduced[a]);
      }
    }
  }

  private void note(int[] factors, double value) {
    if (factors.length == 2 && factors[0] == factors[1]) {
      square[factors[0]] += value;
      return;
    }
    for (int variable : factors) {
      swing[variable] += Math.abs(value);
    }
  }

  private boolean fixSureVariables() {
    boolean found = false;
    for (int i = 0; i < m; i++) {
      if (!sure[i] && Math.abs(gradient[i]) > (2 * Math.abs(square[i]) + swing[i]) * (1 + 1e-9)) {
        sure[i] = true;
        vertex[i] = gradient[i] > 0 ? -1 : 1;
        found = true;
      }
    }
    return found;
  }

  /** Minimum of the separable part less the absolute values of all other terms. */
  private double sumUp(double[] c, int count, MultiIndexTable table) {
    double value = reduced[0];
    double size = 0;
    for (int i = 0; i < m; i++) {
      loss[i] = 0;
      if (sure[i]) {
        minimiser[i] = vertex[i];
      } else {
        value += parabola(i);
        loss[i] = swing[i] + 0.1 * Math.abs(square[i]);
      }
    }
    for (int a = 0; a < count; a++) {
      size += Math.abs(c[a]);
      int[] factors = table.factors(a);
      boolean separable = factors.length < 2 || (factors.length == 2 && factors[0] == factors[1]);
      value -= separable ? 0 : Math.abs(reduced[a]);
    }
    // Reduction, sums and a derivative whose sign rounding got wrong each cost at most a few times
    // gamma_count of the sum of all sizes.
    double rounding = Rounding.gamma(16L * count + 16L * m + 16);
    return Rounding.addDown(value, -Rounding.timesUp(rounding, 2 * size));
  }

  /** Minimum of g x + q x^2 over [-1, 1]. */
  private double parabola(int i) {
    double g = gradient[i];
    double q = square[i];
    if (q > 0 && Math.abs(g) < 2 * q) {
      minimiser[i] = -g / (2 * q);
      return -g * g / (4 * q);
    }
    minimiser[i] = g > 0 ? -1 : 1;
    return q - Math.abs(g);
  }

  /** The bound found last: the polynomial is nowhere smaller. */
  double certifiedMinimum() {
    return certifiedMinimum;
  }

  /** Where the minimum is expected; not a copy. */
  double[] minimiser() {
    return minimiser;
  }

  /**
   * By how much each variable's unresolved terms may lower the bound: an estimate for splitting.
   */
  double loss(int variable) {
    return loss[variable];
  }
}
