package blochbound.measure;

import blochbound.interval.Interval;
import blochbound.interval.Rounding;
import blochbound.linalg.Hermitian;
import blochbound.linalg.HermitianEigen;
import java.util.ArrayList;
import java.util.List;
import java.util.function.DoubleUnaryOperator;

/**
 * The von Neumann entropy -tr(rho log rho) in nats, between 0 and log d.
 *
 * <p>For K = U diag(k) U^+ with an exact unitary U, let sigma = e^-K / Z and Z = tr e^-K. Then
 * S(rho) = tr(K rho) + log Z - D(rho|sigma) for every state rho, and
 *
 * <ul>
 *   <li>above: D &gt;= 0 (Klein), so tr(K rho) + log Z, for all states;
 *   <li>below: D &lt;= log(1 + chi2) with chi2 = tr((rho - sigma) sigma^-1 (rho - sigma)) &lt;=
 *       |rho - sigma|_F^2 / lambda_min(sigma). <i>Proof.</i> With eigenvalues p_i of rho and q_j of
 *       sigma, f(a) = log tr(rho^a sigma^(1-a)) = log sum |&lt;i|j&gt;|^2 p_i^a q_j^(1-a) is convex
 *       in a (a logarithm of a sum of exponentials), f(1) = 0 and f'(1) = D, hence D &lt;= f(2) =
 *       log tr(rho^2 sigma^-1) = log(1 + chi2). (M. B. Ruskai, F. H. Stillinger, J. Phys. A 23
 *       (1990) 2421 have related inequalities; cited from memory, the proof here does not rest on
 *       it.)
 *   <li>below, farther away: S(rho) &gt;= S(sigma) - (t log(d - 1) + h(t)), see {@link LogBounds}.
 * </ul>
 *
 * <p>The eigenvalues are mixed with a little of 1/d, several amounts being offered: a small one is
 * tight at the matrix itself, a larger one flatter around it.
 */
final class Entropy extends CertifiedMeasure {
  private static final double[] MIXTURES = {1e-12, 1e-9, 1e-6, 1e-3};
  private static final double LEAST_VALUE = 1e-300;

  Entropy(int dimension) {
    super(dimension);
  }

  @Override
  public double value(Hermitian state) {
    double sum = 0;
    for (double p : state.eigen().values()) {
      sum -= p > 0 ? p * Math.log(p) : 0;
    }
    return sum;
  }

  @Override
  public Hermitian gradient(Hermitian state) {
    HermitianEigen eigen = state.eigen();
    double[] values = eigen.values();
    for (int k = 0; k < values.length; k++) {
      values[k] = -1 - Math.log(Math.max(values[k], LEAST_VALUE));
    }
    return eigen.withValues(values);
  }

  @Override
  public Interval range() {
    return dimension() == 1
        ? Interval.ZERO
        : Interval.of(0, LogBounds.log(Interval.of(dimension())).upper());
  }

  @Override
  List<AffineBound> lowerWitnesses(Hermitian near) {
    List<AffineBound> bounds = new ArrayList<>();
    for (Gibbs gibbs : candidates(near)) {
      bounds.add(gibbs.lower());
    }
    bounds.add(new Gibbs(SpectralFrame.of(near), MIXTURES[0]).lowerByContinuity());
    return bounds;
  }

  @Override
  List<AffineBound> upperWitnesses(Hermitian near) {
    List<AffineBound> bounds = new ArrayList<>();
    for (Gibbs gibbs : candidates(near)) {
      bounds.add(gibbs.upper());
    }
    return bounds;
  }

  /** The smallest mixture, and those larger ones that change the smallest eigenvalue much. */
  private List<Gibbs> candidates(Hermitian near) {
    SpectralFrame frame = SpectralFrame.of(near);
    List<Gibbs> candidates = new ArrayList<>();
    for (double mixture : MIXTURES) {
      if (candidates.isEmpty() || mixture > frame.value(0)) {
        candidates.add(new Gibbs(frame, mixture));
      }
    }
    return candidates;
  }

  /** The operator K, the exact state sigma of its exponential, and the bounds from them. */
  private static final class Gibbs {
    private final int d;
    private final ApproximateOperator k;
    private final Interval logPartition;
    private final double leastProbability;
    private final Interval entropy;

    /** Bound of |near - sigma|_F. */
    private final double offset;

    Gibbs(SpectralFrame frame, double mixture) {
      this.d = frame.size();
      double[] energies = new double[d];
      Interval partition = Interval.ZERO;
      for (int i = 0; i < d; i++) {
        double mixed = (1 - mixture) * Math.max(frame.value(i), 0) + mixture / d;
        energies[i] = -Math.log(mixed);
        partition = partition.plus(weight(energies[i]));
      }
      Interval mean = Interval.ZERO;
      double least = Double.POSITIVE_INFINITY;
      double[] misses = new double[d];
      for (int i = 0; i < d; i++) {
        Interval p = weight(energies[i]).dividedBy(partition);
        mean = mean.plus(p.times(Interval.of(energies[i])));
        least = Math.min(least, p.lower());
        misses[i] = p.minus(Interval.of(frame.value(i))).magnitude();
      }
      this.k = frame.withValues(energies);
      this.logPartition = LogBounds.log(partition);
      this.leastProbability = least;
      this.entropy = mean.plus(logPartition);
      this.offset = Rounding.addUp(Rounding.normUp(misses), frame.residual());
    }

    private static Interval weight(double energy) {
      return Interval.of(-energy).exp();
    }

    AffineBound upper() {
      return AffineBound.global(
          OperatorArithmetic.shiftedUp(k.centre(), logPartition.upper()), k.error());
    }

    AffineBound lower() {
      return AffineBound.local(
          OperatorArithmetic.shiftedDown(k.centre(), logPartition.lower()),
          distance -> Rounding.addUp(k.error(), divergenceUp(distance)));
    }

    private double divergenceUp(double distance) {
      double reach = Rounding.addUp(distance, offset);
      return LogBounds.logOnePlusUp(
          Rounding.divideUp(Rounding.timesUp(reach, reach), leastProbability));
    }

    AffineBound lowerByContinuity() {
      int size = d;
      double at = offset;
      DoubleUnaryOperator excess =
          distance -> {
            double norm = OperatorArithmetic.traceNormUp(Rounding.addUp(distance, at), size);
            return LogBounds.continuityUp(0.5 * norm, size);
          };
      return AffineBound.local(Hermitian.identity(d).scale(entropy.lower()), excess);
    }
  }
}
