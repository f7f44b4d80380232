package blochbound.cli;

import java.nio.file.Path;
import java.util.concurrent.Callable;
import picocli.CommandLine.Command;
import picocli.CommandLine.Mixin;
import picocli.CommandLine.Parameters;

/** {@code show}: the case as the program understands it. */
@Command(
    name = "show",
    description = "The case as the program understands it: model, generator, nominal values.")
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
    return 0;
  }
}
