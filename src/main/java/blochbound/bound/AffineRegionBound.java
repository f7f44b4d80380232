package blochbound.bound;

import blochbound.generator.MultiIndexTable;
import blochbound.interval.Rounding;
import blochbound.linalg.Hermitian;
import blochbound.measure.StationaryMeasure;
import blochbound.model.Ball.Norm;
import blochbound.model.Region;
import java.util.Arrays;

/**
 * Certified range of tr(W rho) over all stationary states of all devices of a region, by the trial
 * observable of {@link DualKernel}. Workspace for one thread; the kernel must be prepared for the
 * region.
 */
final class AffineRegionBound {
  /** Remainders below this share of the witness count with their Frobenius norm. */
  private static final double NEGLIGIBLE = 1e-9;

  /** Remainders below this share of their mean count with their Frobenius norm. */
  private static final double SMALL_SHARE = 0.5;

  private final DualKernel kernel;
  private final MultiIndexTable table;
  private final int order;
  private final BallConstraint ball;
  private final PolynomialRange range;
  private final RemainderNorms norms;
  private final double[] polynomial;
  private final double[] loss;
  private final double[] minimiser;
  private final double[] kappa;
  private final double[] reach;

  AffineRegionBound(DualKernel kernel, MultiIndexTable table, int order, BallConstraint ball) {
    this.kernel = kernel;
    this.table = table;
    this.order = order;
    this.ball = ball;
    range = new PolynomialRange(table.variables());
    norms = new RemainderNorms(kernel.basis());
    polynomial =
        new double
            [Math.max(
                table.firstOfDegree(order + 1),
                table.firstOfDegree(Math.min(3, table.order() + 1)))];
    loss = new double[table.variables()];
    minimiser = new double[table.variables()];
    kappa = new double[table.count()];
    reach = new double[table.variables()];
  }

  /**
   * Lower bound of tr(W rho) - slack.
   *
   * @param witness Bloch coordinates of W lifted to the whole device, as computed from the operator
   * @param operator W (or -W) on the measure's own space, for the rounding of its coordinates
   * @param slack subtracted
   * @param region the region that the kernel is prepared for
   */
  double certifiedLower(double[] witness, Hermitian operator, double slack, Region region) {
    kernel.run(witness, table, order);
    double scale = norms.frobeniusUp(witness);
    double remainder = remainder(scale);
    double fixed = kernel.errorUp(witness) + coordinateError(operator, scale) + slack;
    double least = Rounding.addDown(minimum(1, region), -remainder);
    if (isWholeBall(region)) {
      least = Math.max(least, overWholeBall());
    }
    return Rounding.addDown(least, -Rounding.inflate(fixed, 4));
  }

  /** Error of the lifted coordinates: two transforms and one product, relative to their norm. */
  private double coordinateError(Hermitian operator, double scale) {
    double norm = operator.matrix().frobeniusNormUp();
    return (kernel.basis().transformError() + 8 * Rounding.UNIT) * Math.max(scale, norm);
  }

  /** Sum of kappa_a; fills the losses by coordinate. */
  private double remainder(double scale) {
    Arrays.fill(loss, 0);
    double total = 0;
    for (int a = 0; a < kernel.reached(); a++) {
      kappa[a] = norms.frobeniusUp(kernel.remainder(a));
      total += kappa[a];
    }
    // The Frobenius norm is at most sqrt(N) too large: small parts are not worth a better one.
    double refine = Math.max(NEGLIGIBLE * scale, SMALL_SHARE * total / kernel.reached());
    double sum = 0;
    for (int a = 0; a < kernel.reached(); a++) {
      if (kappa[a] > refine) {
        kappa[a] = refined(a, kappa[a]);
      }
      sum += kappa[a];
      for (int variable : table.factors(a)) {
        loss[variable] += kappa[a];
      }
    }
    return Rounding.inflate(sum, kernel.reached());
  }

  private double refined(int a, double frobenius) {
    double[] s = kernel.remainder(a);
    if (a == 0) {
      // What a singular centre leaves over does not shrink with the region: it must be sharp.
      return Math.min(frobenius, Math.max(0, -norms.smallestEigenvalueDown(s, frobenius)));
    }
    return table.isEven(a) ? norms.negativePartUp(s, frobenius) : norms.spectralUp(s, frobenius);
  }

  /** Lower bound of sign * phi over the part of the region inside the ball. */
  private double minimum(int sign, Region region) {
    loadPolynomial(sign);
    range.minimise(polynomial, table, polynomial.length);
    double best = range.certifiedMinimum();
    takeMinimiser();
    for (int i = 0; i < loss.length; i++) {
      loss[i] += range.loss(i);
    }
    if (!ball.cuts(region)) {
      return best;
    }
    for (double lambda : ball.multipliers(polynomial, region)) {
      loadPolynomial(sign);
      double slack = ball.add(polynomial, table, region, lambda);
      range.minimise(polynomial, table, polynomial.length);
      double bound = Rounding.addDown(range.certifiedMinimum(), -slack);
      if (bound > best) {
        best = bound;
        takeMinimiser();
      }
    }
    return best;
  }

  private void takeMinimiser() {
    System.arraycopy(range.minimiser(), 0, minimiser, 0, minimiser.length);
  }

