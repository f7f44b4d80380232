package blochbound.bound;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import blochbound.TestCases;
import blochbound.bound.Brackets.Bracket;
import blochbound.bound.BranchOutcome.Reason;
import blochbound.generator.BlochGenerator;
import blochbound.measure.LocatedMeasure;
import blochbound.measure.Measures;
import blochbound.model.DesignCase;
import blochbound.model.Region;
import blochbound.model.Requirement.Sense;
import java.util.Arrays;
import java.util.Locale;
import java.util.SplittableRandom;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.ValueSource;

class SteadyCellBoundTest {
  private static final String PAIR = "sites: {l: {levels: [g, e]}, r: {levels: [g, e]}}";

  private static String[] with(String[] lines, String... more) {
    String[] all = Arrays.copyOf(lines, lines.length + more.length);
    System.arraycopy(more, 0, all, lines.length, more.length);
    return all;
  }

  private static String requirement(String measure, String limit) {
    return "requirements: [{name: only, measure: \"" + measure + "\", " + limit + "}]";
  }

  private static String[] emitter() {
    return new String[] {
      "sites: {q: {levels: [g, e]}}",
      "parameters:",
      "  G: {nominal: 1, tolerance: 0.1}",
      "  om: {nominal: 0.5, tolerance: 0.05}",
      "  d: {nominal: 0, tolerance: 0.1}",
      "hamiltonian: om/2*X@q - d*|e><e|@q",
      "jumps: [{rate: G, operator: lower@q}]"
    };
  }

  @Test
  void theExcitedPopulationOverABoxIsBracketedOnBothSides() {
    // [closed form] p_e = Om^2/(G^2 + 4 D^2 + 2 Om^2): most at (0.9, 0.55, 0), D inside its range
    Bracket most =
        Brackets.of(
            TestCases.plain(with(emitter(), requirement("population(q, e)", "atMost: 0.3"))),
            1e-10);
    assertTrue(most.low() <= 0.213780918727915 + 1e-15);
    assertTrue(most.high() >= 0.213780918727915 - 1e-15);
    assertEquals(0, most.width(), 2e-10);
    // [closed form] least at (1.1, 0.45, +-0.1)
    Bracket least =
        Brackets.of(
            TestCases.plain(with(emitter(), requirement("population(q, e)", "atLeast: 0.1"))),
            1e-10);
    assertTrue(least.low() <= 0.122356495468278 + 1e-15);
    assertTrue(least.high() >= 0.122356495468278 - 1e-15);
    assertEquals(0, least.width(), 2e-10);
  }

  private static DesignCase coherence(String measure, String limit) {
    return TestCases.plain(
        "sites: {q: {levels: [g, e]}}",
        "parameters: {om: {nominal: 0.75, tolerance: 0.25}}",
        "hamiltonian: om/2*X@q",
        "jumps: [{operator: lower@q}]",
        requirement(measure, limit));
  }

  @Test
  void anInteriorBestCaseIsNotMissed() {
    // [closed form] |rho_eg| = sqrt(s/2)/(1+s), s = 2 Om^2: 1/3 at both ends, 1/(2 sqrt 2) inside;
    // mean(Y) has twice that size
    for (String measure : new String[] {"mean(Y@q)/2", "mean(-Y@q)/2"}) {
      String whole = measure.replace(")/2", ")");
      DesignCase atMost = coherence(whole, "atMost: 1");
      double sign = Math.signum(Brackets.value(atMost, 0));
      String limit = sign > 0 ? "atMost: 1" : "atLeast: -1";
      Bracket bracket = Brackets.of(coherence(whole, limit), 1e-9);
      double extreme = sign * 2 * 0.353553390593274;
      assertEquals(2.0 / 3, Math.abs(Brackets.value(atMost, -1)), 1e-12);
      assertEquals(2.0 / 3, Math.abs(Brackets.value(atMost, 1)), 1e-12);
      assertTrue(bracket.low() <= extreme + 1e-15 && bracket.high() >= extreme - 1e-15);
      assertEquals(0, bracket.width(), 2e-9);
      assertTrue(Math.abs(sign > 0 ? bracket.high() : bracket.low()) >= 0.707106781186547);
    }
  }

  @Test
  void purityHasItsMinimumInside() {
    // [closed form] (1 + 2s + s^2/2)/(1+s)^2 falls with s = 2 Om^2: least 7/8 - ... at Om = 1
    Bracket bracket = Brackets.of(coherence("purity", "atLeast: 0.5"), 1e-9);
    double s = 2;
    double least = (1 + 2 * s + s * s / 2) / ((1 + s) * (1 + s));
    assertTrue(bracket.low() <= least && bracket.high() >= least - 1e-14);
    assertEquals(0, bracket.width(), 2e-9);
  }

