package blochbound.report;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.List;
import org.junit.jupiter.api.Test;

// [invariant] expected lines are the words of the text in their order
class TextLayoutTest {
  @Test
  void linesBreakAtBlanks() {
    assertEquals(List.of("one two", "three"), TextLayout.wrap("one two three", 8));
  }

  @Test
  void exactFitIsNotBroken() {
    assertEquals(List.of("one two"), TextLayout.wrap("one two", 7));
    assertEquals(List.of("one two", "x"), TextLayout.wrap("one two x", 7));
  }

  @Test
  void longWordsAreCut() {
    assertEquals(List.of("abcd", "efgh", "i"), TextLayout.wrap("abcdefghi", 4));
  }

  @Test
  void charactersOutsideTheBasicPlaneAreNotCutInHalf() {
    String clef = new String(Character.toChars(0x1D11E));
    assertEquals(List.of(clef + clef, clef), TextLayout.wrap(clef + clef + clef, 2));
  }

  @Test
  void controlCharactersBecomeBlanks() {
    assertEquals("a [31mb c", TextLayout.clean("a\u001b[31mb\nc"));
    assertEquals(List.of(""), TextLayout.wrap("", 10));
  }

  @Test
  void laterLinesHangBehindTheLead() {
    List<String> lines = TextLayout.hanging("lead: ", "word ".repeat(40));
    assertTrue(lines.size() > 1);
    assertTrue(lines.get(0).startsWith("lead: word"));
    assertTrue(lines.get(1).startsWith("      word"));
    lines.forEach(line -> assertTrue(line.length() <= TextLayout.WIDTH));
  }
}
