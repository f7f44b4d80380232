package blochbound.report;

import java.util.ArrayList;
import java.util.List;

/** Lines of plain text that never exceed a width. */
final class TextLayout {
  /** Columns of a text report. */
  static final int WIDTH = 100;

  private TextLayout() {}

  /** The text on one line: controls and line ends of user input become blanks. */
  static String clean(String text) {
    StringBuilder line = new StringBuilder(text.length());
    text.codePoints()
        .map(c -> Character.isISOControl(c) || Character.isWhitespace(c) ? ' ' : c)
        .forEach(line::appendCodePoint);
    return line.toString().strip();
  }

  /**
   * The text in lines of at most {@code width} characters, broken at blanks, and inside a word only
   * where the word alone is too long.
   *
   * @return at least one line
   */
  static List<String> wrap(String text, int width) {
    List<String> lines = new ArrayList<>();
    String rest = clean(text);
    while (length(rest) > width) {
      int limit = rest.offsetByCodePoints(0, width);
      int blank = rest.lastIndexOf(' ', limit);
      int end = blank > 0 ? blank : limit;
      lines.add(rest.substring(0, end).stripTrailing());
      rest = rest.substring(end).stripLeading();
    }
    lines.add(rest);
    return lines;
  }

  /** A paragraph: every line indented by {@code indent} blanks. */
  static List<String> paragraph(String text, int indent) {
    return hanging(" ".repeat(indent), text);
  }

  /** A text whose first line begins with {@code lead} and whose other lines line up behind it. */
  static List<String> hanging(String lead, String text) {
    List<String> lines = new ArrayList<>();
    for (String part : wrap(text, WIDTH - length(lead))) {
      lines.add((lines.isEmpty() ? lead : " ".repeat(length(lead))) + part);
    }
    return lines;
  }

  /** Number of characters. */
  static int length(String text) {
    return text.codePointCount(0, text.length());
  }

  /** The lines as one text that ends with a line end. */
  static String join(List<String> lines) {
    StringBuilder text = new StringBuilder();
    lines.forEach(line -> text.append(line.stripTrailing()).append('\n'));
    return text.toString();
  }
}
