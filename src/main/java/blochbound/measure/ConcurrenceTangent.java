package blochbound.measure;

import blochbound.interval.Interval;
import blochbound.interval.Rounding;
import blochbound.linalg.ComplexBall;
import blochbound.linalg.ComplexMatrix;
import blochbound.linalg.Hermitian;
import blochbound.linalg.HermitianEigen;

/**
 * A bound of the concurrence from above that is tangent at a positive matrix, with a proved
 * second-order remainder.
 *
 * <p><b>Statement.</b> Let Z be an invertible 4 x 4 matrix, s = Z Z^+ with eigenvalues from m to at
 * most l, a_j = z_j^T YY z_j for its columns, alpha_j &gt; 0, theta_j = conj(a_j) / alpha_j, G the
 * Hermitian part of Z^-+ Theta Z^T YY. For every state rho, with D = rho - s, v = |D|_F / sqrt(m)
 * and q = |D|_F / m: C(rho) &lt;= tr(G rho) + sum_j (alpha_j^2 - |a_j|^2)/(2 alpha_j) + remainder,
 *
 * <p>remainder = t v^2 (2 h sqrt(l/m) + k^2) + (2 sqrt(l) k v + k^2 v^2)^2 / (2 alpha), k = 1/(1 +
 * sqrt(1 - q)), h = 1/(4 (1 - q/2 + sqrt(1 - q))), t = max |theta_j|, alpha = min alpha_j; for q
 * &gt;= 1 the same with k = 1, h = 1/2.
 *
 * <p><b>Proof.</b> H = s^(-1/2) Z is unitary. With T = s^(-1/2) D s^(-1/2) &gt;= -1, |T| &lt;= q,
 * the columns of Z' = s^(1/2) (1 + T)^(1/2) H decompose rho, so C(rho) &lt;= sum |z'_j^T YY z'_j|.
 * Put (1 + T)^(1/2) = 1 + K and tau = (s^(1/2))^T YY s^(1/2), symmetric; then z'_j^T YY z'_j = a_j
 * + b_j with b_j = 2 h_j^T tau K h_j + (K h_j)^T tau (K h_j). For every alpha &gt; 0, |a + b| &lt;=
 * (alpha^2 + |a + b|^2)/(2 alpha), whose linear part sums to Re sum theta_j b_j. Scalars: sqrt(1 +
 * x) - 1 = x/(1 + sqrt(1 + x)) and 1 + x/2 - sqrt(1 + x) = (x^2/4)/(1 + x/2 + sqrt(1 + x)), so K =
 * T p(T) = T/2 - T r(T) T with |p(T)| &lt;= k and |r(T)| &lt;= h. T/2 gives tr(G D), and tr(G s) =
 * sum |a_j|^2/alpha_j. Since tau T = (s^(1/2))^T YY D s^(-1/2) and |D s^(-1/2)|_F &lt;= v: |tau
 * K|_F &lt;= sqrt(l) k v, |K^T tau K|_1 &lt;= k^2 v^2, |tau T r(T) T|_1 &lt;= sqrt(l) h v^2 /
 * sqrt(m). As H is unitary, these bound the sums over j: twice the last and the second times t, and
 * sqrt(sum |b_j|^2) &lt;= 2 |tau K|_F + |K^T tau K|_1.
 *
 * <p>Z is the optimal decomposition (Wootters 1998): Takagi vectors of tau with phases 1, i, i, i,
 * mixed by a Hadamard matrix, which makes every a_j a quarter of C.
 */
final class ConcurrenceTangent {
  private static final int[] HADAMARD_SIGNS = {
    1, 1, 1, 1, 1, -1, 1, -1, 1, 1, -1, -1, 1, -1, -1, 1
  };

  private static final Interval TWO = Interval.of(2);
  private static final Interval HALF = Interval.of(0.5);

  private final ComplexBall z;
  private final ComplexBall inverse;
  private final double least;
  private final double largest;
  private final double offset;

  private ConcurrenceTangent(Hermitian near, HermitianEigen eigen, ComplexMatrix z) {
    this.z = ComplexBall.exact(z);
    SquareRootFactor square = SquareRootFactor.of(z, near, eigen);
    this.least = square.leastEigenvalue();
    this.largest = square.largestEigenvalue();
    this.offset = square.error();
    this.inverse = inverse(z, eigen);
  }

  /** The tangent at a positive matrix with a computed square factor. */
  static ConcurrenceTangent at(Hermitian near, ComplexMatrix factor) {
    return new ConcurrenceTangent(near, near.eigen(), decomposition(factor));
  }

  private static ComplexMatrix decomposition(ComplexMatrix s) {
    ComplexMatrix tau = ConcurrenceCeiling.spinFlipped(ComplexBall.exact(s)).centre();
    ComplexMatrix takagi = takagiVectors(tau);
    double[] re = new double[16];
    double[] im = new double[16];
    for (int k = 0; k < 4; k++) {
      for (int j = 0; j < 4; j++) {
        // Phase 1 for the largest value, i for the others; rows of a Hadamard matrix over 2.
        (k == 0 ? re : im)[4 * k + j] = 0.5 * HADAMARD_SIGNS[4 * j + k];
      }
    }
    return s.times(takagi).times(ComplexMatrix.of(4, 4, re, im));
  }

