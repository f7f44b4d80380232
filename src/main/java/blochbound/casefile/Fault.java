package blochbound.casefile;

import java.util.Comparator;

/**
 * One thing that is wrong in a case file, with its place.
 *
 * @param file the file as the user named it
 * @param line line, counted from 1
 * @param column column in characters, counted from 1
 * @param message what is wrong, and what is allowed
 */
public record Fault(String file, int line, int column, String message) {
  static final Comparator<Fault> BY_PLACE =
      Comparator.comparing(Fault::file)
          .thenComparingInt(Fault::line)
          .thenComparingInt(Fault::column)
          .thenComparing(Fault::message);

  /** The line {@code file:line:column: message}. */
  @Override
  public String toString() {
    return file + ":" + line + ":" + column + ": " + message;
  }
}
