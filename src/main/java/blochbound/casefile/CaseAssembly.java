package blochbound.casefile;

import blochbound.casefile.CaseReader.RequirementRule;
import blochbound.casefile.MeasureReader.TargetState;
import blochbound.interval.Interval;
import blochbound.model.Ball;
import blochbound.model.DesignCase;
import blochbound.model.Device;
import blochbound.model.HilbertSpace;
import blochbound.model.Jump;
import blochbound.model.OperatorForm;
import blochbound.model.Parameter;
import blochbound.model.ParameterSpace;
import blochbound.model.Requirement;
import blochbound.model.StateSpec;
import java.util.List;
import java.util.Map;
import java.util.Optional;

/** Reads all sections of one case in the order in which they depend on each other. */
final class CaseAssembly {
  /** First line of every case file of this format. */
  static final String FORMAT = "blochbound-case/1";

  private static final List<String> UNSUPPORTED = List.of("sequence", "generator", "unmodelled");
  private static final List<String> SECTIONS =
      List.of(
          "format",
          "title",
          "timeUnit",
          "sites",
          "parameters",
          "operators",
          "hamiltonian",
          "jumps",
          "target",
          "ball",
          "requirements",
          "sequence",
          "generator",
          "unmodelled");
  private static final double LARGEST = 1e300;

  private final FaultLog log;
  private final Fields fields;
  private final String timeUnit;
  private final Scope scope;
  private final ReferencedFiles files;

  CaseAssembly(YamlNode root, ReferencedFiles files, FaultLog log) {
    this.log = log;
    this.files = files;
    this.fields =
        new Fields(
            root.asMapping("a case: a mapping that begins with format: " + FORMAT),
            "the case",
            SECTIONS,
            log);
    checkFormat();
    refuseUnsupported();
    // With a faulty unit of time the rest is read as in microseconds, to find further faults.
    this.timeUnit = log.attempt(this::timeUnit).orElse("us");
    this.scope = new Scope(new UnitTable(timeUnit), log, new WorkLimit());
  }

  private void checkFormat() {
    log.attempt(
        () -> {
          YamlScalar format = fields.neededScalar("format", "`" + FORMAT + "`");
          if (!format.text().equals(FORMAT)) {
            throw FaultSignal.of(
                format.fault(
                    "unknown format `" + format.text() + "`; this version reads " + FORMAT));
          }
        });
  }

  private void refuseUnsupported() {
    for (String key : UNSUPPORTED) {
      log.attempt(() -> fields.node(key).ifPresent(n -> log.add(n.fault(Unsupported.notYet(key)))));
    }
  }

  private String timeUnit() {
    YamlScalar unit = fields.neededScalar("timeUnit", "one of s, ms, us, ns, none");
    if (!UnitTable.timeUnits().contains(unit.text())) {
      throw FaultSignal.of(
          unit.fault(
              "unknown time unit `"
                  + unit.text()
                  + "`"
                  + Vocabulary.nearest(unit.text(), UnitTable.timeUnits())
                  + "; allowed: s, ms, us, ns, none"));
    }
    return unit.text();
  }

  /** The case; empty when a fault was logged. */
  Optional<DesignCase> read(RequirementRule rule) {
    Optional<String> title = log.attempt(this::title);
    if (!fields.has("generator")) {
      log.attempt(() -> new SiteReader(scope).read(fields.needed("sites")));
    }
    ParameterReader parameters = new ParameterReader(scope);
    log.attempt(() -> fields.node("parameters").ifPresent(parameters::read));
    OperatorReader operators = new OperatorReader(scope, files);
    log.attempt(() -> fields.node("operators").ifPresent(operators::read));
    Optional<Ball> ball = log.attempt(this::ball);
    Optional<OperatorForm> hamiltonian = log.attempt(this::hamiltonian);
    Optional<List<Jump>> jumps = log.attempt(this::jumps);
    Optional<Optional<StateSpec>> target = log.attempt(this::target);
    List<Requirement> requirements = requirements(rule, target);
    ball.ifPresent(b -> log.attempt(() -> prove(b, parameters.offCentre())));
    if (!log.isEmpty()) {
      return Optional.empty();
    }
    HilbertSpace space = scope.sites().space();
    Device device =
        new Device(
            space,
            scope.parameters(),
            ball.orElseThrow(),
            hamiltonian.orElseThrow(),
            jumps.orElseThrow());
    return Optional.of(
        new DesignCase(
            title.orElseThrow(),
            timeUnit,
            device,
            target.orElseThrow(),
            requirements,
            files.hexadecimalDigest()));
  }

