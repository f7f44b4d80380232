package blochbound.generator;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertSame;

import java.util.Arrays;
import java.util.stream.IntStream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

class MultiIndexTableTest {
  private static long binomial(int n, int k) {
    return k == 0 ? 1 : binomial(n - 1, k - 1) * n / k;
  }

  @ParameterizedTest
  @CsvSource({"0, 1", "0, 4", "1, 1", "1, 5", "2, 3", "3, 4", "6, 3", "10, 2"})
  void thereAreAsManyAsTheBinomialCoefficientSays(int m, int order) {
    MultiIndexTable table = MultiIndexTable.of(m, order);
    // [closed form] C(m + k, k) multi-indices of m variables up to degree k
    assertEquals(binomial(m + order, order), table.count());
    assertEquals(table.count(), MultiIndexTable.count(m, order), 0);
    for (int degree = 1; degree <= order + 1; degree++) {
      assertEquals(binomial(m + degree - 1, degree - 1), table.firstOfDegree(degree));
    }
    assertSame(table, MultiIndexTable.of(m, order));
  }

  @ParameterizedTest
  @CsvSource({"1, 5", "2, 4", "3, 4", "5, 3"})
  void sumsAddTheFactors(int m, int order) {
    MultiIndexTable table = MultiIndexTable.of(m, order);
    for (int a = 0; a < table.count(); a++) {
      for (int b = 0; table.degree(a) + table.degree(b) <= order; b++) {
        int[] expected =
            IntStream.concat(Arrays.stream(table.factors(a)), Arrays.stream(table.factors(b)))
                .sorted()
                .toArray();
        assertArrayEquals(expected, table.factors(table.sum(a, b)));
        assertEquals(table.sum(a, b), table.sum(b, a));
        if (b + 1 == table.count()) {
          break;
        }
      }
    }
  }

  @ParameterizedTest
  @CsvSource({"1, 5", "2, 5", "3, 4", "5, 3"})
  void multinomialsAddUpToPowers(int m, int order) {
    MultiIndexTable table = MultiIndexTable.of(m, order);
    for (int degree = 0; degree <= order; degree++) {
      double sum = 0;
      int first = degree == 0 ? 0 : table.firstOfDegree(degree);
      for (int a = first; a < table.firstOfDegree(degree + 1); a++) {
        sum += table.multinomial(a);
      }
      // [closed form] multinomial theorem at (1, .., 1): m^degree
      assertEquals(Math.pow(m, degree), sum, 0);
    }
  }

  @Test
  void evenMeansThatEveryExponentIsEven() {
    MultiIndexTable table = MultiIndexTable.of(2, 4);
    for (int a = 0; a < table.count(); a++) {
      long ofFirst = Arrays.stream(table.factors(a)).filter(v -> v == 0).count();
      long ofSecond = table.degree(a) - ofFirst;
      assertEquals(ofFirst % 2 == 0 && ofSecond % 2 == 0, table.isEven(a));
      // [closed form] binomial coefficient for two variables
      assertEquals(binomial(table.degree(a), (int) ofFirst), table.multinomial(a), 0);
    }
  }
}
