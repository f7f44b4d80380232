package blochbound.casefile;

import java.util.ArrayList;
import java.util.List;

/**
 * A measure split into its name and its arguments.
 *
 * @param whole the text
 * @param name its name
 * @param arguments its arguments, without blanks at their ends
 */
record MeasureText(Passage whole, String name, List<Passage> arguments) {
  /** Splits a text at the commas outside brackets, kets and bras. */
  static MeasureText of(Passage whole) {
    String text = whole.scalar().text();
    int open = text.indexOf('(', whole.from());
    int nameEnd = open < 0 ? whole.to() : open;
    Passage name = new Passage(whole.scalar(), whole.from(), nameEnd).trimmed();
    if (open < 0) {
      return new MeasureText(whole, name.text(), List.of());
    }
    if (whole.isEmpty() || text.charAt(whole.to() - 1) != ')') {
      throw whole.fault("a measure is a name with its arguments in ( )");
    }
    return new MeasureText(
        whole, name.text(), split(new Passage(whole.scalar(), open + 1, whole.to() - 1)));
  }

  private static List<Passage> split(Passage inner) {
    String text = inner.scalar().text();
    List<Passage> parts = new ArrayList<>();
    int start = inner.from();
    int depth = 0;
    for (int i = inner.from(); i < inner.to(); i++) {
      char c = text.charAt(i);
      if (c == '|' || c == '<') {
        // Commas between labels do not separate arguments.
        int close = text.indexOf(c == '|' ? '>' : '|', i + 1);
        i = close < 0 || close >= inner.to() ? i : close;
      } else if (c == '(' || c == ')') {
        depth += c == '(' ? 1 : -1;
      } else if (c == ',' && depth == 0) {
        parts.add(new Passage(inner.scalar(), start, i).trimmed());
        start = i + 1;
      }
    }
    parts.add(new Passage(inner.scalar(), start, inner.to()).trimmed());
    return parts;
  }

  /** Checks the number of arguments; {@code usage} shows how the measure is written. */
  void expect(int least, int most, String usage) {
    boolean empty = arguments.stream().anyMatch(Passage::isEmpty);
    if (arguments.size() < least || arguments.size() > most || empty) {
      throw whole.fault("this measure is written " + usage);
    }
  }
}
