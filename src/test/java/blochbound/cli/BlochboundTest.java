package blochbound.cli;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import blochbound.casefile.CaseReader.RequirementRule;
import blochbound.cli.Session.Attended;
import blochbound.report.CertifyJson;
import blochbound.report.CertifyText;
import blochbound.report.HandMade;
import blochbound.study.CertificationOptions;
import blochbound.study.Verdict;
import java.io.ByteArrayOutputStream;
import java.io.IOException;
import java.io.OutputStream;
import java.io.PrintStream;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.time.Duration;
import java.util.List;
import java.util.OptionalDouble;
import java.util.concurrent.atomic.AtomicBoolean;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

class BlochboundTest {
  @TempDir private Path directory = Path.of("");

  private static String text(byte[] document) {
    return new String(document, StandardCharsets.UTF_8);
  }

  // [invariant] the exit codes that the help promises
  @ParameterizedTest
  @CsvSource({"certified,0", "refuted,3", "undecided,4", "faulty,2", "defect,1", "stopped,130"})
  void outcomeIsTheExitCode(String file, int code) {
    assertEquals(code, InProcess.run("certify", file).code());
  }

  // [invariant] internal error, then bad input, then refuted, then undecided
  @ParameterizedTest
  @CsvSource({
    "certified,undecided,4",
    "undecided,refuted,3",
    "refuted,certified,3",
    "refuted,faulty,2",
    "defect,refuted,1",
    "refuted,stopped,130",
  })
  void worstOfSeveralCasesIsTheExitCode(String first, String second, int code) {
    assertEquals(code, InProcess.run("certify", first, second).code());
  }

  @Test
  void textGoesToTheStandardOutputAlone() {
    InProcess run = InProcess.run("certify", "certified");
    assertEquals(CertifyText.of(HandMade.certified()), run.out());
    assertEquals("", run.err());
  }

  @Test
  void faultsOfAllFilesAreListedBeforeAnyWork() {
    FakeEngine engine = new FakeEngine();
    InProcess run = InProcess.run(engine, "certify", "certified", "faulty", "faulty");
    assertEquals(2, run.code());
    assertEquals("", run.out());
    String fault = "faulty:3:7: unknown key `sties`" + System.lineSeparator();
    assertEquals(fault + fault, run.err());
    assertEquals(List.of(), engine.options);
  }

  @Test
  void certifyNeedsRequirementsAndShowDoesNot() {
    FakeEngine engine = new FakeEngine();
    InProcess.run(engine, "certify", "certified");
    InProcess.run(engine, "show", "certified");
    assertEquals(List.of(RequirementRule.REQUIRED, RequirementRule.OPTIONAL), engine.rules);
  }

  @Test
  void defectInOneCaseKeepsTheOthersResults() {
    InProcess run = InProcess.run("certify", "defect", "certified");
    assertEquals(1, run.code());
    assertTrue(run.out().contains("verdict: certified"), run.out());
    assertTrue(run.err().contains("internal error"), run.err());
    assertTrue(run.err().contains("the bracket is inside out"), run.err());
    assertTrue(run.err().contains("report it"), run.err());
  }

  @Test
  void exhaustedMemoryIsSaidWithoutATrace() {
    InProcess run = InProcess.run("certify", "exhausted");
    assertEquals(1, run.code());
    assertTrue(run.err().startsWith("blochbound: out of memory"), run.err());
    assertFalse(run.err().contains("\tat "), run.err());
  }

  @Test
  void errorOfTheMachineWhileReadingIsAnInternalError() {
    InProcess run = InProcess.run("show", "endless");
    assertEquals(1, run.code());
    assertTrue(run.err().contains("internal error"), run.err());
  }

  @Test
  void nothingIsCertifiedAfterAStop() {
    FakeEngine engine = new FakeEngine();
    InProcess run = InProcess.run(engine, "certify", "stopped", "certified");
    assertEquals(130, run.code());
    assertEquals(1, engine.options.size());
    assertTrue(run.out().contains("Interrupted before the end"), run.out());
  }