  private static DesignCase detunedPair(double a, double widthA, double d, double widthD) {
    return TestCases.plain(
        PAIR,
        "parameters:",
        String.format(Locale.ROOT, "  a: {nominal: %s, tolerance: %s}", a, widthA),
        String.format(Locale.ROOT, "  d: {nominal: %s, tolerance: %s}", d, widthD),
        "hamiltonian: \"a*(X@l+X@r) + d*(|e><e|@l - |e><e|@r)\"",
        "jumps: [{operator: lower@l + lower@r}]",
        requirement("concurrence(l, r)", "atLeast: 0.5"));
  }

  @ParameterizedTest
  @CsvSource({"0.5, 0.05, 0.5, 0.05", "1, 0.1, 0.3, 0.03", "0.4, 0.02, 0.6, 0.06"})
  void theWorstConcurrenceIsAtWeakDriveAndLargeDetuning(
      double a, double widthA, double d, double widthD) {
    // [published] Stannigel, Rabl, Zoller, New J. Phys. 14 (2012) 063014, from memory: C =
    // 2 a^2/(d^2 + 2 a^2), which rises with a and falls with |d|
    double low = a - widthA;
    double high = d + widthD;
    double worst = 2 * low * low / (high * high + 2 * low * low);
    Bracket bracket = Brackets.of(detunedPair(a, widthA, d, widthD), 1e-3);
    assertTrue(bracket.low() <= worst + 1e-12);
    assertTrue(bracket.high() >= worst - 1e-9);
    assertEquals(Reason.NARROW, bracket.outcome().reason());
  }

  private static DesignCase dickePair(String range, String measure, String limit) {
    return TestCases.plain(
        PAIR,
        "parameters: {om: " + range + "}",
        "hamiltonian: \"om*(X@l+X@r)\"",
        "jumps: [{operator: lower@l + lower@r}]",
        requirement(measure, limit));
  }

  @Test
  void everyStationaryStateOfACollectivePairIsCounted() {
    DesignCase triplet =
        dickePair("{nominal: 0.38, tolerance: 0.1}", "mean((1-Z@l*Z@r)/2)", "atMost: 1");
    Bracket most = Brackets.of(triplet, BranchOptions.toGap(1e-3).withRegions(60));
    // [closed form] the singlet has odd parity 1 and stays: no bound below 1 is true
    assertTrue(most.high() >= 1);
    DesignCase worst =
        dickePair("{nominal: 0.38, tolerance: 0.1}", "concurrence(l, r)", "atLeast: 0.05");
    Bracket least = Brackets.of(worst, BranchOptions.toGap(1e-3).withRegions(60));
    // [published] Puri, Lawande, Phys. Lett. A 72 (1979) 200 and Schneider, Milburn, Phys. Rev. A
    // 65 (2002) 042107, from memory: the triplet state has C = x(2-x)/(3x^2+4x+4), x = 4 Om^2, here
    // at Om = 0.28; mixtures with the singlet reach 0
    double x = 4 * 0.28 * 0.28;
    assertTrue(least.low() <= x * (2 - x) / (3 * x * x + 4 * x + 4));
  }

  @ParameterizedTest
  @CsvSource({"0, 1, -1", "0.5, 1, -1", "1e-3, 1, -1"})
  void ratesThatMayVanishTogetherLeaveNoBound(double nominal, double high, double low) {
    // Rates 1 + t down and 0.1 (1 + t) up: population 10/11 for t > -1, any state at t = -1.
    DesignCase touching =
        TestCases.plain(
            "sites: {q: {levels: [g, e]}}",
            String.format(
                Locale.ROOT, "parameters: {t: {nominal: %s, range: [%s, %s]}}", nominal, low, high),
            "jumps: [{rate: 1+t, operator: lower@q}, {rate: 0.1*(1+t), operator: raise@q}]",
            requirement("population(q, g)", "atLeast: 0.9"));
    Bracket bracket = Brackets.of(touching, BranchOptions.toGap(1e-3).withRegions(100));
    // [closed form] at t = -1 the excited state is stationary: the bound is 0 at most
    assertTrue(bracket.low() <= 0);
  }

  @ParameterizedTest
  @ValueSource(strings = {"-0.999", "-0.9", "0"})
  void ratesAwayFromZeroGiveTheirCommonValue(String low) {
    DesignCase away =
        TestCases.plain(
            "sites: {q: {levels: [g, e]}}",
            "parameters: {t: {nominal: 0.5, range: [" + low + ", 1]}}",
            "jumps: [{rate: 1+t, operator: lower@q}, {rate: 0.1*(1+t), operator: raise@q}]",
            requirement("population(q, g)", "atLeast: 0.9"));
    Bracket bracket = Brackets.of(away, 1e-9);
    // [closed form] 1/(1 + 0.1) = 10/11 wherever the rates do not vanish
    assertTrue(bracket.low() <= 10.0 / 11 && bracket.high() >= 10.0 / 11 - 1e-15);
    assertEquals(0, bracket.width(), 2e-9);
  }

