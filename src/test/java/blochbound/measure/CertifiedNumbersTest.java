package blochbound.measure;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import blochbound.interval.Interval;
import blochbound.linalg.ComplexBall;
import blochbound.linalg.ComplexMatrix;
import blochbound.linalg.Hermitian;
import java.math.BigDecimal;
import java.util.SplittableRandom;
import org.junit.jupiter.api.Test;

/** The certified parts that several measures share, against 50-digit decimals. */
class CertifiedNumbersTest {
  @Test
  void logarithmIsEnclosed() {
    SplittableRandom random = new SplittableRandom(41);
    for (int k = 0; k < 300; k++) {
      double x = Math.exp(random.nextDouble(-40, 3));
      Interval log = LogBounds.log(Interval.of(x));
      // [independent] series in 50-digit decimals.
      BigDecimal truth = PreciseMeasures.log(new BigDecimal(x));
      assertTrue(new BigDecimal(log.lower()).compareTo(truth) <= 0);
      assertTrue(new BigDecimal(log.upper()).compareTo(truth) >= 0);
    }
  }

  @Test
  void entropyContinuityIsReachedByTheWorstPair() {
    // [closed form] (1, 0, 0) and (1-t, t/2, t/2): entropies differ by h(t) + t log 2.
    double t = 0.25;
    double h = -t * Math.log(t) - (1 - t) * Math.log(1 - t);
    assertEquals(h + t * Math.log(2), LogBounds.continuityUp(t, 3), 1e-14);
    // [closed form] beyond 1 - 1/d the bound is log d.
    assertEquals(Math.log(3), LogBounds.continuityUp(0.9, 3), 1e-14);
    assertEquals(0, LogBounds.continuityUp(0, 3));
  }

  @Test
  void traceOfProductAndSingularSumsAreEnclosed() {
    ExactStates draws = new ExactStates(42, 2, 2);
    for (int k = 0; k < 40; k++) {
      Hermitian a = draws.noise(2);
      Hermitian b = draws.noise(3);
      assertInside(
          PreciseMatrix.of(a).inner(PreciseMatrix.of(b)), OperatorArithmetic.traceOfProduct(a, b));
      // [independent] 50-digit eigenvalues: for Hermitian matrices their moduli.
      BigDecimal sum = BigDecimal.ZERO;
      BigDecimal most = BigDecimal.ZERO;
      for (BigDecimal value : PreciseMatrix.of(a).eigenvalues()) {
        sum = sum.add(value.abs());
        most = most.max(value.abs());
      }
      ComplexBall ball = ComplexBall.exact(a.matrix());
      assertInside(sum, NuclearNorm.enclosure(ball));
      assertInside(most.add(most).subtract(sum), NuclearNorm.signedSum(ball, -1));
      assertEquals(sum.doubleValue(), NuclearNorm.estimate(a.matrix()), 1e-14);
    }
  }

  @Test
  void spectralFunctionOfTheExactUnitaryReproducesTheMatrix() {
    ExactStates draws = new ExactStates(43, 2, 3);
    for (int k = 0; k < 20; k++) {
      Hermitian a = draws.noise(2);
      SpectralFrame frame = SpectralFrame.of(a);
      double[] values = new double[6];
      for (int i = 0; i < 6; i++) {
        values[i] = frame.value(i);
      }
      ApproximateOperator same = frame.withValues(values);
      double distance =
          PreciseMatrix.of(a).minus(PreciseMatrix.of(same.centre())).frobeniusNorm().doubleValue();
      assertTrue(distance <= same.error() + frame.residual());
      assertTrue(same.error() + frame.residual() < 1e-12);
    }
  }

  @Test
  void projectorIsIdempotentWithinItsError() {
    ExactStates draws = new ExactStates(44, 2, 2);
    for (int k = 0; k < 20; k++) {
      ApproximateOperator p = PositivePart.near(draws.noise(1)).projector();
      PreciseMatrix exact = PreciseMatrix.of(p.centre());
      double miss = exact.times(exact).minus(exact).frobeniusNorm().doubleValue();
      // [invariant] with P = Q + E, Q^2 = Q: |P^2 - P| <= (2 + 1 + |E|) |E|.
      assertTrue(miss <= 3.1 * p.error(), miss + " with " + p.error());
    }
  }

  @Test
  void positiveAndNegativeDefiniteMatricesHaveTrivialParts() {
    PositivePart positive = PositivePart.near(Hermitian.identity(3));
    assertEquals(0, positive.excessUp(0.5));
    PositivePart negative = PositivePart.near(Hermitian.identity(3).scale(-1));
    assertEquals(0, negative.excessUp(0.5));
    // [closed form] beyond the gap only the trace norm sqrt(3) e remains.
    assertEquals(2 * Math.sqrt(3), positive.excessUp(2), 1e-12);
  }

  @Test
  void partialTransposeIsAnInvolutionThatKeepsInnerProducts() {
    PartialTranspose transpose =
        new PartialTranspose(new int[] {2, 3, 2}, new boolean[] {true, false, true});
    ExactStates draws = new ExactStates(45, 4, 3);
    Hermitian a = draws.noise(1);
    Hermitian b = draws.noise(1);
    assertEquals(a, transpose.of(transpose.of(a)));
    assertEquals(transpose.of(a).inner(b), a.inner(transpose.of(b)), 1e-15);
    // [closed form] transposing every site is the transpose.
    PartialTranspose all = new PartialTranspose(new int[] {4, 3}, new boolean[] {true, true});
    assertEquals(a.matrix().transpose(), all.of(a).matrix());
  }

  @Test
  void singularValuesKeepRelativeAccuracy() {
    // [closed form] columns of lengths 1 and 1e-20, orthogonal.
    ComplexMatrix graded = ComplexMatrix.real(new double[][] {{1, 1e-20}, {1, -1e-20}});
    double[] re = graded.transpose().realParts();
    double[] im = new double[4];
    OneSidedJacobi.orthogonalise(re, im, 2, 2, new double[0], new double[0]);
    assertEquals(1e-20 * Math.sqrt(2), OneSidedJacobi.length(re, im, 2, 1), 1e-35);
  }

  private static void assertInside(BigDecimal truth, Interval enclosure) {
    assertTrue(
        new BigDecimal(enclosure.lower()).compareTo(truth) <= 0
            && new BigDecimal(enclosure.upper()).compareTo(truth) >= 0,
        truth + " outside " + enclosure);
  }
}