  @Test
  void jsonFileStandsBesideTheText() throws Exception {
    Path file = directory.resolve("r.json");
    InProcess run = InProcess.run("certify", "certified", "--json", file.toString());
    assertEquals(0, run.code());
    assertEquals(CertifyText.of(HandMade.certified()), run.out());
    assertEquals(text(CertifyJson.of(HandMade.certified())), Files.readString(file));
  }

  @Test
  void jsonOnStandardOutputReplacesTheText() {
    InProcess run = InProcess.run("certify", "--json", "-", "refuted");
    assertEquals(3, run.code());
    assertEquals(text(CertifyJson.of(HandMade.certifiedBut(Verdict.REFUTED, false))), run.out());
    assertEquals(run, InProcess.run("certify", "--json=-", "refuted"));
  }

  @Test
  void severalCasesMakeAJsonArrayEvenWhenOnlyOneFinished() {
    assertTrue(
        InProcess.run("certify", "--json=-", "certified", "certified").out().startsWith("["));
    assertTrue(InProcess.run("certify", "--json=-", "stopped", "certified").out().startsWith("["));
  }

  @Test
  void unwritableJsonIsFoundBeforeTheWork() {
    FakeEngine engine = new FakeEngine();
    String file = directory.resolve("no").resolve("r.json").toString();
    InProcess run = InProcess.run(engine, "certify", "refuted", "--json", file);
    assertEquals(6, run.code());
    assertEquals("", run.out());
    assertEquals(
        "blochbound: cannot write "
            + file
            + ": its directory does not exist"
            + System.lineSeparator(),
        run.err());
    assertEquals(List.of(), engine.options);
  }

  @Test
  void badInputWritesNoJson() throws Exception {
    Path file = directory.resolve("r.json");
    assertEquals(2, InProcess.run("certify", "faulty", "--json", file.toString()).code());
    assertFalse(Files.exists(file));
  }

  @Test
  void brokenStandardOutputIsAFailure() {
    OutputStream broken =
        new OutputStream() {
          @Override
          public void write(int b) throws IOException {
            throw new IOException("broken");
          }
        };
    ByteArrayOutputStream err = new ByteArrayOutputStream();
    int code =
        Blochbound.run(
            new String[] {"certify", "certified"},
            new Session(
                new FakeEngine(),
                new PrintStream(broken, true, StandardCharsets.UTF_8),
                InProcess.stream(err),
                Attended.NO,
                new AtomicBoolean()));
    assertEquals(6, code);
    assertTrue(text(err.toByteArray()).contains("cannot write to the standard output"));
  }

  @Test
  void optionsReachTheStudy() {
    FakeEngine engine = new FakeEngine();
    InProcess run =
        InProcess.run(
            engine,
            "certify",
            "certified",
            "--seed=-5",
            "--gap",
            "1e-3",
            "--rel=0.01",
            "--time",
            "2 min",
            "--threads=3",
            "--samples=77",
            "--quiet");
    assertEquals(0, run.code(), run.err());
    assertEquals(
        List.of(
            new CertificationOptions(
                -5,
                OptionalDouble.of(1e-3),
                OptionalDouble.of(0.01),
                Duration.ofMinutes(2),
                3,
                77)),
        engine.options);
  }

  @Test
  void withoutOptionsTheDefaultsReachTheStudy() {
    FakeEngine engine = new FakeEngine();
    InProcess.run(engine, "certify", "certified");
    assertEquals(List.of(CertificationOptions.withDefaults()), engine.options);
  }

  @ParameterizedTest
  @CsvSource({
    "--seed, 1.5, a whole number",
    "--seed, 9223372036854775808, a whole number from -9223372036854775808 to 9223372036854775807",
    "--gap, 0, a positive number such as 1e-3",
    "--gap, NaN, a positive number such as 1e-3",
    "--gap, Infinity, a positive number such as 1e-3",
    "--rel, 1, a number between 0 and 1 such as 0.01",
    "--rel, x, a number between 0 and 1 such as 0.01",
    "--time, 60, 'a positive number with ms, s, min or h, such as 20s or \"2 min\"'",
    "--time, 0s, more than 0 and at most 8760 h",
    "--threads, 0, a whole number from 1 to 1024",
    "--samples, -1, a whole number from 1 to 2147483647",
  })
  void badValueIsRefusedWithWhatIsAllowed(String option, String value, String allowed) {
    FakeEngine engine = new FakeEngine();
    InProcess run = InProcess.run(engine, "certify", "certified", option, value);
    assertEquals(2, run.code());
    assertEquals("", run.out());
    String first = run.err().lines().findFirst().orElse("");
    assertTrue(
        first.startsWith("blochbound: Invalid value for option '" + option + "': `" + value + "`"),
        first);
    assertTrue(first.contains("allowed is " + allowed), first);
    assertEquals(List.of(), engine.options);
  }

