package blochbound.report;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertNotEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import blochbound.model.Requirement.Sense;
import blochbound.model.Unit;
import blochbound.study.RequirementResult;
import blochbound.study.Verdict;
import java.math.BigDecimal;
import java.util.SplittableRandom;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.ValueSource;

class BracketDigitsTest {
  private static RequirementResult result(
      Sense sense, String limit, double guaranteed, double found, double nominal) {
    return HandMade.full(
        HandMade.requirement("r", sense, limit, Unit.NONE),
        guaranteed,
        found,
        nominal,
        Verdict.UNDECIDED);
  }

  // [closed form] guaranteed and found differ in the given decimal; one more is shown
  @ParameterizedTest
  @CsvSource({
    "0.9, 0.9142, 0.915139, 0.95, 5",
    "0.9, 0.91, 0.93, 0.95, 4",
    "0.9, 0.91500, 0.915012, 0.95, 6",
    "900, 914.2, 915.139, 952, 2",
    "9e9, 9.142e9, 9.2e9, 9.5e9, -6",
  })
  void bracketShowsWithTwoDigits(
      String limit, double guaranteed, double found, double nominal, int scale) {
    BracketDigits digits =
        BracketDigits.of(result(Sense.AT_LEAST, limit, guaranteed, found, nominal));
    assertEquals(scale, digits.scale());
  }

  @ParameterizedTest(name = "seed {0}")
  @ValueSource(longs = {1, 2, 3, 4})
  void certifiedIsNeverRoundedToTheUnsafeSide(long seed) {
    SplittableRandom random = new SplittableRandom(seed);
    for (int i = 0; i < 1000; i++) {
      double size = Math.pow(10, random.nextInt(-12, 12));
      double found = size * (random.nextDouble() - 0.5);
      double width = Math.abs(found) * Math.pow(10, -random.nextInt(1, 16)) * random.nextDouble();
      Sense sense = random.nextBoolean() ? Sense.AT_LEAST : Sense.AT_MOST;
      double guaranteed = found - sense.sign() * width;
      BracketDigits digits =
          BracketDigits.of(result(sense, "0.5", guaranteed, found, found + sense.sign() * size));
      BigDecimal shown = new BigDecimal(digits.certified(guaranteed));
      BigDecimal exact = new BigDecimal(guaranteed);
      assertTrue(sense.sign() * shown.compareTo(exact) <= 0, shown + " for " + exact);
      BigDecimal shownFound = new BigDecimal(digits.estimate(found));
      assertTrue(sense.sign() * shown.compareTo(shownFound) <= 0, "order of the bracket");
    }
  }

  @ParameterizedTest(name = "seed {0}")
  @ValueSource(longs = {1, 2, 3, 4})
  void sideOfTheLimitIsVisible(long seed) {
    SplittableRandom random = new SplittableRandom(seed);
    BigDecimal limit = new BigDecimal("0.9");
    for (int i = 0; i < 1000; i++) {
      double beyond = Math.pow(10, -random.nextInt(1, 15)) * (0.1 + random.nextDouble());
      double found = 0.9 - beyond;
      double guaranteed = found - 0.1 * random.nextDouble();
      BracketDigits digits =
          BracketDigits.of(result(Sense.AT_LEAST, "0.9", guaranteed, found, 0.95));
      assertTrue(new BigDecimal(digits.estimate(found)).compareTo(limit) < 0, "refuted");
      digits =
          BracketDigits.of(result(Sense.AT_LEAST, "0.9", 0.9 + beyond, 0.9 + 2 * beyond, 0.95));
      assertTrue(new BigDecimal(digits.certified(0.9 + beyond)).compareTo(limit) >= 0, "certified");
    }
  }

  @Test
  void foundAndGuaranteedDifferInPrintWhenTheyDoInFact() {
    BracketDigits digits =
        BracketDigits.of(result(Sense.AT_LEAST, "0.9", 0.9151384, 0.915139, 0.95));
    assertNotEquals(digits.certified(0.9151384), digits.estimate(0.915139));
  }

  // [closed form] differences to the limit by hand
  @Test
  void marginIsRoundedDownAndSigned() {
    BracketDigits least = BracketDigits.of(result(Sense.AT_LEAST, "0.5", 0.625, 0.75, 0.875));
    assertEquals("+0.125", least.certifiedMargin(0.625));
    assertEquals("+0.125", least.certifiedMargin(0.6259));
    assertEquals("-0.126", least.certifiedMargin(0.3749));
    assertEquals("0", least.certifiedMargin(0.5));
    BracketDigits most = BracketDigits.of(result(Sense.AT_MOST, "0.5", 0.375, 0.25, 0.125));
    assertEquals("+0.125", most.certifiedMargin(0.375));
    assertEquals("+0.124", most.certifiedMargin(0.3751));
    assertEquals("-", most.certifiedMargin(Double.POSITIVE_INFINITY));
  }

  @Test
  void missingAndInfiniteValuesDoNotCountForTheDigits() {
    RequirementResult empty =
        HandMade.empty(HandMade.requirement("r", Sense.AT_LEAST, "0.25", Unit.NONE), "none");
    // [closed form] four significant digits of 0.25 are four decimals
    assertEquals(4, BracketDigits.of(empty).scale());
    RequirementResult infinite =
        result(Sense.AT_LEAST, "0.25", Double.NEGATIVE_INFINITY, Double.NaN, Double.NaN);
    assertEquals(4, BracketDigits.of(infinite).scale());
  }

  @Test
  void allZeroValuesHaveDigitsToo() {
    BracketDigits digits = BracketDigits.of(result(Sense.AT_MOST, "0", 0, 0, 0));
    assertEquals("0.000", digits.certified(0));
  }
}
