package blochbound.casefile;

import blochbound.model.Requirement;
import blochbound.model.Requirement.Sense;
import java.util.ArrayList;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;

/** Reads the section {@code requirements}. */
final class RequirementReader {
  /** Most requirements of one case. */
  static final int MOST_REQUIREMENTS = 256;

  private static final List<String> KEYS =
      List.of("name", "measure", "atLeast", "atMost", "at", "during", "start");

  private final FaultLog log;
  private final QuantityReader quantities;
  private final MeasureReader measures;
  private final WhenReader moments;
  private final Map<String, YamlScalar> names = new HashMap<>();

  RequirementReader(Scope scope, MeasureReader measures) {
    this.log = scope.log();
    this.quantities = new QuantityReader(scope.units());
    this.measures = measures;
    this.moments = new WhenReader(quantities, new StateReader(new Expressions(scope)));
  }

  /** All requirements that have no fault. */
  List<Requirement> read(YamlNode section) {
    List<YamlNode> items =
        section
            .asSequence("requirements as a list of {name: ..., measure: ..., atLeast: ...}")
            .items();
    if (items.size() > MOST_REQUIREMENTS) {
      throw FaultSignal.of(
          items
              .get(MOST_REQUIREMENTS)
              .fault(
                  "there are "
                      + items.size()
                      + " requirements; this version handles up to "
                      + MOST_REQUIREMENTS));
    }
    List<Requirement> requirements = new ArrayList<>();
    for (YamlNode item : items) {
      log.attempt(() -> requirement(item)).ifPresent(requirements::add);
    }
    return requirements;
  }

  private Requirement requirement(YamlNode item) {
    Fields fields =
        new Fields(
            item.asMapping("a requirement as {name: ..., measure: ..., atLeast: ...}"),
            "a requirement",
            KEYS,
            log);
    Optional<String> name = log.attempt(() -> name(fields));
    Optional<Sense> sense = log.attempt(() -> sense(fields));
    YamlScalar text = fields.neededScalar("measure", "a measure");
    MeasureReader.Measured measure = measures.read(text.passage());
    Optional<WhenReader.Moment> moment = log.attempt(() -> moments.read(fields, measure.spec()));
    Sense side = sense.orElseThrow(FaultSignal::following);
    Quantity limit = limit(fields.neededScalar(side.key(), "a limit"), measure);
    return new Requirement(
        name.orElseThrow(FaultSignal::following),
        text.passage().text(),
        measure.spec(),
        side,
        limit.value(),
        limit.unit(),
        moment.orElseThrow(FaultSignal::following).when(),
        moment.get().start());
  }

  private Quantity limit(YamlScalar scalar, MeasureReader.Measured measure) {
    return quantities.of(measure.dimension(), scalar, "the limit of this measure");
  }

  private String name(Fields fields) {
    YamlScalar name = fields.neededScalar("name", "the name of the requirement");
    if (name.text().isBlank()) {
      throw FaultSignal.of(name.fault("the name of the requirement is empty"));
    }
    YamlScalar first = names.putIfAbsent(name.text(), name);
    if (first != null) {
      throw FaultSignal.of(
          name.fault(
              "the requirement `"
                  + name.text()
                  + "` is already given at line "
                  + first.line()
                  + ", column "
                  + first.column()));
    }
    return name.text();
  }

  private static Sense sense(Fields fields) {
    boolean least = fields.has(Sense.AT_LEAST.key());
    if (fields.isMisspelt(Sense.AT_LEAST.key()) || fields.isMisspelt(Sense.AT_MOST.key())) {
      throw FaultSignal.following();
    }
    if (least == fields.has(Sense.AT_MOST.key())) {
      throw fields.fault(
          least
              ? "a requirement has either `atLeast` or `atMost`, not both"
              : "a requirement needs `atLeast` or `atMost`");
    }
    return least ? Sense.AT_LEAST : Sense.AT_MOST;
  }
}