  /**
   * Vectors q_k with tau q_k = l_k conj(q_k), as columns, largest l_k first: q = x - i y from the
   * eigenvectors (x, y) of the real symmetric [[Re tau, Im tau], [Im tau, -Re tau]].
   */
  private static ComplexMatrix takagiVectors(ComplexMatrix tau) {
    double[] real = new double[64];
    for (int i = 0; i < 4; i++) {
      for (int j = 0; j < 4; j++) {
        real[8 * i + j] = tau.re(i, j);
        real[8 * i + 4 + j] = tau.im(i, j);
        real[8 * (4 + i) + j] = tau.im(i, j);
        real[8 * (4 + i) + 4 + j] = -tau.re(i, j);
      }
    }
    ComplexMatrix vectors =
        Hermitian.part(ComplexMatrix.of(8, 8, real, new double[64])).eigen().vectors();
    double[] re = new double[16];
    double[] im = new double[16];
    for (int k = 0; k < 4; k++) {
      for (int i = 0; i < 4; i++) {
        re[4 * i + k] = vectors.re(i, 7 - k);
        im[4 * i + k] = -vectors.re(4 + i, 7 - k);
      }
    }
    return ComplexMatrix.of(4, 4, re, im);
  }

  /**
   * {@code Z^-1} near {@code V = Z^+ s^-1}: with {@code V Z = 1 + F}, {@code |V - Z^-1| <= |F| |V|
   * / (1 - |F|)}.
   */
  private static ComplexBall inverse(ComplexMatrix z, HermitianEigen eigen) {
    double[] reciprocals = eigen.values();
    for (int k = 0; k < 4; k++) {
      reciprocals[k] = 1 / reciprocals[k];
    }
    ComplexBall v = ComplexBall.exact(z.adjoint().times(eigen.withValues(reciprocals).matrix()));
    double f =
        v.times(ComplexBall.exact(z)).minus(ComplexBall.exact(ComplexMatrix.identity(4))).normUp();
    double radius =
        f < 0.5
            ? Rounding.divideUp(Rounding.timesUp(f, v.normUp()), Math.nextDown(1 - f))
            : Double.POSITIVE_INFINITY;
    return new ComplexBall(v.centre(), radius);
  }

  /** The bound; its slack is infinite where the numbers are too ill-conditioned. */
  AffineBound bound() {
    ComplexBall t = ConcurrenceCeiling.spinFlipped(z);
    Weights weights = new Weights(t);
    ComplexBall transposed = new ComplexBall(z.centre().transpose(), 0);
    ApproximateOperator g =
        hermitianPart(
            inverse
                .adjoint()
                .times(weights.theta())
                .times(transposed)
                .times(ConcurrenceCeiling.flip()));
    double fixed = Rounding.addUp(g.error(), weights.constant());
    return AffineBound.local(
        g.centre(), distance -> Rounding.addUp(fixed, remainderUp(weights, distance)));
  }

  /** The Hermitian part of the members of a ball. */
  private static ApproximateOperator hermitianPart(ComplexBall ball) {
    Hermitian centre = Hermitian.part(ball.centre());
    double rounding = OperatorArithmetic.scalingError(centre, 4);
    return new ApproximateOperator(centre, Rounding.addUp(ball.radius(), rounding));
  }

  private double remainderUp(Weights w, double distance) {
    if (!(least > 0)) {
      return Double.POSITIVE_INFINITY;
    }
    Interval reach = Interval.of(Rounding.addUp(distance, offset));
    Interval m = Interval.of(least);
    Interval q = reach.dividedBy(m);
    Interval k = Interval.ONE;
    Interval h = HALF;
    if (q.upper() < 1) {
      Interval root = Interval.ONE.minus(q).sqrt();
      k = Interval.ONE.dividedBy(Interval.ONE.plus(root));
      h = Interval.of(0.25).dividedBy(Interval.ONE.minus(q.times(HALF)).plus(root));
    }
    Interval l = Interval.of(largest);
    Interval kv = k.times(reach).dividedBy(m.sqrt());
    Interval curved = TWO.times(h).times(l.dividedBy(m).sqrt()).times(reach.square().dividedBy(m));
    Interval moduli = TWO.times(l.sqrt()).times(kv).plus(kv.square()).square();
    return Interval.of(w.mostTheta)
        .times(curved.plus(kv.square()))
        .plus(moduli.dividedBy(TWO.times(Interval.of(w.leastAlpha))))
        .upper();
  }

  /** The numbers alpha_j, theta_j and what the remainder needs of them. */
  private static final class Weights {
    private final double[] re = new double[16];
    private final double[] im = new double[16];
    private double thetaError;
    private double mostTheta;
    private double leastAlpha = Double.POSITIVE_INFINITY;
    private Interval constant = Interval.ZERO;

    Weights(ComplexBall t) {
      ComplexMatrix a = t.centre();
      for (int j = 0; j < 4; j++) {
        double alpha = Math.hypot(a.re(j, j), a.im(j, j));
        Interval x = OperatorArithmetic.around(a.re(j, j), t.radius());
        Interval y = OperatorArithmetic.around(a.im(j, j), t.radius());
        Interval modulus = x.square().plus(y.square());
        Interval place = Interval.of(alpha);
        constant = constant.plus(place.square().minus(modulus).dividedBy(TWO.times(place)));
        re[5 * j] = a.re(j, j) / alpha;
        im[5 * j] = -a.im(j, j) / alpha;
        double error = Rounding.addUp(Rounding.divideUp(t.radius(), alpha), Rounding.gamma(4));
        thetaError = Rounding.addUp(thetaError, error);
        mostTheta = Math.max(mostTheta, modulus.sqrt().dividedBy(place).upper());
        leastAlpha = Math.min(leastAlpha, alpha);
      }
    }

    /** The diagonal matrix of the theta_j. */
    ComplexBall theta() {
      return new ComplexBall(ComplexMatrix.of(4, 4, re, im), thetaError);
    }

    /** Upper bound of sum_j (alpha_j^2 - |a_j|^2)/(2 alpha_j), not below zero. */
    double constant() {
      return Math.max(0, constant.upper());
    }
  }
}
