package blochbound.cli;

import blochbound.casefile.CaseFaultException;
import blochbound.casefile.CaseReader.RequirementRule;
import blochbound.casefile.Fault;
import blochbound.model.DesignCase;
import java.io.Console;
import java.io.PrintStream;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.concurrent.atomic.AtomicBoolean;

/**
 * One run of the program, as its commands see it.
 *
 * @param engine reads cases and runs studies
 * @param out where results go
 * @param err where everything else goes
 * @param attended whether a person watches the standard error
 * @param stop set from outside to end early
 */
record Session(
    Engine engine, PrintStream out, PrintStream err, Attended attended, AtomicBoolean stop) {
  /** Whether progress has a reader. */
  enum Attended {
    /** At a terminal. */
    TERMINAL,
    /** In a script, a pipe or a test. */
    NO;

    /** Whether this virtual machine was started at a terminal. */
    @SuppressWarnings("SystemConsoleNull") // what newer machines do is asked for as well
    static Attended detect() {
      Console console = System.console();
      return console != null && isTerminal(console) ? TERMINAL : NO;
    }

    /** Java 22 and later have a console without a terminal too, and this method to tell. */
    private static boolean isTerminal(Console console) {
      try {
        return (boolean) Console.class.getMethod("isTerminal").invoke(console);
      } catch (ReflectiveOperationException e) {
        return true;
      }
    }
  }

  /** Tells whether the run was asked to end early. */
  boolean isStopped() {
    return stop.get();
  }

  /**
   * Reads all case files.
   *
   * @throws CaseFaultException with the faults of all files
   */
  List<DesignCase> read(List<Path> files, RequirementRule rule) throws CaseFaultException {
    List<DesignCase> cases = new ArrayList<>();
    List<Fault> faults = new ArrayList<>();
    for (Path file : files) {
      try {
        cases.add(engine.read(file, rule));
      } catch (CaseFaultException e) {
        faults.addAll(e.faults());
      }
    }
    if (!faults.isEmpty()) {
      throw new CaseFaultException(faults);
    }
    return cases;
  }
}
