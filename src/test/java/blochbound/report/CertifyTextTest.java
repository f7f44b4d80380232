package blochbound.report;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import blochbound.model.Device;
import blochbound.model.Requirement.Sense;
import blochbound.model.Unit;
import blochbound.study.CertificationResult;
import blochbound.study.FoundPoint;
import blochbound.study.RequirementResult;
import blochbound.study.SteadyStateStatus;
import blochbound.study.SteadyStateStatus.Kind;
import blochbound.study.Verdict;
import java.math.BigDecimal;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.SplittableRandom;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

class CertifyTextTest {
  private static final List<Verdict> VERDICTS = List.of(Verdict.values());

  // [invariant] the values of the hand-made record; margins 0.9142 - 0.90 and 0.915139 - 0.90
  private static final String ONE_REQUIREMENT =
      """
      Pumped emitter
      1 site with 2 levels; 3 parameters, 2 with a tolerance; ball of norm inf and radius 1; seed 1
      steady state: proved unique for every device inside the tolerances.

      bright: certified
        requirement  population(left, e) at least 0.90 in every steady state
        guaranteed   0.91420 (margin +0.0142)
        worst found  0.91514 (margin +0.0151; verified)
        nominal      0.95275
        sampled      worst 0.91514, mean 0.95275; 20000 random devices (100 % of the draws in the ball)
        quantiles    1 %: 0.91514, 50 %: 0.95275
        method       dual-observable branch and bound, 15 regions, 0.0234 s

        worst device found  value  unit  nominal  share of tolerance
        ------------------  -----  ----  -------  ------------------
        pump                 0.8   /us      1.0             -100.0 %
        decay                0.03  /us      0.02             100.0 %
        1 constant parameter at nominal

      verdict: certified - every requirement holds for every device inside the tolerances.
      This speaks for the model that the case states, for parameters that are constant in time and inside
      their tolerances. It is not a safety certificate.
      """;

  private static RequirementResult slow() {
    return HandMade.full(
        HandMade.requirement("slow", Sense.AT_MOST, "0.5", HandMade.PER_MICROSECOND),
        0.72014,
        0.72,
        0.51,
        Verdict.REFUTED);
  }

  private static RequirementResult lost() {
    return HandMade.empty(
        HandMade.requirement("lost", Sense.AT_LEAST, "0.25", Unit.NONE),
        "the nominal device has several stationary states");
  }

  @Test
  void oneRequirementIsTold() {
    assertEquals(ONE_REQUIREMENT, CertifyText.of(HandMade.certified()));
  }

  @Test
  void severalRequirementsBeginWithATable() {
    String text =
        CertifyText.of(
            HandMade.result(
                Verdict.REFUTED, HandMade.certified().requirements().get(0), slow(), lost()));
    // [invariant] the values of the records; the double nearest to 0.72014 lies above it, and as an
    // upper bound it is not rounded down
    String table =
        """

        requirement  limit       nominal  worst found  guaranteed   margin  verdict
        -----------  ----------  -------  -----------  ----------  -------  ---------
        bright       >= 0.90     0.95275      0.91514     0.91420  +0.0142  certified
        slow         <= 0.5 /us  0.51000      0.72000     0.72015  -0.221   refuted
        lost         >= 0.25     -            -           -         -       undecided
        """;
    assertTrue(text.contains(table), text);
    assertTrue(text.contains("\nslow: refuted\n"), text);
    assertTrue(text.contains("\n  guaranteed   0.72015 /us (margin -0.221)\n"), text);
    assertTrue(
        text.contains("\nverdict: refuted - a device inside the tolerances violates slow.\n"),
        text);
  }

  @Test
  void missingValuesAreDashesWithTheirReason() {
    String text = CertifyText.of(HandMade.result(Verdict.UNDECIDED, lost()));
    assertTrue(
        text.contains(
            """
              guaranteed   -
              worst found  -
              nominal      -
              sampled      -
              method       -
              remark       the nominal device has several stationary states
            """),
        text);
    assertTrue(text.contains("\nverdict: undecided - neither proved nor refuted: lost.\n"), text);
    assertFalse(text.contains("worst device found"), text);
  }

  @Test
  void interruptionIsSaid() {
    String text = CertifyText.of(HandMade.certifiedBut(Verdict.UNDECIDED, true));
    assertTrue(text.contains("\nInterrupted before the end:"), text);
  }

