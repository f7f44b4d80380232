package blochbound.cli;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.time.Duration;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.ValueSource;

class DurationTextTest {
  private static String message(Exception refusal) {
    return String.valueOf(refusal.getMessage());
  }

  // [closed form] 1 h = 60 min = 3600 s, 1 s = 1000 ms
  @ParameterizedTest
  @CsvSource({
    "60 s, 60000000000",
    "20s, 20000000000",
    "1ms, 1000000",
    "2 min, 120000000000",
    "0.5 s, 500000000",
    ".5s, 500000000",
    "5.s, 5000000000",
    "1.5h, 5400000000000",
    "0.0000015 s, 1500",
    "8760 h, 31536000000000000",
  })
  void durationsAreRead(String text, long nanoseconds) {
    assertEquals(Duration.ofNanos(nanoseconds), DurationText.parse(text));
  }

  @ParameterizedTest
  @ValueSource(
      strings = {
        "", "60", "s", "-1 s", "+1 s", "1 S", "1 sec", "1 s s", "1,5 s", "1e3 s", "NaN s", "1 m",
        "0x1p3 s", "1 us", ".s"
      })
  void otherTextsAreRefusedWithWhatIsAllowed(String text) {
    IllegalArgumentException refusal =
        assertThrows(IllegalArgumentException.class, () -> DurationText.parse(text));
    assertTrue(message(refusal).contains(DurationText.ALLOWED), message(refusal));
  }

  @ParameterizedTest
  @ValueSource(strings = {"0 s", "0.0000000001 s", "8760.1 h", "999999999999999 h"})
  void durationsOutOfRangeAreRefused(String text) {
    IllegalArgumentException refusal =
        assertThrows(IllegalArgumentException.class, () -> DurationText.parse(text));
    assertTrue(message(refusal).contains("at most 8760 h"), message(refusal));
  }
}
