package blochbound.report;

import blochbound.check.Check;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.Collections;
import java.util.List;

/**
 * A table of plain text: aligned columns, two blanks apart, at most {@link TextLayout#WIDTH}
 * columns wide. Where the cells need more room the widest columns are narrowed and their cells
 * wrapped.
 */
final class TextTable {
  private static final String SEPARATOR = "  ";
  private static final int MOST_COLUMNS = 16;
  private static final int LEAST_WIDTH = 4;

  /** Where the cells of a column stand. */
  enum Align {
    /** Text from the left. */
    LEFT,
    /** Numbers to the right. */
    RIGHT,
    /** Numbers with their decimal points below each other. */
    DECIMAL
  }

  /**
   * A column.
   *
   * @param header heading
   * @param align alignment of cells and heading
   */
  record Column(String header, Align align) {}

  private final List<Column> columns;
  private final List<List<String>> rows = new ArrayList<>();

  private TextTable(List<Column> columns) {
    Check.that(columns.size() <= MOST_COLUMNS, "at most " + MOST_COLUMNS + " columns");
    this.columns = columns;
  }

  /** An empty table. */
  static TextTable of(Column... columns) {
    return new TextTable(List.of(columns));
  }

  /** Adds a row with one cell for each column. */
  TextTable row(String... cells) {
    Check.that(cells.length == columns.size(), "one cell for each column");
    rows.add(Arrays.stream(cells).map(TextLayout::clean).toList());
    return this;
  }

  /** The lines with heading and rule, indented by {@code indent} blanks. */
  List<String> lines(int indent) {
    List<List<String>> cells = byColumn();
    int[] widths = widths(cells, TextLayout.WIDTH - indent);
    List<String> lines = new ArrayList<>();
    String lead = " ".repeat(indent);
    lines.addAll(line(lead, columns.stream().map(Column::header).toList(), widths));
    lines.addAll(line(lead, Arrays.stream(widths).mapToObj("-"::repeat).toList(), widths));
    for (int i = 0; i < rows.size(); i++) {
      int row = i;
      lines.addAll(line(lead, cells.stream().map(column -> column.get(row)).toList(), widths));
    }
    return lines;
  }

  private List<List<String>> byColumn() {
    List<List<String>> cells = new ArrayList<>();
    for (int j = 0; j < columns.size(); j++) {
      int column = j;
      List<String> texts = rows.stream().map(row -> row.get(column)).toList();
      cells.add(columns.get(j).align() == Align.DECIMAL ? alignPoints(texts) : texts);
    }
    return cells;
  }

  /** Adds blanks behind the numbers so that their points meet once they stand to the right. */
  private static List<String> alignPoints(List<String> texts) {
    int longest = texts.stream().mapToInt(TextTable::fraction).max().orElse(0);
    return texts.stream().map(text -> text + " ".repeat(longest - fraction(text))).toList();
  }

  /** Number of characters from the decimal point on, or behind the digits where there is none. */
  private static int fraction(String text) {
    int i = text.startsWith("-") || text.startsWith("+") ? 1 : 0;
    while (i < text.length() && Character.isDigit(text.charAt(i))) {
      i++;
    }
    return TextLayout.length(text.substring(i));
  }

  private int[] widths(List<List<String>> cells, int room) {
    int[] widths = new int[columns.size()];
    for (int j = 0; j < widths.length; j++) {
      int longest = cells.get(j).stream().mapToInt(TextLayout::length).max().orElse(0);
      widths[j] = Math.max(longest, TextLayout.length(columns.get(j).header()));
    }
    int excess = Arrays.stream(widths).sum() + SEPARATOR.length() * (widths.length - 1) - room;
    for (; excess > 0; excess--) {
      int widest = 0;
      for (int j = 1; j < widths.length; j++) {
        widest = widths[j] > widths[widest] ? j : widest;
      }
      Check.that(widths[widest] > LEAST_WIDTH, "a table needs room for its columns");
      widths[widest]--;
    }
    return widths;
  }

  /** One row of cells, as many lines as its longest wrapped cell needs. */
  private List<String> line(String lead, List<String> cells, int[] widths) {
    List<List<String>> parts = new ArrayList<>();
    for (int j = 0; j < widths.length; j++) {
      String cell = cells.get(j);
      boolean fits = TextLayout.length(cell) <= widths[j];
      parts.add(fits ? List.of(cell) : TextLayout.wrap(cell, widths[j]));
    }
    int height = Collections.max(parts.stream().map(List::size).toList());
    List<String> lines = new ArrayList<>();
    for (int i = 0; i < height; i++) {
      StringBuilder line = new StringBuilder(lead);
      for (int j = 0; j < widths.length; j++) {
        String part = i < parts.get(j).size() ? parts.get(j).get(i) : "";
        line.append(j == 0 ? "" : SEPARATOR).append(pad(part, widths[j], columns.get(j).align()));
      }
      lines.add(line.toString().stripTrailing());
    }
    return lines;
  }

  private static String pad(String text, int width, Align align) {
    String blanks = " ".repeat(width - TextLayout.length(text));
    return align == Align.LEFT ? text + blanks : blanks + text;
  }
}