  private String title() {
    return fields.scalar("title", "a title").map(YamlScalar::text).orElse("");
  }

  private Ball ball() {
    return fields.node("ball").map(b -> new BallReader(scope).read(b)).orElseGet(Ball::unitBox);
  }

  private OperatorForm hamiltonian() {
    boolean none = !fields.has("hamiltonian") && !fields.has("jumps");
    if (none && UNSUPPORTED.stream().noneMatch(fields::has)) {
      throw fields.fault("the device has no dynamics; add `hamiltonian` or `jumps`, or both");
    }
    return fields
        .node("hamiltonian")
        .map(new DynamicsReader(scope)::hamiltonian)
        .orElseGet(() -> OperatorForm.zero(scope.sites().dimension()));
  }

  private List<Jump> jumps() {
    return fields.node("jumps").map(new DynamicsReader(scope)::jumps).orElse(List.of());
  }

  private Optional<StateSpec> target() {
    return fields
        .scalar("target", "a state")
        .map(t -> new StateReader(new Expressions(scope)).state(t.passage()));
  }

  private List<Requirement> requirements(
      RequirementRule rule, Optional<Optional<StateSpec>> target) {
    TargetState known =
        !fields.has("target")
            ? TargetState.ABSENT
            : target.isEmpty() ? TargetState.FAULTY : TargetState.KNOWN;
    MeasureReader measures = new MeasureReader(scope, known, target.flatMap(t -> t));
    Optional<List<Requirement>> read =
        log.attempt(
            () ->
                fields
                    .node("requirements")
                    .map(new RequirementReader(scope, measures)::read)
                    .orElse(List.of()));
    boolean none = read.isPresent() && read.get().isEmpty();
    if (none && rule == RequirementRule.REQUIRED && log.isEmpty()) {
      log.attempt(
          () -> {
            throw fields.fault("there is no requirement; add `requirements` to certify");
          });
    }
    return read.orElse(List.of());
  }

  /** Builds the ball and proves all conditions on it. */
  private void prove(Ball ball, Map<String, YamlNode> offCentre) {
    List<Parameter> parameters = scope.parameters();
    if (ball.norm() != Ball.Norm.BOX && !offCentre.isEmpty()) {
      offCentre.forEach(
          (name, place) ->
              log.add(
                  place.fault(
                      "the nominal value of "
                          + name
                          + " is not the middle of its range, which needs `norm: inf`, not "
                          + ball.norm().text())));
      throw FaultSignal.following();
    }
    ParameterSpace space;
    try {
      space = ParameterSpace.of(parameters, ball);
    } catch (IllegalArgumentException e) {
      throw FaultSignal.of(fields.needed("ball").fault("" + e.getMessage()));
    }
    Interval[] ranges = space.ranges();
    for (int i = 0; i < ranges.length; i++) {
      if (!(ranges[i].magnitude() <= LARGEST)) {
        throw FaultSignal.of(
            fields
                .needed(fields.has("ball") ? "ball" : "parameters")
                .fault("the range of " + parameters.get(i).name() + " reaches over 1e300"));
      }
    }
    new ConditionProver(space, log, timeUnit).prove(scope.conditions());
  }
}
