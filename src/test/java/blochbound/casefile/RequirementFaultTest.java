package blochbound.casefile;

import java.util.List;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.Arguments;
import org.junit.jupiter.params.provider.FieldSource;

/** Faults of requirements, each with its place. */
class RequirementFaultTest {
  /** Faults without a sign stand at the requirement itself. */
  static final List<Arguments> FAULTS =
      List.of(
          Arguments.of(
              "measure: \"§purty\", atLeast: 1",
              "unknown measure `purty`; the nearest known is `purity`; measures are mean, population, fidelity, concurrence, negativity, purity, traceDistance, entropy, gap, settling, gateFidelity, functional"),
          Arguments.of("measure: §purity(), atLeast: 1", "this measure is written purity"),
          Arguments.of(
              "measure: §mean, atLeast: 1", "this measure is written mean(<Hermitian operator>)"),
          Arguments.of(
              "measure: §mean(Z@a, atLeast: 1", "a measure is a name with its arguments in ( )"),
          Arguments.of(
              "measure: mean(§lower@a), atLeast: 1",
              "the operator of mean( ) is not Hermitian in its constant part; add the adjoint, as in a + adj(a)"),
          Arguments.of(
              "measure: mean(§g * Z@a), atLeast: 1 /us",
              "the operator of mean( ) must not depend on parameters, here on its part with g"),
          Arguments.of("measure: \"mean(Z@§c)\", atLeast: 1", "unknown site `c`; sites are a, b"),
          Arguments.of(
              "measure: mean(3 kHz * Z@a), atLeast: §1",
              "the limit of this measure must be 1/time, not a pure number; write a unit such as /us or kHz"),
          Arguments.of(
              "measure: §population(a), atLeast: 1",
              "this measure is written population(site, label, ...)"),
          Arguments.of(
              "measure: \"population(a, §x)\", atLeast: 1",
              "the site a has no level `x`; its levels are g, e"),
          Arguments.of(
              "measure: \"population(a, g, §g)\", atLeast: 1", "the level `g` occurs twice"),
          Arguments.of(
              "measure: \"population(§c, g)\", atLeast: 1", "unknown site `c`; sites are a, b"),
          Arguments.of(
              "measure: §fidelity, atLeast: 1",
              "fidelity without a state needs a `target`; add one or write fidelity(<state>)"),
          Arguments.of(
              "measure: \"fidelity(§|g,g> - |g,g>)\", atLeast: 1",
              "the ket is zero, which is no state"),
          Arguments.of(
              "measure: \"fidelity(|§g>)\", atLeast: 1",
              "expected one label for each of the sites (a, b), not 1; for one site write |a><b|@site"),
          Arguments.of(
              "measure: \"fidelity(|g,g,§?>)\", atLeast: 1",
              "a ket is written |a,b> with labels of letters, digits, _ + -"),
          Arguments.of(
              "measure: \"fidelity(§g * |g,g>)\", atLeast: 1",
              "a ket must be a pure number, not 1/time"),
          Arguments.of(
              "measure: \"fidelity(§2)\", atLeast: 1",
              "a state is a ket such as |g,e> or a density operator such as |g,e><g,e|, not a number"),
          Arguments.of(
              "measure: \"fidelity(§0.5 * |g,g><g,g| + 0.4 * |e,e><e,e|)\", atLeast: 1",
              "the density operator has the trace 0.900000; it must be 1"),
          Arguments.of(
              "measure: \"fidelity(§1.5 * |g,g><g,g| - 0.5 * |e,e><e,e|)\", atLeast: 1",
              "the density operator has the negative eigenvalue -0.500000; it must be positive semidefinite"),
          Arguments.of(
              "measure: \"fidelity(§|g,g><g,g| + |g,g><e,e|)\", atLeast: 1",
              "the density operator is not Hermitian"),
          Arguments.of("measure: \"concurrence(a, §a)\", atLeast: 1", "the site `a` occurs twice"),
          Arguments.of(
              "measure: §concurrence(a), atLeast: 1", "this measure is written concurrence(a, b)"),
          Arguments.of(
              "measure: \"§negativity(a, b)\", atLeast: 1",
              "negativity needs at least one site on the other side of the cut"),
          Arguments.of(
              "measure: gap, atLeast: §1",
              "the limit of this measure must be 1/time, not a pure number; write a unit such as /us or kHz"),
          Arguments.of(
              "measure: gap, atLeast: §1 us",
              "the limit of this measure must be 1/time, not a time; write a unit such as /us or kHz"),
          Arguments.of(
              "measure: purity, atLeast: §1 /us",
              "the limit of this measure must be a pure number, not 1/time"),
          Arguments.of("measure: purity, atLeast: 90 §%", "% is allowed in tolerances only"),
          Arguments.of(
              "measure: purity, atLeast: §high",
              "`high` is no number; allowed is a finite decimal such as 0.5 or 2e-3, with a unit where it has one"),
          Arguments.of(
              "measure: gap, at: 1 us, start: \"|g,g>\", atLeast: 1 /us",
              "gap and settling( ) have no `at` and no `during`"),
          Arguments.of(
              "measure: purity, at: 1 us, atLeast: 1",
              "a requirement at a time needs `start:`, the initial state"),
          Arguments.of(
              "measure: purity, at: end, atLeast: 1",
              "a requirement at a time needs `start:`, the initial state"),
          Arguments.of(
              "measure: purity, at: §stedy, atLeast: 1",
              "unknown moment `stedy`; the nearest known is `steady`; allowed: steady, a time such as 12 us, end"),
          Arguments.of(
              "measure: purity, at: §1 /us, start: \"|g,g>\", atLeast: 1",
              "the moment must be a time, not 1/time; write a unit such as us"),
          Arguments.of(
              "measure: purity, at: §-1 us, start: \"|g,g>\", atLeast: 1",
              "a time must not be negative"),
          Arguments.of(
              "measure: purity, at: 1 us, during: §[1 us, 2 us], start: \"|g,g>\", atLeast: 1",
              "a requirement has either `at` or `during`"),
          Arguments.of(
              "measure: purity, during: §[2 us, 1500 ns], start: \"|g,g>\", atLeast: 1",
              "the ends of `during` are in the wrong order"),
          Arguments.of(
              "measure: purity, during: §[2 us], start: \"|g,g>\", atLeast: 1",
              "`during` has two ends, as in [5 us, 20 us]"),
          Arguments.of(
              "measure: purity, start: §\"|g,g>\", atLeast: 1",
              "`start` needs `at:` a time or `during:`; steady states have no start"),
          Arguments.of(
              "measure: purity, at: 1 us, start: §any, atLeast: 1",
              "`start: any` is for settling( ) only"),
          Arguments.of(
              "measure: settling(0.1), atMost: 1 us", "settling( ) needs `start:`, a state or any"),
          Arguments.of(
              "measure: settling(§2), start: any, atMost: 1 us",
              "the trace distance of settling( ) must lie between 0 and 1"),
          Arguments.of("measure: gateFidelity(§lower@a), atLeast: 1", "the gate is not unitary"),
          Arguments.of(
              "measure: \"gateFidelity(X@a, |g,g>, §|g,g> + |e,g>)\", atLeast: 1",
              "the kets of the subspace must be orthogonal"),
          Arguments.of(
              "measure: \"gateFidelity(X@a, §X@a)\", atLeast: 1", "expected a ket such as |g,e>"),
          Arguments.of(
              "measure: gateFidelity(X@a), at: steady, atLeast: 1",
              "gateFidelity( ) is at a time or at the end of a sequence, not steady"),
          Arguments.of(
              "measure: gateFidelity(X@a), start: §\"|g,g>\", atLeast: 1",
              "gateFidelity( ) averages over all states; it has no `start`"),
          Arguments.of("measure: purity", "a requirement needs `atLeast` or `atMost`"),
          Arguments.of(
              "measure: purity, atLeast: 0, atMost: 1",
              "a requirement has either `atLeast` or `atMost`, not both"),
          Arguments.of("atLeast: 0", "`measure` is missing in a requirement"),
          Arguments.of(
              "measure: purity, §atleast: 0",
              "unknown key `atleast` in a requirement; the nearest known is `atLeast`; allowed: name, measure, atLeast, atMost, at, during, start"));

