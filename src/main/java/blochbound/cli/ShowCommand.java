package blochbound.cli;

import blochbound.casefile.CaseReader.RequirementRule;
import blochbound.report.CaseJson;
import blochbound.report.CaseOverview;
import blochbound.report.CaseText;
import java.nio.file.Path;
import java.util.List;
import java.util.concurrent.Callable;
import picocli.CommandLine.Command;
import picocli.CommandLine.Mixin;
import picocli.CommandLine.Parameters;

/** {@code show}: the case as the program understands it. */
@Command(
    name = "show",
    sortOptions = false,
    description = "The case as the program understands it: model, generator, nominal values.",
    exitCodeListHeading = "%nExit codes:%n",
    exitCodeList = {
      "0:shown",
      "2:bad usage or bad input; nothing is written",
      "6:an output could not be written",
      "1:internal error"
    })
final class ShowCommand implements Callable<Integer> {
  private final Session session;

  @Parameters(paramLabel = "CASE", description = "Case file.")
  private Path file = Path.of("");

  @Mixin private final OutputOptions output = new OutputOptions();

  ShowCommand(Session session) {
    this.session = session;
  }

  @Override
  public Integer call() throws Exception {
    CaseOverview overview =
        CaseOverview.of(session.read(List.of(file), RequirementRule.OPTIONAL).get(0));
    output.check();
    if (output.hasText()) {
      session.out().print(CaseText.of(overview));
    }
    output.write(() -> CaseJson.of(overview), session);
    return ExitCode.SUCCESS.number();
  }
}
