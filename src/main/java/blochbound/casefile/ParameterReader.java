package blochbound.casefile;

import blochbound.casefile.YamlNode.Entry;
import blochbound.casefile.YamlNode.Mapping;
import blochbound.model.Distribution;
import blochbound.model.Parameter;
import java.math.BigDecimal;
import java.math.RoundingMode;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;

/** Reads the section {@code parameters}. */
final class ParameterReader {
  /** Most parameters of one case. */
  static final int MOST_PARAMETERS = 64;

  private static final List<String> KEYS =
      List.of("nominal", "tolerance", "range", "distribution", "sigma", "drift");
  private static final List<String> DISTRIBUTIONS = List.of("uniform", "normal", "triangular");

  private final Scope scope;
  private final QuantityReader quantities;
  private final ToleranceReader tolerances;
  private final Map<String, YamlNode> offCentre = new HashMap<>();

  ParameterReader(Scope scope) {
    this.scope = scope;
    this.quantities = new QuantityReader(scope.units());
    this.tolerances = new ToleranceReader(quantities);
  }

  /** Reads all parameters in order and tells them to the scope. */
  void read(YamlNode section) {
    Mapping mapping = section.asMapping("parameters as a mapping, such as kappa: {nominal: 1 /us}");
    if (mapping.entries().size() > MOST_PARAMETERS) {
      throw FaultSignal.of(
          mapping
              .entries()
              .get(MOST_PARAMETERS)
              .key()
              .fault(
                  "there are "
                      + mapping.entries().size()
                      + " parameters; this version handles up to "
                      + MOST_PARAMETERS));
    }
    for (Entry e : mapping.entries()) {
      scope.addParameter(e.key(), scope.log().attempt(() -> parameter(e)));
    }
  }

  /** Places of the tolerances whose nominal value is not in the middle, by parameter name. */
  Map<String, YamlNode> offCentre() {
    return offCentre;
  }

  private Parameter parameter(Entry entry) {
    if (entry.value().isNothing()) {
      throw FaultSignal.of(entry.key().fault("a parameter needs {nominal: ...}"));
    }
    Mapping mapping = entry.value().asMapping("a parameter as {nominal: ..., tolerance: ...}");
    Fields fields = new Fields(mapping, "a parameter", KEYS, scope.log());
    refuseDrift(fields);
    String name = entry.key().text();
    Quantity nominal = quantities.one(fields.neededScalar("nominal", "a number with a unit"));
    ToleranceReader.Range range = tolerances.range(fields, nominal);
    Distribution distribution = distribution(fields, nominal);
    Parameter parameter =
        new Parameter(
            name, nominal.value(), range.lower(), range.upper(), nominal.unit(), distribution);
    if (!parameter.isCentred()) {
      offCentre.put(name, fields.node("tolerance").or(() -> fields.node("range")).orElseThrow());
    }
    return parameter;
  }

  private void refuseDrift(Fields fields) {
    scope
        .log()
        .attempt(
            () ->
                fields
                    .node("drift")
                    .ifPresent(d -> scope.log().add(d.fault(Unsupported.notYet("drift")))));
  }

  private Distribution distribution(Fields fields, Quantity nominal) {
    Optional<YamlScalar> sigma = fields.scalar("sigma", "a number with a unit");
    Optional<YamlScalar> word = fields.scalar("distribution", "uniform, normal or triangular");
    String name = word.map(YamlScalar::text).orElse("uniform");
    if (!DISTRIBUTIONS.contains(name)) {
      throw FaultSignal.of(
          word.orElseThrow()
              .fault(
                  "unknown distribution `"
                      + name
                      + "`"
                      + Vocabulary.nearest(name, DISTRIBUTIONS)
                      + "; allowed: uniform, normal, triangular"));
    }
    boolean normal = name.equals("normal");
    if (normal && sigma.isEmpty()) {
      throw FaultSignal.of(
          word.orElseThrow().fault("the distribution normal needs `sigma`, its deviation"));
    }
    if (!normal && sigma.isPresent()) {
      throw FaultSignal.of(
          sigma.get().fault("`sigma` belongs to `distribution: normal` only, here it is " + name));
    }
    return normal
        ? normal(sigma.get(), nominal)
        : name.equals("uniform") ? new Distribution.Uniform() : new Distribution.Triangular();
  }

  private Distribution normal(YamlScalar scalar, Quantity nominal) {
    Quantity sigma = quantities.one(scalar);
    tolerances.requireSameDimension(sigma, nominal, scalar.passage(), "sigma");
    BigDecimal value =
        UnitConversion.convert(sigma.value(), sigma.unit(), nominal.unit(), RoundingMode.FLOOR);
    if (!(value.doubleValue() > 0)) {
      throw scalar.passage().fault("sigma must be positive");
    }
    return new Distribution.Normal(value.doubleValue());
  }
}
