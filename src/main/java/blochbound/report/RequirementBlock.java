package blochbound.report;

import blochbound.model.Device;
import blochbound.model.Parameter;
import blochbound.model.Unit;
import blochbound.report.TextTable.Align;
import blochbound.report.TextTable.Column;
import blochbound.study.FoundPoint;
import blochbound.study.Guarantee;
import blochbound.study.RequirementResult;
import blochbound.study.SampledTruth;
import java.math.BigDecimal;
import java.math.RoundingMode;
import java.util.ArrayList;
import java.util.List;
import java.util.stream.Collectors;

/** The part of a report that tells everything about one requirement. */
final class RequirementBlock {
  private static final int INDENT = 2;
  private static final int LABEL_WIDTH = 13;
  private static final int ESTIMATE_DIGITS = 3;
  private static final BigDecimal HUNDRED = BigDecimal.valueOf(100);

  private final Device device;
  private final RequirementResult result;
  private final Unit unit;
  private final BracketDigits digits;

  RequirementBlock(Device device, RequirementResult result) {
    this.device = device;
    this.result = result;
    unit = result.requirement().unit();
    digits = BracketDigits.of(result);
  }

  List<String> lines() {
    List<String> lines = new ArrayList<>();
    lines.addAll(
        TextLayout.paragraph(result.requirement().name() + ": " + result.verdict().key(), 0));
    lines.addAll(labelled("requirement", RequirementWords.sentence(result.requirement())));
    lines.addAll(labelled("guaranteed", result.guaranteed().map(this::guaranteed).orElse("-")));
    lines.addAll(labelled("worst found", result.worstFound().map(this::found).orElse("-")));
    lines.addAll(labelled("nominal", nominal()));
    lines.addAll(labelled("sampled", result.sampled().map(this::sampled).orElse("-")));
    result.sampled().ifPresent(s -> lines.addAll(labelled("quantiles", quantiles(s))));
    lines.addAll(labelled("method", result.guaranteed().map(RequirementBlock::method).orElse("-")));
    result.remarks().forEach(remark -> lines.addAll(labelled("remark", remark)));
    result
        .worstFound()
        .ifPresent(
            found -> {
              lines.add("");
              lines.addAll(worstPoint(found));
            });
    return lines;
  }

  private static List<String> labelled(String label, String text) {
    String lead = " ".repeat(INDENT) + label + " ".repeat(LABEL_WIDTH - label.length());
    return TextLayout.hanging(lead, text);
  }

  private String guaranteed(Guarantee guarantee) {
    return RequirementWords.withUnit(digits.certified(guarantee.value()), unit)
        + " (margin "
        + digits.certifiedMargin(guarantee.value())
        + ")";
  }

  private String found(FoundPoint found) {
    return RequirementWords.withUnit(digits.estimate(found.value()), unit)
        + " (margin "
        + digits.margin(found.value())
        + (found.verified() ? "; verified)" : "; not verified)");
  }

  private String nominal() {
    return result.nominal().isPresent()
        ? RequirementWords.withUnit(digits.estimate(result.nominal().getAsDouble()), unit)
        : "-";
  }

  private String sampled(SampledTruth sampled) {
    StringBuilder text = new StringBuilder();
    text.append("worst ").append(digits.estimate(sampled.worst()));
    text.append(", mean ").append(digits.estimate(sampled.mean()));
    text.append("; ").append(Counted.of(sampled.count(), "random device"));
    text.append(" (").append(percent(sampled.acceptance())).append(" of the draws in the ball)");
    return text.toString();
  }

  /** The values that the stated shares of the devices do not exceed. */
  private String quantiles(SampledTruth sampled) {
    return sampled.quantiles().stream()
        .map(q -> percent(q.probability()) + ": " + digits.estimate(q.value()))
        .collect(Collectors.joining(", "));
  }

  private static String method(Guarantee guarantee) {
    return guarantee.method()
        + ", "
        + Counted.of(guarantee.regions(), "region")
        + ", "
        + NumberText.significant(guarantee.seconds(), ESTIMATE_DIGITS, RoundingMode.HALF_EVEN)
        + " s";
  }

  private static String percent(double share) {
    return NumberText.significant(100 * share, ESTIMATE_DIGITS, RoundingMode.HALF_EVEN) + " %";
  }

  private List<String> worstPoint(FoundPoint found) {
    TextTable table =
        TextTable.of(
            new Column("worst device found", Align.LEFT),
            new Column("value", Align.DECIMAL),
            new Column("unit", Align.LEFT),
            new Column("nominal", Align.DECIMAL),
            new Column("share of tolerance", Align.DECIMAL));
    int constants = 0;
    for (int i = 0; i < device.parameters().size(); i++) {
      Parameter p = device.parameters().get(i);
      if (p.isConstant()) {
        constants++;
        continue;
      }
      table.row(
          p.name(),
          NumberText.exact(found.point().get(i)),
          p.unit().symbol(),
          NumberText.exact(p.nominal()),
          share(found.shares().get(i)));
    }
    if (constants == device.parameters().size()) {
      return TextLayout.paragraph("All parameters are constant.", INDENT);
    }
    List<String> lines = new ArrayList<>(table.lines(INDENT));
    if (constants > 0) {
      String rest = Counted.of(constants, "constant parameter") + " at nominal";
      lines.addAll(TextLayout.paragraph(rest, INDENT));
    }
    return lines;
  }

  /** Share of the tolerance in percent with one decimal. */
  private static String share(double share) {
    if (!Double.isFinite(share)) {
      return "-";
    }
    BigDecimal percent =
        new BigDecimal(share).multiply(HUNDRED).setScale(1, RoundingMode.HALF_EVEN);
    return NumberText.exact(percent) + " %";
  }
}
