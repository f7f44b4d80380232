package blochbound.cli;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import blochbound.casefile.CaseReader.RequirementRule;
import blochbound.model.DesignCase;
import blochbound.report.HandMade;
import blochbound.study.CertificationOptions;
import blochbound.study.CertificationResult;
import blochbound.study.Verdict;
import java.io.BufferedReader;
import java.io.InputStreamReader;
import java.nio.charset.StandardCharsets;
import java.nio.file.Path;
import java.util.concurrent.TimeUnit;
import java.util.concurrent.atomic.AtomicBoolean;
import java.util.stream.Collectors;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.condition.DisabledOnOs;
import org.junit.jupiter.api.condition.OS;

class InterruptionTest {
  /** A program whose study says that it runs and then waits to be stopped. */
  static final class Waiting implements Engine {
    /** Runs it like the real program. */
    public static void main(String[] arguments) {
      Blochbound.runUntilSignal(arguments, new Waiting());
    }

    @Override
    public DesignCase read(Path file, RequirementRule rule) {
      return HandMade.designCase(file.toString(), HandMade.emitter());
    }

    @Override
    public CertificationResult certify(
        DesignCase designCase, CertificationOptions options, AtomicBoolean stop) {
      System.out.println("running");
      while (!stop.get()) {
        Thread.onSpinWait();
      }
      return HandMade.certifiedBut(Verdict.UNDECIDED, true);
    }
  }

  @Test
  @DisabledOnOs(OS.WINDOWS)
  void signalPrintsTheResultSoFarAndLeavesWith130() throws Exception {
    Process program =
        new ProcessBuilder(
                Path.of(System.getProperty("java.home"), "bin", "java").toString(),
                "-cp",
                System.getProperty("java.class.path"),
                Waiting.class.getName(),
                "certify",
                "case")
            .redirectError(ProcessBuilder.Redirect.INHERIT)
            .start();
    try (BufferedReader out =
        new BufferedReader(
            new InputStreamReader(program.getInputStream(), StandardCharsets.UTF_8))) {
      assertEquals("running", out.readLine());
      int sent =
          new ProcessBuilder("kill", "-INT", String.valueOf(program.pid())).start().waitFor();
      assertEquals(0, sent);
      String rest = out.lines().collect(Collectors.joining("\n"));
      assertTrue(rest.contains("Interrupted before the end"), rest);
      assertTrue(program.waitFor(30, TimeUnit.SECONDS));
      // [common practice, no source] 128 plus the number of the interrupt, 2
      assertEquals(130, program.exitValue());
    } finally {
      program.destroyForcibly();
    }
  }

  @Test
  void signalSetsTheFlagAndWaitsForTheResults() throws Exception {
    Interruption interruption = Interruption.watch();
    assertFalse(interruption.stop().get());
    Thread signal = new Thread(interruption::endEarly);
    signal.start();
    while (!interruption.stop().get()) {
      Thread.onSpinWait();
    }
    assertTrue(signal.isAlive());
    interruption.close();
    signal.join(10_000);
    assertFalse(signal.isAlive());
  }
}
