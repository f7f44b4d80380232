package blochbound.cli;

import blochbound.cli.Session.Attended;
import java.io.ByteArrayOutputStream;
import java.io.PrintStream;
import java.nio.charset.StandardCharsets;
import java.util.concurrent.atomic.AtomicBoolean;

/**
 * One run of the program inside the test.
 *
 * @param code exit code
 * @param out what it wrote to the standard output
 * @param err what it wrote to the standard error
 */
record InProcess(int code, String out, String err) {
  /** Runs with the fake engine. */
  static InProcess run(String... arguments) {
    return run(new FakeEngine(), arguments);
  }

  /** Runs with an engine. */
  static InProcess run(Engine engine, String... arguments) {
    ByteArrayOutputStream out = new ByteArrayOutputStream();
    ByteArrayOutputStream err = new ByteArrayOutputStream();
    int code =
        Blochbound.run(
            arguments,
            new Session(engine, stream(out), stream(err), Attended.NO, new AtomicBoolean()));
    return new InProcess(
        code, out.toString(StandardCharsets.UTF_8), err.toString(StandardCharsets.UTF_8));
  }

  /** A stream of UTF-8 text. */
  static PrintStream stream(ByteArrayOutputStream bytes) {
    return new PrintStream(bytes, true, StandardCharsets.UTF_8);
  }
}
