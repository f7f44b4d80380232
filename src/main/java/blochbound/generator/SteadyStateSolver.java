package blochbound.generator;

import blochbound.interval.Rounding;
import blochbound.linalg.LuDecomposition;
import java.util.Arrays;

/**
 * Steady states at single points of the parameter space, with adjoints for gradients; reusable
 * workspace, not for use by several threads at once.
 *
 * <p>Where A(p) is singular to rounding there is more than one stationary state; {@link
 * #longTimeAverage} then gives the one that an initial state tends to.
 */
public final class SteadyStateSolver {
  /** Relative pivot below which the stationary state counts as not unique to rounding. */
  public static final double SINGULAR_PIVOT = 1e-14;

  private final BlochGenerator generator;
  private final LuDecomposition lu;
  private final double[] right;
  private final double[] solution;
  private final double[] scratch;
  private final double[] state;
  private double[] coefficients = {};

  /** Workspace for one generator. */
  public SteadyStateSolver(BlochGenerator generator) {
    this.generator = generator;
    int n = generator.unknowns();
    lu = new LuDecomposition(n);
    right = new double[n];
    solution = new double[n];
    scratch = new double[n];
    state = new double[n + 1];
  }

  /**
   * Solves A(p) r = -b(p) at parameters in internal units.
   *
   * @return whether the solution is unique to rounding; only then {@link #state} is valid
   */
  public boolean solve(double[] parameters) {
    coefficients = generator.coefficients(parameters);
    generator.assemble(coefficients, lu.rows(), right);
    lu.factor();
    if (lu.smallestRelativePivot() < SINGULAR_PIVOT) {
      return false;
    }
    for (int i = 0; i < right.length; i++) {
      right[i] = -right[i];
    }
    lu.solve(right, solution);
    refine();
    state[0] = 1 / Math.sqrt(generator.basis().levels());
    System.arraycopy(solution, 0, state, 1, solution.length);
    return true;
  }

  /** One step of iterative refinement: a residual from the sparse terms corrects the solution. */
  private void refine() {
    double[] residual = residual(solution);
    lu.solve(residual, scratch);
    for (int i = 0; i < solution.length; i++) {
      solution[i] += scratch[i];
    }
  }

  /** The vector -b - A r. */
  private double[] residual(double[] r) {
    double[] whole = new double[r.length + 1];
    whole[0] = 1 / Math.sqrt(generator.basis().levels());
    System.arraycopy(r, 0, whole, 1, r.length);
    double[] sum = derivative(whole);
    double[] residual = new double[r.length];
    for (int i = 0; i < residual.length; i++) {
      residual[i] = -sum[i + 1];
    }
    return residual;
  }

  /** The vector L(p) r for the point solved last. */
  private double[] derivative(double[] r) {
    double[] sum = new double[r.length];
    double[] part = new double[r.length];
    for (int j = 0; j < coefficients.length; j++) {
      generator.terms().get(j).matrix().times(r, part);
      for (int i = 0; i < sum.length; i++) {
        sum[i] += coefficients[j] * part[i];
      }
    }
    return sum;
  }

  /** Bloch coordinates of the steady state solved last, not a copy; r_0 = 1/sqrt(N) comes first. */
  public double[] state() {
    return state;
  }

  /**
   * Euclidean norm of L r for the steady state solved last, divided by that of the rates: estimate.
   */
  public double relativeResidual() {
    double[] residual = derivative(state);
    double size = 0;
    for (int j = 0; j < coefficients.length; j++) {
      size += Math.abs(coefficients[j]) * generator.terms().get(j).matrix().frobeniusUp();
    }
    return size == 0 ? 0 : Rounding.normUp(residual) / size;
  }

  /**
   * Derivatives of tr(W rho) with respect to all coefficients mu_j at the point solved last, by one
   * adjoint solve: d tr(W rho)/d mu_j = y' M_j r with A' y = -w.
   *
   * @param witness Bloch coordinates of W
   */
  public double[] sensitivities(double[] witness) {
    int n = generator.unknowns();
    double[] minus = new double[n];
    for (int i = 0; i < n; i++) {
      minus[i] = -witness[i + 1];
    }
    double[] y = new double[n];
    lu.solveTransposed(minus, y, scratch);
    double[] part = new double[n + 1];
    double[] sensitivity = new double[coefficients.length];
    for (int j = 0; j < sensitivity.length; j++) {
      generator.terms().get(j).matrix().times(state, part);
      double sum = 0;
      for (int i = 0; i < n; i++) {
        sum += y[i] * part[i + 1];
      }
      sensitivity[j] = sum;
    }
    return sensitivity;
  }

  /**
   * The stationary state that an initial state tends to on average, for generators with several: s
   * (s - L)^-1 r for a small s, an estimate.
   *
   * @param parameters parameters in internal units
   * @param initial Bloch coordinates of the initial state
   * @return coordinates of a state that is stationary up to about 1e-9 of the fastest rate
   */
  public double[] longTimeAverage(double[] parameters, double[] initial) {
    coefficients = generator.coefficients(parameters);
    generator.assemble(coefficients, lu.rows(), right);
    double scale = 0;
    for (double[] row : lu.rows()) {
      for (double entry : row) {
        scale = Math.max(scale, Math.abs(entry));
      }
    }
    if (scale == 0) {
      return initial.clone();
    }
    // (s - A) r = s r_initial + b, solved as (A - s) r = -(s r_initial + b).
    double shift = 1e-9 * scale;
    for (int i = 0; i < right.length; i++) {
      lu.rows()[i][i] -= shift;
      right[i] = -right[i] - shift * initial[i + 1];
    }
    lu.factor();
    lu.solve(right, solution);
    double[] average = Arrays.copyOf(initial, initial.length);
    System.arraycopy(solution, 0, average, 1, solution.length);
    return average;
  }
}
