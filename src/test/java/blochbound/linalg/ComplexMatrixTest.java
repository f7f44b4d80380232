package blochbound.linalg;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertNotEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.math.BigDecimal;
import java.util.SplittableRandom;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;

/** Algebra of complex matrices: small whole numbers, so that every identity is exact. */
class ComplexMatrixTest {
  private static ComplexMatrix whole(SplittableRandom random, int rows, int columns) {
    double[] re = new double[rows * columns];
    double[] im = new double[rows * columns];
    for (int k = 0; k < re.length; k++) {
      re[k] = random.nextInt(-9, 10);
      im[k] = random.nextInt(-9, 10);
    }
    return ComplexMatrix.of(rows, columns, re, im);
  }

  /** Equality that does not tell the two zeros apart. */
  private static void assertSame(ComplexMatrix expected, ComplexMatrix actual) {
    assertEquals(0, expected.minus(actual).frobeniusNormUp(), () -> expected + "\n" + actual);
  }

  @ParameterizedTest(name = "seed {0}")
  @MethodSource("blochbound.Draws#seeds")
  void theLawsOfMatrixAlgebraHold(long seed) {
    SplittableRandom random = new SplittableRandom(seed);
    ComplexMatrix a = whole(random, 2, 3);
    ComplexMatrix b = whole(random, 3, 2);
    ComplexMatrix c = whole(random, 3, 2);
    // [invariant] distributive law, adjoint of a product, mixed-product rule of Kronecker
    assertSame(a.times(b).plus(a.times(c)), a.times(b.plus(c)));
    assertSame(b.adjoint().times(a.adjoint()), a.times(b).adjoint());
    assertSame(a.times(b).kron(b.times(a)), a.kron(b).times(b.kron(a)));
    assertSame(a.transpose().conjugate(), a.adjoint());
    assertSame(a.combine(2, a, -3), a.scale(-1));
    assertSame(a.scale(0, 1).scale(0, 1), a.scale(-1));
  }

  @ParameterizedTest(name = "seed {0}")
  @MethodSource("blochbound.Draws#seeds")
  void theTraceOfAProductNeedsNoProduct(long seed) {
    SplittableRandom random = new SplittableRandom(seed);
    ComplexMatrix a = whole(random, 2, 3);
    ComplexMatrix b = whole(random, 3, 2);
    // [invariant] tr(AB) = tr(BA)
    assertEquals(a.times(b).traceRe(), a.traceOfProduct(b));
    assertEquals(b.times(a).traceRe(), a.traceOfProduct(b));
    assertEquals(a.times(b).traceIm(), b.times(a).traceIm());
  }

  @ParameterizedTest(name = "seed {0}")
  @MethodSource("blochbound.Draws#seeds")
  void theFrobeniusNormIsBoundedAtEveryScale(long seed) {
    SplittableRandom random = new SplittableRandom(seed);
    ComplexMatrix a = Matrices.random(random, 3, 3, random.nextInt(-1074, 1000));
    BigDecimal bound = new BigDecimal(a.frobeniusNormUp());
    assertTrue(bound.pow(2).compareTo(BigMatrix.of(a).squaredNorm()) >= 0);
  }

  @Test
  void theLeftFactorOfAKroneckerProductIsMoreSignificant() {
    ComplexMatrix z = ComplexMatrix.real(new double[][] {{1, 0}, {0, -1}});
    // [closed form] Z (x) 1 = diag(1, 1, -1, -1)
    ComplexMatrix expected =
        ComplexMatrix.real(
            new double[][] {{1, 0, 0, 0}, {0, 1, 0, 0}, {0, 0, -1, 0}, {0, 0, 0, -1}});
    assertSame(expected, z.kron(ComplexMatrix.identity(2)));
  }

  @Test
  void outerProductsAndUnitsHaveTheirEntryInPlace() {
    ComplexMatrix a = ComplexMatrix.of(2, 1, new double[] {1, 0}, new double[] {0, 0});
    ComplexMatrix b = ComplexMatrix.of(2, 1, new double[] {0, 0}, new double[] {0, 1});
    // [closed form] |0><1| i^* = -i |0><1|
    assertSame(ComplexMatrix.unit(2, 0, 1).scale(0, -1), ComplexMatrix.outer(a, b));
  }

  @Test
  void shapesThatDoNotFitAreRefused() {
    ComplexMatrix a = ComplexMatrix.zero(2, 3);
    assertThrows(IllegalArgumentException.class, () -> a.plus(ComplexMatrix.zero(3, 2)));
    assertThrows(IllegalArgumentException.class, () -> a.times(ComplexMatrix.zero(2, 3)));
    assertThrows(IllegalArgumentException.class, () -> a.traceOfProduct(ComplexMatrix.zero(2, 3)));
    double[] three = new double[3];
    assertThrows(IllegalArgumentException.class, () -> ComplexMatrix.of(2, 2, three, three));
  }

  @Test
  void entriesAreCopiedAndCompared() {
    double[] re = {1, 2};
    ComplexMatrix m = ComplexMatrix.of(1, 2, re, new double[2]);
    re[0] = 5;
    assertEquals(1, m.re(0, 0));
    m.realParts()[0] = 7;
    assertEquals(1, m.re(0, 0));
    assertEquals(ComplexMatrix.real(new double[][] {{1, 2}}), m);
    assertEquals(ComplexMatrix.real(new double[][] {{1, 2}}).hashCode(), m.hashCode());
    assertNotEquals(ComplexMatrix.real(new double[][] {{1}, {2}}), m);
    assertTrue(m.isFinite());
    assertFalse(m.scale(Double.POSITIVE_INFINITY).isFinite());
  }
}
