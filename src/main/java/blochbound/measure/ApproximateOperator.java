package blochbound.measure;

import blochbound.interval.Rounding;
import blochbound.linalg.ComplexBall;
import blochbound.linalg.ComplexMatrix;
import blochbound.linalg.Hermitian;
import blochbound.model.StateSpec;

/**
 * A Hermitian operator known up to a Frobenius error.
 *
 * @param centre the computed operator
 * @param error bound of |operator - centre| in the Frobenius norm
 */
record ApproximateOperator(Hermitian centre, double error) {
  /** The Hermitian member of a ball; taking the Hermitian part brings the centre no further off. */
  static ApproximateOperator from(ComplexBall ball) {
    Hermitian centre = Hermitian.part(ball.centre());
    if (differsNowhere(centre.matrix(), ball.centre())) {
      return new ApproximateOperator(centre, ball.radius());
    }
    double rounding =
        Rounding.timesUp(Rounding.gamma(4), ComplexBall.exact(ball.centre()).normUp());
    return new ApproximateOperator(centre, Rounding.addUp(ball.radius(), rounding));
  }

  private static boolean differsNowhere(ComplexMatrix a, ComplexMatrix b) {
    for (int i = 0; i < a.rows(); i++) {
      for (int j = 0; j < a.columns(); j++) {
        if (a.re(i, j) != b.re(i, j) || a.im(i, j) != b.im(i, j)) {
          return false;
        }
      }
    }
    return true;
  }

  /** The density matrix of a state that a case writes down. */
  static ApproximateOperator from(StateSpec state) {
    return from(density(state));
  }

  private static ComplexBall density(StateSpec state) {
    if (state instanceof StateSpec.Pure pure) {
      return pure.ket().times(pure.ket().adjoint());
    }
    return ((StateSpec.Mixed) state).density();
  }

  /** The operator as a ball. */
  ComplexBall ball() {
    return new ComplexBall(matrix(), error);
  }

  /** The computed matrix. */
  ComplexMatrix matrix() {
    return centre.matrix();
  }
}
