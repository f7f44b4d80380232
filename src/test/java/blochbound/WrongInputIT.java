package blochbound;

import static org.junit.jupiter.api.Assertions.assertEquals;

import blochbound.WholeProgram.Result;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.stream.Stream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/** Input with faults: every fault in one line with its place, exit code 2, nothing written. */
class WrongInputIT {
  private static final String FAULTY =
      """
      format: blochbound-case/1
      title: "Many faults"
      timeUnit: us
      colour: red
      sites:
        left:  {levels: [g, e]}
        right: {levels: [g, e, f]}
      parameters:
        pump:    {nominal: 1.0 /us, tolerence: 20 %}
        decay:   {nominal: 0.02 /us, range: [0.03 /us, 0.05 /us]}
        shift:   {nominal: 0 kHz, tolerance: 20 %}
        stray:   {nominal: 1 khz, tolerance: 8 kHz}
        field:   {nominal: 0.1 rad/us, tolerance: 50 %, drift: fast}
        lower:   {nominal: 1 /us}
      operators:
        odd: (1 - Z@left * Z@right) / 2
      hamiltonian: field * lower@left
      jumps:
        - {rate: pump,  operator: X@lefft}
        - {rate: 2,     operator: lower@left}
        - {rate: decai, operator: lower@right}
      target: "|g> + |e>"
      ball: {norm: 3, radius: 1}
      requirements:
        - {name: entangled, measure: "concurrence(left, right)", atLeast: 0.9}
        - {name: pure,      measure: puritty, atLeast: 0.9}
        - {name: both,      measure: purity,  atLeast: 0.9, atMost: 0.95}
        - {name: both,      measure: gap,     atLeast: 0.3}
        - {name: in time,   measure: purity,  at: 12 us, atLeast: 0.9}
        - {name: cold,      measure: "population(left, h)", atMost: 0.1}
      unmodelled: {hamiltonian: 2 kHz}
      """;

  // [invariant] the faults put into the file above, each at the word that is wrong
  private static final String FAULTS =
      String.join(
          "\n",
          fault(
              4,
              "colour",
              "unknown key `colour` in the case; allowed: format, title, timeUnit, sites,"
                  + " parameters, operators, hamiltonian, jumps, target, ball, requirements,"
                  + " sequence, generator, unmodelled"),
          fault(
              9,
              "tolerence",
              "unknown key `tolerence` in a parameter; the nearest known is `tolerance`; allowed:"
                  + " nominal, tolerance, range, distribution, sigma, drift"),
          fault(10, "[0.03", "the range must contain the nominal value 0.02 /us"),
          fault(11, "20 %", "% of a nominal value of 0 is nothing; give the tolerance with a unit"),
          fault(
              12,
              "khz",
              "unknown unit `khz`; the nearest known is `kHz`; units are Hz kHz MHz GHz (cycles),"
                  + " /s /ms /us /ns, rad/s rad/ms rad/us rad/ns, s ms us ns"),
          fault(
              13,
              "fast",
              "this version does not handle `drift` yet; remove it to study the case without it"),
          fault(14, "lower", "`lower` is a reserved word; choose another name"),
          fault(
              16,
              "Z@right",
              "Z is for two-level sites, right has 3 levels; use lower, raise, number or |a><b|"),
          fault(
              17,
              "field",
              "the Hamiltonian is not Hermitian in its part with field; add the adjoint, as in a +"
                  + " adj(a)"),
          fault(
              19,
              "lefft",
              "unknown site `lefft`; the nearest known is `left`; sites are left, right"),
          fault(
              20,
              "lower",
              "rate x operator^2 must be 1/time, not a pure number; the rate is a pure number, the"
                  + " operator a pure number"),
          fault(
              21,
              "decai",
              "unknown name `decai`; the nearest known is `decay`; parameters and operators above"
                  + " are pump, decay, shift, stray, field, odd"),
          fault(
              22,
              "g>",
              "expected one label for each of the sites (left, right), not 1; for one site write"
                  + " |a><b|@site"),
          fault(23, "3", "unknown norm `3`; allowed: inf, 2, 1"),
          fault(
              25,
              "right",
              "concurrence is for two-level sites, right has 3 levels; negativity takes any"),
          fault(
              26,
              "puritty",
              "unknown measure `puritty`; the nearest known is `purity`; measures are mean,"
                  + " population, fidelity, concurrence, negativity, purity, traceDistance,"
                  + " entropy, gap, settling, gateFidelity, functional"),
          fault(27, "{name", "a requirement has either `atLeast` or `atMost`, not both"),
          fault(28, "both", "the requirement `both` is already given at line 27, column 12"),
          fault(
              28,
              "0.3",
              "the limit of this measure must be 1/time, not a pure number; write a unit such as"
                  + " /us or kHz"),
          fault(29, "{name", "a requirement at a time needs `start:`, the initial state"),
          fault(30, "h)", "the site left has no level `h`; its levels are g, e"),
          fault(
              31,
              "{hamiltonian",
              "this version does not handle `unmodelled` yet; remove it to study the case without"
                  + " it"));

