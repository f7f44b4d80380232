package blochbound.casefile;

import java.io.IOException;
import java.io.InputStream;
import java.nio.file.Files;
import java.nio.file.InvalidPathException;
import java.nio.file.Path;
import java.security.MessageDigest;
import java.security.NoSuchAlgorithmException;
import java.util.HexFormat;

/** Reads the files that a case refers to and digests them with the case, in order. */
final class ReferencedFiles {
  /** Largest referenced file in bytes. */
  static final int MOST_BYTES = 4 << 20;

  private final Path directory;
  private final String shownDirectory;
  private final MessageDigest digest = sha256();

  /**
   * Starts the digest with the case itself.
   *
   * @param directory where relative names start
   * @param caseName the case file as the user named it
   */
  ReferencedFiles(Path directory, String caseName, byte[] caseBytes) {
    this.directory = directory;
    int slash = Math.max(caseName.lastIndexOf('/'), caseName.lastIndexOf('\\'));
    this.shownDirectory = caseName.substring(0, slash + 1);
    digest.update(caseBytes);
  }

  /** Name of a referenced file in messages. */
  String shown(String name) {
    return shownDirectory + name;
  }

  /** The bytes of a referenced file. */
  byte[] read(YamlScalar name) {
    byte[] bytes;
    try (InputStream in = Files.newInputStream(directory.resolve(name.text()))) {
      bytes = in.readNBytes(MOST_BYTES + 1);
    } catch (IOException | InvalidPathException e) {
      throw FaultSignal.of(
          name.fault("the file `" + shown(name.text()) + "` cannot be read: " + reason(e)));
    }
    if (bytes.length > MOST_BYTES) {
      throw FaultSignal.of(
          name.fault(
              "the file `" + shown(name.text()) + "` is over " + MOST_BYTES + " bytes long"));
    }
    digest.update(bytes);
    return bytes;
  }

  /** Why a file cannot be read, in words. */
  static String reason(Exception e) {
    if (e instanceof java.nio.file.NoSuchFileException) {
      return "there is no such file";
    }
    if (e instanceof java.nio.file.AccessDeniedException) {
      return "access is denied";
    }
    return e instanceof InvalidPathException ? "the name is no file name" : "" + e.getMessage();
  }

  /** Hexadecimal SHA-256 of the case and of all files read so far. */
  String hexadecimalDigest() {
    return HexFormat.of().formatHex(digest.digest());
  }

  private static MessageDigest sha256() {
    try {
      return MessageDigest.getInstance("SHA-256");
    } catch (NoSuchAlgorithmException e) {
      throw new IllegalStateException("every Java platform has SHA-256", e);
    }
  }
}
