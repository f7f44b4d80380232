package blochbound.casefile;

import blochbound.casefile.YamlScalar.Style;

/**
 * Finds where a character of a scalar's text stands in the file.
 *
 * <p>Folding, quoting and indentation change blanks only, and escapes are read one by one; so the
 * k-th visible character of the text is the k-th visible one of the source.
 */
final class ScalarPlaces {
  private final YamlScalar scalar;
  private int index;
  private int line;
  private int column;

  ScalarPlaces(YamlScalar scalar) {
    this.scalar = scalar;
    this.index = scalar.index();
    this.line = scalar.line();
    this.column = scalar.column();
  }

  /** Line and column of the character at {@code offset}, or just past the last visible one. */
  int[] place(int offset) {
    String text = scalar.text();
    int end = Math.min(offset, text.length());
    long before = text.substring(0, end).codePoints().filter(ScalarPlaces::isVisible).count();
    boolean onVisible = end < text.length() && isVisible(text.codePointAt(end));
    skipOpening();
    long toPass = onVisible ? before : before - 1;
    for (long k = 0; k < toPass; k++) {
      skipToVisible();
      step(characterLength());
    }
    if (onVisible || before > 0) {
      skipToVisible();
    }
    if (!onVisible && before > 0) {
      step(characterLength());
    }
    return new int[] {line, column};
  }

  private void skipOpening() {
    switch (scalar.style()) {
      case SINGLE_QUOTED, DOUBLE_QUOTED -> step(1);
      case BLOCK -> {
        while (index < scalar.source().length() && !scalar.source().endsLine(index)) {
          step(1);
        }
      }
      case PLAIN -> {}
    }
  }

  private void skipToVisible() {
    while (index < scalar.source().length() && !isVisible(decoded())) {
      step(characterLength());
    }
  }

  /** The character that the source stands for at {@code index}, a blank for a line joint. */
  private int decoded() {
    int c = scalar.source().at(index);
    if (scalar.style() != Style.DOUBLE_QUOTED || c != '\\') {
      return c;
    }
    int escape = scalar.source().at(index + 1);
    return switch (escape) {
      case 'x', 'u', 'U' -> hexadecimal();
      case 't', 'n', 'r', 'v', 'f', ' ', '\t', '\n', '\r', 'L', 'P' -> ' ';
      default -> escape;
    };
  }

  private int hexadecimal() {
    int value = 0;
    for (int i = index + 2; i < index + characterLength(); i++) {
      value = 16 * value + Character.digit(scalar.source().at(i), 16);
    }
    return value;
  }

  /** How many source characters stand for the one at {@code index}. */
  private int characterLength() {
    int c = scalar.source().at(index);
    if (scalar.style() == Style.SINGLE_QUOTED && c == '\'') {
      return 2;
    }
    if (scalar.style() != Style.DOUBLE_QUOTED || c != '\\') {
      return 1;
    }
    return switch (scalar.source().at(index + 1)) {
      case 'x' -> 4;
      case 'u' -> 6;
      case 'U' -> 10;
      default -> 2;
    };
  }

  private void step(int count) {
    for (int k = 0; k < count && index < scalar.source().length(); k++) {
      boolean ends = scalar.source().endsLine(index);
      line += ends ? 1 : 0;
      column = ends ? 1 : column + 1;
      index++;
    }
  }

  private static boolean isVisible(int character) {
    return !Character.isWhitespace(character);
  }
}
