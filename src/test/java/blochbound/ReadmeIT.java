package blochbound;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.regex.Matcher;
import java.util.regex.Pattern;
import java.util.stream.Stream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/**
 * The commands of the README, run as they stand there.
 *
 * <p>A comment {@code <!-- run: exit N -->} before a block of commands tells what must come of
 * them, {@code output below} that the next block is what they print, and {@code <!-- file: name
 * -->} that the reader saves a block. Lines that begin with mvn are left to the build that runs
 * this test.
 */
class ReadmeIT {
  private static final Pattern BLOCK =
      Pattern.compile("(?:<!-- (.*?) -->\n)?```(\\w+)\n(.*?)```\n", Pattern.DOTALL);
  private static final Pattern RUN = Pattern.compile("run: exit (\\d+)(, output below)?");
  private static final String PROGRAM = "java -jar target/blochbound.jar ";
  private static final String SECONDS = "\\d[0-9.e-]* s$";

  @TempDir private Path directory = Path.of("");

  private record Block(String remark, String language, String content) {}

  private static List<Block> blocks() throws IOException {
    Matcher matcher = BLOCK.matcher(Files.readString(WholeProgram.project().resolve("README.md")));
    List<Block> blocks = new ArrayList<>();
    while (matcher.find()) {
      String remark = matcher.group(1) == null ? "" : matcher.group(1);
      blocks.add(new Block(remark, matcher.group(2), matcher.group(3)));
    }
    return blocks;
  }

  @Test
  void everyCommandDoesWhatThePageSays() throws Exception {
    // The reader's directory: the project's cases, and the files saved on the way.
    Path cases = Files.createDirectory(directory.resolve("cases"));
    try (Stream<Path> shipped = Files.list(WholeProgram.project().resolve("cases"))) {
      for (Path file : shipped.toList()) {
        Files.copy(file, cases.resolve(file.getFileName()));
      }
    }
    List<Block> blocks = blocks();
    int run = 0;
    for (int i = 0; i < blocks.size(); i++) {
      Block block = blocks.get(i);
      if (block.remark.startsWith("file: ")) {
        Files.writeString(directory.resolve(block.remark.substring(6)), block.content);
      }
      Matcher expected = RUN.matcher(block.remark);
      if (!expected.matches()) {
        continue;
      }
      for (String line : commands(block)) {
        WholeProgram.Result result =
            WholeProgram.run(directory, line.substring(PROGRAM.length()).split(" "));
        assertEquals(
            Integer.parseInt(expected.group(1)), result.exitCode(), line + "\n" + result.err());
        assertEquals("", result.err());
        if (expected.group(2) != null) {
          assertPrinted(blocks.get(i + 1).content, result.out());
        }
        run++;
      }
    }
    // [invariant] a page without a command it can find is no page that was tested
    assertTrue(run >= 6, run + " commands were run");
  }

  /** The commands of the program; everything else in a block that is to be run must be Maven's. */
  private static List<String> commands(Block block) {
    assertEquals("sh", block.language);
    List<String> lines = Arrays.stream(block.content.split("\n")).toList();
    lines.forEach(line -> assertTrue(line.startsWith(PROGRAM) || line.startsWith("mvn "), line));
    return lines.stream().filter(line -> line.startsWith(PROGRAM)).toList();
  }

  /** Compares line by line, seconds apart; a line {@code [... ...]} stands for any lines. */
  private static void assertPrinted(String shown, String printed) {
    List<String> actual = printed.lines().map(ReadmeIT::timeless).toList();
    int at = 0;
    boolean isTrimmed = false;
    for (String line : shown.lines().map(ReadmeIT::timeless).toList()) {
      if (line.startsWith("[...")) {
        isTrimmed = true;
        continue;
      }
      while (isTrimmed && at < actual.size() && !actual.get(at).equals(line)) {
        at++;
      }
      isTrimmed = false;
      assertTrue(at < actual.size(), "not printed: " + line);
      assertEquals(line, actual.get(at));
      at++;
    }
    assertEquals(actual.size(), at, "the page ends before the output");
  }

  private static String timeless(String line) {
    return line.replaceAll(SECONDS, "T s");
  }

  @Test
  void everyLinkLeadsToAFile() throws Exception {
    Matcher link =
        Pattern.compile("\\]\\(([^)#]+)\\)")
            .matcher(Files.readString(WholeProgram.project().resolve("README.md")));
    int found = 0;
    while (link.find()) {
      if (!link.group(1).startsWith("http")) {
        assertTrue(Files.exists(WholeProgram.project().resolve(link.group(1))), link.group(1));
        found++;
      }
    }
    assertTrue(found > 0);
  }
}
