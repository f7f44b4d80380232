package blochbound.linalg;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;

import java.util.SplittableRandom;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;

/** A matrix that equals its adjoint to the last bit stays one. */
class HermitianTest {
  @ParameterizedTest(name = "seed {0}")
  @MethodSource("blochbound.Draws#seeds")
  void partsCombinationsAndRebuiltMatricesAreHermitianToTheLastBit(long seed) {
    SplittableRandom random = new SplittableRandom(seed);
    int n = random.nextInt(1, 6);
    Hermitian a = Matrices.hermitian(random, n, random.nextInt(-300, 300));
    Hermitian b = Matrices.hermitian(random, n, random.nextInt(-300, 300));
    // Each constructor checks the symmetry exactly.
    Hermitian sum = a.combine(random.nextDouble(), b, -random.nextDouble());
    assertEquals(n, sum.shift(0.3).scale(1 / 3.0).size());
    assertEquals(n, a.eigen().withValues(a.eigen().values()).size());
    // [invariant] tr(AB) is real and symmetric
    assertEquals(
        a.inner(b),
        b.inner(a),
        1e-13 * Math.abs(a.matrix().frobeniusNorm() * b.matrix().frobeniusNorm()));
  }

  @Test
  void theHermitianPartOfAMatrixIsTheMeanWithItsAdjoint() {
    ComplexMatrix m = ComplexMatrix.of(2, 2, new double[] {1, 4, 2, 3}, new double[] {5, 1, 3, 7});
    Hermitian part = Hermitian.part(m);
    // [closed form] (m + m^+)/2 = [[1, 3 - i], [3 + i, 3]]
    assertEquals(1, part.re(0, 0));
    assertEquals(0, Math.abs(part.im(0, 0)));
    assertEquals(3, part.re(0, 1));
    assertEquals(-1, part.im(0, 1));
    assertEquals(1, part.im(1, 0));
    assertEquals(4, part.trace());
  }

  @Test
  void whatDiffersFromItsAdjointIsRefused() {
    ComplexMatrix raise = ComplexMatrix.unit(2, 1, 0);
    assertThrows(IllegalArgumentException.class, () -> new Hermitian(raise));
    ComplexMatrix imaginary = ComplexMatrix.identity(1).scale(0, 1);
    assertThrows(IllegalArgumentException.class, () -> new Hermitian(imaginary));
    ComplexMatrix flat = ComplexMatrix.zero(1, 2);
    assertThrows(IllegalArgumentException.class, () -> new Hermitian(flat));
    ComplexMatrix broken = ComplexMatrix.identity(1).scale(Double.NaN);
    assertThrows(IllegalArgumentException.class, () -> new Hermitian(broken));
  }
}
