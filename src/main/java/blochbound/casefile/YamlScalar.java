package blochbound.casefile;

/**
 * A scalar of a case file: its text, whatever YAML would make of it.
 *
 * @param source the text it stands in
 * @param index position of its first character, which is the quote of a quoted scalar
 * @param line its line, counted from 1
 * @param column its column, counted from 1
 * @param style how it is written
 * @param text its text after folding and unescaping
 */
record YamlScalar(SourceText source, int index, int line, int column, Style style, String text)
    implements YamlNode {
  /** How a scalar is written. */
  enum Style {
    /** Without quotes. */
    PLAIN,
    /** In single quotes, where two quotes stand for one. */
    SINGLE_QUOTED,
    /** In double quotes, with backslash escapes. */
    DOUBLE_QUOTED,
    /** Indented below a bar or an angle bracket. */
    BLOCK
  }

  @Override
  public YamlScalar asScalar(String what) {
    return this;
  }

  @Override
  public boolean isNothing() {
    return style == Style.PLAIN && text.isEmpty();
  }

  /** The whole text as a passage, without blanks at its ends. */
  Passage passage() {
    return new Passage(this, 0, text.length()).trimmed();
  }

  /** A fault at the character {@code offset} of {@link #text()}. */
  Fault fault(int offset, String message) {
    int[] place = new ScalarPlaces(this).place(offset);
    return source.fault(place[0], place[1], message);
  }
}
