package blochbound.study;

import static blochbound.study.Certifications.found;
import static blochbound.study.Certifications.guaranteed;
import static blochbound.study.Certifications.only;
import static blochbound.study.Certifications.options;
import static blochbound.study.Certifications.run;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import blochbound.TestCases;
import blochbound.model.DesignCase;
import java.math.BigDecimal;
import java.util.List;
import java.util.concurrent.atomic.AtomicBoolean;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

class CertificationTest {
  private static DesignCase pumpedPair(String entangled, String onTarget) {
    return TestCases.read(
        """
        timeUnit: us
        sites:
          left:  {levels: [g, e]}
          right: {levels: [g, e]}
        parameters:
          pumpParity: {nominal: 1.0 /us,  tolerance: 20 %%}
          pumpPhase:  {nominal: 1.0 /us,  tolerance: 20 %%}
          decayLeft:  {nominal: 0.02 /us, range: [0.01 /us, 0.03 /us]}
          decayRight: {nominal: 0.02 /us, range: [0.01 /us, 0.03 /us]}
          shiftLeft:  {nominal: 0 kHz,    tolerance: 8 kHz}
        operators:
          odd:   (1 - Z@left * Z@right) / 2
          minus: (1 - X@left * X@right) / 2
        hamiltonian: "shiftLeft * |e><e|@left"
        jumps:
          - {rate: pumpParity, operator: X@left * odd}
          - {rate: pumpPhase,  operator: Z@left * minus}
          - {rate: decayLeft,  operator: lower@left}
          - {rate: decayRight, operator: lower@right}
        target: "(|g,g> + |e,e>) / sqrt(2)"
        requirements:
          - {name: entangled, measure: "concurrence(left, right)", atLeast: %s}
          - {name: on target, measure: fidelity, atLeast: %s}
        """
            .formatted(entangled, onTarget));
  }

  @Test
  void theSampleCaseHasItsKnownNominalAndWorstValues() {
    CertificationResult result = run(pumpedPair("0.90", "0.94"), options());
    RequirementResult entangled = result.requirements().get(0);
    RequirementResult onTarget = result.requirements().get(1);
    // [independent] brute force over vertices with a dense solver, printed to six digits
    assertEquals(0.952747, entangled.nominal().orElseThrow(), 5e-7);
    assertEquals(0.915139, found(entangled), 5e-7);
    assertEquals(0.976374, onTarget.nominal().orElseThrow(), 5e-7);
    assertEquals(0.954435, found(onTarget), 5e-7);
    assertTrue(guaranteed(entangled) >= 0.90 && guaranteed(onTarget) >= 0.94);
    assertEquals(Verdict.CERTIFIED, result.verdict());
    assertEquals(SteadyStateStatus.Kind.UNIQUE, result.status().orElseThrow().kind());
    List<BigDecimal> point = entangled.worstFound().orElseThrow().point();
    // [independent] worst at both pumps -20 %, both decays 0.03, the shift at either end
    assertEquals(
        List.of("0.8", "0.8", "0.03", "0.03"),
        point.stream().limit(4).map(BigDecimal::toPlainString).toList());
    assertEquals(8, Math.abs(point.get(4).doubleValue()), 0);
    assertTrue(entangled.worstFound().get().verified());
  }

  @Test
  void aLimitAboveTheTruthIsRefutedByAVerifiedDevice() {
    CertificationResult result = run(pumpedPair("0.92", "0.94"), options());
    RequirementResult entangled = result.requirements().get(0);
    assertEquals(Verdict.REFUTED, entangled.verdict());
    assertEquals(Verdict.REFUTED, result.verdict());
    assertTrue(found(entangled) < 0.92);
    assertTrue(entangled.worstFound().orElseThrow().verified());
  }

  @Test
  void aGapNarrowsTheBracketPastTheDecision() {
    RequirementResult result =
        run(pumpedPair("0.5", "0.5"), options().withGap(1e-4)).requirements().get(0);
    assertEquals(Verdict.CERTIFIED, result.verdict());
    assertTrue(found(result) - guaranteed(result) <= 1e-4);
    RequirementResult relative =
        run(pumpedPair("0.5", "0.5"), options().withRelativeGap(0.01)).requirements().get(0);
    double loss = relative.nominal().orElseThrow() - found(relative);
    assertTrue(found(relative) - guaranteed(relative) <= 0.010001 * loss);
  }

