package blochbound.cli;

import static org.junit.jupiter.api.Assertions.assertEquals;

import blochbound.cli.Session.Attended;
import java.io.ByteArrayOutputStream;
import org.junit.jupiter.api.Test;

class ProgressTest {
  @Test
  void everyLineHasTheSameWidth() {
    // [common practice, no source] a terminal of 80 columns wraps at the 80th
    assertEquals(79, Progress.line("short", 1).length());
    assertEquals(79, Progress.line("long ".repeat(40), 123456).length());
    assertEquals("7 s a b", Progress.line("a\u001bb", 7).stripTrailing());
  }

  @Test
  void shortTasksShowNothing() {
    ByteArrayOutputStream bytes = new ByteArrayOutputStream();
    Progress.show(Attended.NO, InProcess.stream(bytes), "task").end();
    Progress.show(Attended.TERMINAL, InProcess.stream(bytes), "task").end();
    assertEquals(0, bytes.size());
  }
}
