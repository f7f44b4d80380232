package blochbound.cli;

import java.nio.file.Path;
import java.util.Optional;
import java.util.function.Supplier;
import picocli.CommandLine.Option;

/** Options for where results go, shared by commands. */
final class OutputOptions {
  private static final String STANDARD_OUTPUT = "-";

  @Option(
      names = "--json",
      paramLabel = "FILE",
      description = {
        "Also write the machine result to this file;",
        "with - it goes to the standard output instead of the text."
      })
  private Optional<Path> json = Optional.empty();

  @Option(names = "--quiet", description = "No progress on the terminal.")
  private boolean quiet;

  /** Tells whether text belongs on the standard output. */
  boolean hasText() {
    return json.filter(OutputOptions::isStandardOutput).isEmpty();
  }

  /** Tells whether progress is not wanted. */
  boolean isQuiet() {
    return quiet;
  }

  /**
   * Finds out before the work starts whether the file can be written.
   *
   * @throws OutputException when it cannot
   */
  void check() throws OutputException {
    if (json.isPresent() && hasText()) {
      new ResultFile(json.get()).check();
    }
  }

  /**
   * Writes the machine result where it is wanted, if anywhere.
   *
   * @throws OutputException when it cannot be written
   */
  void write(Supplier<byte[]> document, Session session) throws OutputException {
    if (json.isEmpty()) {
      return;
    }
    byte[] content = document.get();
    if (isStandardOutput(json.get())) {
      session.out().write(content, 0, content.length);
    } else {
      new ResultFile(json.get()).write(content);
    }
  }

  private static boolean isStandardOutput(Path file) {
    return file.toString().equals(STANDARD_OUTPUT);
  }
}
