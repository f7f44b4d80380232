package blochbound.measure;

import blochbound.interval.Interval;
import blochbound.interval.Rounding;
import blochbound.linalg.ComplexBall;
import blochbound.linalg.ComplexMatrix;
import blochbound.linalg.Hermitian;
import java.util.ArrayList;
import java.util.List;

/**
 * Bounds of the concurrence from above near a matrix, none of which is a linear function that holds
 * everywhere and is tight: C is convex.
 *
 * <p>Let s' = S S^+ be the exact neighbour of the matrix ({@link SquareRootFactor}), m its smallest
 * eigenvalue, f = l1 - l2 - l3 - l4 of tau = S^T YY S, q = |rho - s'|_F / m.
 *
 * <ul>
 *   <li>Continuity: |f(rho) - f(s')| &lt;= |tau - tau'|_1 &lt;= |sqrt(rho) - sqrt(s')|_F (1 +
 *       |S|_F), by Mirsky's theorem and tau - tau' = (R - R')^T YY R + R'^T YY (R - R') with the
 *       two square roots R, R'; C = max(0, f).
 *   <li>Shrinking: for q &lt; 1, rho - (1 - q) s' &gt;= 0, and C is convex, homogeneous and at most
 *       the trace: C(rho) &lt;= (1 - q) C(s') + 1 - (1 - q) tr s'.
 *   <li>Tangent: {@link ConcurrenceTangent}, where s' is positive and entangled.
 *   <li>One site, for all states: C(rho)^2 &lt;= 4 det rho_A, and 2 sqrt(det X det rho_A) &lt;=
 *       tr(X rho_A) for every 2 x 2 X &gt; 0 (arithmetic and geometric mean). <i>Proof of the
 *       first.</i> Equality for pure states; 2 sqrt(det) is the minimum of tr(X .) over det X = 1,
 *       hence concave, and C is a convex roof. X = 1 - r.sigma with r the Bloch vector of the site
 *       is best; it is shortened when the site is nearly pure.
 * </ul>
 */
final class ConcurrenceCeiling {
  /** Below this concurrence the tangent's remainder is useless. */
  private static final double LEAST_CONCURRENCE = 1e-3;

  private static final double LEAST_EIGENVALUE = 1e-7;

  private final Hermitian near;
  private final SquareRootFactor factor;
  private final Interval signedSum;

  ConcurrenceCeiling(Hermitian near) {
    this.near = near;
    this.factor = SquareRootFactor.of(near, 0);
    this.signedSum = NuclearNorm.signedSum(spinFlipped(ComplexBall.exact(factor.factor())), -1);
  }

  /** The ball of S^T YY S. */
  static ComplexBall spinFlipped(ComplexBall s) {
    ComplexBall transposed = new ComplexBall(s.centre().transpose(), s.radius());
    return transposed.times(flip()).times(s);
  }

  /** The matrix YY of two spin flips. */
  static ComplexBall flip() {
    double[] re = new double[16];
    for (int i = 0; i < 4; i++) {
      re[4 * i + 3 - i] = TwoSiteFactor.sign(i);
    }
    return ComplexBall.exact(ComplexMatrix.of(4, 4, re, new double[16]));
  }

  /** Certified enclosure of the concurrence over all states within a distance of the matrix. */
  Interval continuity(double distance) {
    double change = changeUp(distance);
    return Interval.of(
        Math.min(1, Math.max(0, Rounding.addDown(signedSum.lower(), -change))),
        Math.min(1, Math.max(0, Rounding.addUp(signedSum.upper(), change))));
  }

  private double changeUp(double distance) {
    return Rounding.timesUp(factor.rootDistanceUp(distance), Rounding.addUp(1, factor.normUp()));
  }

  /** The bounds, in no order. */
  List<AffineBound> bounds() {
    List<AffineBound> bounds = new ArrayList<>();
    if (signedSum.lower() > LEAST_CONCURRENCE && factor.leastEigenvalue() > LEAST_EIGENVALUE) {
      bounds.add(ConcurrenceTangent.at(near, factor.factor()).bound());
    }
    bounds.add(AffineBound.local(Hermitian.identity(4).scale(0), this::constantUp));
    addSite(bounds, 0);
    addSite(bounds, 1);
    return bounds;
  }

  private double constantUp(double distance) {
    return Math.min(continuity(distance).upper(), shrunkUp(distance));
  }

  private double shrunkUp(double distance) {
    if (!(factor.leastEigenvalue() > 0)) {
      return 1;
    }
    double q =
        Rounding.divideUp(Rounding.addUp(distance, factor.error()), factor.leastEigenvalue());
    if (q >= 1) {
      return 1;
    }
    Interval trace =
        OperatorArithmetic.trace(near)
            .minus(Interval.of(OperatorArithmetic.traceNormUp(factor.error(), 4)));
    double spare = trace.minus(Interval.of(Math.max(0, signedSum.upper()))).lower();
    // C(rho) <= 1 - (1 - q)(tr s' - C(s')).
    return Rounding.addUp(1, -Rounding.timesDown(Math.nextDown(1 - q), Math.max(0, spare)));
  }

  private void addSite(List<AffineBound> bounds, int site) {
    int other = site == 0 ? 1 : 2;
    int own = 3 - other;
    double x = 0;
    double y = 0;
    double z = 0;
    // Blocks 00, 11 and 01 of the reduced state.
    for (int k = 0; k <= other; k += other) {
      z += near.re(k, k) - near.re(own + k, own + k);
      x += 2 * near.re(k, own + k);
      y -= 2 * near.im(k, own + k);
    }
    double square = x * x + y * y + z * z;
    for (double place : TangentBound.places(1 - square)) {
      double scale = square > 1 - place ? Math.sqrt((1 - place) / square) : 1;
      bounds.add(siteTangent(own, scale * x, scale * y, scale * z));
    }
  }

  /** The bound tr(X rho_A)/sqrt(det X) with X = 1 - x sigma_x - y sigma_y - z sigma_z, rounded. */
  private static AffineBound siteTangent(int own, double x, double y, double z) {
    double first = 1 - z;
    double second = 1 + z;
    Interval determinant =
        Interval.of(first)
            .times(Interval.of(second))
            .minus(Interval.of(x).square())
            .minus(Interval.of(y).square());
    double t = Rounding.divideUp(1, Interval.of(Math.max(0, determinant.lower())).sqrt().lower());
    double[] re = new double[16];
    double[] im = new double[16];
    int other = 3 - own;
    for (int k = 0; k <= other; k += other) {
      re[5 * k] = t * first;
      re[5 * (own + k)] = t * second;
      re[4 * k + own + k] = -t * x;
      re[4 * (own + k) + k] = -t * x;
      im[4 * k + own + k] = t * y;
      im[4 * (own + k) + k] = -t * y;
    }
    Hermitian w = new Hermitian(ComplexMatrix.of(4, 4, re, im));
    return AffineBound.global(w, OperatorArithmetic.scalingError(w, 2));
  }
}
