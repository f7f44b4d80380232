package blochbound.casefile;

import blochbound.casefile.YamlNode.Mapping;
import blochbound.model.Ball;
import blochbound.model.Ball.Correlation;
import blochbound.model.Ball.Norm;
import java.math.BigDecimal;
import java.util.ArrayList;
import java.util.HashSet;
import java.util.List;
import java.util.Optional;
import java.util.Set;

/** Reads the section {@code ball}. */
final class BallReader {
  private final Scope scope;
  private final QuantityReader quantities;

  BallReader(Scope scope) {
    this.scope = scope;
    this.quantities = new QuantityReader(scope.units());
  }

  /** The ball. */
  Ball read(YamlNode section) {
    Mapping mapping = section.asMapping("a ball as {norm: inf, radius: 1}");
    Fields fields =
        new Fields(mapping, "`ball`", List.of("norm", "radius", "correlations"), scope.log());
    Optional<Norm> norm =
        scope.log().attempt(() -> fields.scalar("norm", "a norm").map(this::norm).orElse(Norm.BOX));
    Optional<BigDecimal> radius =
        scope
            .log()
            .attempt(
                () -> fields.scalar("radius", "a number").map(this::radius).orElse(BigDecimal.ONE));
    Optional<List<Correlation>> correlations =
        scope
            .log()
            .attempt(() -> fields.node("correlations").map(this::correlations).orElse(List.of()));
    if (norm.isEmpty() || radius.isEmpty() || correlations.isEmpty()) {
      throw FaultSignal.following();
    }
    if (!correlations.get().isEmpty() && norm.get() != Norm.ELLIPSOID) {
      throw FaultSignal.of(
          fields
              .needed("correlations")
              .fault("correlations need `norm: 2`, not " + norm.get().text()));
    }
    return new Ball(norm.get(), radius.get(), correlations.get());
  }

  private Norm norm(YamlScalar scalar) {
    for (Norm norm : Norm.values()) {
      if (norm.text().equals(scalar.text())) {
        return norm;
      }
    }
    throw FaultSignal.of(scalar.fault("unknown norm `" + scalar.text() + "`; allowed: inf, 2, 1"));
  }

  private BigDecimal radius(YamlScalar scalar) {
    BigDecimal radius = quantities.pureNumber(scalar, "the radius");
    if (radius.signum() < 0) {
      throw scalar.passage().fault("the radius must not be negative");
    }
    return radius;
  }

  private List<Correlation> correlations(YamlNode node) {
    List<Correlation> found = new ArrayList<>();
    Set<Set<Integer>> pairs = new HashSet<>();
    for (YamlNode item : node.asSequence("a list of {between: [a, b], value: 0.6}").items()) {
      Correlation c = correlation(item);
      if (!pairs.add(Set.of(c.first(), c.second()))) {
        throw FaultSignal.of(item.fault("the correlation of these two parameters is given twice"));
      }
      found.add(c);
    }
    return found;
  }

  private Correlation correlation(YamlNode item) {
    String shape = "a correlation as {between: [a, b], value: 0.6}";
    Fields fields =
        new Fields(
            item.asMapping(shape), "a correlation", List.of("between", "value"), scope.log());
    List<YamlNode> names =
        fields.needed("between").asSequence("two parameters, as in [a, b]").items();
    if (names.size() != 2) {
      throw FaultSignal.of(
          fields.needed("between").fault("a correlation is between two parameters, as in [a, b]"));
    }
    int first = parameter(names.get(0));
    int second = parameter(names.get(1));
    if (first == second) {
      throw FaultSignal.of(names.get(1).fault("a correlation is between two different parameters"));
    }
    YamlScalar text = fields.neededScalar("value", "a number between -1 and 1");
    BigDecimal value = quantities.pureNumber(text, "a correlation");
    if (value.abs().compareTo(BigDecimal.ONE) >= 0) {
      throw text.passage()
          .fault(
              "a correlation must lie strictly between -1 and 1; parameters that always move"
                  + " together are one shared parameter");
    }
    return new Correlation(first, second, value);
  }

  private int parameter(YamlNode node) {
    YamlScalar name = node.asScalar("the name of a parameter");
    int index =
        scope
            .parameterIndex(name.text())
            .orElseThrow(() -> FaultSignal.of(name.fault(scope.unknownParameter(name.text()))));
    if (scope.parameter(index).isConstant()) {
      throw FaultSignal.of(
          name.fault("`" + name.text() + "` has no tolerance, so it cannot be correlated"));
    }
    return index;
  }
}