  /** A line of the program about the first occurrence of a word in a line of the file. */
  private static String fault(int line, String word, String message) {
    int column = FAULTY.lines().toList().get(line - 1).indexOf(word) + 1;
    return "faulty.yaml:" + line + ":" + column + ": " + message;
  }

  @TempDir private Path directory = Path.of("");

  private Result certify(String... arguments) throws Exception {
    return WholeProgram.runBriefly(
        directory,
        Stream.concat(Stream.of("certify"), Stream.of(arguments)).toArray(String[]::new));
  }

  private void assertRefused(String expected, Result run) {
    assertEquals(2, run.exitCode());
    assertEquals("", run.out());
    assertEquals(expected.lines().toList(), run.err().lines().toList());
  }

  @Test
  void allFaultsOfAFileAreListedInOrderAndNothingIsWritten() throws Exception {
    Files.writeString(directory.resolve("faulty.yaml"), FAULTY);
    Files.writeString(directory.resolve("r.json"), "an older result");
    assertRefused(FAULTS, certify("faulty.yaml", "--json", "r.json"));
    assertEquals("an older result", Files.readString(directory.resolve("r.json")));
    try (Stream<Path> files = Files.list(directory)) {
      assertEquals(
          List.of("faulty.yaml", "r.json"),
          files.map(f -> f.getFileName().toString()).sorted().toList());
    }
  }

  @Test
  void faultsOfOneCaseKeepTheOthersFromBeingRun() throws Exception {
    SmallCase.coldest(directory, "good.yaml", "0.2");
    SmallCase.coldest(directory, "bad.yaml", "20 %");
    assertRefused(
        "bad.yaml:13:64: % is allowed in tolerances only", certify("good.yaml", "bad.yaml"));
  }

  @Test
  void fileThatCannotBeReadIsNamed() throws Exception {
    Files.createDirectory(directory.resolve("folder"));
    assertRefused(
        "none.yaml:1:1: the file cannot be read: there is no such file", certify("none.yaml"));
    assertRefused("folder:1:1: the file cannot be read: it is a directory", certify("folder"));
  }

  @Test
  void binaryFileIsNoCase() throws Exception {
    Files.write(directory.resolve("binary.yaml"), new byte[] {(byte) 0xCA, (byte) 0xFE, 0, 1});
    assertRefused("binary.yaml:1:1: the file is not encoded in UTF-8", certify("binary.yaml"));
  }

  @Test
  void negativeRateIsRefusedWithTheDevice() throws Exception {
    Files.writeString(
        directory.resolve("negative.yaml"),
        """
        format: blochbound-case/1
        title: "Rate that turns negative"
        timeUnit: us
        sites: {emitter: {levels: [g, e]}}
        parameters:
          decay: {nominal: 1.0 /us, tolerance: 120 %}
        jumps:
          - {rate: decay, operator: lower@emitter}
        requirements:
          - {name: cold, measure: "population(emitter, e)", atMost: 0.1}
        """);
    assertRefused(
        // [closed form] 1 - 1.2 = -0.2
        "negative.yaml:8:12: the rate is not proved to stay at or above 0 inside the ball: it is"
            + " about -0.2000 (with time in us) at decay = -0.2 /us; narrow the tolerance or move"
            + " the nominal value",
        certify("negative.yaml"));
  }
}
