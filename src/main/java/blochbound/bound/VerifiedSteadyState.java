package blochbound.bound;

import blochbound.generator.BlochGenerator;
import blochbound.generator.GeneratorTerm;
import blochbound.generator.RegionExpansion;
import blochbound.interval.Interval;
import blochbound.interval.Rounding;
import blochbound.linalg.LuDecomposition;
import blochbound.measure.LocatedMeasure;
import blochbound.measure.StationaryMeasure;
import java.util.Optional;

/**
 * The steady state of one device with a proved error bound.
 *
 * <p>With an approximate inverse R and an approximate solution r of A r = -b: if |1 - R A| = alpha
 * &lt; 1 then A is regular and the exact solution lies within |R| |b + A r| / (1 - alpha) of r, in
 * the Frobenius and Euclidean norms (S. M. Rump, Acta Numerica 19 (2010) 287, section 10.3). A and
 * b are the exact generator: coefficients, matrices and sums count with their error bounds.
 *
 * @param state Bloch coordinates of the whole device
 * @param distance bound of the Euclidean distance of the exact steady state from it
 */
public record VerifiedSteadyState(double[] state, double distance) {
  /**
   * The steady state at parameters in internal units that are known up to intervals; empty when it
   * is not proved unique.
   */
  public static Optional<VerifiedSteadyState> at(BlochGenerator generator, Interval[] parameters) {
    RegionExpansion expansion = RegionExpansion.at(generator, parameters);
    int n = generator.unknowns();
    double[] centre = expansion.atCentre();
    double[][] a = new double[n][n];
    double[] b = new double[n];
    generator.assemble(centre, a, b);
    LuDecomposition lu = new LuDecomposition(n);
    for (int i = 0; i < n; i++) {
      System.arraycopy(a[i], 0, lu.rows()[i], 0, n);
    }
    lu.factor();
    if (!lu.isRegular()) {
      return Optional.empty();
    }
    double[][] inverse = lu.inverse();
    double[] state = solution(lu, b, generator.basis().levels());
    double generatorNorm = 0;
    double generatorError = 0;
    for (int j = 0; j < centre.length; j++) {
      GeneratorTerm term = generator.terms().get(j);
      double norm = term.matrix().frobeniusUp();
      double rest = expansion.coefficient(j).remainder();
      generatorNorm += Math.abs(centre[j]) * norm;
      generatorError += Math.abs(centre[j]) * term.radius() + rest * (norm + term.radius());
    }
    generatorNorm = Rounding.inflate(generatorNorm, 4L * centre.length);
    generatorError =
        Rounding.inflate(
            generatorError + Rounding.gamma(centre.length + 4L) * generatorNorm,
            8L * centre.length);
    double inverseNorm = frobeniusUp(inverse);
    double alpha = defectUp(inverse, a, generatorError, inverseNorm);
    if (!(alpha < 1)) {
      return Optional.empty();
    }
    double residual = residualUp(a, b, state, generatorNorm, generatorError);
    double distance =
        Rounding.divideUp(Rounding.timesUp(inverseNorm, residual), Rounding.addDown(1, -alpha));
    return Double.isFinite(distance)
        ? Optional.of(new VerifiedSteadyState(state, Rounding.addUp(distance, 2 * Rounding.UNIT)))
        : Optional.empty();
  }

  private static double[] solution(LuDecomposition lu, double[] b, int levels) {
    double[] minus = new double[b.length];
    for (int i = 0; i < b.length; i++) {
      minus[i] = -b[i];
    }
    double[] r = new double[b.length];
    lu.solve(minus, r);
    double[] state = new double[b.length + 1];
    state[0] = 1 / Math.sqrt(levels);
    System.arraycopy(r, 0, state, 1, r.length);
    return state;
  }

  /** Bound of |1 - R A| for the exact A. */
  private static double defectUp(
      double[][] inverse, double[][] a, double generatorError, double inverseNorm) {
    int n = a.length;
    double sum = 0;
    double[] row = new double[n];
    for (int i = 0; i < n; i++) {
      java.util.Arrays.fill(row, 0);
      for (int k = 0; k < n; k++) {
        double factor = inverse[i][k];
        double[] from = a[k];
        for (int j = 0; j < n; j++) {
          row[j] += factor * from[j];
        }
      }
      row[i] -= 1;
      for (int j = 0; j < n; j++) {
        sum += row[j] * row[j];
      }
    }
    double computed = Rounding.inflate(Math.sqrt(Rounding.inflate(sum, (long) n * n + 4)), 4);
    double rounding = Rounding.gamma(n + 4L) * (inverseNorm * frobeniusUp(a) + Math.sqrt(n));
    return Rounding.inflate(computed + rounding + inverseNorm * generatorError, 8);
  }

  /** Bound of |b + A r| for the exact A and b. */
  private static double residualUp(
      double[][] a, double[] b, double[] state, double generatorNorm, double generatorError) {
    int n = a.length;
    double sum = 0;
    for (int i = 0; i < n; i++) {
      double entry = b[i];
      for (int j = 0; j < n; j++) {
        entry += a[i][j] * state[j + 1];
      }
      sum += entry * entry;
    }
    double length = Rounding.normUp(state);
    double rounding = Rounding.gamma(n + 8L) * generatorNorm * length;
    return Rounding.inflate(
        Math.sqrt(Rounding.inflate(sum, n + 4L)) + rounding + generatorError * length, 8);
  }

  private static double frobeniusUp(double[][] matrix) {
    double sum = 0;
    for (double[] row : matrix) {
      double norm = Rounding.normUp(row);
      sum += norm * norm;
    }
    return Rounding.inflate(Math.sqrt(Rounding.inflate(sum, 3L * matrix.length)), 4);
  }

  /**
   * Certified enclosure of a measure at this device.
   *
   * @param reducer a workspace for the same generator and measure
   */
  public Interval enclosure(
      LocatedMeasure located, StationaryMeasure reducer, BlochGenerator generator) {
    // Tracing out levels stretches the Frobenius norm by at most the root of their number.
    double stretch =
        Rounding.inflate(Math.sqrt(generator.basis().tracedLevels(located.sites())), 2);
    double transform = 2 * generator.basis().transformError() * Rounding.normUp(state);
    double reduced = Rounding.inflate(stretch * (distance + transform + 8 * Rounding.UNIT), 8);
    return located.measure().enclosure(reducer.reduced(state), reduced);
  }
}
