package blochbound.casefile;

/** Parts of the case format that this version does not handle; none of them is ever ignored. */
final class Unsupported {
  private Unsupported() {}

  /** Says that a key or measure is known but not handled. */
  static String notYet(String key) {
    return "this version does not handle `" + key + "` yet; remove it to study the case without it";
  }
}
