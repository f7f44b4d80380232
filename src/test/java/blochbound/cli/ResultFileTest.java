package blochbound.cli;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.stream.Stream;
import org.junit.jupiter.api.Assumptions;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

class ResultFileTest {
  private static final byte[] CONTENT = "{}\n".getBytes(StandardCharsets.UTF_8);

  @TempDir private Path directory = Path.of("");

  private static String message(Exception refusal) {
    return String.valueOf(refusal.getMessage());
  }

  private List<Path> entries() throws IOException {
    try (Stream<Path> entries = Files.list(directory)) {
      return entries.toList();
    }
  }

  @Test
  void contentReplacesAnOlderFileAndNothingElseStays() throws Exception {
    Path file = directory.resolve("result.json");
    Files.writeString(file, "an older and longer result");
    ResultFile result = new ResultFile(file);
    result.check();
    assertEquals("an older and longer result", Files.readString(file));
    result.write(CONTENT);
    assertArrayEquals(CONTENT, Files.readAllBytes(file));
    assertEquals(List.of(file), entries());
  }

  @Test
  void checkLeavesNoFileBehind() throws Exception {
    new ResultFile(directory.resolve("result.json")).check();
    assertEquals(List.of(), entries());
  }

  @Test
  void missingDirectoryIsSaid() {
    ResultFile result = new ResultFile(directory.resolve("no").resolve("result.json"));
    OutputException refusal = assertThrows(OutputException.class, result::check);
    assertTrue(message(refusal).endsWith("its directory does not exist"), message(refusal));
    assertThrows(OutputException.class, () -> result.write(CONTENT));
  }

  @Test
  void directoryIsNoFile() {
    OutputException refusal = assertThrows(OutputException.class, new ResultFile(directory)::check);
    assertTrue(message(refusal).endsWith("it is a directory"), message(refusal));
  }

  @Test
  void fileInPlaceOfADirectoryIsSaid() throws Exception {
    Path file = Files.writeString(directory.resolve("file"), "x");
    ResultFile result = new ResultFile(file.resolve("result.json"));
    OutputException refusal = assertThrows(OutputException.class, result::check);
    assertFalse(message(refusal).contains("null"), message(refusal));
  }

  @Test
  void linksAreFollowed() throws Exception {
    Path target = Files.writeString(directory.resolve("target"), "old");
    Path link = Files.createSymbolicLink(directory.resolve("link"), Path.of("target"));
    new ResultFile(link).write(CONTENT);
    assertTrue(Files.isSymbolicLink(link));
    assertArrayEquals(CONTENT, Files.readAllBytes(target));
  }

  @Test
  void devicesAreWrittenDirectlyAndStayDevices() throws Exception {
    Path device = Path.of("/dev/null");
    Assumptions.assumeTrue(Files.exists(device));
    ResultFile result = new ResultFile(device);
    result.check();
    result.write(CONTENT);
    assertTrue(Files.exists(device));
    assertFalse(Files.isRegularFile(device));
  }

  @Test
  void fullDeviceIsAFailure() {
    Path device = Path.of("/dev/full");
    Assumptions.assumeTrue(Files.exists(device));
    OutputException refusal =
        assertThrows(OutputException.class, () -> new ResultFile(device).write(CONTENT));
    assertTrue(message(refusal).startsWith("cannot write /dev/full: "), message(refusal));
  }
}