  private void loadPolynomial(int sign) {
    Arrays.fill(polynomial, 0);
    for (int a = 0; a < kernel.solved(); a++) {
      polynomial[a] = sign * kernel.phi()[a];
    }
  }

  private boolean isWholeBall(Region region) {
    if (ball.norm() == Norm.BOX) {
      return false;
    }
    for (int j = 0; j < region.coordinates(); j++) {
      if (region.centre(j) != 0 || region.halfWidth(j) != 1) {
        return false;
      }
    }
    return true;
  }

  /**
   * Lower bound of phi less the remainders over the ball |x| at most 1 itself: the multinomial
   * theorem bounds each degree, the trust-region dual the quadratic part (method section 4).
   */
  private double overWholeBall() {
    int m = table.variables();
    double[] g = new double[m];
    double[][] q = new double[m][m];
    double value = kernel.phi()[0];
    double rest = kappa[0];
    for (int degree = 1; degree <= table.order(); degree++) {
      double fromPhi = 0;
      double fromKappa = 0;
      for (int a = table.firstOfDegree(degree); a < table.firstOfDegree(degree + 1); a++) {
        double phi = a < kernel.solved() ? kernel.phi()[a] : 0;
        if (degree == 1) {
          g[a - 1] = phi;
        } else if (degree == 2) {
          int[] f = table.factors(a);
          q[f[0]][f[1]] += f[0] == f[1] ? phi : 0.5 * phi;
          q[f[1]][f[0]] = q[f[0]][f[1]];
        } else {
          fromPhi = combine(fromPhi, Math.abs(phi), table.multinomial(a));
        }
        fromKappa = combine(fromKappa, kappa[a], table.multinomial(a));
      }
      rest = Rounding.addUp(rest, Rounding.addUp(finish(fromPhi), finish(fromKappa)));
    }
    return Rounding.addDown(Rounding.addDown(value, quadratic(q, g)), -rest);
  }

  private double combine(double sum, double size, double multinomial) {
    return ball.norm() == Norm.ELLIPSOID
        ? Rounding.addUp(sum, Rounding.divideUp(Rounding.timesUp(size, size), multinomial))
        : Math.max(sum, Rounding.divideUp(size, multinomial));
  }

  private double finish(double combined) {
    return ball.norm() == Norm.ELLIPSOID ? Rounding.sqrtUp(combined) : combined;
  }

  private double quadratic(double[][] q, double[] g) {
    if (ball.norm() == Norm.ELLIPSOID) {
      return TrustRegion.certifiedMinimum(q, g);
    }
    double linear = 0;
    double square = 0;
    for (int i = 0; i < g.length; i++) {
      linear = Math.max(linear, Math.abs(g[i]));
      for (int j = 0; j < g.length; j++) {
        square = Math.max(square, Math.abs(q[i][j]));
      }
    }
    return -Rounding.addUp(linear, square);
  }

  /**
   * Bound of the Frobenius distance of every stationary reduced state of the region from a matrix,
   * from a certified range of each of its Bloch coordinates.
   */
  double distanceUp(StationaryMeasure measure, Hermitian near, Region region) {
    double[] coordinates = measure.reducedCoordinates(near);
    int levels = near.size();
    Arrays.fill(reach, 0);
    double sum = square(Math.abs(1 / Math.sqrt(levels) - coordinates[0]) + 4 * Rounding.UNIT);
    for (int k = 1; k < coordinates.length; k++) {
      sum += square(deviationUp(measure.liftedBasis(k), coordinates[k], region));
    }
    double norm = near.matrix().frobeniusNormUp();
    double error = kernel.basis().transformError() * norm;
    double distance = Rounding.sqrtUp(Rounding.inflate(sum, 2L * coordinates.length + 4));
    // No state is longer than 1.
    return Math.min(Rounding.addUp(distance, error), Rounding.addUp(1, norm));
  }

  /** Bound of |tr(W rho) - value| over all stationary states of the region. */
  private double deviationUp(double[] witness, double value, Region region) {
    kernel.run(witness, table, order);
    double scale = norms.frobeniusUp(witness);
    double remainder = 0;
    for (int a = 0; a < kernel.reached(); a++) {
      double[] s = kernel.remainder(a);
      double frobenius = norms.frobeniusUp(s);
      double size = frobenius > NEGLIGIBLE * scale ? norms.spectralUp(s, frobenius) : frobenius;
      remainder += size;
      double move = size + (a < kernel.solved() ? Math.abs(kernel.phi()[a]) : 0);
      for (int variable : table.factors(a)) {
        reach[variable] += move;
      }
    }
    double fixed =
        Rounding.inflate(
            remainder + kernel.errorUp(witness) + 8 * Rounding.UNIT * scale, kernel.reached());
    double low = minimum(1, region);
    double high = -minimum(-1, region);
    return Rounding.addUp(Math.max(Math.abs(high - value), Math.abs(value - low)), fixed);
  }

  private static double square(double x) {
    return Rounding.timesUp(x, x);
  }

  /** How far each coordinate may move the state, from the last distance: an estimate. */
  double[] reach() {
    return reach;
  }

  /** Where the polynomial is expected to be smallest, in x; not a copy. */
  double[] minimiser() {
    return minimiser;
  }

  /**
   * By how much each coordinate's terms may lower the bound: an estimate for splitting; not a copy.
   */
  double[] loss() {
    return loss;
  }
}
