package blochbound.casefile;

/**
 * A stretch of a scalar's text.
 *
 * @param scalar the scalar
 * @param from offset of its first character
 * @param to offset just past its last character
 */
record Passage(YamlScalar scalar, int from, int to) {
  /** The text of the passage. */
  String text() {
    return scalar.text().substring(from, to);
  }

  /** Tells whether it has no character. */
  boolean isEmpty() {
    return from == to;
  }

  /** The passage without blanks at its ends. */
  Passage trimmed() {
    int start = from;
    int end = to;
    while (start < end && Character.isWhitespace(scalar.text().charAt(start))) {
      start++;
    }
    while (end > start && Character.isWhitespace(scalar.text().charAt(end - 1))) {
      end--;
    }
    return new Passage(scalar, start, end);
  }

  /** A fault at an offset of the scalar's text. */
  FaultSignal fault(int offset, String message) {
    return FaultSignal.of(scalar.fault(offset, message));
  }

  /** A fault at the first character. */
  FaultSignal fault(String message) {
    return fault(from, message);
  }
}
