package blochbound.casefile;

/**
 * The text of a case file, by characters (code points) as YAML counts them.
 *
 * @param file the file as the user named it
 * @param characters its code points
 */
record SourceText(String file, int[] characters) {
  private static final int LONGEST_MESSAGE = 1000;

  /** The text of a file. */
  static SourceText of(String file, String text) {
    return new SourceText(file, text.codePoints().toArray());
  }

  /** Number of characters. */
  int length() {
    return characters.length;
  }

  /** The character at {@code index}, or -1 past the end. */
  int at(int index) {
    return index < characters.length ? characters[index] : -1;
  }

  /** Tells whether a line ends with the character at {@code index}. */
  boolean endsLine(int index) {
    return at(index) == '\n' || (at(index) == '\r' && at(index + 1) != '\n');
  }

  /** A fault at a line and a column that count from 1. */
  Fault fault(int line, int column, String message) {
    // Hostile text must not flood the terminal.
    String shown =
        message.length() <= LONGEST_MESSAGE
            ? message
            : message.substring(0, LONGEST_MESSAGE) + "...";
    return new Fault(file, line, column, shown);
  }

  /** A fault at a character. */
  Fault faultAt(int index, String message) {
    int line = 1;
    int column = 1;
    for (int i = 0; i < index; i++) {
      column = endsLine(i) ? 1 : column + 1;
      line += endsLine(i) ? 1 : 0;
    }
    return fault(line, column, message);
  }
}