  @Test
  void aSlowDeviceIsBoundedSoundly() {
    DesignCase slow =
        TestCases.plain(
            "sites: {q: {levels: [g, e]}}",
            "parameters: {f: {nominal: 2e-10, tolerance: 1e-10}, u: {nominal: 0.2, tolerance: 0.1}}",
            "hamiltonian: 0.5*Z@q",
            "jumps:",
            "  - {rate: 1, operator: Z@q}",
            "  - {rate: f, operator: lower@q}",
            "  - {rate: u*f, operator: raise@q}",
            requirement("population(q, g)", "atLeast: 0.7"));
    Bracket bracket = Brackets.of(slow, 1e-3);
    // [closed form] 1/(1 + u), least at u = 0.3
    assertTrue(bracket.low() <= 1 / 1.3);
    assertTrue(bracket.high() >= 1 / 1.3 - 1e-5);
    assertTrue(bracket.low() > 0.75, "slow is not singular: " + bracket.low());
  }

  private static String[] scaledEmitter(double scale) {
    return new String[] {
      "sites: {q: {levels: [g, e]}}",
      "parameters:",
      String.format(Locale.ROOT, "  G: {nominal: %s, tolerance: 10 %%}", scale),
      String.format(Locale.ROOT, "  om: {nominal: %s, tolerance: 10 %%}", 0.5 * scale),
      String.format(Locale.ROOT, "  d: {nominal: 0, tolerance: %s}", 0.1 * scale),
      "hamiltonian: om/2*X@q - d*|e><e|@q",
      "jumps: [{rate: G, operator: lower@q}]",
      requirement("population(q, e)", "atMost: 0.3")
    };
  }

  @ParameterizedTest
  @ValueSource(doubles = {1e-9, 1e9})
  void boundsDoNotDependOnTheUnitOfTime(double scale) {
    BranchOptions options = BranchOptions.toGap(0).withRegions(15);
    Bracket plain = Brackets.of(TestCases.plain(scaledEmitter(1)), options);
    Bracket scaled = Brackets.of(TestCases.plain(scaledEmitter(scale)), options);
    // [invariant] steady states have no unit of time
    assertEquals(plain.high(), scaled.high(), 1e-11);
    assertEquals(plain.low(), scaled.low(), 1e-11);
  }

  @ParameterizedTest
  @CsvSource({"2, 0.374165738677394", "1, 0.3"})
  void wholeBallsAreBoundedSharply(int norm, double reach) {
    DesignCase designCase =
        TestCases.plain(
            "sites: {q: {levels: [g, e]}}",
            "parameters:",
            "  a: {nominal: 0.4, tolerance: 0.3}",
            "  b: {nominal: 0.4, tolerance: 0.2}",
            "  c: {nominal: 0.4, tolerance: 0.1}",
            "ball: {norm: " + norm + ", radius: 1}",
            "jumps: [{rate: 50, operator: raise@q}, {rate: a+b+c, operator: lower@q}]",
            requirement("population(q, e)", "atMost: 1"));
    BlochGenerator generator = BlochGenerator.stationary(designCase.device());
    LocatedMeasure located =
        Measures.of(designCase.requirements().get(0).measure(), designCase.device().space());
    SteadyCellBound bound = new SteadyCellBound(generator, located, Sense.AT_MOST, 1);
    double high = -bound.bound(Region.whole(3), Double.POSITIVE_INFINITY).certifiedLower();
    // [closed form] 50/(50 + 1.2 + y), y from -reach to reach: |w|_2 = sqrt(0.14) on the ellipsoid,
    // |w|_inf = 0.3 on the diamond
    assertTrue(high >= 50 / (51.2 - reach));
    // [closed form] first order, and the second-order remainder |w|^2/s^2 of the multinomial
    // theorem
    double first = 50 / 51.2 * (1 + reach / 51.2);
    assertEquals(first + reach * reach / (51.2 * 51.2), high, 1e-10);
  }

  @Test
  void cellsAreBelowEverySampleOfTheirRegion() {
    DesignCase designCase = detunedPair(0.5, 0.2, 0.5, 0.2);
    SplittableRandom random = new SplittableRandom(6);
    Bracket bracket = Brackets.of(designCase, BranchOptions.toGap(0).withRegions(25));
    bracket
        .outcome()
        .certificates()
        .forEach(
            c -> {
              for (int k = 0; k < 30; k++) {
                boolean isVertex = k < 6;
                double[] x =
                    random.doubles(2, -1, 1).map(v -> isVertex ? Math.copySign(1, v) : v).toArray();
                double value = Brackets.value(designCase, c.region().at(x));
                // Samples of the concurrence are rounded by up to about 1e-9 here.
                assertTrue(c.certifiedLower() <= value + 1e-9);
              }
            });
  }
}
