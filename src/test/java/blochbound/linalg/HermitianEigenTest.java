package blochbound.linalg;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import blochbound.BigReference;
import blochbound.interval.Interval;
import java.math.BigDecimal;
import java.util.List;
import java.util.SplittableRandom;
import java.util.stream.Stream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;

/** Eigenvalues against published ones and against exact inertia. */
class HermitianEigenTest {
  private static final double[][] ROSSER = {
    {611, 196, -192, 407, -8, -52, -49, 29},
    {196, 899, 113, -192, -71, -43, -8, -44},
    {-192, 113, 899, 196, 61, 49, 8, 52},
    {407, -192, 196, 611, 8, 44, 59, -23},
    {-8, -71, 61, 8, 411, -599, 208, 208},
    {-52, -43, 49, 44, -599, 411, 208, 208},
    {-49, -8, 8, 59, 208, 208, 99, -911},
    {29, -44, 52, -23, 208, 208, -911, 99}
  };

  private static HermitianEigen eigen(double[][] rows) {
    return new Hermitian(ComplexMatrix.real(rows)).eigen();
  }

  /** The proved bound holds without any tolerance, and is small enough to be of use. */
  private static void assertProved(List<BigDecimal> ascending, HermitianEigen eigen, double most) {
    double bound = eigen.errorBound();
    for (int k = 0; k < ascending.size(); k++) {
      BigDecimal error = new BigDecimal(eigen.value(k)).subtract(ascending.get(k)).abs();
      assertTrue(error.compareTo(new BigDecimal(bound)) <= 0, eigen.value(k) + " +- " + bound);
    }
    assertTrue(bound <= most, "the error bound " + bound + " is of no use");
    assertContains(eigen.smallest(), ascending.get(0));
    assertContains(eigen.largest(), ascending.get(ascending.size() - 1));
  }

  private static void assertContains(Interval interval, BigDecimal exact) {
    assertTrue(new BigDecimal(interval.lower()).compareTo(exact) <= 0);
    assertTrue(new BigDecimal(interval.upper()).compareTo(exact) >= 0);
  }

  private static BigDecimal root(long radicand) {
    return BigDecimal.valueOf(radicand).sqrt(BigReference.DIGITS);
  }

  @Test
  void rossersEigenvaluesLieWithinTheErrorBound() {
    BigDecimal ten = BigDecimal.TEN;
    BigDecimal hundred = BigDecimal.valueOf(100);
    BigDecimal middle = BigDecimal.valueOf(510);
    // [published] Rosser, Lanczos, Hestenes, Karush, J. Res. NBS 47 (1951) 291, from memory:
    // 0, 1000 (twice), 1020, 510 +- 100 sqrt(26), +- 10 sqrt(10405)
    List<BigDecimal> exact =
        Stream.of(
                BigDecimal.ZERO,
                BigDecimal.valueOf(1000),
                BigDecimal.valueOf(1000),
                BigDecimal.valueOf(1020),
                middle.add(hundred.multiply(root(26))),
                middle.subtract(hundred.multiply(root(26))),
                ten.multiply(root(10405)),
                ten.multiply(root(10405)).negate())
            .sorted()
            .toList();
    assertProved(exact, eigen(ROSSER), 1e-9);
  }

  @Test
  void wilkinsonsCloseEigenvaluesLieWithinTheErrorBound() {
    double[][] w = new double[21][21];
    for (int i = 0; i < 21; i++) {
      w[i][i] = Math.abs(10 - i);
      if (i > 0) {
        w[i][i - 1] = 1;
        w[i - 1][i] = 1;
      }
    }
    HermitianEigen eigen = eigen(w);
    double bound = eigen.errorBound();
    // [published] Wilkinson, The Algebraic Eigenvalue Problem (1965), from memory: the top pair of
    // W21+ is 10.746194182903321832, 10.746194182903393432, the smallest -1.12544152211998422
    BigDecimal top = new BigDecimal("10.746194182903393432");
    BigDecimal second = new BigDecimal("10.746194182903321832");
    BigDecimal least = new BigDecimal("-1.12544152211998422");
    BigDecimal allowed = new BigDecimal(bound);
    assertTrue(top.subtract(new BigDecimal(eigen.value(20))).abs().compareTo(allowed) <= 0);
    assertTrue(second.subtract(new BigDecimal(eigen.value(19))).abs().compareTo(allowed) <= 0);
    assertTrue(least.subtract(new BigDecimal(eigen.value(0))).abs().compareTo(allowed) <= 0);
    assertContains(eigen.largest(), top);
    assertTrue(bound <= 1e-11);
    // The pair is 7.16e-14 apart: an honest enclosure of the larger one holds the other as well
    // unless the error bound is smaller than that.
    assertTrue(bound < 7.16e-14 || eigen.largest().contains(second.doubleValue()));
  }

