package blochbound;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import blochbound.WholeProgram.Result;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.stream.Stream;
import org.junit.jupiter.api.Assumptions;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/** Options, outputs and exit codes of the program, run as a user runs it. */
class CommandLineIT {
  @TempDir private Path directory = Path.of("");

  /** Certifies with few samples, which these tests do not look at. */
  private Result certify(String... arguments) throws Exception {
    List<String> all = new ArrayList<>(List.of("certify", "--samples=200"));
    all.addAll(List.of(arguments));
    return run(all.toArray(new String[0]));
  }

  private Result run(String... arguments) throws Exception {
    return WholeProgram.runBriefly(directory, arguments);
  }

  /** Everything except the seconds, which no run shares with another. */
  private static String timeless(String json) {
    return json.replaceAll("\"seconds\": [0-9.e-]+", "\"seconds\": 0");
  }

  private List<String> entries() throws Exception {
    try (Stream<Path> files = Files.list(directory)) {
      return files.map(f -> f.getFileName().toString()).sorted().toList();
    }
  }

  @Test
  void oneThreadAndOneSeedGiveTheSameResultTwiceAndAnotherSeedDrawsOthers() throws Exception {
    SmallCase.coldest(directory, "cold.yaml", "0.14");
    List<String> runs = new ArrayList<>();
    for (String seed : List.of("7", "7", "8")) {
      Result run = certify("cold.yaml", "--json=-", "--threads=1", "--gap=1e-6", "--seed", seed);
      assertEquals(0, run.exitCode(), run.err());
      runs.add(run.out());
    }
    assertEquals(timeless(runs.get(0)), timeless(runs.get(1)));
    JsonValue one = JsonValue.parse(runs.get(0));
    JsonValue other = JsonValue.parse(runs.get(2));
    // [invariant] the seed and the number of devices asked for
    assertEquals(7, one.get("seed").number().intValue());
    JsonValue sampled = one.get("requirements").items().get(0).get("sampled");
    assertEquals(200, sampled.get("count").number().intValue());
    JsonValue others = other.get("requirements").items().get(0).get("sampled");
    assertFalse(sampled.get("mean").number().equals(others.get("mean").number()));
  }

  @Test
  void gapNarrowsTheBracketAroundTheClosedForm() throws Exception {
    SmallCase.coldest(directory, "cold.yaml", "0.14");
    Result run = certify("cold.yaml", "--json", "-", "--gap", "1e-9");
    JsonValue r = JsonValue.parse(run.out()).get("requirements").items().get(0);
    double guaranteed = r.get("guaranteed").get("value").number().doubleValue();
    double found = r.get("worstFound").get("value").number().doubleValue();
    // [closed form] strongest heating and weakest decay: 0.12 / (0.12 + 0.8) = 3/23
    double exact = 3.0 / 23;
    assertTrue(guaranteed >= exact, guaranteed + " does not bound " + exact);
    assertTrue(guaranteed - found <= 1e-9, guaranteed + " - " + found);
    // [common practice, no source] rounding of a well-conditioned solve of three unknowns
    assertEquals(exact, found, 1e-14);
    // [closed form] 0.1 / 1.1
    assertEquals(1.0 / 11, r.get("nominal").number().doubleValue(), 1e-15);
  }

  @Test
  void relativeGapIsAShareOfTheWorstLoss() throws Exception {
    SmallCase.coldest(directory, "cold.yaml", "0.14");
    Result run = certify("cold.yaml", "--json", "-", "--rel", "0.001");
    JsonValue r = JsonValue.parse(run.out()).get("requirements").items().get(0);
    double guaranteed = r.get("guaranteed").get("value").number().doubleValue();
    // [closed form] the loss is 3/23 - 1/11
    double loss = 3.0 / 23 - 1.0 / 11;
    assertTrue(guaranteed >= 3.0 / 23);
    assertTrue(guaranteed - 3.0 / 23 <= 0.001 * loss, guaranteed + "");
  }

