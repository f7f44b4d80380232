package blochbound.casefile;

import java.util.Optional;
import org.snakeyaml.engine.v2.exceptions.Mark;
import org.snakeyaml.engine.v2.exceptions.MarkedYamlEngineException;

/** Explains in words of the case file what unquoted text does to YAML. */
final class YamlDamage {
  private static final String NEED_QUOTES = "|>@*&!%?-[{#`\"'";
  private static final String TELLTALES = "()|<>@*+/^[]{}";

  private final SourceText source;

  YamlDamage(SourceText source) {
    this.source = source;
  }

  /** The fault behind a syntax error. */
  Fault explain(MarkedYamlEngineException error) {
    Optional<Mark> mark = error.getProblemMark().or(error::getContextMark);
    int index = mark.map(Mark::getIndex).orElse(0);
    int line = mark.map(m -> m.getLine() + 1).orElse(1);
    int column = mark.map(m -> m.getColumn() + 1).orElse(1);
    String problem = error.getProblem() == null ? "" : error.getProblem();
    String context = error.getContext() == null ? "" : error.getContext();
    if (context.contains("block scalar")) {
      // The mark stands behind the bar or angle bracket that opened the text.
      Mark start = error.getContextMark().orElseThrow();
      return source.fault(
          start.getLine() + 1, start.getColumn() + 1, quote(source.at(start.getIndex())));
    }
    return source.fault(line, column, explain(problem, context, error, index));
  }

  private String explain(
      String problem, String context, MarkedYamlEngineException error, int index) {
    int character = source.at(index);
    if (character == '\t') {
      return "a tab must not indent; use blanks";
    }
    if (problem.contains("mapping values are not allowed")) {
      return "a second `:` in one line, or a wrong indentation; text that holds `: ` must be"
          + " quoted";
    }
    boolean unclosed = problem.contains("stream end") || problem.contains("end of stream");
    if (unclosed) {
      String opener = context.contains("quoted") ? "quote" : "bracket";
      String where =
          error
              .getContextMark()
              .map(m -> " opened at line " + (m.getLine() + 1) + ", column " + (m.getColumn() + 1))
              .orElse("");
      return "the file ends inside the " + opener + where;
    }
    if (problem.startsWith("expected ','")) {
      return "expected `,` or the closing bracket; text that holds a comma or `: ` inside { } or"
          + " [ ] must be quoted";
    }
    boolean starts = problem.contains("cannot start") || problem.contains("node content");
    if (starts && character > 0 && NEED_QUOTES.indexOf(character) >= 0) {
      return quote(character);
    }
    return "no YAML 1.2 text: " + (context.isEmpty() ? problem : context + ", " + problem);
  }

  private static String quote(int character) {
    return "text that begins with `" + Character.toString(character) + "` must be quoted";
  }

  /** The fault of a key without a value that is the rest of unquoted text. */
  static Optional<Fault> inEntry(YamlScalar key, YamlNode value) {
    if (!value.isNothing() || key.style() != YamlScalar.Style.PLAIN) {
      return Optional.empty();
    }
    String text = key.text();
    if (text.chars().anyMatch(c -> TELLTALES.indexOf(c) >= 0)) {
      return Optional.of(
          key.fault(
              "`"
                  + text
                  + "` looks like the rest of a text that was cut at a comma; text that holds a"
                  + " comma or `: ` inside { } or [ ] must be quoted"));
    }
    if (text.indexOf(':') > 0) {
      return Optional.of(key.fault("`" + text + "` needs a blank after the `:`"));
    }
    return Optional.empty();
  }
}
