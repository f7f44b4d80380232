package blochbound.measure;

import blochbound.interval.Interval;
import blochbound.interval.Rounding;
import blochbound.linalg.ComplexBall;
import blochbound.linalg.ComplexMatrix;
import blochbound.linalg.Hermitian;
import blochbound.model.StateSpec;
import java.util.ArrayList;
import java.util.List;

/**
 * The squared Uhlmann fidelity F = r^2 with a mixed reference, r = |sqrt(rho) sqrt(ref)|_1.
 *
 * <p>With any Q (k by d) r = tr sqrt(A), A = Q rho Q^+, is the root fidelity with Q^+ Q; Q is a
 * computed square root of the reference on its support, and r changes by at most |sqrt(ref) -
 * sqrt(Q^+ Q)|_F on the way to the reference itself.
 *
 * <ul>
 *   <li>Above: F &lt;= tr(G rho) tr(G^-1 ref) for any G &gt; 0, from r = max_V |tr(V sqrt(rho)
 *       G^(1/2) G^(-1/2) sqrt(ref))| and Cauchy-Schwarz (P. M. Alberti, Lett. Math. Phys. 7 (1983)
 *       25; cited from memory). G = U diag(g) U^+ with an exact unitary, so its inverse is known.
 *   <li>Below: sqrt(a) &gt;= sqrt(b) + (a - b)/(2 sqrt(b)) - (a - b)^2/(2 b^(3/2)) for a &gt;= 0, b
 *       &gt; 0 (with a = b(1 + x): sqrt(1 + x) - 1 - x/2 = -(x^2/4)/(1 + x/2 + sqrt(1 + x)) &gt;=
 *       -x^2/2), so by Klein's inequality r &gt;= tr sqrt(B)/2 + tr(A B^(-1/2))/2 - tr((A - B)^2
 *       B^(-3/2))/2, and F &gt;= 2 r0 r - r0^2 for any r0 &gt;= 0.
 * </ul>
 */
final class MixedFidelity extends CertifiedMeasure {
  private static final double SUPPORT_CUT = 1e-14;

  /** Least eigenvalues given to B, in the order tried. */
  private static final double[] FLOORS = {1e-13, 1e-9, 1e-6, 1e-3};

  private final ApproximateOperator reference;
  private final ComplexMatrix root;
  private final ComplexBall rootBall;
  private final double rootError;
  private final double rootNorm;
  private final double largest;

  MixedFidelity(StateSpec.Mixed state) {
    this(ApproximateOperator.from(state));
  }

  private MixedFidelity(ApproximateOperator reference) {
    super(reference.centre().size());
    this.reference = reference;
    SquareRootFactor factor = SquareRootFactor.of(reference.centre(), SUPPORT_CUT);
    this.root = factor.factor().adjoint();
    this.rootBall = ComplexBall.exact(root);
    this.rootError = factor.rootDistanceUp(reference.error());
    this.rootNorm = factor.normUp();
    this.largest = factor.largestEigenvalue();
  }

  @Override
  public double value(Hermitian state) {
    ComplexMatrix s = SquareRootFactor.estimate(state, SUPPORT_CUT);
    double r = NuclearNorm.estimate(root.times(s));
    return r * r;
  }

  @Override
  public Hermitian gradient(Hermitian state) {
    Compressed compressed = new Compressed(state, FLOORS[0]);
    return compressed.witness().centre().scale(compressed.rootFidelity);
  }

  @Override
  public Interval range() {
    return Interval.of(0, 1);
  }

  @Override
  Interval continuity(Hermitian near, double distance) {
    SquareRootFactor factor = SquareRootFactor.of(near, 0);
    Interval middle = NuclearNorm.enclosure(rootBall.times(ComplexBall.exact(factor.factor())));
    double change =
        Rounding.addUp(Rounding.timesUp(factor.rootDistanceUp(distance), rootNorm), rootError);
    Interval r = middle.plus(Interval.of(-change, change));
    Interval square = Interval.of(Math.max(0, r.lower()), Math.max(0, r.upper())).square();
    return Interval.of(Math.min(1, square.lower()), Math.min(1, square.upper()));
  }

  @Override
  List<AffineBound> lowerWitnesses(Hermitian near) {
    List<AffineBound> bounds = new ArrayList<>();
    for (Compressed compressed : candidates(near)) {
      bounds.add(compressed.lower());
    }
    return bounds;
  }

  @Override
  List<AffineBound> upperWitnesses(Hermitian near) {
    List<AffineBound> bounds = new ArrayList<>();
    for (Compressed compressed : candidates(near)) {
      // The part of G outside the support of the reference may be as small as rounding allows.
      bounds.add(upper(compressed.witness().centre(), 0.1 * Math.sqrt(compressed.floor)));
    }
    return bounds;
  }

  private List<Compressed> candidates(Hermitian near) {
    List<Compressed> candidates = new ArrayList<>();
    double least = Double.NEGATIVE_INFINITY;
    for (double floor : FLOORS) {
      if (candidates.isEmpty() || floor > least) {
        Compressed compressed = new Compressed(near, floor);
        least = compressed.frame.value(0);
        candidates.add(compressed);
      }
    }
    return candidates;
  }

