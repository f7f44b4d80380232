package blochbound.cli;

import blochbound.casefile.CaseFaultException;
import java.io.PrintStream;
import picocli.CommandLine;
import picocli.CommandLine.IExecutionExceptionHandler;
import picocli.CommandLine.IParameterExceptionHandler;
import picocli.CommandLine.ParameterException;
import picocli.CommandLine.ParseResult;
import picocli.CommandLine.UnmatchedArgumentException;

/** Says what went wrong and picks the exit code: the only place that does. */
final class FailureHandler implements IExecutionExceptionHandler, IParameterExceptionHandler {
  private static final String PROGRAM = "blochbound: ";

  private final PrintStream err;

  FailureHandler(PrintStream err) {
    this.err = err;
  }

  @Override
  public int handleParseException(ParameterException failure, String[] arguments) {
    CommandLine command = failure.getCommandLine();
    if (failure instanceof UnmatchedArgumentException unmatched) {
      reportUnmatched(unmatched);
    } else {
      err.println(PROGRAM + failure.getMessage());
    }
    err.println("See " + command.getCommandSpec().qualifiedName() + " --help.");
    return ExitCode.BAD_INPUT.number();
  }

  private void reportUnmatched(UnmatchedArgumentException failure) {
    boolean isCommand = !failure.getCommandLine().getSubcommands().isEmpty();
    String what =
        failure.isUnknownOption()
            ? "unknown option"
            : isCommand ? "unknown command" : "surplus argument";
    err.println(PROGRAM + what + " `" + failure.getUnmatched().get(0) + "`");
    failure.getSuggestions().stream()
        .findFirst()
        .ifPresent(nearest -> err.println("Did you mean " + nearest + "?"));
  }

  @Override
  public int handleExecutionException(
      Exception failure, CommandLine command, ParseResult arguments) {
    return report(failure).number();
  }

  /** Reports a failure of a command. */
  ExitCode report(Throwable failure) {
    if (failure instanceof CaseFaultException faults) {
      faults.faults().forEach(err::println);
      return ExitCode.BAD_INPUT;
    }
    if (failure instanceof OutputException) {
      err.println(PROGRAM + failure.getMessage());
      return ExitCode.CANNOT_WRITE;
    }
    if (failure instanceof OutOfMemoryError) {
      err.println(PROGRAM + "out of memory; java -Xmx4g -jar ... allows 4 GB, for example");
      return ExitCode.INTERNAL_ERROR;
    }
    err.println(
        PROGRAM
            + "internal error, a defect of the program and not of the case; no result can be"
            + " relied on. Please report it with the case file and these lines:");
    failure.printStackTrace(err);
    return ExitCode.INTERNAL_ERROR;
  }
}
