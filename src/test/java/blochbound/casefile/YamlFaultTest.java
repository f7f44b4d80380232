package blochbound.casefile;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import blochbound.casefile.CaseReader.RequirementRule;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

/** Faults of the file and of its YAML, before anything of the case is read. */
class YamlFaultTest {
  @TempDir Path directory;

  private static String quoted(String start) {
    return "text that begins with `" + start + "` must be quoted";
  }

  @Test
  void aliasesAnchorsAndTagsAreFaults() {
    CaseText.textHasFaults(
        "a: §*x\nb: §&y z\nc: §!!str d\ne: §! f\n",
        "`*x` is an alias of YAML, which a case file must not have; text that begins with * must"
            + " be quoted",
        "`&y` is an anchor of YAML, which a case file must not have; text that begins with & must"
            + " be quoted",
        "`!!str` is a tag of YAML, which a case file must not have; text that begins with ! must"
            + " be quoted",
        "`!` is a tag of YAML, which a case file must not have; text that begins with ! must be"
            + " quoted");
  }

  @Test
  void duplicateKeysNameBothPlaces() {
    CaseText.textHasFaults(
        "title: a\nsites: {l: {levels: 2}, §l: {levels: 3}}\n§title: b\n",
        "the key `l` is already given at line 2, column 9",
        "the key `title` is already given at line 1, column 1");
  }

  @Test
  void keysMustBeWords() {
    CaseText.textHasFaults("? §[a, b]\n: c\n", "a key must be a word, not a list or a mapping");
  }

  @Test
  void nestingIsLimited() {
    CaseText.textHasFaults("a: " + "[".repeat(31) + "§[", "nested more than 32 levels deep");
    CaseText.textHasFaults(
        "a: " + "[".repeat(31) + "§[" + "[".repeat(30_000), "nested more than 32 levels deep");
  }

  @Test
  void emptyFilesAndSecondDocumentsAreFaults() {
    String empty = "the file is empty; it must hold a case, see `format`";
    CaseText.textHasFaults("§", empty);
    CaseText.textHasFaults("§\n# only a comment\n", empty);
    CaseText.textHasFaults(
        "a: b\n§---\nc: d\n", "a second document starts here; a case file holds one document");
    CaseText.textHasFaults(
        "§- a\n- b\n", "expected a case: a mapping that begins with format: blochbound-case/1");
    CaseText.textHasFaults(
        "§just text\n", "expected a case: a mapping that begins with format: blochbound-case/1");
  }

  @Test
  void unquotedKetsAreExplained() {
    CaseText.textHasFaults("target: §|g,g>\n", quoted("|"));
    CaseText.textHasFaults("target: §>g\n", quoted(">"));
    CaseText.textHasFaults("jumps: [{rate: k, operator: §|g><e|@a}]\n", quoted("|"));
    CaseText.textHasFaults("a: {tolerance: §%5}\n", quoted("%"));
    CaseText.textHasFaults("a: §@x\n", quoted("@"));
    CaseText.textHasFaults("a: {levels: [+, §-]}\n", quoted("-"));
    CaseText.textHasFaults("a: {sigma: §- 5}\n", quoted("-"));
    CaseText.textHasFaults("a: §`x\n", quoted("`"));
  }

  @Test
  void unquotedCommasAreExplained() {
    String cut =
        "` looks like the rest of a text that was cut at a comma; text that holds a comma or `: `"
            + " inside { } or [ ] must be quoted";
    CaseText.textHasFaults("r: {measure: concurrence(a, §b), atLeast: 1}\n", "`b)" + cut);
    CaseText.textHasFaults("r: {measure: fidelity(|g,§g>), atLeast: 1}\n", "`g>)" + cut);
    CaseText.textHasFaults("r: {§name:x}\n", "`name:x` needs a blank after the `:`");
  }

  @Test
  void colonsInTextAreExplained() {
    CaseText.textHasFaults(
        "title: pair§: first lot\n",
        "a second `:` in one line, or a wrong indentation; text that holds `: ` must be quoted");
    CaseText.textHasFaults(
        "r: {name: pair§: first}\n",
        "expected `,` or the closing bracket; text that holds a comma or `: ` inside { } or [ ]"
            + " must be quoted");
    CaseText.textHasFaults(
        "a: b\n c§: d\n",
        "a second `:` in one line, or a wrong indentation; text that holds `: ` must be quoted");
  }

  @Test
  void openBracketsAndQuotesNameTheirPlace() {
    CaseText.textHasFaults(
        "a: {b: c\n§", "the file ends inside the bracket opened at line 1, column 4");
    CaseText.textHasFaults(
        "a: [b\n§", "the file ends inside the bracket opened at line 1, column 4");
    CaseText.textHasFaults(
        "a: \"b\n§", "the file ends inside the quote opened at line 1, column 4");
  }

