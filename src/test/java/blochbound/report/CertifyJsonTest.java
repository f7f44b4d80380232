package blochbound.report;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import blochbound.model.Requirement.Sense;
import blochbound.model.Unit;
import blochbound.study.CertificationResult;
import blochbound.study.SteadyStateStatus;
import blochbound.study.SteadyStateStatus.Kind;
import blochbound.study.Verdict;
import java.math.BigDecimal;
import java.nio.charset.StandardCharsets;
import java.util.List;
import java.util.Optional;
import org.junit.jupiter.api.Test;

class CertifyJsonTest {
  // [invariant] the values of the hand-made record, keys in the order of the format
  private static final String ONE_REQUIREMENT =
      """
      {
        "format": "blochbound-result/1",
        "case": {
          "title": "Pumped emitter",
          "sha256": "00ff"
        },
        "seed": 1,
        "steadyState": {
          "status": "unique"
        },
        "requirements": [
          {
            "name": "bright",
            "measure": "population(left, e)",
            "sense": "atLeast",
            "limit": 0.90,
            "unit": "",
            "nominal": 0.952747,
            "worstFound": {
              "value": 0.915139,
              "point": {
                "pump": 0.8,
                "decay": 0.03,
                "shift": 0
              },
              "units": {
                "pump": "/us",
                "decay": "/us",
                "shift": "/us"
              },
              "verified": true
            },
            "guaranteed": {
              "value": 0.9142,
              "method": "dual-observable branch and bound",
              "regions": 15,
              "seconds": 0.0234
            },
            "sampled": {
              "count": 20000,
              "worst": 0.915139,
              "mean": 0.952747,
              "acceptance": 1,
              "quantiles": [
                {
                  "probability": 0.01,
                  "value": 0.915139
                },
                {
                  "probability": 0.5,
                  "value": 0.952747
                }
              ]
            },
            "verdict": "certified",
            "remarks": [ ]
          }
        ],
        "verdict": "certified"
      }
      """;

  private static String text(byte[] document) {
    return new String(document, StandardCharsets.UTF_8);
  }

  @Test
  void oneResultIsAnObject() {
    assertEquals(ONE_REQUIREMENT, text(CertifyJson.of(HandMade.certified())));
  }

  @Test
  void severalResultsAreAnArrayOfTheSameObjects() {
    String two =
        text(CertifyJson.ofAll(List.of(HandMade.certified(), HandMade.certified()))).strip();
    String one = ONE_REQUIREMENT.strip().indent(2).stripTrailing();
    assertEquals("[\n" + one + ",\n" + one + "\n]", two);
  }

  @Test
  void missingValuesAreNullAndTheRemarksSayWhy() {
    String json =
        text(
            CertifyJson.of(
                HandMade.result(
                    Verdict.UNDECIDED,
                    HandMade.empty(
                        HandMade.requirement("lost", Sense.AT_MOST, "1e-12", Unit.NONE),
                        "say \"why\""))));
    String expected =
        """
              "sense": "atMost",
              "limit": 1e-12,
              "unit": "",
              "nominal": null,
              "worstFound": null,
              "guaranteed": null,
              "sampled": null,
              "verdict": "undecided",
              "remarks": [
                "say \\"why\\""
              ]
        """;
    assertTrue(json.contains(expected), json);
  }

  @Test
  void infiniteValuesAreNull() {
    String json =
        text(
            CertifyJson.of(
                HandMade.result(
                    Verdict.UNDECIDED,
                    HandMade.full(
                        HandMade.requirement("r", Sense.AT_LEAST, "0.5", Unit.NONE),
                        Double.NEGATIVE_INFINITY,
                        0.75,
                        0.875,
                        Verdict.UNDECIDED))));
    assertTrue(json.contains("\"guaranteed\": {\n        \"value\": null,"), json);
  }

  @Test
  void interruptionAndPointOfSeveralStationaryStatesAreTold() {
    CertificationResult r = HandMade.certified();
    SteadyStateStatus status =
        new SteadyStateStatus(
            Kind.NOT_UNIQUE,
            Optional.of(List.of(BigDecimal.ZERO, new BigDecimal("1E-7"), BigDecimal.TEN)),
            "no rate");
    String json =
        text(
            CertifyJson.of(
                new CertificationResult(
                    r.designCase(), -3, Optional.of(status), List.of(), r.verdict(), true)));
    String expected =
        """
          "seed": -3,
          "steadyState": {
            "status": "notUnique",
            "point": {
              "pump": 0,
              "decay": 1e-7,
              "shift": 10
            },
        """;
    assertTrue(json.contains(expected), json);
    assertTrue(json.contains("\"reason\": \"no rate\""), json);
    assertTrue(json.endsWith("\"verdict\": \"certified\",\n  \"interrupted\": true\n}\n"), json);
  }

  @Test
  void caseWithoutSteadyMeasuresHasNoSteadyState() {
    CertificationResult r = HandMade.certified();
    String json =
        text(
            CertifyJson.of(
                new CertificationResult(
                    r.designCase(), 1, Optional.empty(), List.of(), r.verdict(), false)));
    assertTrue(json.contains("\"steadyState\": null,\n  \"requirements\": [ ],"), json);
  }
}
