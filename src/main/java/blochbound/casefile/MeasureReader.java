package blochbound.casefile;

import blochbound.casefile.Value.Operator;
import blochbound.linalg.ComplexBall;
import blochbound.linalg.ComplexMatrix;
import blochbound.model.MeasureSpec;
import blochbound.model.StateSpec;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.stream.Stream;

/** Reads measures such as {@code concurrence(left, right)}. */
final class MeasureReader {
  /** Names of all measures. */
  static final List<String> NAMES =
      List.of(
          "mean",
          "population",
          "fidelity",
          "concurrence",
          "negativity",
          "purity",
          "traceDistance",
          "entropy",
          "gap",
          "settling",
          "gateFidelity",
          "functional");

  /**
   * A measure with the dimension of its values.
   *
   * @param spec the measure
   * @param dimension dimension of its values and limits
   */
  record Measured(MeasureSpec spec, Dimension dimension) {}

  /** Whether the case names a target state. */
  enum TargetState {
    /** There is no key {@code target}. */
    ABSENT,
    /** There is one, but it has a fault. */
    FAULTY,
    /** There is one. */
    KNOWN
  }

  private final Scope scope;
  private final Expressions expressions;
  private final StateReader states;
  private final QuantityReader quantities;
  private final TargetState targetState;
  private final Optional<StateSpec> target;

  MeasureReader(Scope scope, TargetState targetState, Optional<StateSpec> target) {
    this.scope = scope;
    this.expressions = new Expressions(scope);
    this.states = new StateReader(expressions);
    this.quantities = new QuantityReader(scope.units());
    this.targetState = targetState;
    this.target = target;
  }

  /** The measure of a text. */
  Measured read(Passage passage) {
    MeasureText text = MeasureText.of(passage);
    return switch (text.name()) {
      case "mean" -> mean(text);
      case "population" -> pure(population(text));
      case "fidelity" -> pure(fidelity(text));
      case "concurrence" -> pure(concurrence(text));
      case "negativity" -> pure(negativity(text));
      case "traceDistance" -> pure(traceDistance(text));
      case "gateFidelity" -> pure(gateFidelity(text));
      case "purity" -> pure(plain(text, new MeasureSpec.Purity()));
      case "entropy" -> pure(plain(text, new MeasureSpec.Entropy()));
      case "gap" -> new Measured(plain(text, new MeasureSpec.Gap()), dimension(Dimension.RATE));
      case "settling" -> new Measured(settling(text), dimension(Dimension.TIME));
      case "functional" -> throw passage.fault(Unsupported.notYet("functional"));
      default -> throw unknown(text);
    };
  }

  private static Measured pure(MeasureSpec spec) {
    return new Measured(spec, Dimension.NONE);
  }

  private Dimension dimension(Dimension dimension) {
    return scope.units().isDimensionless() ? Dimension.NONE : dimension;
  }

  private static FaultSignal unknown(MeasureText text) {
    return text.whole()
        .fault(
            "unknown measure `"
                + text.name()
                + "`"
                + Vocabulary.nearest(text.name(), NAMES)
                + "; measures are "
                + String.join(", ", NAMES));
  }

  private static MeasureSpec plain(MeasureText text, MeasureSpec spec) {
    text.expect(0, 0, text.name());
    return spec;
  }

  private Measured mean(MeasureText text) {
    text.expect(1, 1, "mean(<Hermitian operator>)");
    Passage argument = text.arguments().get(0);
    Operator operator = expressions.hermitian(argument, "the operator of mean( )");
    ComplexBall matrix = expressions.constant(operator, argument, "the operator of mean( )");
    return new Measured(new MeasureSpec.Mean(matrix), operator.dimension());
  }

  private MeasureSpec population(MeasureText text) {
    text.expect(2, Integer.MAX_VALUE, "population(site, label, ...)");
    int site = site(text.arguments().get(0));
    List<Integer> levels = new ArrayList<>();
    for (Passage label : text.arguments().subList(1, text.arguments().size())) {
      int level = scope.sites().level(site, label.text(), label, label.from());
      if (levels.contains(level)) {
        throw label.fault("the level `" + label.text() + "` occurs twice");
      }
      levels.add(level);
    }
    return new MeasureSpec.Population(site, List.copyOf(levels));
  }

