package blochbound;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.io.IOException;
import java.math.BigDecimal;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.stream.Stream;
import org.junit.jupiter.api.BeforeAll;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/** All shipped cases, certified in one run of the program. */
class ShippedCasesIT {
  private static List<String> files = List.of();
  private static WholeProgram.Result run = new WholeProgram.Result(-1, "", "");
  private static List<JsonValue> results = List.of();

  @BeforeAll
  static void certifyAllCases(@TempDir Path directory) throws Exception {
    try (Stream<Path> cases = Files.list(WholeProgram.project().resolve("cases"))) {
      files =
          cases
              .map(c -> "cases/" + c.getFileName())
              .filter(c -> c.endsWith(".yaml"))
              .sorted()
              .toList();
    }
    Path json = directory.resolve("results.json");
    List<String> arguments = new ArrayList<>(List.of("certify"));
    arguments.addAll(files);
    arguments.addAll(List.of("--json", json.toString()));
    run = WholeProgram.run(WholeProgram.project(), arguments.toArray(new String[0]));
    results = JsonValue.parse(Files.readString(json)).items();
  }

  private static boolean isRefuted(String file) {
    return file.contains("refuted");
  }

  @Test
  void everyCaseHasTheVerdictThatItsNamePromises() {
    // [invariant] the cases that ship; one is refuted on purpose and says so in its name
    assertEquals(7, files.size(), files.toString());
    assertEquals(files.size(), results.size());
    for (int i = 0; i < files.size(); i++) {
      assertEquals(
          isRefuted(files.get(i)) ? "refuted" : "certified",
          results.get(i).get("verdict").text(),
          files.get(i));
    }
  }

  @Test
  void theWorstVerdictIsTheExitCode() {
    // [invariant] at least one refuted, none undecided
    assertEquals(3, run.exitCode());
    assertEquals("", run.err());
  }

  @Test
  void guaranteedIsNoBetterThanFoundAndFoundNoBetterThanSampled() {
    int compared = 0;
    for (JsonValue result : results) {
      for (JsonValue r : result.get("requirements").items()) {
        boolean isLeast = r.get("sense").text().equals("atLeast");
        List<BigDecimal> ascending =
            Stream.of(
                    r.get("guaranteed").get("value"),
                    r.get("worstFound").get("value"),
                    r.get("sampled").get("worst"),
                    r.get("sampled").get("mean"))
                .map(JsonValue::number)
                .map(v -> isLeast ? v : v.negate())
                .toList();
        for (int k = 1; k < ascending.size(); k++) {
          assertTrue(
              ascending.get(k - 1).compareTo(ascending.get(k)) <= 0,
              r.get("name").text() + ": " + ascending);
        }
        compared++;
      }
    }
    // [invariant] number of requirements in the shipped files
    assertEquals(18, compared);
  }

  @Test
  void everyVerdictFollowsFromItsNumbers() {
    for (JsonValue result : results) {
      for (JsonValue r : result.get("requirements").items()) {
        BigDecimal sign =
            r.get("sense").text().equals("atLeast") ? BigDecimal.ONE : BigDecimal.ONE.negate();
        BigDecimal limit = r.get("limit").number().multiply(sign);
        JsonValue found = r.get("worstFound");
        if (r.get("verdict").text().equals("certified")) {
          assertTrue(
              r.get("guaranteed").get("value").number().multiply(sign).compareTo(limit) >= 0);
        } else {
          assertTrue(found.get("value").number().multiply(sign).compareTo(limit) < 0);
          assertTrue(found.get("verified").truth());
        }
      }
    }
  }

  @Test
  void worstPairIsTheOneThatBruteForceFound() {
    JsonValue found =
        results
            .get(files.indexOf("cases/pair-refuted.yaml"))
            .get("requirements")
            .items()
            .get(0)
            .get("worstFound");
    // [independent] brute force over a grid of the same device with Python and NumPy, printed to
    // six
    // digits: both pumps -20 %, both decays at 0.03, shift at either end
    assertEquals(0.915139, found.get("value").number().doubleValue(), 5e-7);
    JsonValue point = found.get("point");
    assertEquals(0, point.get("pumpParity").number().compareTo(new BigDecimal("0.8")));
    assertEquals(0, point.get("pumpPhase").number().compareTo(new BigDecimal("0.8")));
    assertEquals(0, point.get("decayLeft").number().compareTo(new BigDecimal("0.03")));
    assertEquals(0, point.get("decayRight").number().compareTo(new BigDecimal("0.03")));
    assertEquals(0, point.get("shiftLeft").number().abs().compareTo(new BigDecimal("8")));
  }

  @Test
  void everyFoundDeviceLiesInsideItsRange() throws IOException {
    JsonValue emitter = results.get(files.indexOf("cases/driven-emitter.yaml"));
    for (JsonValue r : emitter.get("requirements").items()) {
      JsonValue point = r.get("worstFound").get("point");
      // [closed form] 80 MHz +- 10 %, 0 +- 25 MHz, 1 /ns +- 10 %, and 0 to 0.1 /ns as written
      assertInside(point.get("drive"), "72", "88");
      assertInside(point.get("detuning"), "-25", "25");
      assertInside(point.get("decay"), "0.9", "1.1");
      assertInside(point.get("dephasing"), "0", "0.1");
    }
  }

  private static void assertInside(JsonValue value, String lower, String upper) {
    assertTrue(new BigDecimal(lower).compareTo(value.number()) <= 0, lower);
    assertTrue(value.number().compareTo(new BigDecimal(upper)) <= 0, upper);
  }

  @Test
  void steadyStatesOfAllCasesAreProvedUnique() {
    for (JsonValue result : results) {
      assertEquals("unique", result.get("steadyState").get("status").text());
    }
  }

  @Test
  void everyTextLineFitsAHundredColumns() {
    run.out().lines().forEach(line -> assertTrue(line.length() <= 100, line));
    assertFalse(run.out().contains("\t"));
  }

  @Test
  void textStatesEveryRequirementAndItsVerdict() {
    for (JsonValue result : results) {
      for (JsonValue r : result.get("requirements").items()) {
        String heading = "\n" + r.get("name").text() + ": " + r.get("verdict").text() + "\n";
        assertTrue(run.out().contains(heading), heading);
      }
    }
  }
}