  @Test
  void aStoppedRunKeepsAValidBracket() {
    CertificationResult result =
        Certification.run(
            pumpedPair("0.914", "0.94"), options().withGap(1e-9), new AtomicBoolean(true));
    assertTrue(result.interrupted());
    for (RequirementResult r : result.requirements()) {
      // [independent] brute force as above: no worst value is below 0.9151
      assertTrue(guaranteed(r) <= (r.requirement().name().equals("entangled") ? 0.91514 : 0.95444));
    }
  }

  @Test
  void severalThreadsProveTheSame() {
    RequirementResult result =
        run(pumpedPair("0.914", "0.94"), options().withThreads(3).withGap(1e-4))
            .requirements()
            .get(0);
    // [independent] brute force as above
    assertEquals(0.915139, found(result), 5e-7);
    assertTrue(found(result) - guaranteed(result) <= 1e-4);
    assertEquals(Verdict.CERTIFIED, result.verdict());
  }

  @Test
  void oneThreadAndOneSeedGiveOneResult() {
    RequirementResult first = run(pumpedPair("0.914", "0.94"), options()).requirements().get(0);
    RequirementResult second = run(pumpedPair("0.914", "0.94"), options()).requirements().get(0);
    assertEquals(guaranteed(first), guaranteed(second), 0);
    assertEquals(first.worstFound(), second.worstFound());
    assertEquals(first.sampled(), second.sampled());
  }

  private static String[] coldDecay(String range) {
    return new String[] {
      "sites: {l: {levels: [g, e]}, r: {levels: [g, e]}}",
      "parameters: {c: {nominal: 0.01, range: " + range + "}, p: {nominal: 1, tolerance: 20 %}}",
      "jumps:",
      "  - {rate: p, operator: \"(|g,e><g,g| + |e,g><g,g|)/sqrt(2)\"}",
      "  - {rate: c, operator: \"(|g,g><g,e| + |g,g><e,g|)/sqrt(2)\"}",
      "  - {rate: p, operator: \"(|g,g><g,e| - |g,g><e,g|)/sqrt(2)\"}",
      "  - {rate: p, operator: \"(|g,e><e,e| + |e,g><e,e|)/sqrt(2)\"}",
      "requirements: [{name: only, measure: \"concurrence(l, r)\", atLeast: 0.5}]"
    };
  }

  @ParameterizedTest
  @ValueSource(strings = {"[0.005, 0.02]", "[0.0099, 0.0101]", "[0, 0.02]"})
  void theColdDecayStateIsBracketedByItsClosedForm(String range) {
    double most = Double.parseDouble(range.substring(range.indexOf(',') + 1, range.length() - 1));
    RequirementResult result = only(options().withGap(2e-5), coldDecay(range));
    // [closed form] (1-w)|psi+><psi+| + w|gg><gg|, w = c/(c+p): concurrence 1 - w = p/(c+p), worst
    // at the largest c and p = 0.8; psi+ and gg make a two-state chain
    double worst = 0.8 / (0.8 + most);
    assertEquals(1 / 1.01, result.nominal().orElseThrow(), 1e-7);
    assertTrue(guaranteed(result) <= worst);
    assertTrue(guaranteed(result) >= worst - 1e-4, "" + guaranteed(result));
    assertEquals(worst, found(result), 1e-7);
  }

