package blochbound.casefile;

import blochbound.interval.ExactNumber;
import blochbound.model.MeasureSpec;
import blochbound.model.StateSpec;
import blochbound.model.When;
import java.util.List;
import java.util.Optional;

/** Reads {@code at}, {@code during} and {@code start} of a requirement. */
final class WhenReader {
  /**
   * The moment and the initial state.
   *
   * @param when the moment
   * @param start the initial state; empty when there is none or any is meant
   */
  record Moment(When when, Optional<StateSpec> start) {}

  private final QuantityReader quantities;
  private final StateReader states;

  WhenReader(QuantityReader quantities, StateReader states) {
    this.quantities = quantities;
    this.states = states;
  }

  /** The moment of a requirement, checked against its measure. */
  Moment read(Fields fields, MeasureSpec measure) {
    Optional<YamlNode> during = fields.node("during");
    Optional<YamlScalar> at = fields.scalar("at", "steady, a time, or end");
    Optional<YamlScalar> start = fields.scalar("start", "a state");
    if (at.isPresent() && during.isPresent()) {
      throw FaultSignal.of(during.get().fault("a requirement has either `at` or `during`"));
    }
    When when =
        during
            .map(this::during)
            .or(() -> at.map(this::at))
            .orElseGet(
                () ->
                    measure instanceof MeasureSpec.GateFidelity
                        ? new When.AtEnd()
                        : new When.Steady());
    check(fields, measure, when, start);
    boolean any = start.isPresent() && start.get().passage().text().equals("any");
    if (any && !(measure instanceof MeasureSpec.Settling)) {
      throw FaultSignal.of(start.get().fault("`start: any` is for settling( ) only"));
    }
    return new Moment(when, any ? Optional.empty() : start.map(s -> states.state(s.passage())));
  }

  private static void check(
      Fields fields, MeasureSpec measure, When when, Optional<YamlScalar> start) {
    boolean steady = when instanceof When.Steady;
    if (measure instanceof MeasureSpec.Gap || measure instanceof MeasureSpec.Settling) {
      if (!steady) {
        throw fields.fault("gap and settling( ) have no `at` and no `during`");
      }
      if (measure instanceof MeasureSpec.Settling && start.isEmpty()) {
        throw fields.fault("settling( ) needs `start:`, a state or any");
      }
    }
    if (measure instanceof MeasureSpec.GateFidelity) {
      if (steady) {
        throw fields.fault("gateFidelity( ) is at a time or at the end of a sequence, not steady");
      }
      if (start.isPresent()) {
        throw FaultSignal.of(
            start.get().fault("gateFidelity( ) averages over all states; it has no `start`"));
      }
    } else if (!steady && start.isEmpty()) {
      throw fields.fault("a requirement at a time needs `start:`, the initial state");
    }
    if (steady && start.isPresent() && !(measure instanceof MeasureSpec.Settling)) {
      throw FaultSignal.of(
          start
              .get()
              .fault("`start` needs `at:` a time or `during:`; steady states have no start"));
    }
  }

  private When at(YamlScalar scalar) {
    String text = scalar.passage().text();
    if (text.equals("steady")) {
      return new When.Steady();
    }
    if (text.equals("end")) {
      return new When.AtEnd();
    }
    if (text.matches("[A-Za-z]+")) {
      throw scalar
          .passage()
          .fault(
              "unknown moment `"
                  + text
                  + "`"
                  + Vocabulary.nearest(text, List.of("steady", "end"))
                  + "; allowed: steady, a time such as 12 us, end");
    }
    Quantity time = time(scalar);
    return new When.At(time.value(), time.unit());
  }

  private Quantity time(YamlScalar scalar) {
    Quantity time = quantities.of(Dimension.TIME, scalar, "the moment");
    if (time.value().signum() < 0) {
      throw scalar.passage().fault("a time must not be negative");
    }
    return time;
  }

  private static ExactNumber exact(Quantity time) {
    return ExactNumber.of(time.value()).times(time.unit().factor());
  }

  private When during(YamlNode node) {
    List<YamlNode> ends = node.asSequence("an interval of times as [5 us, 20 us]").items();
    if (ends.size() != 2) {
      throw FaultSignal.of(node.fault("`during` has two ends, as in [5 us, 20 us]"));
    }
    Quantity from = time(ends.get(0).asScalar("a time"));
    Quantity until = time(ends.get(1).asScalar("a time"));
    // Times have no factor of pi, so that their difference is exact.
    boolean isInOrder =
        exact(until).plus(exact(from).negate()).map(length -> length.signum() >= 0).orElse(false);
    if (!isInOrder) {
      throw FaultSignal.of(node.fault("the ends of `during` are in the wrong order"));
    }
    return new When.During(from.value(), from.unit(), until.value(), until.unit());
  }
}
