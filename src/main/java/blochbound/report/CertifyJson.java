package blochbound.report;

import blochbound.model.Parameter;
import blochbound.study.CertificationResult;
import blochbound.study.FoundPoint;
import blochbound.study.Guarantee;
import blochbound.study.RequirementResult;
import blochbound.study.SampledTruth;
import blochbound.study.SteadyStateStatus;
import java.io.IOException;
import java.math.BigDecimal;
import java.util.List;

/**
 * The machine result of a certification, format {@code blochbound-result/1}, in UTF-8.
 *
 * <p>Numbers are never rounded: limits and points are the decimals themselves, other values the
 * shortest decimals that read back as the same double. A missing value is null, and the remarks say
 * why. Points are in the parameters' own units, which stand beside them under {@code units}.
 */
public final class CertifyJson {
  private static final String FORMAT = "blochbound-result/1";

  private CertifyJson() {}

  /** The document of one result. */
  public static byte[] of(CertificationResult result) {
    return JsonFields.document(json -> json.object(fields -> result(fields, result)));
  }

  /** The document of several results: an array of what {@link #of} writes. */
  public static byte[] ofAll(List<CertificationResult> results) {
    return JsonFields.document(json -> json.array(results, CertifyJson::result));
  }

  private static void result(JsonFields json, CertificationResult result) throws IOException {
    List<Parameter> parameters = result.designCase().device().parameters();
    json.text("format", FORMAT);
    json.object("case", fields -> fields.identity(result.designCase()));
    json.integer("seed", result.seed());
    json.object(
        "steadyState",
        result.status(),
        (fields, status) -> steadyState(fields, parameters, status));
    json.array(
        "requirements",
        result.requirements(),
        (fields, requirement) -> requirement(fields, parameters, requirement));
    json.text("verdict", result.verdict().key());
    if (result.interrupted()) {
      json.truth("interrupted", true);
    }
  }

  private static void steadyState(
      JsonFields json, List<Parameter> parameters, SteadyStateStatus status) throws IOException {
    json.text("status", status.kind().key());
    if (status.point().isPresent()) {
      point(json, parameters, status.point().get());
    }
    if (!status.reason().isEmpty()) {
      json.text("reason", status.reason());
    }
  }

  private static void requirement(
      JsonFields json, List<Parameter> parameters, RequirementResult result) throws IOException {
    json.demand(result.requirement());
    json.real("nominal", result.nominal().orElse(Double.NaN));
    json.object(
        "worstFound", result.worstFound(), (fields, found) -> found(fields, parameters, found));
    json.object("guaranteed", result.guaranteed(), CertifyJson::guaranteed);
    json.object("sampled", result.sampled(), CertifyJson::sampled);
    json.text("verdict", result.verdict().key());
    json.strings("remarks", result.remarks());
  }

  private static void found(JsonFields json, List<Parameter> parameters, FoundPoint found)
      throws IOException {
    json.real("value", found.value());
    point(json, parameters, found.point());
    json.truth("verified", found.verified());
  }

  private static void point(JsonFields json, List<Parameter> parameters, List<BigDecimal> point)
      throws IOException {
    json.object(
        "point",
        fields -> {
          for (int i = 0; i < parameters.size(); i++) {
            fields.decimal(parameters.get(i).name(), point.get(i));
          }
        });
    json.object(
        "units",
        fields -> {
          for (Parameter p : parameters) {
            fields.text(p.name(), p.unit().symbol());
          }
        });
  }

  private static void guaranteed(JsonFields json, Guarantee guarantee) throws IOException {
    json.real("value", guarantee.value());
    json.text("method", guarantee.method());
    json.integer("regions", guarantee.regions());
    json.real("seconds", guarantee.seconds());
  }

  private static void sampled(JsonFields json, SampledTruth sampled) throws IOException {
    json.integer("count", sampled.count());
    json.real("worst", sampled.worst());
    json.real("mean", sampled.mean());
    json.real("acceptance", sampled.acceptance());
    json.array(
        "quantiles",
        sampled.quantiles(),
        (fields, quantile) -> {
          fields.real("probability", quantile.probability());
          fields.real("value", quantile.value());
        });
  }
}