  @Test
  void severalStationaryStatesAreReportedAndCounted() {
    CertificationResult result =
        run(
            TestCases.plain(
                "sites: {l: {levels: [g, e]}, r: {levels: [g, e]}}",
                "parameters: {om: {nominal: 0.38, tolerance: 0.02}}",
                "hamiltonian: \"om*(X@l+X@r)\"",
                "jumps: [{operator: lower@l + lower@r}]",
                "requirements:",
                "  - {name: c, measure: \"concurrence(l, r)\", atLeast: 0.11}",
                "  - {name: odd, measure: \"mean((1-Z@l*Z@r)/2)\", atMost: 0.9}"),
            options().withTime(java.time.Duration.ofMillis(600)));
    SteadyStateStatus status = result.status().orElseThrow();
    assertEquals(SteadyStateStatus.Kind.NOT_UNIQUE, status.kind());
    assertTrue(status.point().isPresent());
    assertFalse(status.reason().isEmpty());
    // [closed form] equal mixtures of triplet state and singlet have no entanglement; the singlet
    // alone has odd parity 1
    assertTrue(guaranteed(result.requirements().get(0)) <= 0);
    assertTrue(guaranteed(result.requirements().get(1)) >= 1);
    assertFalse(result.verdict() == Verdict.CERTIFIED);
  }

  @Test
  void aRangeThatTouchesTheZeroRateHasNoBoundAndOneThatDoesNotHasTheCommonValue() {
    String[] lines = {
      "sites: {q: {levels: [g, e]}}",
      "",
      "jumps: [{rate: 1+t, operator: lower@q}, {rate: 0.1*(1+t), operator: raise@q}]",
      "requirements: [{name: only, measure: \"population(q, g)\", atLeast: 0.9}]"
    };
    lines[1] = "parameters: {t: {nominal: 0, range: [-1, 1]}}";
    CertificationResult touching =
        run(TestCases.plain(lines), options().withTime(java.time.Duration.ofMillis(600)));
    // [closed form] at t = -1 every state is stationary: the worst population is 0
    assertTrue(guaranteed(touching.requirements().get(0)) <= 0);
    assertTrue(found(touching.requirements().get(0)) <= 1e-9);
    assertEquals(SteadyStateStatus.Kind.NOT_UNIQUE, touching.status().orElseThrow().kind());
    assertFalse(touching.verdict() == Verdict.CERTIFIED);
    lines[1] = "parameters: {t: {nominal: 0, range: [-0.99, 1]}}";
    CertificationResult away = run(TestCases.plain(lines), options());
    // [closed form] 10/11 for all t > -1
    assertEquals(10.0 / 11, found(away.requirements().get(0)), 1e-12);
    assertEquals(Verdict.CERTIFIED, away.verdict());
    assertEquals(SteadyStateStatus.Kind.UNIQUE, away.status().orElseThrow().kind());
  }

  @ParameterizedTest
  @ValueSource(
      strings = {
        "concurrence(l, r), atLeast",
        "concurrence(l, r), atMost",
        "negativity(l), atLeast",
        "negativity(l), atMost",
        "purity, atLeast",
        "purity, atMost",
        "entropy, atLeast",
        "entropy, atMost",
        "fidelity(|g,e>), atLeast",
        "traceDistance(|g,g>), atLeast",
        "traceDistance(|g,g>), atMost",
        "population(l, e), atMost",
        "mean(X@l*X@r + Z@l), atLeast"
      })
  void withoutTolerancesTheGuaranteeIsTheNominalValue(String requirement) {
    int comma = requirement.lastIndexOf(',');
    String sense = requirement.substring(comma + 2);
    RequirementResult result =
        only(
            options().withGap(1e-10),
            "sites: {l: {levels: [g, e]}, r: {levels: [g, e]}}",
            "parameters: {om: {nominal: 0.7}}",
            "hamiltonian: \"om*X@l + 0.4*X@l*X@r + 0.3*Z@r\"",
            "jumps: [{operator: lower@l}, {rate: 0.5, operator: lower@r}, {rate: 0.1, operator: Z@r}]",
            "requirements: [{name: only, measure: \""
                + requirement.substring(0, comma)
                + "\", "
                + sense
                + ": "
                + (sense.equals("atLeast") ? "0" : "2")
                + "}]");
    // [invariant] one device, one value
    double nominal = result.nominal().orElseThrow();
    assertEquals(nominal, guaranteed(result), requirement.startsWith("conc") ? 1e-6 : 1e-9);
    assertEquals(nominal, found(result), 0);
    assertEquals(1, result.guaranteed().orElseThrow().regions());
  }