  @Test
  void unknownOptionAndCommandGetASuggestion() {
    InProcess option = InProcess.run("certify", "certified", "--sed", "1");
    assertEquals(2, option.code());
    assertTrue(option.err().startsWith("blochbound: unknown option `--sed`"), option.err());
    assertTrue(option.err().contains("Did you mean --seed?"), option.err());
    InProcess command = InProcess.run("certfy", "certified");
    assertEquals(2, command.code());
    assertTrue(command.err().startsWith("blochbound: unknown command `certfy`"), command.err());
    assertTrue(command.err().contains("Did you mean certify?"), command.err());
    InProcess argument = InProcess.run("show", "certified", "refuted");
    assertEquals(2, argument.code());
    assertTrue(argument.err().startsWith("blochbound: surplus argument `refuted`"), argument.err());
  }

  @Test
  void missingArgumentsAreBadUsage() {
    assertEquals(2, InProcess.run().code());
    assertEquals(2, InProcess.run("certify").code());
    assertEquals(2, InProcess.run("certify", "certified", "--json").code());
    assertEquals(2, InProcess.run("certify", "--json", "--quiet", "certified").code());
    assertEquals(2, InProcess.run("show", "certified", "refuted").code());
  }

  @Test
  void fileNamesWithAnAtSignAreNotExpanded() {
    InProcess run = InProcess.run("show", "@case");
    assertEquals(0, run.code(), run.err());
    assertTrue(run.out().startsWith("@case\n"), run.out());
  }

  @Test
  void helpAndVersionSucceed() {
    InProcess help = InProcess.run("--help");
    assertEquals(0, help.code());
    assertTrue(help.out().contains("certify"), help.out());
    assertTrue(help.out().contains("show"), help.out());
    InProcess certify = InProcess.run("certify", "--help");
    assertEquals(0, certify.code());
    for (String promised : List.of("--json", "--seed", "--gap", "--rel", "--time", "--threads")) {
      assertTrue(certify.out().contains(promised), promised);
    }
    InProcess version = InProcess.run("--version");
    assertEquals(0, version.code());
    assertTrue(version.out().startsWith("blochbound "), version.out());
  }

  @Test
  void helpHasNoEscapeSequencesAndFits() {
    String help = InProcess.run("certify", "--help").out();
    assertFalse(help.contains("\u001b"), help);
    help.lines().forEach(line -> assertTrue(line.length() <= 100, line));
  }

  @Test
  void showIsTextOrJson() {
    InProcess text = InProcess.run("show", "certified");
    assertEquals(0, text.code());
    assertTrue(text.out().startsWith("certified\nsha256 00ff\n"), text.out());
    InProcess json = InProcess.run("show", "--json=-", "certified");
    assertEquals(0, json.code());
    assertTrue(json.out().startsWith("{\n  \"format\": \"blochbound-show/1\""), json.out());
    assertEquals(2, InProcess.run("show", "faulty").code());
  }

  @Test
  void standardEngineReadsFiles() {
    ByteArrayOutputStream out = new ByteArrayOutputStream();
    ByteArrayOutputStream err = new ByteArrayOutputStream();
    String missing = directory.resolve("none.yaml").toString();
    int code =
        Blochbound.run(
            new String[] {"certify", missing}, InProcess.stream(out), InProcess.stream(err));
    assertEquals(2, code);
    assertTrue(text(err.toByteArray()).startsWith(missing + ":1:1: "), text(err.toByteArray()));
  }
}
