package blochbound.bound;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import blochbound.generator.MultiIndexTable;
import java.math.BigDecimal;
import java.util.Arrays;
import java.util.SplittableRandom;
import java.util.stream.LongStream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;

class PolynomialRangeTest {
  static LongStream seeds() {
    return LongStream.range(0, Integer.getInteger("blochbound.soak", 150));
  }

  private static BigDecimal value(double[] c, MultiIndexTable table, double[] x) {
    BigDecimal sum = BigDecimal.ZERO;
    for (int a = 0; a < c.length; a++) {
      if (c[a] != 0) {
        BigDecimal product = new BigDecimal(c[a]);
        for (int variable : table.factors(a)) {
          product = product.multiply(new BigDecimal(x[variable]));
        }
        sum = sum.add(product);
      }
    }
    return sum;
  }

  private static double minimum(double[] c, MultiIndexTable table) {
    PolynomialRange range = new PolynomialRange(table.variables());
    range.minimise(c, table, c.length);
    return range.certifiedMinimum();
  }

  @ParameterizedTest(name = "seed {0}")
  @MethodSource("seeds")
  void theBoundIsNeverAboveAValueInExactDecimals(long seed) {
    SplittableRandom random = new SplittableRandom(seed);
    int m = random.nextInt(1, 7);
    int degree = random.nextInt(1, 5);
    MultiIndexTable table = MultiIndexTable.of(m, degree + 1);
    double[] c = new double[table.firstOfDegree(degree + 1)];
    for (int a = 0; a < c.length; a++) {
      // Falling sizes make some variables monotone; equal ones leave many ties.
      double size = seed % 2 == 0 ? Math.scalb(1.0, -2 * table.degree(a)) : 1;
      c[a] = random.nextInt(3) == 0 ? 0 : size * random.nextDouble(-1, 1);
    }
    PolynomialRange range = new PolynomialRange(m);
    range.minimise(c, table, c.length);
    BigDecimal bound = new BigDecimal(range.certifiedMinimum());
    double[] guess = range.minimiser().clone();
    assertTrue(value(c, table, guess).compareTo(bound) >= 0);
    for (int k = 0; k < 40; k++) {
      boolean isVertex = k % 2 == 0;
      double[] x = random.doubles(m, -1, 1).map(v -> isVertex ? Math.copySign(1, v) : v).toArray();
      assertTrue(value(c, table, x).compareTo(bound) >= 0, () -> Arrays.toString(x));
    }
  }

  @ParameterizedTest(name = "seed {0}")
  @MethodSource("seeds")
  void multilinearFormsAreBoundedBelowTheirBestVertex(long seed) {
    SplittableRandom random = new SplittableRandom(seed);
    int m = random.nextInt(2, 5);
    MultiIndexTable table = MultiIndexTable.of(m, 3);
    double[] c = new double[table.firstOfDegree(3)];
    for (int a = 0; a < c.length; a++) {
      // Small whole numbers: every sum is exact, so only the rounding term keeps a distance.
      boolean isSquare = table.degree(a) == 2 && table.isEven(a);
      c[a] = isSquare ? 0 : random.nextInt(-4, 5);
    }
    double least = Double.POSITIVE_INFINITY;
    for (int vertex = 0; vertex < 1 << m; vertex++) {
      double[] x = new double[m];
      for (int j = 0; j < m; j++) {
        x[j] = (vertex >> j) % 2 == 0 ? -1 : 1;
      }
      least = Math.min(least, value(c, table, x).doubleValue());
    }
    // [closed form] a multilinear form is least at a vertex of the cube
    assertTrue(minimum(c, table) <= least);
  }

  @Test
  void monotonePolynomialsAreBoundedAtTheirVertex() {
    MultiIndexTable table = MultiIndexTable.of(2, 3);
    double[] c = new double[table.count()];
    c[0] = 1;
    c[1] = 4;
    c[2] = -5;
    c[table.plus(1, 1)] = 0.5;
    c[table.plus(table.plus(1, 0), 1)] = 0.25;
    // [closed form] 1 + 4x - 5y + xy/2 + x^2 y/4 falls to the vertex (-1, 1):
    // 1 - 4 - 5 - 1/2 + 1/4 = -8.25
    assertEquals(-8.25, minimum(c, table), 1e-12);
    assertTrue(minimum(c, table) <= -8.25);
  }

  @Test
  void monotonyThatAppearsOnceAnotherVariableIsFixedIsUsed() {
    MultiIndexTable table = MultiIndexTable.of(2, 2);
    double[] c = new double[table.count()];
    c[1] = 3;
    c[2] = 0.5;
    c[table.plus(1, 1)] = 1;
    // [closed form] 3x + y/2 + xy: x = -1 is sure, then y/2 - y = -y/2 falls to y = 1
    assertEquals(-3.5, minimum(c, table), 1e-12);
  }

  @Test
  void aVariableThatIsNotSureIsNotFixed() {
    MultiIndexTable table = MultiIndexTable.of(2, 2);
    double[] c = new double[table.count()];
    c[1] = 1;
    c[2] = 2;
    c[table.plus(1, 1)] = 1.5;
    // [closed form] x + 2y + 1.5 xy is -2.5 at (1, -1), although x alone would choose -1
    assertEquals(-2.5, minimum(c, table), 1e-12);
    assertTrue(minimum(c, table) <= -2.5);
  }

  @Test
  void aParabolaIsBoundedAtItsLowestPoint() {
    MultiIndexTable table = MultiIndexTable.of(2, 2);
    double[] c = new double[table.count()];
    c[1] = 1;
    c[table.plus(1, 0)] = 2;
    c[table.plus(2, 1)] = -3;
    PolynomialRange range = new PolynomialRange(2);
    range.minimise(c, table, c.length);
    // [closed form] x + 2 x^2 has -1/8 at x = -1/4; -3 y^2 has -3 at the ends
    assertEquals(-3.125, range.certifiedMinimum(), 1e-12);
    assertEquals(-0.25, range.minimiser()[0], 0);
    assertEquals(1, Math.abs(range.minimiser()[1]), 0);
  }

  @Test
  void noVariablesLeaveTheConstant() {
    MultiIndexTable table = MultiIndexTable.of(0, 2);
    // [invariant] a constant is its own minimum, rounded downwards
    assertEquals(0.3, minimum(new double[] {0.3}, table), 1e-12);
    assertTrue(minimum(new double[] {0.3}, table) <= 0.3);
  }

  @Test
  void aWorkspaceKeepsNothingFromThePolynomialBefore() {
    MultiIndexTable table = MultiIndexTable.of(3, 3);
    SplittableRandom random = new SplittableRandom(4);
    double[] first = random.doubles(table.count(), -1, 1).toArray();
    double[] second = random.doubles(table.firstOfDegree(3), -1, 1).toArray();
    PolynomialRange used = new PolynomialRange(3);
    used.minimise(first, table, first.length);
    used.minimise(second, table, second.length);
    PolynomialRange fresh = new PolynomialRange(3);
    fresh.minimise(second, table, second.length);
    // [invariant] the same polynomial, the same bound
    assertEquals(fresh.certifiedMinimum(), used.certifiedMinimum(), 0);
    assertArrayEquals(fresh.minimiser(), used.minimiser(), 0);
  }
}
