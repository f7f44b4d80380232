package blochbound.cli;

import blochbound.cli.Session.Attended;
import java.io.FileDescriptor;
import java.io.FileOutputStream;
import java.io.PrintStream;
import java.io.PrintWriter;
import java.nio.charset.StandardCharsets;
import java.util.concurrent.atomic.AtomicBoolean;
import picocli.CommandLine;
import picocli.CommandLine.Command;
import picocli.CommandLine.Help;
import picocli.CommandLine.Help.Ansi;

/** The program: parses the command line, runs one command and returns its exit code. */
@Command(
    name = "blochbound",
    description = "Guaranteed worst-case bounds for open quantum devices inside their tolerances.",
    synopsisSubcommandLabel = "COMMAND",
    footer = "%nblochbound COMMAND --help tells the options of a command.")
public final class Blochbound {
  private Blochbound() {}

  /** Runs the program on the standard streams and ends the virtual machine. */
  public static void main(String[] arguments) {
    runUntilSignal(arguments, Engine.STANDARD);
  }

  /** Runs the program with an engine as {@link #main} does. */
  static void runUntilSignal(String[] arguments, Engine engine) {
    PrintStream out = stream(FileDescriptor.out);
    PrintStream err = stream(FileDescriptor.err);
    int code;
    try (Interruption interruption = Interruption.watch()) {
      code = run(arguments, new Session(engine, out, err, Attended.detect(), interruption.stop()));
    }
    System.exit(code);
  }

  /**
   * Runs the program on other streams.
   *
   * @param arguments the command line
   * @param out where results go
   * @param err where everything else goes
   * @return the exit code
   */
  public static int run(String[] arguments, PrintStream out, PrintStream err) {
    return run(arguments, new Session(Engine.STANDARD, out, err, Attended.NO, new AtomicBoolean()));
  }

  /** Runs the program in a session. */
  static int run(String[] arguments, Session session) {
    FailureHandler failures = new FailureHandler(session.err());
    ExitCode code;
    try {
      code = ExitCode.of(commandLine(session, failures).execute(arguments));
    } catch (Error e) {
      code = failures.report(e);
    }
    if (session.out().checkError()) {
      code = code.orWorse(failures.report(new OutputException("the standard output")));
    }
    return code.number();
  }

  private static CommandLine commandLine(Session session, FailureHandler failures) {
    CommandLine line = new CommandLine(new Blochbound());
    line.addSubcommand(new CertifyCommand(session, failures));
    line.addSubcommand(new ShowCommand(session));
    prepare(line);
    line.getSubcommands().values().forEach(Blochbound::prepare);
    return line.setOut(writer(session.out()))
        .setErr(writer(session.err()))
        .setColorScheme(Help.defaultColorScheme(Ansi.OFF))
        .setUsageHelpWidth(100)
        .setExpandAtFiles(false)
        .setUnmatchedOptionsAllowedAsOptionParameters(false)
        .setParameterExceptionHandler(failures)
        .setExecutionExceptionHandler(failures);
  }

  private static void prepare(CommandLine command) {
    command.getCommandSpec().mixinStandardHelpOptions(true).versionProvider(new VersionText());
  }

  private static PrintWriter writer(PrintStream stream) {
    return new PrintWriter(stream, true, StandardCharsets.UTF_8);
  }

  private static PrintStream stream(FileDescriptor descriptor) {
    return new PrintStream(new FileOutputStream(descriptor), true, StandardCharsets.UTF_8);
  }
}