  @Test
  void limitAtTheTrueWorstIsRefutedOrUndecidedButNeverCertified() throws Exception {
    // [closed form] 3/23 = 0.13043478260869565..., so the first limit fails by 2e-10
    SmallCase.coldest(directory, "below.yaml", "0.1304347824");
    SmallCase.coldest(directory, "at.yaml", "0.13043478260869565");
    Result below = certify("below.yaml");
    assertEquals(3, below.exitCode(), below.out());
    assertTrue(below.out().contains("verdict: refuted - "), below.out());
    Result at = certify("at.yaml");
    assertEquals(4, at.exitCode(), at.out());
    assertTrue(at.out().contains("The limit lies within rounding of the true worst case."));
  }

  @Test
  void tooLittleTimeLeavesAValidBracket() throws Exception {
    Result run =
        WholeProgram.runBriefly(
            WholeProgram.project(),
            "certify",
            "cases/parity-pair.yaml",
            "--time",
            "1ms",
            "--json",
            "-");
    JsonValue result = JsonValue.parse(run.out());
    String verdict = result.get("verdict").text();
    // [invariant] the exit code of the verdict
    assertEquals(verdict.equals("certified") ? 0 : 4, run.exitCode(), run.out());
    for (JsonValue r : result.get("requirements").items()) {
      double guaranteed = r.get("guaranteed").get("value").number().doubleValue();
      double found = r.get("worstFound").get("value").number().doubleValue();
      double sampled = r.get("sampled").get("worst").number().doubleValue();
      assertTrue(guaranteed <= found && found <= sampled, run.out());
      if (r.get("verdict").text().equals("undecided")) {
        assertTrue(r.get("remarks").items().get(0).text().contains("--time"), run.out());
      }
    }
  }

  @Test
  void whatThisVersionDoesNotBoundIsUndecidedAndSaysSo() throws Exception {
    SmallCase.write(directory, "quick.yaml", "measure: gap, atLeast: 0.3 /us");
    Result run = certify("quick.yaml");
    assertEquals(4, run.exitCode());
    assertTrue(run.out().contains("\n  guaranteed   -\n"), run.out());
    assertTrue(run.out().contains("it makes no statement on gap."), run.out());
  }

  @Test
  void severalCasesMakeOneArrayAndTheWorstExitCode() throws Exception {
    SmallCase.coldest(directory, "good.yaml", "0.2");
    SmallCase.coldest(directory, "bad.yaml", "0.1");
    Result run = certify("bad.yaml", "good.yaml", "--json", "r.json", "--quiet");
    assertEquals(3, run.exitCode(), run.err());
    List<JsonValue> results =
        JsonValue.parse(Files.readString(directory.resolve("r.json"))).items();
    assertEquals(
        List.of("refuted", "certified"),
        results.stream().map(r -> r.get("verdict").text()).toList());
    assertTrue(run.out().contains("\n" + "=".repeat(100) + "\n"), run.out());
    assertEquals(List.of("bad.yaml", "good.yaml", "r.json"), entries());
  }

  @Test
  void machineResultHasTheFieldsOfItsFormat() throws Exception {
    SmallCase.coldest(directory, "cold.yaml", "0.2");
    JsonValue result = JsonValue.parse(certify("cold.yaml", "--json", "-").out());
    assertEquals("blochbound-result/1", result.get("format").text());
    // [invariant] the fields that the format promises, in its order
    assertEquals(
        List.of("format", "case", "seed", "steadyState", "requirements", "verdict"), result.keys());
    assertEquals(
        List.of(
            "name",
            "measure",
            "sense",
            "limit",
            "unit",
            "nominal",
            "worstFound",
            "guaranteed",
            "sampled",
            "verdict",
            "remarks"),
        result.get("requirements").items().get(0).keys());
  }

