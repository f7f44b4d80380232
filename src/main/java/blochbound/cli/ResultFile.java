package blochbound.cli;

import java.io.IOException;
import java.nio.file.AccessDeniedException;
import java.nio.file.FileSystemException;
import java.nio.file.Files;
import java.nio.file.NoSuchFileException;
import java.nio.file.Path;
import java.nio.file.StandardCopyOption;
import java.nio.file.StandardOpenOption;

/**
 * A file for results that is written whole or not at all: into a new file next to it, which then
 * takes its name in one step. Links are followed, and devices are written directly.
 */
final class ResultFile {
  private final Path named;

  /** The file that the user names. */
  ResultFile(Path named) {
    this.named = named;
  }

  /**
   * Finds out before the work starts whether the file can be written.
   *
   * @throws OutputException when it cannot
   */
  void check() throws OutputException {
    try {
      if (Files.isDirectory(named)) {
        throw new OutputException(named, "it is a directory");
      }
      if (Files.exists(named) && !Files.isWritable(named)) {
        throw new OutputException(named, "it is write-protected");
      }
      if (!isDevice()) {
        Path trial = neighbour();
        Files.createFile(trial);
        Files.delete(trial);
      }
    } catch (IOException e) {
      throw failure(e);
    }
  }

  /**
   * Writes the content.
   *
   * @throws OutputException when it cannot be written; an older file is then untouched
   */
  void write(byte[] content) throws OutputException {
    try {
      if (isDevice()) {
        Files.write(named, content, StandardOpenOption.WRITE);
        return;
      }
      Path whole = neighbour();
      try {
        Files.write(whole, content, StandardOpenOption.CREATE_NEW, StandardOpenOption.WRITE);
        Files.move(whole, target(), StandardCopyOption.ATOMIC_MOVE);
      } finally {
        Files.deleteIfExists(whole);
      }
    } catch (IOException e) {
      throw failure(e);
    }
  }

  private boolean isDevice() {
    return Files.exists(named) && !Files.isRegularFile(named);
  }

  private Path target() throws IOException {
    return Files.exists(named) ? named.toRealPath() : named.toAbsolutePath();
  }

  private Path neighbour() throws IOException {
    Path target = target();
    return target.resolveSibling(
        "." + target.getFileName() + "." + ProcessHandle.current().pid() + ".part");
  }

  private OutputException failure(IOException e) {
    if (e instanceof NoSuchFileException) {
      return new OutputException(named, "its directory does not exist");
    }
    if (e instanceof AccessDeniedException) {
      return new OutputException(named, "permission denied");
    }
    String reason = e instanceof FileSystemException f ? f.getReason() : e.getMessage();
    return new OutputException(named, reason == null ? e.getClass().getSimpleName() : reason);
  }
}