  @Test
  void otherSyntaxErrorsKeepTheirPlace() {
    CaseText.textHasFaults("§\ta: b\n", "a tab must not indent; use blanks");
    CaseText.textHasFaults(
        "a: \"\\§q\"\n",
        "no YAML 1.2 text: while scanning a double-quoted scalar, found unknown escape character"
            + " q(113)");
    CaseText.textHasFaults(
        "a: §]\n",
        "no YAML 1.2 text: while parsing a block node, expected the node content, but found ']'");
    CaseText.textHasFaults(
        "§%YAML 3.1\n---\na: b\n", "the file is no YAML 1.2 text: Version{major=3, minor=1}");
  }

  @Test
  void scalarsAreTextWhateverYamlWouldMakeOfThem() throws CaseFaultException {
    var sites =
        CaseText.pair()
            .set("title", "2026-12-01")
            .set("sites", "{a: {levels: [off, no]}, b: {levels: [01, null, 1e3]}}")
            .set("hamiltonian", "g * |off,null><off,null|")
            .set("jumps", "[]")
            .read();
    assertEquals("2026-12-01", sites.title());
    assertEquals("[off, no]", sites.device().space().sites().get(0).levels().toString());
    assertEquals("[01, null, 1e3]", sites.device().space().sites().get(1).levels().toString());
  }

  @Test
  void placesCountCharactersBehindQuotesEscapesAndLineJoints() {
    CaseText.pair().set("hamiltonian", "'g * §Q'").hasFaults(unknown("Q"));
    CaseText.pair().set("hamiltonian", "\"g *\\x20\\x58@a * §Q\"").hasFaults(unknown("Q"));
    CaseText.pair().set("hamiltonian", "\"g *\\\n     X@a +\n   §Q\"").hasFaults(unknown("Q"));
    CaseText.pair().set("hamiltonian", "g *\n   X@a +\n   §Q").hasFaults(unknown("Q"));
    CaseText.pair().set("hamiltonian", "|  # folded\n  g *\n  §Q\n").hasFaults(unknown("Q"));
    CaseText.pair().set("hamiltonian", ">-\n  g *\n\n  §Q\n").hasFaults(unknown("Q"));
    CaseText.pair()
        .set("title", "\"µ𝛀\"")
        .set("sites", "{a: {levels: [g, §'µ']}}")
        .without("hamiltonian")
        .without("jumps")
        .set("jumps", "[]")
        .hasFaults("`µ` is no level label; labels hold letters, digits, _ + -, at most 64");
  }

  private static String unknown(String name) {
    return "unknown name `" + name + "`; parameters and operators above" + " are g, kappa";
  }

  @Test
  void carriageReturnsEndLines() {
    String alias =
        "`*x` is an alias of YAML, which a case file must not have; text that begins with * must"
            + " be quoted";
    assertEquals("pair.yaml:3:4: " + alias + "\n", CaseText.faults("a: b\r\nc: d\r\ne: *x\r\n"));
    assertEquals("pair.yaml:3:4: " + alias + "\n", CaseText.faults("a: b\rc: d\re: *x\r"));
  }

  @ParameterizedTest
  @ValueSource(strings = {"\u0000", "\u0007", "\uFFFE", "\uFEFF"})
  void charactersThatYamlForbidsAreFaults(String character) {
    String code = String.format("U+%04X", (int) character.charAt(0));
    CaseText.textHasFaults(
        "a: b\nc: x§" + character + "\n", "the character " + code + " is not allowed in YAML text");
  }

  @Test
  void aByteOrderMarkIsSkipped() throws CaseFaultException {
    assertEquals("us", CaseText.read("\uFEFF" + CaseText.pair().text()).timeUnit());
  }

  @Test
  void unreadableFilesAreFaults() throws IOException {
    Path missing = directory.resolve("none.yaml");
    assertFault(missing, missing + ":1:1: the file cannot be read: there is no such file");
    Path latin = Files.write(directory.resolve("latin.yaml"), new byte[] {'a', ':', (byte) 0xB5});
    assertFault(latin, latin + ":1:1: the file is not encoded in UTF-8");
    Path large = directory.resolve("large.yaml");
    Files.write(large, new byte[CaseReader.MOST_BYTES + 1]);
    assertFault(large, large + ":1:1: the file is over 1048576 bytes (1 MiB) long");
    CaseFaultException e = assertThrows(CaseFaultException.class, () -> CaseReader.read(directory));
    assertTrue(e.getMessage().startsWith(directory + ":1:1: the file cannot be read: "));
  }

  @Test
  void longLinesAreFaults() {
    CaseText.textHasFaults(
        "a: b\n" + "#".repeat(CaseReader.LONGEST_LINE) + "§#\n",
        "a line of more than 32768 characters; break the line");
  }

  @Test
  void aFileOfTheLargestSizeIsRead() throws Exception {
    String text = CaseText.pair().text();
    Path file = directory.resolve("full.yaml");
    String full = text + ("#".repeat(63) + "\n").repeat(CaseReader.MOST_BYTES / 64);
    Files.writeString(file, full.substring(0, CaseReader.MOST_BYTES));
    assertEquals(4, CaseReader.read(file, RequirementRule.OPTIONAL).device().space().dimension());
  }

  private static void assertFault(Path file, String message) {
    CaseFaultException e = assertThrows(CaseFaultException.class, () -> CaseReader.read(file));
    assertEquals(message, e.getMessage());
  }
}