  @Test
  void hilbertsEigenvaluesLieWithinTheErrorBound() {
    double[][] h = new double[4][4];
    for (int i = 0; i < 4; i++) {
      for (int j = 0; j < 4; j++) {
        // 420 is a multiple of 1..7, so that the entries are exact.
        h[i][j] = 420.0 / (i + j + 1);
      }
    }
    // [published] eigenvalues of the Hilbert matrix of order 4, digits from memory
    List<BigDecimal> exact =
        Stream.of(
                "9.67023040225868855e-5",
                "6.73827360576074795e-3",
                "0.169141220221450032",
                "1.50021428005924282")
            .map(text -> new BigDecimal(text).multiply(BigDecimal.valueOf(420)))
            .toList();
    HermitianEigen eigen = eigen(h);
    assertProved(exact, eigen, 1e-10);
    double product = 1;
    for (double value : eigen.values()) {
      product *= value / 420;
    }
    // [published] det = 1/6048000
    assertEquals(1.0 / 6048000, product, 1e-12 / 6048000 * 1e4);
  }

  @ParameterizedTest(name = "seed {0}")
  @MethodSource("blochbound.Draws#seeds")
  void everyEigenvalueLiesWithinTheErrorBoundByExactInertia(long seed) {
    SplittableRandom random = new SplittableRandom(seed);
    int n = random.nextInt(1, 6);
    Hermitian matrix = Matrices.hermitian(random, n, random.nextInt(-40, 40));
    if (random.nextInt(3) == 0) {
      // A matrix of low rank has many equal eigenvalues.
      ComplexMatrix column = Matrices.random(random, n, 1, 0);
      matrix = Hermitian.part(ComplexMatrix.outer(column, column));
    }
    HermitianEigen eigen = matrix.eigen();
    BigMatrix exact = BigMatrix.of(matrix.matrix());
    double bound = eigen.errorBound();
    assertTrue(bound <= 1e-11 * matrix.matrix().frobeniusNormUp() + 1e-300);
    // A nudge far below the bound keeps the shift off exact eigenvalues.
    BigDecimal nudge = new BigDecimal(bound).multiply(new BigDecimal("1e-30"));
    for (int k = 0; k < n; k++) {
      BigDecimal value = new BigDecimal(eigen.value(k));
      BigDecimal below = value.subtract(new BigDecimal(bound)).subtract(nudge);
      BigDecimal above = value.add(new BigDecimal(bound)).add(nudge);
      // [invariant] Sylvester: at most k eigenvalues below, at least k + 1 up to the k-th
      if (bound > 0) {
        assertTrue(exact.eigenvaluesBelow(below) <= k);
        assertTrue(exact.eigenvaluesBelow(above) >= k + 1);
      }
    }
  }

  @Test
  void theErrorBoundIsTrueWhereSquaresUnderflow() {
    // [closed form] eigenvalues of [[0, x], [x, 0]] are -x and x
    for (double x : new double[] {1e-120, 1e-170, 1e-300, 1e-310}) {
      HermitianEigen eigen = eigen(new double[][] {{0, x}, {x, 0}});
      assertProved(List.of(new BigDecimal(-x), new BigDecimal(x)), eigen, 10 * x + 1e-320);
    }
  }

  @Test
  void vectorsRebuildTheMatrix() {
    Hermitian m = Matrices.hermitian(new SplittableRandom(5), 5, 0);
    HermitianEigen eigen = m.eigen();
    // [invariant] V diag(values) V^+ is the matrix, V^+ V the unit matrix
    Hermitian rebuilt = eigen.withValues(eigen.values());
    assertTrue(rebuilt.combine(1, m, -1).matrix().frobeniusNorm() < 1e-13);
    assertTrue(eigen.orthogonalityDefect() < 1e-12);
    for (int k = 0; k < 5; k++) {
      ComplexMatrix v = eigen.vector(k);
      ComplexMatrix residual = m.matrix().times(v).minus(v.scale(eigen.value(k)));
      assertTrue(residual.frobeniusNorm() < 1e-13);
    }
  }

  @Test
  void oneLevelZeroAndDiagonalMatricesAreExact() {
    assertEquals(-3, eigen(new double[][] {{-3}}).value(0));
    assertEquals(0, new Hermitian(ComplexMatrix.zero(3, 3)).eigen().value(2));
    HermitianEigen diagonal = eigen(new double[][] {{2, 0}, {0, -1}});
    assertEquals(-1, diagonal.value(0));
    assertEquals(2, diagonal.value(1));
    assertTrue(diagonal.errorBound() < 1e-13);
  }
}