  @ParameterizedTest
  @FieldSource("FAULTS")
  void faultsHaveTheirPlace(String fields, String message) {
    String item = "{name: r, " + fields + "}";
    CaseText.pair()
        .set("requirements", "[" + (fields.contains("§") ? "" : "§") + item + "]")
        .hasFaults(message);
  }

  @Test
  void namesAreNeededAndDistinct() {
    CaseText.pair()
        .set(
            "requirements",
            """

            - §{measure: purity, atLeast: 1}
            - {name: §'', measure: purity, atLeast: 1}
            - {name: r, measure: purity, atLeast: 1}
            - {name: §r, measure: purity, atLeast: 1}""")
        .hasFaults(
            "`name` is missing in a requirement",
            "the name of the requirement is empty",
            "the requirement `r` is already given at line 10, column 10");
  }

  @Test
  void concurrenceNeedsTwoLevelSites() {
    CaseText.pair()
        .set("sites", "{a: {levels: 3}, b: {levels: 2}}")
        .set("hamiltonian", "g * number@a")
        .set("requirements", "[{name: r, measure: 'concurrence(§a, b)', atLeast: 0}]")
        .hasFaults("concurrence is for two-level sites, a has 3 levels; negativity takes any");
  }

  @Test
  void aFaultyTargetIsReportedOnce() {
    CaseText.pair()
        .set("target", "'§|g,g> - |g,g>'")
        .requirement("measure: fidelity, atLeast: 1")
        .hasFaults("the ket is zero, which is no state");
  }
}
