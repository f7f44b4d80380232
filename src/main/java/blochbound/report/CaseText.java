package blochbound.report;

import blochbound.generator.GeneratorTerm;
import blochbound.model.DesignCase;
import blochbound.model.Device;
import blochbound.model.Jump;
import blochbound.model.Parameter;
import blochbound.model.Requirement;
import blochbound.model.Site;
import blochbound.report.CaseOverview.Population;
import blochbound.report.CaseOverview.SteadyState;
import blochbound.report.TextTable.Align;
import blochbound.report.TextTable.Column;
import java.math.RoundingMode;
import java.util.ArrayList;
import java.util.List;
import java.util.OptionalDouble;
import java.util.stream.Collectors;

/** A case as the program understands it, in plain text. */
public final class CaseText {
  private static final int INDENT = 2;
  private static final int ERROR_DIGITS = 2;
  private static final int MOST_POPULATIONS = 4;

  private final CaseOverview overview;
  private final DesignCase designCase;
  private final Device device;
  private final FormulaText formulas;
  private final OperatorText operators;

  private CaseText(CaseOverview overview) {
    this.overview = overview;
    designCase = overview.designCase();
    device = designCase.device();
    formulas = new FormulaText(device.parameters());
    operators = new OperatorText(device.space(), formulas);
  }

  /** The whole text; every line ends with a line end. */
  public static String of(CaseOverview overview) {
    return new CaseText(overview).text();
  }

  private String text() {
    List<String> lines = new ArrayList<>(TextLayout.paragraph(designCase.title(), 0));
    lines.addAll(TextLayout.hanging("sha256 ", designCase.sha256()));
    section(lines, sizes(), sites());
    section(lines, ball(), parameters());
    section(lines, "hamiltonian in " + angularUnit(), operators.terms(device.hamiltonian()));
    section(lines, "jumps, rates in " + rateUnit(), jumps());
    section(lines, "generator, " + Counted.of(generatorTerms().size(), "term"), generator());
    section(lines, "target", target());
    section(lines, "steady state of the nominal device", List.of(steadyState()));
    section(lines, "requirements", requirements());
    return TextLayout.join(lines);
  }

  /** A heading with indented paragraphs; lines that begin with a blank are laid out already. */
  private static void section(List<String> lines, String heading, List<String> content) {
    lines.add("");
    lines.addAll(TextLayout.paragraph(heading, 0));
    for (String part : content.isEmpty() ? List.of("none") : content) {
      if (part.startsWith(" ")) {
        lines.add(part);
      } else {
        lines.addAll(TextLayout.paragraph(part, INDENT));
      }
    }
  }

  private String sizes() {
    return Counted.of(device.space().sites().size(), "site")
        + ", N = "
        + device.space().dimension()
        + ", n = N^2 - 1 = "
        + overview.generator().unknowns()
        + " Bloch unknowns";
  }

  private List<String> sites() {
    TextTable table =
        TextTable.of(new Column("site", Align.LEFT), new Column("levels", Align.LEFT));
    for (Site site : device.space().sites()) {
      table.row(site.name(), String.join(" ", site.levels()));
    }
    return table.lines(INDENT);
  }

  private String ball() {
    String text =
        Counted.of(device.parameters().size(), "parameter")
            + ", ball of norm "
            + device.ball().norm().text()
            + " and radius "
            + NumberText.exact(device.ball().radius());
    return device.ball().correlations().isEmpty() ? text : text + ", correlated: " + correlations();
  }

  private String correlations() {
    return device.ball().correlations().stream()
        .map(c -> name(c.first()) + " " + name(c.second()) + " " + NumberText.exact(c.value()))
        .collect(Collectors.joining(", "));
  }

  private String name(int parameter) {
    return device.parameters().get(parameter).name();
  }

