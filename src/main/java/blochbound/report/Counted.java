package blochbound.report;

/** Counts with their nouns. */
final class Counted {
  private Counted() {}

  /** The count and the noun, with an s unless it is one. */
  static String of(long count, String noun) {
    return count + " " + noun + (count == 1 ? "" : "s");
  }
}
