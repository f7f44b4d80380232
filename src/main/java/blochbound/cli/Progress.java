package blochbound.cli;

import blochbound.cli.Session.Attended;
import java.io.PrintStream;
import java.util.concurrent.CountDownLatch;
import java.util.concurrent.TimeUnit;

/**
 * A line on a terminal that tells what is being worked on and for how long; it is wiped at the end.
 */
final class Progress {
  private static final int WIDTH = 79;
  private static final long STEP_MILLISECONDS = 1000;

  private final PrintStream terminal;
  private final String task;
  private final CountDownLatch done = new CountDownLatch(1);
  private final Thread writer = new Thread(this::write, "progress");

  private Progress(PrintStream terminal, String task) {
    this.terminal = terminal;
    this.task = task;
  }

  /**
   * Shows a task on a terminal until it ends: from its first second on, and nothing where nobody
   * watches.
   */
  static Progress show(Attended attended, PrintStream terminal, String task) {
    Progress progress = new Progress(terminal, task);
    progress.writer.setDaemon(true);
    if (attended == Attended.TERMINAL) {
      progress.writer.start();
    }
    return progress;
  }

  private void write() {
    long seconds = 0;
    try {
      while (!done.await(STEP_MILLISECONDS, TimeUnit.MILLISECONDS)) {
        seconds++;
        terminal.print("\r" + line(task, seconds));
        terminal.flush();
      }
    } catch (InterruptedException e) {
      Thread.currentThread().interrupt();
    }
    if (seconds > 0) {
      terminal.print("\r" + " ".repeat(WIDTH) + "\r");
      terminal.flush();
    }
  }

  /** The line for a task, always of the same width so that it overwrites the one before. */
  static String line(String task, long seconds) {
    String time = seconds + " s ";
    int room = WIDTH - time.length();
    String printable = task.replaceAll("\\p{Cntrl}", " ");
    String start = printable.length() > room ? printable.substring(0, room) : printable;
    return time + start + " ".repeat(room - start.length());
  }

  /** Wipes the line. */
  void end() {
    done.countDown();
    try {
      writer.join();
    } catch (InterruptedException e) {
      Thread.currentThread().interrupt();
    }
  }
}
