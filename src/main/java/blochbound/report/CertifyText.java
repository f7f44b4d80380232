package blochbound.report;

import blochbound.model.Device;
import blochbound.model.Parameter;
import blochbound.model.ParameterSpace;
import blochbound.report.TextTable.Align;
import blochbound.report.TextTable.Column;
import blochbound.study.CertificationResult;
import blochbound.study.FoundPoint;
import blochbound.study.Guarantee;
import blochbound.study.RequirementResult;
import blochbound.study.SteadyStateStatus;
import blochbound.study.SteadyStateStatus.Kind;
import blochbound.study.Verdict;
import java.math.BigDecimal;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.stream.Collectors;

/** The report of a certification for an engineer, in plain text. */
public final class CertifyText {
  private static final String SCOPE =
      "This speaks for the model that the case states, for parameters that are constant in time and"
          + " inside their tolerances. It is not a safety certificate.";

  private CertifyText() {}

  /** The whole report; every line ends with a line end. */
  public static String of(CertificationResult result) {
    List<String> lines = new ArrayList<>(head(result));
    if (result.requirements().size() > 1) {
      lines.add("");
      lines.addAll(summary(result));
    }
    for (RequirementResult requirement : result.requirements()) {
      lines.add("");
      lines.addAll(new RequirementBlock(result.designCase().device(), requirement).lines());
    }
    lines.add("");
    lines.addAll(conclusion(result));
    return TextLayout.join(lines);
  }

  private static List<String> head(CertificationResult result) {
    Device device = result.designCase().device();
    List<String> lines = new ArrayList<>();
    lines.addAll(TextLayout.wrap(result.designCase().title(), TextLayout.WIDTH));
    lines.addAll(TextLayout.paragraph(device(device) + "; seed " + result.seed(), 0));
    result.status().ifPresent(status -> lines.addAll(steadyState(device.parameters(), status)));
    return lines;
  }

  private static String device(Device device) {
    ParameterSpace space = device.parameterSpace();
    return Counted.of(device.space().sites().size(), "site")
        + " with "
        + Counted.of(device.space().dimension(), "level")
        + "; "
        + Counted.of(device.parameters().size(), "parameter")
        + ", "
        + space.coordinates()
        + " with a tolerance; ball of norm "
        + device.ball().norm().text()
        + " and radius "
        + NumberText.exact(device.ball().radius());
  }

  private static List<String> steadyState(List<Parameter> parameters, SteadyStateStatus status) {
    String sentence =
        switch (status.kind()) {
          case UNIQUE -> "proved unique for every device inside the tolerances.";
          case UNPROVED -> "not proved unique. ";
          case NOT_UNIQUE -> "not unique. ";
        };
    String reason = status.kind() == Kind.UNIQUE ? "" : status.reason();
    List<String> lines = new ArrayList<>(TextLayout.hanging("steady state: ", sentence + reason));
    status.point().ifPresent(p -> lines.addAll(TextLayout.hanging("  at ", point(parameters, p))));
    return lines;
  }

  private static String point(List<Parameter> parameters, List<BigDecimal> point) {
    List<String> parts = new ArrayList<>();
    for (int i = 0; i < parameters.size(); i++) {
      Parameter p = parameters.get(i);
      parts.add(p.name() + " = " + RequirementWords.quantity(point.get(i), p.unit()));
    }
    return String.join(", ", parts);
  }

  private static List<String> summary(CertificationResult result) {
    TextTable table =
        TextTable.of(
            new Column("requirement", Align.LEFT),
            new Column("limit", Align.LEFT),
            new Column("nominal", Align.DECIMAL),
            new Column("worst found", Align.DECIMAL),
            new Column("guaranteed", Align.DECIMAL),
            new Column("margin", Align.DECIMAL),
            new Column("verdict", Align.LEFT));
    for (RequirementResult r : result.requirements()) {
      BracketDigits digits = BracketDigits.of(r);
      Optional<Double> certified = r.guaranteed().map(Guarantee::value);
      table.row(
          r.requirement().name(),
          RequirementWords.limit(r.requirement()),
          r.nominal().isPresent() ? digits.estimate(r.nominal().getAsDouble()) : "-",
          r.worstFound().map(FoundPoint::value).map(digits::estimate).orElse("-"),
          certified.map(digits::certified).orElse("-"),
          certified.map(digits::certifiedMargin).orElse("-"),
          r.verdict().key());
    }
    List<String> lines = new ArrayList<>(table.lines(0));
    lines.addAll(
        TextLayout.paragraph(
            "Values are in the unit of the limit; the margin is the distance of the guaranteed value"
                + " inside the limit.",
            0));
    return lines;
  }

  private static List<String> conclusion(CertificationResult result) {
    List<String> lines = new ArrayList<>();
    if (result.interrupted()) {
      lines.addAll(
          TextLayout.paragraph(
              "Interrupted before the end: the values above are those so far.", 0));
    }
    String verdict = result.verdict().key() + " - " + reason(result);
    lines.addAll(TextLayout.hanging("verdict: ", verdict));
    lines.addAll(TextLayout.paragraph(SCOPE, 0));
    return lines;
  }

  private static String reason(CertificationResult result) {
    if (result.requirements().isEmpty()) {
      return "no requirement has a result.";
    }
    return switch (result.verdict()) {
      case CERTIFIED -> "every requirement holds for every device inside the tolerances.";
      case REFUTED -> "a device inside the tolerances violates " + names(result) + ".";
      case UNDECIDED -> "neither proved nor refuted: " + names(result) + ".";
    };
  }

  /** Names of the requirements that make the verdict. */
  private static String names(CertificationResult result) {
    Verdict verdict = result.verdict();
    return result.requirements().stream()
        .filter(r -> r.verdict() == verdict)
        .map(r -> r.requirement().name())
        .collect(Collectors.joining(", "));
  }
}
