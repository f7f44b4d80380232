package blochbound.bound;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import blochbound.BigReference;
import blochbound.RandomDevices;
import blochbound.generator.BlochBasis;
import blochbound.linalg.BigMatrix;
import blochbound.linalg.Hermitian;
import java.math.BigDecimal;
import java.util.SplittableRandom;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

class RemainderNormsTest {
  /**
   * Coordinates of an exact matrix of two-level sites: they need sqrt(2)^-k, so an even number of
   * sites keeps them exact.
   */
  private static Hermitian matrix(SplittableRandom random, int n) {
    return new Hermitian(RandomDevices.hermitian(random, n));
  }

  @ParameterizedTest(name = "seed {0}")
  @ValueSource(longs = {1, 2, 3, 4, 5, 6, 7, 8, 9, 10, 11, 12})
  void boundsHoldForTheExactEigenvalues(long seed) {
    SplittableRandom random = new SplittableRandom(seed);
    boolean isLarge = seed % 2 == 0;
    BlochBasis basis = isLarge ? BlochBasis.of(2, 2, 2, 2) : BlochBasis.of(2, 2);
    RemainderNorms norms = new RemainderNorms(basis);
    for (int k = 0; k < (isLarge ? 2 : 12); k++) {
      Hermitian s = matrix(random, basis.levels());
      double[] r = basis.coordinates(s);
      double frobenius = norms.frobeniusUp(r);
      BigMatrix exact = BigMatrix.of(s.matrix());
      BigDecimal length = exact.squaredNorm().sqrt(BigReference.DIGITS);
      assertTrue(new BigDecimal(frobenius).compareTo(length) >= 0);
      assertEquals(length.doubleValue(), frobenius, 1e-13 * frobenius);
      int n = basis.levels();
      double spectral = norms.spectralUp(r, frobenius);
      // [independent] Sylvester's law of inertia in 90-digit decimals counts the eigenvalues
      assertEquals(0, exact.eigenvaluesBelow(new BigDecimal(-spectral)));
      assertEquals(n, exact.eigenvaluesBelow(new BigDecimal(spectral)));
      assertTrue(spectral <= frobenius);
      double negative = norms.negativePartUp(r, frobenius);
      assertEquals(0, exact.eigenvaluesBelow(new BigDecimal(-negative)));
      assertTrue(negative <= spectral * (1 + 1e-12));
      double least = norms.smallestEigenvalueDown(r, frobenius);
      assertEquals(0, exact.eigenvaluesBelow(new BigDecimal(least)));
      BigDecimal above = new BigDecimal(least + 1e-10 * frobenius);
      assertTrue(exact.eigenvaluesBelow(above) > 0, "the smallest eigenvalue is sharp");
    }
  }

  @Test
  void thePositivePartCostsNothing() {
    BlochBasis basis = BlochBasis.of(2, 2);
    RemainderNorms norms = new RemainderNorms(basis);
    Hermitian positive = Hermitian.identity(4).combine(3, matrix(new SplittableRandom(2), 4), 0.1);
    double[] r = basis.coordinates(positive);
    // [closed form] lambda_min > 0: the negative part is zero up to rounding
    assertEquals(0, norms.negativePartUp(r, norms.frobeniusUp(r)), 1e-13);
  }

  @Test
  void zeroHasNoNorm() {
    RemainderNorms norms = new RemainderNorms(BlochBasis.of(2, 2));
    // [closed form] all norms of the zero matrix are 0
    assertEquals(0, norms.frobeniusUp(new double[16]), 0);
    assertEquals(0, norms.spectralUp(new double[16], 0), 0);
    assertEquals(0, norms.negativePartUp(new double[16], 0), 0);
  }

  @ParameterizedTest
  @ValueSource(doubles = {1e-170, 1e-12, 1e12, 1e170})
  void boundsHoldAtAnySize(double size) {
    BlochBasis basis = BlochBasis.of(2, 2);
    RemainderNorms norms = new RemainderNorms(basis);
    double[] r = new double[16];
    r[15] = size;
    double frobenius = norms.frobeniusUp(r);
    assertTrue(frobenius >= size, "a norm must not underflow");
    // [closed form] Z Z / 2 has the eigenvalues 1/2 and -1/2
    assertTrue(norms.spectralUp(r, frobenius) >= 0.5 * size);
    assertTrue(norms.negativePartUp(r, frobenius) >= 0.5 * size);
  }
}