  /**
   * The bound F &lt;= tr(G rho) c, c &gt;= tr(G^-1 ref), with G near a matrix, at least a floor.
   */
  private AffineBound upper(Hermitian near, double floor) {
    SpectralFrame frame = SpectralFrame.of(near);
    double[] g = new double[dimension()];
    Interval inverse = Interval.ZERO;
    for (int k = 0; k < g.length; k++) {
      g[k] = Math.max(frame.value(k), 0) + floor;
      double weight = onReferenceUp(frame, k);
      inverse = inverse.plus(Interval.of(Rounding.divideUp(weight, g[k])));
    }
    double c = inverse.upper();
    ApproximateOperator operator = frame.withValues(g);
    double slack =
        Rounding.addUp(
            Rounding.timesUp(c, operator.error()),
            OperatorArithmetic.scalingError(operator.centre(), c));
    return AffineBound.global(operator.centre().scale(c), slack);
  }

  /** Upper bound of u^+ ref u for the k-th exact unit vector u of a frame. */
  private double onReferenceUp(SpectralFrame frame, int k) {
    ComplexBall v = ComplexBall.exact(frame.eigen().vector(k));
    ComplexBall value = v.adjoint().times(reference.ball()).times(v);
    double turning =
        Rounding.timesUp(
            Rounding.timesUp(frame.defect(), Rounding.addUp(2, frame.defect())),
            reference.ball().normUp());
    double sum = Rounding.addUp(Math.max(0, value.centre().re(0, 0)), value.radius());
    return Rounding.addUp(sum, turning);
  }

  /** The state between the square roots of the reference, and B, its neighbour above a floor. */
  private final class Compressed {
    private final double floor;
    private final SpectralFrame frame;
    private final double[] b;
    private final double rootFidelity;

    /** Bound of |Q near Q^+ - U diag(values) U^+|_F. */
    private final double offset;

    Compressed(Hermitian near, double floor) {
      this.floor = floor;
      ApproximateOperator a =
          ApproximateOperator.from(
              rootBall.times(ComplexBall.exact(near.matrix())).times(rootBall.adjoint()));
      this.frame = SpectralFrame.of(a.centre());
      this.offset = Rounding.addUp(a.error(), frame.residual());
      this.b = new double[frame.size()];
      double sum = 0;
      for (int k = 0; k < b.length; k++) {
        b[k] = Math.max(frame.value(k), floor);
        sum += Math.sqrt(Math.max(frame.value(k), 0));
      }
      this.rootFidelity = sum;
    }

    /** The operator Q^+ B^(-1/2) Q. */
    ApproximateOperator witness() {
      double[] inverseRoots = new double[b.length];
      for (int k = 0; k < b.length; k++) {
        inverseRoots[k] = 1 / Math.sqrt(b[k]);
      }
      // The numbers 1/sqrt(b) are rounded: a relative error of two units at most.
      ApproximateOperator inner = frame.withValues(inverseRoots);
      double rounding =
          Rounding.timesUp(Rounding.gamma(3), OperatorArithmetic.frobeniusUp(inner.centre()));
      ComplexBall ball = new ComplexBall(inner.matrix(), Rounding.addUp(inner.error(), rounding));
      return ApproximateOperator.from(rootBall.adjoint().times(ball).times(rootBall));
    }

    AffineBound lower() {
      ApproximateOperator w = witness();
      double r0 = rootFidelity;
      Interval sum = Interval.ZERO;
      for (double value : b) {
        sum = sum.plus(Interval.of(value).sqrt());
      }
      Interval constant = Interval.of(r0).times(sum).minus(Interval.of(r0).square());
      double fixed =
          Rounding.addUp(
              Rounding.timesUp(r0, w.error()), OperatorArithmetic.scalingError(w.centre(), r0));
      return AffineBound.local(
          OperatorArithmetic.shiftedDown(w.centre().scale(r0), constant.lower()),
          distance -> Rounding.addUp(fixed, Rounding.timesUp(r0, slackUp(distance))));
    }

    /** Bound of tr((A - B)^2 B^(-3/2)) + 2 |sqrt(ref) - sqrt(Q^+ Q)|_F. */
    private double slackUp(double distance) {
      double reach = Rounding.addUp(Rounding.timesUp(largest, distance), offset);
      double least = b[0];
      double scale = Rounding.timesDown(least, Math.nextDown(Math.sqrt(least)));
      // Minkowski: |A - U diag(values) U^+|_F <= reach, and values differ from b one by one.
      double moved = 0;
      for (int k = 0; k < b.length; k++) {
        double change = Math.nextUp(b[k] - frame.value(k));
        double weight = Rounding.timesDown(b[k], Math.nextDown(Math.sqrt(b[k])));
        moved +=
            b[k] == frame.value(k)
                ? 0
                : Rounding.divideUp(Rounding.timesUp(change, change), weight);
      }
      double root =
          Rounding.addUp(
              Rounding.divideUp(reach, Math.nextDown(Math.sqrt(scale))),
              Rounding.sqrtUp(Rounding.inflate(moved, b.length)));
      return Rounding.addUp(Rounding.timesUp(root, root), Rounding.timesUp(2, rootError));
    }
  }
}
