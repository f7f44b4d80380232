package blochbound.casefile;

import blochbound.casefile.Value.Ket;
import blochbound.casefile.Value.Operator;
import blochbound.casefile.YamlNode.Entry;
import blochbound.casefile.YamlNode.Mapping;
import blochbound.linalg.ComplexBall;
import blochbound.model.HilbertSpace;
import blochbound.model.OperatorForm;
import java.nio.charset.StandardCharsets;
import java.util.ArrayList;
import java.util.List;
import java.util.stream.IntStream;

/** Reads the section {@code operators}; an operator may use those above it. */
final class OperatorReader {
  /** Most named operators of one case. */
  static final int MOST_OPERATORS = 1024;

  private final Scope scope;
  private final ReferencedFiles files;
  private final Expressions expressions;

  OperatorReader(Scope scope, ReferencedFiles files) {
    this.scope = scope;
    this.files = files;
    this.expressions = new Expressions(scope);
  }

  /** Reads all operators in order and tells them to the scope. */
  void read(YamlNode section) {
    Mapping mapping = section.asMapping("operators as a mapping, such as odd: (1 - Z@left) / 2");
    if (mapping.entries().size() > MOST_OPERATORS) {
      throw FaultSignal.of(
          mapping
              .entries()
              .get(MOST_OPERATORS)
              .key()
              .fault("this version handles up to " + MOST_OPERATORS + " named operators"));
    }
    for (Entry e : mapping.entries()) {
      scope.addOperator(e.key(), scope.log().attempt(() -> value(e)));
    }
  }

  private Value value(Entry entry) {
    if (entry.value().isNothing()) {
      throw FaultSignal.of(entry.key().fault("the operator needs an expression or {file: ...}"));
    }
    if (entry.value() instanceof YamlScalar text) {
      Value value = expressions.value(text.passage());
      if (value instanceof Ket) {
        throw text.passage().fault("a state |...> cannot be a named operator");
      }
      return value;
    }
    String shape = "an expression or {file: name.mtx, sites: [a, b]}";
    Fields fields =
        new Fields(
            entry.value().asMapping(shape), "an operator", List.of("file", "sites"), scope.log());
    return new Operator(OperatorForm.constant(fromFile(fields)), Dimension.NONE);
  }

  private ComplexBall fromFile(Fields fields) {
    YamlScalar name = fields.neededScalar("file", "the name of a Matrix Market file");
    HilbertSpace space = scope.sites().space();
    List<Integer> on =
        fields
            .node("sites")
            .map(this::sites)
            .orElseGet(() -> IntStream.range(0, space.sites().size()).boxed().toList());
    int size =
        on.stream().mapToInt(i -> space.sites().get(i).dimension()).reduce(1, (a, b) -> a * b);
    String text = new String(files.read(name), StandardCharsets.ISO_8859_1);
    return scope.sites().embed(on, MatrixMarket.read(files.shown(name.text()), text, size));
  }

  private List<Integer> sites(YamlNode node) {
    List<Integer> on = new ArrayList<>();
    for (YamlNode item : node.asSequence("a list of sites, as in [a, b]").items()) {
      YamlScalar name = item.asScalar("the name of a site");
      int site = scope.sites().site(name.text(), name.passage(), 0);
      if (on.contains(site)) {
        throw FaultSignal.of(name.fault("the site `" + name.text() + "` occurs twice"));
      }
      on.add(site);
    }
    if (on.isEmpty()) {
      throw FaultSignal.of(node.fault("the operator needs at least one site"));
    }
    return on;
  }
}
