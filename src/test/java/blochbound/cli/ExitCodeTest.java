package blochbound.cli;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;

import java.util.NoSuchElementException;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.EnumSource;

class ExitCodeTest {
  // [invariant] the order of severity that the help of certify promises
  @ParameterizedTest
  @CsvSource({"0,4,4", "4,3,3", "3,130,130", "130,6,6", "6,2,2", "2,1,1", "1,0,1", "4,4,4"})
  void worseOneWins(int first, int second, int worse) {
    assertEquals(worse, ExitCode.of(first).orWorse(ExitCode.of(second)).number());
    assertEquals(worse, ExitCode.of(second).orWorse(ExitCode.of(first)).number());
  }

  @ParameterizedTest
  @EnumSource
  void numbersNameOneCode(ExitCode code) {
    assertEquals(code, ExitCode.of(code.number()));
  }

  @Test
  void otherNumbersAreNoCodes() {
    assertThrows(NoSuchElementException.class, () -> ExitCode.of(77));
  }
}
