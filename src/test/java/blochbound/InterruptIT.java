package blochbound;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.io.BufferedReader;
import java.io.InputStreamReader;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.concurrent.TimeUnit;
import java.util.stream.Collectors;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.condition.DisabledOnOs;
import org.junit.jupiter.api.condition.OS;
import org.junit.jupiter.api.io.TempDir;

/** Ctrl-C in the middle of the work. */
class InterruptIT {
  @TempDir private Path directory = Path.of("");

  @Test
  @DisabledOnOs(OS.WINDOWS)
  void interruptPrintsTheBracketSoFarAndWritesTheMachineResult() throws Exception {
    Path first = SmallCase.coldest(directory, "first.yaml", "0.2");
    Path json = directory.resolve("r.json");
    // The second case is given a gap that takes it far longer than this test.
    Process program =
        new ProcessBuilder(
                WholeProgram.briefCommand(
                    "certify",
                    first.toString(),
                    WholeProgram.project().resolve("cases/parity-pair.yaml").toString(),
                    "--gap",
                    "1e-9",
                    "--samples",
                    "200",
                    "--json",
                    json.toString()))
            .redirectError(ProcessBuilder.Redirect.INHERIT)
            .start();
    try (BufferedReader out =
        new BufferedReader(
            new InputStreamReader(program.getInputStream(), StandardCharsets.UTF_8))) {
      String line = out.readLine();
      while (line != null && !line.startsWith("verdict: ")) {
        line = out.readLine();
      }
      assertEquals(
          "verdict: certified - every requirement holds for every device inside the tolerances.",
          line);
      // Time to begin with the second case.
      assertFalse(program.waitFor(500, TimeUnit.MILLISECONDS));
      int sent =
          new ProcessBuilder("kill", "-INT", String.valueOf(program.pid())).start().waitFor();
      assertEquals(0, sent);
      String rest = out.lines().collect(Collectors.joining("\n"));
      assertTrue(program.waitFor(30, TimeUnit.SECONDS));
      // [common practice, no source] 128 plus the number of the interrupt, 2
      assertEquals(130, program.exitValue());
      assertTrue(rest.contains("Interrupted before the end"), rest);
      assertTrue(rest.contains("\nentangled: "), rest);
    } finally {
      program.destroyForcibly();
    }
    JsonValue second = JsonValue.parse(Files.readString(json)).items().get(1);
    assertTrue(second.get("interrupted").truth());
    for (JsonValue r : second.get("requirements").items()) {
      double guaranteed = r.get("guaranteed").get("value").number().doubleValue();
      assertTrue(guaranteed <= r.get("worstFound").get("value").number().doubleValue());
    }
  }
}