  private int site(Passage name) {
    return scope.sites().site(name.text(), name, name.from());
  }

  private MeasureSpec fidelity(MeasureText text) {
    text.expect(0, 1, "fidelity (with `target`) or fidelity(<state>)");
    if (!text.arguments().isEmpty()) {
      return new MeasureSpec.Fidelity(states.state(text.arguments().get(0)));
    }
    if (targetState == TargetState.ABSENT) {
      throw text.whole()
          .fault("fidelity without a state needs a `target`; add one or write fidelity(<state>)");
    }
    return new MeasureSpec.Fidelity(target.orElseThrow(FaultSignal::following));
  }

  private MeasureSpec concurrence(MeasureText text) {
    text.expect(2, 2, "concurrence(a, b)");
    List<Integer> sites = sites(text);
    for (int k = 0; k < 2; k++) {
      int levels = scope.sites().space().sites().get(sites.get(k)).dimension();
      if (levels != 2) {
        Passage name = text.arguments().get(k);
        throw name.fault(
            "concurrence is for two-level sites, "
                + name.text()
                + " has "
                + levels
                + " levels; negativity takes any");
      }
    }
    return new MeasureSpec.Concurrence(sites.get(0), sites.get(1));
  }

  private MeasureSpec negativity(MeasureText text) {
    text.expect(1, Integer.MAX_VALUE, "negativity(a) or negativity(a, b, ...)");
    List<Integer> sites = sites(text);
    if (sites.size() == scope.sites().space().sites().size()) {
      throw text.whole().fault("negativity needs at least one site on the other side of the cut");
    }
    return new MeasureSpec.Negativity(sites);
  }

  private List<Integer> sites(MeasureText text) {
    List<Integer> sites = new ArrayList<>();
    for (Passage name : text.arguments()) {
      int site = site(name);
      if (sites.contains(site)) {
        throw name.fault("the site `" + name.text() + "` occurs twice");
      }
      sites.add(site);
    }
    return List.copyOf(sites);
  }

  private MeasureSpec traceDistance(MeasureText text) {
    text.expect(1, 1, "traceDistance(<state>)");
    return new MeasureSpec.TraceDistance(states.state(text.arguments().get(0)));
  }

  private MeasureSpec settling(MeasureText text) {
    text.expect(1, 1, "settling(0.01)");
    Passage argument = text.arguments().get(0);
    Quantity q = quantities.one(argument);
    double distance = q.value().doubleValue();
    if (!q.unit().symbol().isEmpty() || !(distance > 0 && distance < 1)) {
      throw argument.fault("the trace distance of settling( ) must lie between 0 and 1");
    }
    return new MeasureSpec.Settling(distance);
  }

  private MeasureSpec gateFidelity(MeasureText text) {
    text.expect(
        1, Integer.MAX_VALUE, "gateFidelity(<unitary>) or gateFidelity(<unitary>, |a>, |b>)");
    Passage argument = text.arguments().get(0);
    Operator operator = expressions.operator(argument, "the gate");
    expressions.require(Dimension.NONE, operator, argument, "the gate");
    ComplexBall gate = expressions.constant(operator, argument, "the gate");
    ComplexMatrix unit = ComplexMatrix.identity(gate.centre().rows());
    if (!gate.adjoint().times(gate).minus(ComplexBall.exact(unit)).mayBeZero()) {
      throw argument.fault("the gate is not unitary");
    }
    List<ComplexBall> kets = text.arguments().stream().skip(1).map(states::ket).toList();
    for (int k = 1; k < kets.size(); k++) {
      ComplexBall last = kets.get(k);
      Stream<ComplexBall> before = kets.subList(0, k).stream();
      if (!before.allMatch(b -> b.adjoint().times(last).mayBeZero())) {
        throw text.arguments().get(k + 1).fault("the kets of the subspace must be orthogonal");
      }
    }
    return new MeasureSpec.GateFidelity(gate, kets);
  }
}