  @Test
  void unwritableOutputIsFoundBeforeTheWorkAndLeavesNothing() throws Exception {
    SmallCase.coldest(directory, "cold.yaml", "0.2");
    Result missing = certify("cold.yaml", "--json", "no/r.json");
    assertEquals(6, missing.exitCode());
    assertEquals("", missing.out());
    assertEquals(
        "blochbound: cannot write no/r.json: its directory does not exist",
        missing.err().stripTrailing());
    Result taken = certify("cold.yaml", "--json", ".");
    assertEquals(6, taken.exitCode());
    assertEquals("blochbound: cannot write .: it is a directory", taken.err().stripTrailing());
    assertEquals(List.of("cold.yaml"), entries());
  }

  @Test
  void fullOutputIsAFailureAfterTheText() throws Exception {
    Assumptions.assumeTrue(Files.exists(Path.of("/dev/full")));
    SmallCase.coldest(directory, "cold.yaml", "0.2");
    Result run = certify("cold.yaml", "--json", "/dev/full");
    assertEquals(6, run.exitCode());
    assertTrue(run.out().contains("verdict: certified"), run.out());
    assertTrue(run.err().startsWith("blochbound: cannot write /dev/full: "), run.err());
  }

  @Test
  void wrongOptionsSayWhatIsAllowed() throws Exception {
    SmallCase.coldest(directory, "cold.yaml", "0.2");
    Result option = certify("cold.yaml", "--jsn", "r.json");
    assertEquals(2, option.exitCode());
    assertEquals(
        List.of(
            "blochbound: unknown option `--jsn`",
            "Did you mean --json?",
            "See blochbound certify --help."),
        option.err().lines().toList());
    Result value = certify("cold.yaml", "--time", "60");
    assertEquals(2, value.exitCode());
    assertEquals(
        List.of(
            "blochbound: Invalid value for option '--time': `60` is no duration; allowed is a"
                + " positive number with ms, s, min or h, such as 20s or \"2 min\"",
            "See blochbound certify --help."),
        value.err().lines().toList());
    Result command = run("certfy", "cold.yaml");
    assertEquals(2, command.exitCode());
    assertEquals(
        List.of(
            "blochbound: unknown command `certfy`",
            "Did you mean certify?",
            "See blochbound --help."),
        command.err().lines().toList());
    assertEquals(2, run().exitCode());
    for (Result run : List.of(option, value, command)) {
      assertEquals("", run.out());
    }
  }

  @Test
  void helpAndVersionSucceed() throws Exception {
    Result help = run("certify", "--help");
    assertEquals(0, help.exitCode());
    assertEquals("", help.err());
    for (String promised :
        List.of("--json", "--seed", "--gap", "--rel", "--time", "--threads", "--samples", "130")) {
      assertTrue(help.out().contains(promised), promised);
    }
    Result version = run("--version");
    assertEquals(0, version.exitCode());
    assertTrue(version.out().matches("blochbound \\d+\\.\\d+\\.\\d+\\R"), version.out());
  }

  @Test
  void showTellsTheModelAsUnderstood() throws Exception {
    SmallCase.coldest(directory, "cold.yaml", "0.2");
    Result text = run("show", "cold.yaml");
    assertEquals(0, text.exitCode(), text.err());
    // [closed form] two levels have three Bloch unknowns; 0.1 / 1.1 = 0.0909091
    assertTrue(text.out().contains("1 site, N = 2, n = N^2 - 1 = 3 Bloch unknowns"), text.out());
    assertTrue(text.out().contains("populations |g> 0.909091, |e> 0.0909091"), text.out());
    text.out().lines().forEach(line -> assertTrue(line.length() <= 100, line));
    Result json = run("show", "cold.yaml", "--json", "-");
    JsonValue shown = JsonValue.parse(json.out());
    assertEquals("blochbound-show/1", shown.get("format").text());
    assertEquals(3, shown.get("unknowns").number().intValue());
  }
}
