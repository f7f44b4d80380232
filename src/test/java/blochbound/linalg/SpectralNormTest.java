package blochbound.linalg;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.SplittableRandom;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

class SpectralNormTest {
  @ParameterizedTest(name = "{0} rows, seed 11")
  @ValueSource(ints = {1, 2, 3, 4, 9, 16})
  void upperBoundIsNotBelowTheCertifiedLargestEigenvalue(int n) {
    SplittableRandom random = new SplittableRandom(11);
    for (int draw = 0; draw < 60; draw++) {
      Hermitian s = random(random, n);
      HermitianEigen eigen = s.eigen();
      double error = eigen.errorBound();
      double exactAtLeast =
          Math.max(Math.abs(eigen.value(0)), Math.abs(eigen.value(n - 1))) - error;
      double bound = SpectralNorm.upperBound(s);
      assertTrue(bound >= exactAtLeast, bound + " below " + exactAtLeast);
      // [closed form] (tr S^16)^(1/16) <= n^(1/16) |S|, with room for rounding.
      double most = Math.pow(n, 1.0 / 16) * (exactAtLeast + 2 * error) * (1 + 1e-12);
      assertTrue(bound <= most, bound + " above " + most);
    }
  }

  @Test
  void dominantEigenvalueIsMetToRounding() {
    // [closed form] |psi><psi| + 0.1 (1 - |psi><psi|) has norm 1.
    Hermitian s =
        Hermitian.part(
            ComplexMatrix.real(new double[][] {{0.55, 0.45, 0}, {0.45, 0.55, 0}, {0, 0, 0.1}}));
    // [closed form] tr S^16 = 1 + 2e-16.
    assertEquals(1, SpectralNorm.upperBound(s), 1e-14);
    assertTrue(SpectralNorm.upperBound(s) >= 1);
  }

  @Test
  void signedPermutationsAreBoundedByOneAndAtMostTheSixteenthRootOfTheirSize() {
    // [closed form] the unit matrix of 4 rows: 4^(1/16) = 1.0905077326652577.
    double bound = SpectralNorm.upperBound(Hermitian.identity(4));
    assertTrue(bound >= 1.0905077326652575 && bound <= 1.09050773266527, "" + bound);
  }

  @ParameterizedTest(name = "scale {0}")
  @ValueSource(doubles = {1e-310, 1e-300, 1e-160, 1e150, 1e300})
  void extremeScalesNeitherOverflowNorUnderflow(double scale) {
    Hermitian s = new Hermitian(ComplexMatrix.real(new double[][] {{0, scale}, {scale, 0}}));
    double bound = SpectralNorm.upperBound(s);
    assertTrue(bound >= scale, "" + bound);
    // [closed form] 2^(1/16) = 1.0442737824274138.
    assertTrue(bound <= scale * 1.04427378243, "" + bound);
  }

  @Test
  void zeroIsBoundedByZeroAndInfiniteEntriesByInfinity() {
    assertEquals(0, SpectralNorm.upperBound(Hermitian.identity(3).scale(0)));
    double[] re = {Double.NaN, 0, 0, 1};
    assertEquals(
        Double.POSITIVE_INFINITY,
        SpectralNorm.upperBound(re, new double[4], 2, new double[SpectralNorm.scratchLength(2)]));
  }

  @Test
  void shortScratchIsRefused() {
    assertThrows(
        IllegalArgumentException.class,
        () -> SpectralNorm.upperBound(new double[4], new double[4], 2, new double[15]));
  }

  private static Hermitian random(SplittableRandom random, int n) {
    double[] re = new double[n * n];
    double[] im = new double[n * n];
    for (int k = 0; k < re.length; k++) {
      re[k] = random.nextDouble(-1, 1);
      im[k] = random.nextDouble(-1, 1);
    }
    return Hermitian.part(ComplexMatrix.of(n, n, re, im));
  }
}
