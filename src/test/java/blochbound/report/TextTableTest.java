package blochbound.report;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import blochbound.report.TextTable.Align;
import blochbound.report.TextTable.Column;
import java.util.List;
import java.util.SplittableRandom;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

class TextTableTest {
  private static final List<Align> ALIGNMENTS = List.of(Align.values());

  // [invariant] the cells given, laid out by hand
  @Test
  void pointsStandBelowEachOther() {
    List<String> lines =
        TextTable.of(
                new Column("name", Align.LEFT),
                new Column("value", Align.DECIMAL),
                new Column("count", Align.RIGHT))
            .row("a", "0.03", "1")
            .row("bcdef", "-8", "10")
            .row("c", "1.5e-7", "100")
            .lines(2);
    assertEquals(
        List.of(
            "  name     value  count",
            "  -----  -------  -----",
            "  a       0.03        1",
            "  bcdef  -8          10",
            "  c       1.5e-7    100"),
        lines);
  }

  @Test
  void longCellsWrapInsideTheirColumn() {
    List<String> lines =
        TextTable.of(new Column("name", Align.LEFT), new Column("text", Align.LEFT))
            .row("n", "word ".repeat(30))
            .lines(0);
    // [closed form] 30 words of 5 characters need two lines of 94 characters
    assertEquals(4, lines.size());
    assertTrue(lines.get(3).startsWith("      word"), lines.get(3));
  }

  @ParameterizedTest(name = "seed {0}")
  @ValueSource(longs = {1, 2, 3, 4, 5})
  void noLineIsTooLong(long seed) {
    SplittableRandom random = new SplittableRandom(seed);
    for (int i = 0; i < 50; i++) {
      Column[] columns = new Column[random.nextInt(1, 12)];
      for (int j = 0; j < columns.length; j++) {
        columns[j] = new Column(text(random), ALIGNMENTS.get(random.nextInt(3)));
      }
      TextTable table = TextTable.of(columns);
      for (int row = 0; row < 4; row++) {
        String[] cells = new String[columns.length];
        for (int j = 0; j < cells.length; j++) {
          cells[j] = text(random);
        }
        table.row(cells);
      }
      table.lines(2).forEach(line -> assertTrue(line.length() <= TextLayout.WIDTH, line));
    }
  }

  private static String text(SplittableRandom random) {
    StringBuilder text = new StringBuilder();
    int length = random.nextInt(0, 60);
    for (int i = 0; i < length; i++) {
      text.append(random.nextInt(6) == 0 ? ' ' : (char) ('0' + random.nextInt(70)));
    }
    return text.toString();
  }

  @Test
  void rowsNeedOneCellForEachColumn() {
    TextTable table = TextTable.of(new Column("name", Align.LEFT));
    assertThrows(IllegalArgumentException.class, () -> table.row("a", "b"));
  }
}