  private List<String> parameters() {
    if (device.parameters().isEmpty()) {
      return List.of();
    }
    TextTable table =
        TextTable.of(
            new Column("parameter", Align.LEFT),
            new Column("nominal", Align.DECIMAL),
            new Column("from", Align.DECIMAL),
            new Column("to", Align.DECIMAL),
            new Column("unit", Align.LEFT),
            new Column("of nominal", Align.LEFT),
            new Column("distribution", Align.LEFT));
    for (Parameter p : device.parameters()) {
      ParameterText text = ParameterText.of(p, device.ball());
      table.row(
          p.name(),
          NumberText.exact(p.nominal()),
          NumberText.exact(text.lower().stripTrailingZeros()),
          NumberText.exact(text.upper().stripTrailingZeros()),
          p.unit().symbol(),
          text.share(),
          text.distribution());
    }
    return table.lines(INDENT);
  }

  private boolean isDimensionless() {
    return designCase.timeUnit().equals("none");
  }

  private String angularUnit() {
    return isDimensionless() ? "pure numbers" : "rad/" + designCase.timeUnit();
  }

  private String rateUnit() {
    return isDimensionless() ? "pure numbers" : "1/" + designCase.timeUnit();
  }

  private List<String> jumps() {
    if (device.jumps().isEmpty()) {
      return List.of();
    }
    TextTable table =
        TextTable.of(new Column("rate", Align.LEFT), new Column("operator", Align.LEFT));
    for (Jump jump : device.jumps()) {
      table.row(formulas.scalar(jump.rate()), String.join(" + ", operators.terms(jump.operator())));
    }
    return table.lines(INDENT);
  }

  private List<GeneratorTerm> generatorTerms() {
    return overview.generator().terms();
  }

  private List<String> generator() {
    if (generatorTerms().isEmpty()) {
      return List.of();
    }
    TextTable table =
        TextTable.of(
            new Column("coefficient", Align.LEFT),
            new Column("nonzeros", Align.RIGHT),
            new Column("Frobenius norm", Align.DECIMAL),
            new Column("error at most", Align.LEFT));
    for (GeneratorTerm term : generatorTerms()) {
      table.row(
          formulas.monomial(term.monomial()),
          String.valueOf(term.matrix().entries()),
          FormulaText.number(term.matrix().frobeniusUp()),
          NumberText.significant(term.radius(), ERROR_DIGITS, RoundingMode.CEILING));
    }
    return table.lines(INDENT);
  }

  private List<String> target() {
    return designCase.target().map(operators::state).map(List::of).orElse(List.of());
  }

  private String steadyState() {
    if (overview.steadyState().isEmpty()) {
      return "not unique to rounding";
    }
    SteadyState state = overview.steadyState().get();
    String populations =
        state.populations().stream()
            .limit(MOST_POPULATIONS)
            .map(this::population)
            .collect(Collectors.joining(", "));
    boolean isAll = state.populations().size() <= MOST_POPULATIONS;
    return "purity "
        + FormulaText.number(state.purity())
        + (isAll ? "; populations " : "; largest populations ")
        + populations;
  }

  private String population(Population population) {
    return "|"
        + operators.label(population.index())
        + "> "
        + FormulaText.number(population.probability());
  }

  private List<String> requirements() {
    if (designCase.requirements().isEmpty()) {
      return List.of();
    }
    TextTable table =
        TextTable.of(
            new Column("requirement", Align.LEFT),
            new Column("measure", Align.LEFT),
            new Column("limit", Align.LEFT),
            new Column("moment", Align.LEFT),
            new Column("nominal", Align.DECIMAL));
    for (int i = 0; i < designCase.requirements().size(); i++) {
      Requirement r = designCase.requirements().get(i);
      OptionalDouble nominal = overview.nominalValues().get(i);
      table.row(
          r.name(),
          r.measureText(),
          RequirementWords.limit(r),
          RequirementWords.moment(r),
          nominal.isPresent() ? FormulaText.number(nominal.getAsDouble()) : "-");
    }
    return table.lines(INDENT);
  }
}
