package blochbound.casefile;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import blochbound.linalg.ComplexBall;
import blochbound.linalg.ComplexMatrix;
import blochbound.model.OperatorForm;

/** Comparisons of matrices with proved error bounds. */
final class Matrices {
  private Matrices() {}

  /** The value of an operator at the parameters {@code p} in internal units, rounded. */
  static ComplexMatrix at(OperatorForm form, double... p) {
    ComplexMatrix sum = ComplexMatrix.zero(form.dimension(), form.dimension());
    for (var e : form.terms().entrySet()) {
      sum = sum.plus(e.getValue().centre().scale(e.getKey().value(p)));
    }
    return sum;
  }

  /** Asserts that the entries agree to rounding. */
  static void assertClose(ComplexMatrix expected, ComplexMatrix actual) {
    assertEquals(expected.rows(), actual.rows());
    assertEquals(expected.columns(), actual.columns());
    double distance = expected.minus(actual).frobeniusNorm();
    assertTrue(
        distance <= 1e-14 * (1 + expected.frobeniusNorm()),
        () -> "expected\n" + expected + "but was\n" + actual);
  }

  /** Asserts that the error bound reaches the given matrix. */
  static void assertContains(ComplexBall ball, ComplexMatrix member) {
    double distance = ball.centre().minus(member).frobeniusNorm();
    assertTrue(distance <= ball.radius(), () -> distance + " over " + ball.radius());
  }

  /** A real matrix. */
  static ComplexMatrix real(double[]... rows) {
    return ComplexMatrix.real(rows);
  }

  static double[] row(double... entries) {
    return entries;
  }
}
