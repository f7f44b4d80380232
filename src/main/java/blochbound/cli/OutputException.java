package blochbound.cli;

import java.nio.file.Path;

/** A result could not be written where the user asked for it. */
final class OutputException extends Exception {
  private static final long serialVersionUID = 1L;

  /** A failure of a file. */
  OutputException(Path file, String reason) {
    super("cannot write " + file + ": " + reason);
  }

  /** A failure of something else, without a known reason. */
  OutputException(String place) {
    super("cannot write to " + place);
  }
}
