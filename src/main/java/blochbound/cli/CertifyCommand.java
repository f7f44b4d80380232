package blochbound.cli;

import blochbound.casefile.CaseReader.RequirementRule;
import blochbound.cli.Session.Attended;
import blochbound.model.DesignCase;
import blochbound.report.CertifyJson;
import blochbound.report.CertifyText;
import blochbound.study.CertificationOptions;
import blochbound.study.CertificationResult;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.concurrent.Callable;
import picocli.CommandLine.Command;
import picocli.CommandLine.Mixin;
import picocli.CommandLine.Parameters;

/** {@code certify}: nominal, worst found, guaranteed bound, samples, verdict per requirement. */
@Command(
    name = "certify",
    sortOptions = false,
    description = {
      "Nominal value, worst found, guaranteed bound, sampled values and verdict",
      "for every requirement of every case."
    },
    exitCodeListHeading = "%nExit codes (of several cases the worst):%n",
    exitCodeList = {
      "0:every requirement is certified",
      "3:at least one requirement is refuted",
      "4:none is refuted, at least one is undecided",
      "2:bad usage or bad input; nothing is written",
      "6:an output could not be written",
      "130:interrupted; the brackets so far are printed",
      "1:internal error"
    })
final class CertifyCommand implements Callable<Integer> {
  private static final String SEPARATOR = "\n" + "=".repeat(100) + "\n\n";

  private final Session session;
  private final FailureHandler failures;

  @Parameters(arity = "1..*", paramLabel = "CASE", description = "Case files.")
  private List<Path> files = List.of();

  @Mixin private final StudyOptions study = new StudyOptions();
  @Mixin private final OutputOptions output = new OutputOptions();

  CertifyCommand(Session session, FailureHandler failures) {
    this.session = session;
    this.failures = failures;
  }

  @Override
  public Integer call() throws Exception {
    CertificationOptions options = study.options();
    List<DesignCase> cases = session.read(files, RequirementRule.REQUIRED);
    output.check();
    List<CertificationResult> results = new ArrayList<>();
    ExitCode worst = ExitCode.SUCCESS;
    for (DesignCase designCase : cases) {
      worst =
          worst.orWorse(
              session.isStopped() ? ExitCode.INTERRUPTED : certify(designCase, options, results));
    }
    return worst.orWorse(write(results)).number();
  }

  /** Certifies one case; a defect in one case does not keep the others from their results. */
  private ExitCode certify(
      DesignCase designCase, CertificationOptions options, List<CertificationResult> results) {
    try {
      CertificationResult result = run(designCase, options);
      if (output.hasText()) {
        session.out().print((results.isEmpty() ? "" : SEPARATOR) + CertifyText.of(result));
        session.out().flush();
      }
      results.add(result);
      return exitCode(result);
    } catch (RuntimeException | Error e) {
      return failures.report(e);
    }
  }

  private CertificationResult run(DesignCase designCase, CertificationOptions options) {
    Attended attended = output.isQuiet() ? Attended.NO : session.attended();
    Progress progress = Progress.show(attended, session.err(), designCase.title());
    try {
      return session.engine().certify(designCase, options, session.stop());
    } finally {
      progress.end();
    }
  }

  private ExitCode write(List<CertificationResult> results) {
    if (results.isEmpty()) {
      return ExitCode.SUCCESS;
    }
    try {
      output.write(
          () -> files.size() == 1 ? CertifyJson.of(results.get(0)) : CertifyJson.ofAll(results),
          session);
      return ExitCode.SUCCESS;
    } catch (OutputException e) {
      return failures.report(e);
    }
  }

  private static ExitCode exitCode(CertificationResult result) {
    ExitCode verdict =
        switch (result.verdict()) {
          case CERTIFIED -> ExitCode.SUCCESS;
          case REFUTED -> ExitCode.REFUTED;
          case UNDECIDED -> ExitCode.UNDECIDED;
        };
    return result.interrupted() ? verdict.orWorse(ExitCode.INTERRUPTED) : verdict;
  }
}