  @Test
  void severalStationaryStatesAreNamedWithTheirDevice() {
    CertificationResult r = HandMade.certified();
    SteadyStateStatus status =
        new SteadyStateStatus(
            Kind.NOT_UNIQUE,
            Optional.of(List.of(new BigDecimal("0.0"), BigDecimal.ZERO, BigDecimal.ZERO)),
            "Without pump and decay every state is stationary.");
    String text =
        CertifyText.of(
            new CertificationResult(
                r.designCase(),
                r.seed(),
                Optional.of(status),
                r.requirements(),
                r.verdict(),
                r.interrupted()));
    assertTrue(
        text.contains(
            """

            steady state: not unique. Without pump and decay every state is stationary.
              at pump = 0.0 /us, decay = 0 /us, shift = 0 /us
            """),
        text);
  }

  @ParameterizedTest(name = "seed {0}")
  @ValueSource(longs = {1, 2, 3, 4, 5, 6})
  void noLineIsLongerThanAHundredColumns(long seed) {
    SplittableRandom random = new SplittableRandom(seed);
    for (int i = 0; i < 40; i++) {
      String text = CertifyText.of(randomResult(random));
      text.lines().forEach(line -> assertTrue(line.codePointCount(0, line.length()) <= 100, line));
      assertFalse(text.lines().anyMatch(line -> line.endsWith(" ")), text);
    }
  }

  private static CertificationResult randomResult(SplittableRandom random) {
    Device device =
        HandMade.emitter(
            HandMade.parameter(name(random), "1", "1e-30", "123456789.123456789"),
            HandMade.parameter(name(random), "0.02", "0.01", "0.03"),
            HandMade.parameter(name(random), "0", "-8", "8"));
    List<RequirementResult> results = new ArrayList<>();
    int count = random.nextInt(4);
    for (int i = 0; i < count; i++) {
      results.add(randomRequirement(random));
    }
    return new CertificationResult(
        HandMade.designCase(name(random) + "\n" + name(random), device),
        random.nextLong(),
        Optional.of(
            new SteadyStateStatus(
                Kind.NOT_UNIQUE,
                Optional.of(
                    List.of(BigDecimal.ONE, new BigDecimal("1e-200"), new BigDecimal("-7.5"))),
                name(random) + " " + name(random))),
        results,
        VERDICTS.get(random.nextInt(3)),
        random.nextBoolean());
  }

  private static RequirementResult randomRequirement(SplittableRandom random) {
    Sense sense = random.nextBoolean() ? Sense.AT_LEAST : Sense.AT_MOST;
    Unit unit = random.nextBoolean() ? Unit.NONE : HandMade.PER_MICROSECOND;
    String limit = random.nextInt(-900, 900) + "e" + random.nextInt(-250, 250);
    RequirementResult full =
        HandMade.full(
            HandMade.requirement(name(random), sense, limit, unit),
            value(random),
            value(random),
            value(random),
            VERDICTS.get(random.nextInt(3)));
    FoundPoint found =
        new FoundPoint(
            value(random),
            List.of(
                new BigDecimal("123456789.123456789"),
                new BigDecimal(value(random) > 0 ? "0.0123456789012345678901" : "0.03"),
                new BigDecimal("-7.99999999999999999999999999")),
            List.of(random.nextDouble(), -1.0, Double.NaN),
            random.nextBoolean());
    return new RequirementResult(
        full.requirement(),
        random.nextBoolean() ? full.nominal() : OptionalDouble.empty(),
        Optional.of(found),
        full.guaranteed().filter(g -> random.nextBoolean()),
        full.sampled().filter(s -> random.nextBoolean()),
        full.verdict(),
        List.of(name(random), name(random) + " " + name(random)));
  }

  private static double value(SplittableRandom random) {
    return switch (random.nextInt(6)) {
      case 0 -> 0;
      case 1 -> Double.longBitsToDouble(random.nextLong());
      case 2 -> Double.NEGATIVE_INFINITY;
      default -> random.nextDouble();
    };
  }

  private static String name(SplittableRandom random) {
    int length = random.nextInt(4) == 0 ? random.nextInt(150) : random.nextInt(1, 12);
    StringBuilder name = new StringBuilder("n");
    for (int i = 0; i < length; i++) {
      name.appendCodePoint(random.nextInt(9) == 0 ? 0x1D11E : 'a' + random.nextInt(26));
    }
    return name.toString();
  }
}