  @Test
  void measuresAtATimeAreUndecidedAndSaySo() {
    RequirementResult result =
        only(
            options(),
            "sites: {q: {levels: [g, e]}}",
            "jumps: [{operator: lower@q}]",
            "requirements: [{name: only, measure: gap, atLeast: 0.1}]");
    assertEquals(Verdict.UNDECIDED, result.verdict());
    assertTrue(result.guaranteed().isEmpty());
    assertEquals(1, result.remarks().size());
  }

  @ParameterizedTest
  @ValueSource(strings = {"purity", "population(q, 0)", "mean(number@q + 1)"})
  void aSiteWithOneLevelHasOneState(String measure) {
    RequirementResult result =
        only(
            options(),
            "sites: {q: {levels: 1}}",
            "parameters: {a: {nominal: 0.4, tolerance: 0.1}}",
            "hamiltonian: a*number@q",
            "requirements: [{name: only, measure: \"" + measure + "\", atLeast: 0.9}]");
    // [closed form] the only state is 1
    assertEquals(1, result.nominal().orElseThrow(), 0);
    assertEquals(1, guaranteed(result), 1e-12);
    assertEquals(Verdict.CERTIFIED, result.verdict());
  }

  @Test
  void aSlowDeviceIsCertifiedWithoutContradiction() {
    RequirementResult result =
        only(
            options(),
            "sites: {q: {levels: [g, e]}}",
            "parameters: {f: {nominal: 2e-10, tolerance: 1e-10}, u: {nominal: 0.2, tolerance: 0.1}}",
            "hamiltonian: 0.5*Z@q",
            "jumps:",
            "  - {rate: 1, operator: Z@q}",
            "  - {rate: f, operator: lower@q}",
            "  - {rate: u*f, operator: raise@q}",
            "requirements: [{name: only, measure: \"population(q, g)\", atLeast: 0.76}]");
    // [closed form] 1/(1 + u), least 0.7692 at u = 0.3, whatever the slow rate
    assertEquals(1 / 1.3, found(result), 1e-5);
    assertTrue(guaranteed(result) <= 1 / 1.3);
    assertEquals(Verdict.CERTIFIED, result.verdict());
  }

  @Test
  void aLimitAtTheTrueWorstIsUndecided() {
    RequirementResult result =
        only(
            options().withTime(java.time.Duration.ofSeconds(2)),
            "sites: {q: {levels: [g, e]}}",
            "parameters: {u: {nominal: 0.2, tolerance: 0.05}}",
            "jumps: [{rate: 1, operator: lower@q}, {rate: u, operator: raise@q}]",
            // [closed form] 1/(1 + 0.25) = 0.8 exactly
            "requirements: [{name: only, measure: \"population(q, g)\", atLeast: 0.8}]");
    assertTrue(guaranteed(result) <= 0.8);
    assertEquals(Verdict.UNDECIDED, result.verdict());
    assertEquals(1, result.remarks().size());
  }

  @ParameterizedTest
  @ValueSource(
      strings = {
        "entropy, atLeast: 0.40",
        "fidelity(0.5*|0><0| + 0.5*|1><1|), atLeast: 0.86",
        "traceDistance(0.5*|0><0| + 0.5*|1><1|), atMost: 0.35"
      })
  void aSideWithoutFirstOrderEffectIsSplitToo(String requirement) {
    int comma = requirement.lastIndexOf(',');
    RequirementResult result =
        only(
            options(),
            "sites: {q: {levels: 2}}",
            "parameters:",
            "  u: {nominal: 0, tolerance: 0.1}",
            "  v: {nominal: 0, tolerance: 0.5}",
            "hamiltonian: u*X@q + v*Z@q",
            "jumps:",
            "  - {operator: lower@q}",
            "  - {rate: 0.2, operator: raise@q}",
            "  - {rate: 0.5, operator: Z@q}",
            "requirements:",
            "  - {name: m, measure: \"%s\"%s}"
                .formatted(requirement.substring(0, comma), requirement.substring(comma)));
    // [independent] dense sampling in numpy: entropy at least 0.45056, fidelity at least 0.8727,
    // distance at most 0.3333; the limits leave room, so that a proof must be found
    assertEquals(Verdict.CERTIFIED, result.verdict());
  }
}
