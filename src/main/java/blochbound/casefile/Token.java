package blochbound.casefile;

import java.util.List;

/**
 * A word of an expression.
 *
 * @param kind its kind
 * @param text its text; a symbol as one character
 * @param labels level labels of a ket or a bra, otherwise empty
 * @param at offset of its first character
 */
record Token(Kind kind, String text, List<Label> labels, int at) {
  /** Kinds of words. */
  enum Kind {
    /** Unsigned decimal. */
    NUMBER,
    /** Letters, digits and underscores. */
    NAME,
    /** Level labels between a bar and a closing angle bracket. */
    KET,
    /** Level labels between an opening angle bracket and a bar. */
    BRA,
    /** One of {@code + - * / ^ ( ) @}. */
    SYMBOL,
    /** Behind the last word. */
    END
  }

  /**
   * A level label.
   *
   * @param text the label
   * @param at offset of its first character
   */
  record Label(String text, int at) {}

  /** Tells whether it is that symbol. */
  boolean is(String symbol) {
    return kind == Kind.SYMBOL && text.equals(symbol);
  }

  /** Tells whether it is that name. */
  boolean isName(String name) {
    return kind == Kind.NAME && text.equals(name);
  }

  /** Words for messages. */
  String shown() {
    return kind == Kind.END ? "the end of the text" : "`" + text + "`";
  }
}
