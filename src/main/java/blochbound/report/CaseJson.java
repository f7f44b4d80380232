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
import java.io.IOException;
import java.util.List;
import java.util.stream.IntStream;

/**
 * A case as the program understands it, for programs: format {@code blochbound-show/1}, in UTF-8.
 *
 * <p>Numbers are written as in {@link CertifyJson}; formulas and operators are the texts of {@link
 * CaseText}.
 */
public final class CaseJson {
  private static final String FORMAT = "blochbound-show/1";

  private final CaseOverview overview;
  private final Device device;
  private final FormulaText formulas;
  private final OperatorText operators;

  private CaseJson(CaseOverview overview) {
    this.overview = overview;
    device = overview.designCase().device();
    formulas = new FormulaText(device.parameters());
    operators = new OperatorText(device.space(), formulas);
  }

  /** The document. */
  public static byte[] of(CaseOverview overview) {
    return JsonFields.document(json -> json.object(new CaseJson(overview)::write));
  }

  private void write(JsonFields json) throws IOException {
    DesignCase designCase = overview.designCase();
    json.text("format", FORMAT);
    json.object("case", fields -> fields.identity(designCase));
    json.text("timeUnit", designCase.timeUnit());
    json.integer("levels", device.space().dimension());
    json.integer("unknowns", overview.generator().unknowns());
    json.array("sites", device.space().sites(), CaseJson::site);
    json.object("ball", this::ball);
    json.array("parameters", device.parameters(), this::parameter);
    json.strings("hamiltonian", operators.terms(device.hamiltonian()));
    json.array("jumps", device.jumps(), this::jump);
    json.array("generator", overview.generator().terms(), this::term);
    json.text("target", designCase.target().map(operators::state));
    json.object("steadyState", overview.steadyState(), this::steadyState);
    List<Integer> positions = IntStream.range(0, designCase.requirements().size()).boxed().toList();
    json.array("requirements", positions, this::requirement);
  }

  private static void site(JsonFields json, Site site) throws IOException {
    json.text("name", site.name());
    json.strings("levels", site.levels());
  }

  private void ball(JsonFields json) throws IOException {
    json.text("norm", device.ball().norm().text());
    json.decimal("radius", device.ball().radius());
    json.array(
        "correlations",
        device.ball().correlations(),
        (fields, correlation) -> {
          fields.strings(
              "between",
              List.of(
                  device.parameters().get(correlation.first()).name(),
                  device.parameters().get(correlation.second()).name()));
          fields.decimal("value", correlation.value());
        });
  }

  private void parameter(JsonFields json, Parameter parameter) throws IOException {
    ParameterText text = ParameterText.of(parameter, device.ball());
    json.text("name", parameter.name());
    json.text("unit", parameter.unit().symbol());
    json.decimal("nominal", parameter.nominal());
    json.decimal("lower", text.lower());
    json.decimal("upper", text.upper());
    json.text("distribution", text.distribution());
  }

  private void jump(JsonFields json, Jump jump) throws IOException {
    json.text("rate", formulas.scalar(jump.rate()));
    json.strings("operator", operators.terms(jump.operator()));
  }

  private void term(JsonFields json, GeneratorTerm term) throws IOException {
    json.text("coefficient", formulas.monomial(term.monomial()));
    json.integer("nonzeros", term.matrix().entries());
    json.real("frobeniusNorm", term.matrix().frobeniusUp());
    json.real("errorAtMost", term.radius());
  }

  private void steadyState(JsonFields json, SteadyState state) throws IOException {
    json.real("purity", state.purity());
    json.array("populations", state.populations(), this::population);
  }

  private void population(JsonFields json, Population population) throws IOException {
    json.text("levels", operators.label(population.index()));
    json.real("value", population.probability());
  }

  private void requirement(JsonFields json, int position) throws IOException {
    Requirement requirement = overview.designCase().requirements().get(position);
    json.demand(requirement);
    json.text("moment", RequirementWords.moment(requirement));
    json.real("nominal", overview.nominalValues().get(position).orElse(Double.NaN));
  }
}
