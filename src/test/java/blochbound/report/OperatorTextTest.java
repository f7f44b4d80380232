package blochbound.report;

import static org.junit.jupiter.api.Assertions.assertEquals;

import blochbound.linalg.ComplexBall;
import blochbound.linalg.ComplexMatrix;
import blochbound.model.HilbertSpace;
import blochbound.model.OperatorForm;
import blochbound.model.Scalar;
import blochbound.model.Site;
import blochbound.model.StateSpec;
import java.util.List;
import org.junit.jupiter.api.Test;

// [invariant] the expected texts spell the matrices built in each test
class OperatorTextTest {
  private static final FormulaText FORMULAS =
      new FormulaText(List.of(HandMade.parameter("g", "1", "1", "2")));
  private static final OperatorText ONE =
      new OperatorText(new HilbertSpace(List.of(new Site("q", List.of("g", "e")))), FORMULAS);
  private static final OperatorText TWO =
      new OperatorText(
          new HilbertSpace(
              List.of(new Site("q", List.of("g", "e")), new Site("c", List.of("0", "1", "2")))),
          FORMULAS);

  private static ComplexBall exact(double... reThenIm) {
    double[] re = new double[4];
    double[] im = new double[4];
    System.arraycopy(reThenIm, 0, re, 0, 4);
    System.arraycopy(reThenIm, 4, im, 0, 4);
    return ComplexBall.exact(ComplexMatrix.of(2, 2, re, im));
  }

  @Test
  void entriesAreDyadsOfLabels() {
    assertEquals("|g><e| + |e><g|", ONE.matrix(exact(0, 1, 1, 0, 0, 0, 0, 0)));
    assertEquals("-i * |g><e| + i * |e><g|", ONE.matrix(exact(0, 0, 0, 0, 0, -1, 1, 0)));
    assertEquals("-|g><g| + 0.5 * |e><e|", ONE.matrix(exact(-1, 0, 0, 0.5, 0, 0, 0, 0)));
    assertEquals("(0.5-2*i) * |g><e|", ONE.matrix(exact(0, 0.5, 0, 0, 0, -2, 0, 0)));
    assertEquals("0", ONE.matrix(exact(0, 0, 0, 0, 0, 0, 0, 0)));
  }

  @Test
  void multiplesOfTheIdentityAreNumbers() {
    assertEquals("3", ONE.matrix(exact(3, 0, 0, 3, 0, 0, 0, 0)));
  }

  @Test
  void entriesWithinTheErrorBoundAreZero() {
    ComplexMatrix m = ComplexMatrix.real(new double[][] {{1e-17, 1}, {0, 0}});
    assertEquals("|g><e|", ONE.matrix(new ComplexBall(m, 1e-16)));
  }

  @Test
  void lastSiteCountsFastest() {
    assertEquals("g,2", TWO.label(2));
    assertEquals("e,0", TWO.label(3));
  }

  @Test
  void longMatricesAreSummedUp() {
    double[][] ones = new double[6][6];
    for (double[] row : ones) {
      java.util.Arrays.fill(row, 1);
    }
    // [closed form] 36 entries of one have the norm 6
    assertEquals("36 entries of norm 6", TWO.matrix(ComplexBall.exact(ComplexMatrix.real(ones))));
  }

  @Test
  void operatorsShowTheirParameters() {
    ComplexBall x = exact(0, 1, 1, 0, 0, 0, 0, 0);
    OperatorForm form = OperatorForm.constant(x).times(Scalar.parameter(0).plus(Scalar.ONE));
    assertEquals(List.of("|g><e| + |e><g|", "g * (|g><e| + |e><g|)"), ONE.terms(form));
  }

  @Test
  void statesAreKetsOrDensities() {
    ComplexMatrix ket = ComplexMatrix.real(new double[][] {{0.6}, {-0.8}});
    assertEquals("0.6 * |g> - 0.8 * |e>", ONE.state(new StateSpec.Pure(ComplexBall.exact(ket))));
    assertEquals(
        "0.25 * |g><g| + 0.75 * |e><e|",
        ONE.state(new StateSpec.Mixed(exact(0.25, 0, 0, 0.75, 0, 0, 0, 0))));
  }
}
