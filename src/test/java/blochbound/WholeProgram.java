package blochbound;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;

/**
 * Runs the built jar in a process of its own, as a user does; for tests named {@code *IT}.
 *
 * <p>The build passes the path of the jar in the system property {@code blochbound.jar}.
 */
public final class WholeProgram {
  private WholeProgram() {}

  /**
   * What a run of the program left behind.
   *
   * @param exitCode exit code of the process
   * @param out standard output
   * @param err standard error
   */
  public record Result(int exitCode, String out, String err) {}

  /** Path of the jar under test. */
  public static Path jar() {
    String path = System.getProperty("blochbound.jar");
    if (path == null || !Files.isRegularFile(Path.of(path))) {
      throw new IllegalStateException(
          "no jar at " + path + ": run the whole-program tests by mvn verify");
    }
    return Path.of(path);
  }

  /** Directory of the project, in which a reader of its pages types commands. */
  public static Path project() {
    return jar().toAbsolutePath().getParent().getParent();
  }

  /** The command {@code java -jar blochbound.jar arguments}, with options of the machine. */
  private static List<String> command(List<String> machine, String... arguments) {
    List<String> command = new ArrayList<>();
    command.add(Path.of(System.getProperty("java.home"), "bin", "java").toString());
    command.addAll(machine);
    command.add("-jar");
    command.add(jar().toString());
    command.addAll(List.of(arguments));
    return command;
  }

  /** The same command for work that is over before a better compiler would pay. */
  public static List<String> briefCommand(String... arguments) {
    return command(List.of("-XX:TieredStopAtLevel=1", "-XX:+UseSerialGC"), arguments);
  }

  /** Runs {@code java -jar blochbound.jar arguments} in a directory and waits for its end. */
  public static Result run(Path directory, String... arguments)
      throws IOException, InterruptedException {
    return run(directory, command(List.of(), arguments));
  }

  /** Runs a {@link #briefCommand} in a directory and waits for its end. */
  public static Result runBriefly(Path directory, String... arguments)
      throws IOException, InterruptedException {
    return run(directory, briefCommand(arguments));
  }

  private static Result run(Path directory, List<String> command)
      throws IOException, InterruptedException {
    Path out = Files.createTempFile("blochbound", ".out");
    Path err = Files.createTempFile("blochbound", ".err");
    try {
      // Files instead of pipes: neither stream can fill up and stop the program.
      Process process =
          new ProcessBuilder(command)
              .directory(directory.toFile())
              .redirectOutput(out.toFile())
              .redirectError(err.toFile())
              .start();
      process.getOutputStream().close();
      return new Result(process.waitFor(), Files.readString(out), Files.readString(err));
    } finally {
      Files.delete(out);
      Files.delete(err);
    }
  }
}
