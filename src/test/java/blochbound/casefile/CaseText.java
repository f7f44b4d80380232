package blochbound.casefile;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;

import blochbound.casefile.CaseReader.RequirementRule;
import blochbound.model.DesignCase;
import java.nio.file.Path;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.stream.Collectors;

/** Builds case texts for tests; the sign § stands in front of a character that has a fault. */
final class CaseText {
  static final String NAME = "pair.yaml";

  private final Map<String, String> sections = new LinkedHashMap<>();

  private CaseText() {}

  /** A pair of two-level sites with a coupling and one decay. */
  static CaseText pair() {
    return new CaseText()
        .set("format", "blochbound-case/1")
        .set("timeUnit", "us")
        .set("sites", "{a: {levels: [g, e]}, b: {levels: [g, e]}}")
        .set("parameters", "{g: {nominal: 2 /us, tolerance: 10 %}, kappa: {nominal: 0.5 /us}}")
        .set("hamiltonian", "g * X@a * X@b")
        .set("jumps", "[{rate: kappa, operator: lower@a}]");
  }

  /** A pair without a unit of time and with dimensionless parameters x and y. */
  static CaseText dimensionless() {
    return pair()
        .set("timeUnit", "none")
        .set("parameters", "{x: {nominal: 2, tolerance: 10 %}, y: {nominal: 0.5}}")
        .set("hamiltonian", "x * X@a * X@b")
        .set("jumps", "[{rate: y, operator: lower@a}]");
  }

  CaseText set(String key, String value) {
    sections.put(key, value);
    return this;
  }

  CaseText without(String key) {
    sections.remove(key);
    return this;
  }

  /** One requirement in flow style. */
  CaseText requirement(String fields) {
    return set("requirements", "[{name: r, " + fields + "}]");
  }

  String text() {
    return sections.entrySet().stream()
        .map(e -> e.getKey() + ": " + e.getValue() + "\n")
        .collect(Collectors.joining());
  }

  DesignCase read() throws CaseFaultException {
    return read(text());
  }

  static DesignCase read(String text) throws CaseFaultException {
    return CaseReader.read(text, NAME, Path.of("."), RequirementRule.OPTIONAL);
  }

  /** Asserts that the text has exactly the given faults, each at one of the signs §, in order. */
  void hasFaults(String... messages) {
    textHasFaults(text(), messages);
  }

  /** Asserts that a text has exactly the given faults, each at one of the signs §, in order. */
  static void textHasFaults(String marked, String... messages) {
    StringBuilder expected = new StringBuilder();
    int line = 1;
    int column = 1;
    int next = 0;
    for (int c : marked.codePoints().toArray()) {
      if (c == '§') {
        expected.append(NAME + ":" + line + ":" + column + ": " + messages[next++] + "\n");
      } else {
        column = c == '\n' ? 1 : column + 1;
        line += c == '\n' ? 1 : 0;
      }
    }
    assertEquals(messages.length, next, "signs in the text");
    assertEquals(expected.toString(), faults(marked.replace("§", "")));
  }

  /** The faults of a text, one a line. */
  static String faults(String text) {
    return faultList(text).stream().map(f -> f + "\n").collect(Collectors.joining());
  }

  static List<Fault> faultList(String text) {
    CaseFaultException e = assertThrows(CaseFaultException.class, () -> read(text));
    return e.faults();
  }
}
