package blochbound.study;

import static blochbound.study.Certifications.found;
import static blochbound.study.Certifications.guaranteed;
import static blochbound.study.Certifications.only;
import static blochbound.study.Certifications.options;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import blochbound.TestCases;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

/** What may not change with units, names and the shape of the ball, and how it may change. */
class InvarianceTest {
  private static RequirementResult pair(String ball, String measure) {
    return only(
        options(),
        "sites: {l: {levels: [g, e]}, r: {levels: [g, e]}}",
        "parameters:",
        "  pump: {nominal: 1, tolerance: 20 %}",
        "  decay: {nominal: 0.05, tolerance: 0.03}",
        "  field: {nominal: 0, tolerance: 0.1}",
        "operators: {odd: (1-Z@l*Z@r)/2, minus: (1-X@l*X@r)/2}",
        "ball: " + ball,
        "hamiltonian: field*X@l",
        "jumps:",
        "  - {rate: pump, operator: X@l*odd}",
        "  - {rate: pump, operator: Z@l*minus}",
        "  - {rate: decay, operator: lower@l}",
        "  - {rate: decay, operator: lower@r}",
        "requirements: [{name: only, measure: \"" + measure + "\", atLeast: 0.1}]");
  }

  @ParameterizedTest
  @ValueSource(strings = {"concurrence(l, r)", "purity", "negativity(r)", "population(l, g)"})
  void aLargerBallIsNeverProvedBetterThanASmallerOneIsFound(String measure) {
    double before = Double.POSITIVE_INFINITY;
    for (String radius : List.of("0", "0.25", "0.5", "1", "1.5")) {
      RequirementResult result = pair("{norm: inf, radius: " + radius + "}", measure);
      assertTrue(guaranteed(result) <= before, radius);
      // [invariant] the worst of a larger set is not better, up to rounding
      assertTrue(found(result) <= before + 1e-9, radius);
      before = found(result);
    }
  }

  @ParameterizedTest
  @ValueSource(strings = {"concurrence(l, r)", "purity", "population(l, g)"})
  void theBallsLieInsideOneAnother(String measure) {
    RequirementResult diamond = pair("{norm: 1, radius: 1}", measure);
    RequirementResult ellipsoid = pair("{norm: 2, radius: 1}", measure);
    RequirementResult box = pair("{norm: inf, radius: 1}", measure);
    // [invariant] |t|_inf <= |t|_2 <= |t|_1: the diamond is the smallest ball
    assertTrue(found(diamond) >= found(ellipsoid) - 1e-9);
    assertTrue(found(ellipsoid) >= found(box) - 1e-9);
    assertTrue(guaranteed(box) <= found(box));
    assertTrue(guaranteed(box) <= found(ellipsoid));
    assertTrue(guaranteed(ellipsoid) <= found(diamond));
  }

  private static RequirementResult timed(String unit, double scale) {
    return Certifications.run(
            TestCases.read(
                String.format(
                    Locale.ROOT,
                    """
                    timeUnit: %1$s
                    sites: {q: {levels: [g, e]}}
                    parameters:
                      G: {nominal: %2$s /%1$s, tolerance: 10 %%}
                      om: {nominal: %3$s rad/%1$s, tolerance: 10 %%}
                      d: {nominal: 0 rad/%1$s, tolerance: %4$s rad/%1$s}
                    hamiltonian: om/2*X@q - d*|e><e|@q
                    jumps: [{rate: G, operator: lower@q}]
                    requirements: [{name: only, measure: "population(q, e)", atMost: 0.3}]
                    """,
                    unit,
                    scale,
                    0.5 * scale,
                    0.1 * scale)),
            options().withGap(1e-6))
        .requirements()
        .get(0);
  }

  @Test
  void theUnitOfTimeDoesNotMatter() {
    RequirementResult inMicroseconds = timed("us", 1);
    RequirementResult inNanoseconds = timed("ns", 0.001);
    RequirementResult inSeconds = timed("s", 1e6);
    for (RequirementResult other : List.of(inNanoseconds, inSeconds)) {
      // [invariant] the same devices
      assertEquals(found(inMicroseconds), found(other), 1e-12);
      assertEquals(guaranteed(inMicroseconds), guaranteed(other), 1e-6);
      assertTrue(guaranteed(other) >= found(inMicroseconds));
      assertTrue(guaranteed(inMicroseconds) >= found(other));
    }
  }

  private static RequirementResult relabelled(String first, String second) {
    List<String> lines = new ArrayList<>();
    lines.add("sites: {" + first + ": {levels: [g, e]}, " + second + ": {levels: [g, e]}}");
    lines.add("parameters: {k: {nominal: 0.4, tolerance: 0.2}, h: {nominal: 0.2, tolerance: 0.1}}");
    lines.add("hamiltonian: \"k*(X@a*X@b + Y@a*Y@b) + h*X@a + 0.3*Z@b\"");
    lines.add("jumps: [{operator: lower@a}, {rate: 0.3, operator: raise@b}]");
    lines.add("requirements: [{name: only, measure: \"concurrence(a, b)\", atLeast: 0.01}]");
    return only(options().withGap(1e-2), lines.toArray(new String[0]));
  }

  @Test
  void theOrderOfTheSitesDoesNotMatter() {
    RequirementResult one = relabelled("a", "b");
    RequirementResult other = relabelled("b", "a");
    // [invariant] the same device with its sites written in another order
    assertEquals(one.nominal().orElseThrow(), other.nominal().orElseThrow(), 1e-9);
    assertEquals(found(one), found(other), 1e-7);
    assertTrue(guaranteed(one) <= found(other) + 1e-9);
    assertTrue(guaranteed(other) <= found(one) + 1e-9);
  }

  @ParameterizedTest
  @ValueSource(doubles = {-0.9, -0.3, 0.5, 0.95})
  void correlatedEllipsoidsHaveTheirTangentAsWorstCase(double rho) {
    RequirementResult result =
        only(
            options().withGap(1e-6),
            "sites: {q: {levels: [g, e]}}",
            "parameters: {up: {nominal: 0.4, tolerance: 0.1}, down: {nominal: 1, tolerance: 0.3}}",
            "ball: {norm: 2, radius: 1, correlations: [{between: [up, down], value: " + rho + "}]}",
            "jumps: [{rate: up, operator: raise@q}, {rate: down, operator: lower@q}]",
            "requirements: [{name: only, measure: \"population(q, e)\", atMost: 0.9}]");
    // [closed form] p_e = k/(1+k), k = up/down; the line up = k down touches the ellipse when
    // (0.4 - k)^2 = 0.1^2 - 2 rho k 0.1 0.3 + k^2 0.3^2
    double a = 1 - 0.09;
    double b = -0.8 + 2 * rho * 0.03;
    double c = 0.16 - 0.01;
    double k = (-b + Math.sqrt(b * b - 4 * a * c)) / (2 * a);
    double worst = k / (1 + k);
    assertEquals(worst, found(result), 1e-8);
    assertTrue(guaranteed(result) >= worst - 1e-15);
    assertEquals(worst, guaranteed(result), 2e-6);
  }
}
