package blochbound.measure;

import blochbound.generator.BlochBasis;
import blochbound.generator.BlochGenerator;
import blochbound.generator.SteadyStateSolver;
import blochbound.linalg.ComplexMatrix;
import blochbound.linalg.Hermitian;
import blochbound.model.ParameterSpace;
import blochbound.model.Requirement.Sense;
import java.util.Arrays;

/**
 * A measure of the steady state as a function of the coordinates z of the tolerance ball, with
 * gradients: rounded values, for searches and samples. Workspace for one thread.
 *
 * <p>At a point with several stationary states the value is the worst over those that basis states
 * and the maximally mixed state tend to, and the gradient is zero.
 */
public final class StationaryMeasure {
  private final BlochGenerator generator;
  private final LocatedMeasure located;
  private final Sense sense;
  private final SteadyStateSolver solver;
  private final BlochBasis reducedBasis;
  private final int[] embedding;
  private final double tracedRoot;
  private boolean unique;

  /** A measure on the steady states of a generator; the sense tells which value is the worst. */
  public StationaryMeasure(BlochGenerator generator, LocatedMeasure located, Sense sense) {
    this.generator = generator;
    this.located = located;
    this.sense = sense;
    solver = new SteadyStateSolver(generator);
    reducedBasis = generator.basis().reduced(located.sites());
    embedding = generator.basis().embedding(located.sites());
    tracedRoot = Math.sqrt(generator.basis().tracedLevels(located.sites()));
  }

  /** Value at z. */
  public double value(double[] z) {
    return value(z, new double[0]);
  }

  /** Value at parameters in internal units. */
  public double valueAt(double[] parameters) {
    return at(parameters, new double[0]);
  }

  /** Value at z; writes the gradient unless the array is empty. */
  public double value(double[] z, double[] gradient) {
    return at(generator.space().parametersAt(z), gradient);
  }

  private double at(double[] p, double[] gradient) {
    Arrays.fill(gradient, 0);
    unique = solver.solve(p);
    if (!unique) {
      return worstOfSeveral(p);
    }
    Hermitian state = reduced(solver.state());
    if (gradient.length > 0) {
      fillGradient(p, state, gradient);
    }
    return located.measure().value(state);
  }

  /** Tells whether the steady state was unique to rounding at the point evaluated last. */
  public boolean wasUnique() {
    return unique;
  }

  /** Bloch coordinates of the steady state evaluated last, when it was unique; not a copy. */
  public double[] state() {
    return solver.state();
  }

  /** Reduced density matrix on the measure's sites for Bloch coordinates of the whole device. */
  public Hermitian reduced(double[] state) {
    double[] part = new double[embedding.length];
    for (int k = 0; k < part.length; k++) {
      part[k] = state[embedding[k]] * tracedRoot;
    }
    return reducedBasis.matrix(part);
  }

  /** Bloch coordinates on the whole device of an operator on the measure's sites. */
  public double[] lifted(Hermitian operator) {
    double[] part = reducedBasis.coordinates(operator);
    double[] whole = new double[generator.basis().size()];
    for (int k = 0; k < part.length; k++) {
      whole[embedding[k]] = part[k] * tracedRoot;
    }
    return whole;
  }

  /** Bloch coordinates of a matrix on the measure's sites in their own basis. */
  public double[] reducedCoordinates(Hermitian matrix) {
    return reducedBasis.coordinates(matrix);
  }

  /** Bloch coordinates on the whole device of the k-th basis matrix of the measure's sites. */
  public double[] liftedBasis(int k) {
    double[] whole = new double[generator.basis().size()];
    whole[embedding[k]] = tracedRoot;
    return whole;
  }

  private void fillGradient(double[] p, Hermitian state, double[] gradient) {
    double[] byCoefficient = solver.sensitivities(lifted(located.measure().gradient(state)));
    ParameterSpace space = generator.space();
    for (int row = 0; row < gradient.length; row++) {
      int parameter = space.parameterOf(row);
      double sum = 0;
      for (int j = 0; j < byCoefficient.length; j++) {
        sum += byCoefficient[j] * generator.terms().get(j).monomial().derivative(p, parameter);
      }
      for (int k = 0; k < gradient.length; k++) {
        gradient[k] += sum * space.slope(row, k).middle();
      }
    }
  }

  private double worstOfSeveral(double[] p) {
    int n = generator.basis().levels();
    double worst = Double.NaN;
    for (int level = -1; level < n; level++) {
      Hermitian start =
          level < 0
              ? Hermitian.identity(n).scale(1.0 / n)
              : new Hermitian(ComplexMatrix.unit(n, level, level));
      double[] average = solver.longTimeAverage(p, generator.basis().coordinates(start));
      double value = located.measure().value(reduced(average));
      boolean isWorse = Double.isNaN(worst) || sense.sign() * value < sense.sign() * worst;
      worst = isWorse ? value : worst;
    }
    return worst;
  }
}
