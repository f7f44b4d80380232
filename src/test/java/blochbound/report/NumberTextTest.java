package blochbound.report;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.math.BigDecimal;
import java.math.RoundingMode;
import java.util.SplittableRandom;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.ValueSource;

class NumberTextTest {
  // [invariant] the text is the decimal of the left column, in the notation of the class comment
  @ParameterizedTest
  @CsvSource({
    "0, 0",
    "0.00, 0.00",
    "0E+5, 0",
    "0E-30, 0",
    "0.90, 0.90",
    "-0.5, -0.5",
    "2E+4, 20000",
    "123456789, 123456789",
    "1234567890, 1.234567890e9",
    "-1E+300, -1e300",
    "0.00001, 0.00001",
    "0.0000012, 1.2e-6",
    "-1E-300, -1e-300",
  })
  void exactKeepsEveryDigit(String decimal, String text) {
    assertEquals(text, NumberText.exact(new BigDecimal(decimal)));
    assertEquals(0, new BigDecimal(decimal).compareTo(new BigDecimal(text)));
  }

  // [invariant] the decimal literals are the shortest ones that name these doubles
  @ParameterizedTest
  @CsvSource({
    "0.1, 0.1",
    "-0.0, 0",
    "0.915139, 0.915139",
    "1e23, 1e23",
    "2e-3, 0.002",
    "4.9e-324, 5e-324",
    "1.7976931348623157e308, 1.7976931348623157e308",
    "0.30000000000000004, 0.30000000000000004",
    "-15, -15",
  })
  void shortestIsShort(double value, String text) {
    assertEquals(text, NumberText.shortest(value));
  }

  @ParameterizedTest(name = "seed {0}")
  @ValueSource(longs = {1, 2, 3})
  void shortestReadsBackAsTheSameDouble(long seed) {
    SplittableRandom random = new SplittableRandom(seed);
    for (int i = 0; i < 2000; i++) {
      double value = Double.longBitsToDouble(random.nextLong());
      if (Double.isFinite(value)) {
        assertEquals(value + 0.0, Double.parseDouble(NumberText.shortest(value)));
      }
    }
  }

  @Test
  void shortestRefusesWhatIsNoNumber() {
    assertThrows(IllegalArgumentException.class, () -> NumberText.shortest(Double.NaN));
    assertThrows(
        IllegalArgumentException.class, () -> NumberText.shortest(Double.NEGATIVE_INFINITY));
  }

  // [closed form] decimal rounding by hand
  @ParameterizedTest
  @CsvSource({
    "0.91999, 3, FLOOR, 0.919",
    "0.91901, 3, CEILING, 0.920",
    "-0.91901, 3, FLOOR, -0.920",
    "1234.5, -2, FLOOR, 1200",
    "0, 4, FLOOR, 0.0000",
    "1e-9, 3, CEILING, 0.001",
    "-1e-9, 3, FLOOR, -0.001",
    "1e-9, 3, FLOOR, 0.000",
  })
  void roundedGoesTheWayItIsTold(double value, int scale, RoundingMode mode, String text) {
    assertEquals(text, NumberText.rounded(value, scale, mode));
  }

  // [closed form] decimal rounding by hand
  @ParameterizedTest
  @CsvSource({
    "0.0142379, 3, FLOOR, 0.0142",
    "-0.0142379, 3, FLOOR, -0.0143",
    "99999, 3, HALF_EVEN, 100000",
    "1.0, 3, HALF_EVEN, 1",
    "0, 3, HALF_EVEN, 0",
    "3.14159e-12, 3, HALF_EVEN, 3.14e-12",
  })
  void significantKeepsThatManyDigits(double value, int digits, RoundingMode mode, String text) {
    assertEquals(text, NumberText.significant(value, digits, mode));
  }

  @Test
  void valuesThatAreNoNumbersAreWords() {
    assertEquals("undefined", NumberText.rounded(Double.NaN, 3, RoundingMode.FLOOR));
    assertEquals("-infinity", NumberText.rounded(Double.NEGATIVE_INFINITY, 3, RoundingMode.FLOOR));
    assertEquals(
        "infinity", NumberText.significant(Double.POSITIVE_INFINITY, 3, RoundingMode.FLOOR));
  }

  @Test
  void everyTextIsAJsonNumber() {
    String grammar = "-?(0|[1-9][0-9]*)(\\.[0-9]+)?(e-?[0-9]+)?";
    SplittableRandom random = new SplittableRandom(4);
    for (int i = 0; i < 2000; i++) {
      double value = Double.longBitsToDouble(random.nextLong());
      if (Double.isFinite(value)) {
        String text = NumberText.shortest(value);
        assertTrue(text.matches(grammar), text);
      }
    }
  }
}
