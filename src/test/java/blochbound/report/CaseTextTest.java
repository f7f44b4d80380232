package blochbound.report;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import blochbound.interval.ExactNumber;
import blochbound.model.Ball;
import blochbound.model.DesignCase;
import blochbound.model.Device;
import blochbound.model.MeasureSpec;
import blochbound.model.Requirement;
import blochbound.model.Requirement.Sense;
import blochbound.model.Unit;
import blochbound.model.When;
import java.math.BigDecimal;
import java.nio.charset.StandardCharsets;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;
import org.apache.commons.math3.fraction.BigFraction;
import org.junit.jupiter.api.Test;

class CaseTextTest {
  private static final Unit THIRD = new Unit("third", new ExactNumber(new BigFraction(1, 3), 0), 0);

  private static Requirement gap() {
    return new Requirement(
        "quick",
        "gap",
        new MeasureSpec.Gap(),
        Sense.AT_LEAST,
        new BigDecimal("0.3"),
        HandMade.PER_MICROSECOND,
        new When.Steady(),
        Optional.empty());
  }

  private static Requirement later() {
    return new Requirement(
        "later",
        "purity",
        new MeasureSpec.Purity(),
        Sense.AT_LEAST,
        new BigDecimal("0.3"),
        Unit.NONE,
        new When.During(BigDecimal.ONE, HandMade.MICROSECOND, BigDecimal.TEN, HandMade.MICROSECOND),
        Optional.empty());
  }

  private static DesignCase designCase(Device device, Requirement... requirements) {
    return new DesignCase(
        "Pumped emitter", "us", device, Optional.empty(), List.of(requirements), "00ff");
  }

  private static DesignCase designCase() {
    return designCase(
        HandMade.emitter(),
        HandMade.requirement("bright", Sense.AT_LEAST, "0.90", Unit.NONE),
        HandMade.requirement("thirds", Sense.AT_MOST, "3", THIRD),
        gap(),
        later());
  }

  @Test
  void modelAndNominalValuesAreTold() {
    String text = CaseText.of(CaseOverview.of(designCase()));
    // [closed form] rate equations: upper level 1/1.02 = 0.980392, purity (1 + 0.02^2)/1.02^2
    String expected =
        """
        hamiltonian in rad/us
          shift * |e><e|

        jumps, rates in 1/us
          rate   operator
          -----  --------
          pump   |e><g|
          decay  |g><e|
        """;
    assertTrue(text.contains(expected), text);
    assertTrue(
        text.contains(
            """
            steady state of the nominal device
              purity 0.961553; populations |e> 0.980392, |g> 0.0196078

            requirements
              requirement  measure              limit       moment                            nominal
              -----------  -------------------  ----------  -------------------------------  --------
              bright       population(left, e)  >= 0.90     in every steady state            0.980392
              thirds       population(left, e)  <= 3 third  in every steady state            2.94118
              quick        gap                  >= 0.3 /us  in every device                  -
              later        purity               >= 0.3      at all times from 1 us to 10 us  -
            """),
        text);
  }

  @Test
  void rangesAreThoseAtTheRadiusOfTheBall() {
    Device device = HandMade.emitter();
    Device half =
        new Device(
            device.space(),
            device.parameters(),
            new Ball(Ball.Norm.BOX, new BigDecimal("0.5"), List.of()),
            device.hamiltonian(),
            device.jumps());
    String text = CaseText.of(CaseOverview.of(designCase(half)));
    // [closed form] half of +-0.2 about 1 and of +-0.01 about 0.02
    String expected =
        """
        3 parameters, ball of norm inf and radius 0.5
          parameter  nominal   from     to  unit  of nominal  distribution
          ---------  -------  -----  -----  ----  ----------  ------------
          pump          1.0   0.9    1.1    /us   +-10 %      uniform
          decay         0.02  0.015  0.025  /us   +-25 %      uniform
          shift         0     0      0      /us   constant    -
        """;
    assertTrue(text.contains(expected), text);
  }

  @Test
  void deviceWithoutUniqueSteadyStateHasNoNominalValue() {
    Device still =
        HandMade.emitter(
            HandMade.parameter("pump", "0", "0", "1"),
            HandMade.parameter("decay", "0", "0", "1"),
            HandMade.parameter("shift", "0", "0", "0"));
    CaseOverview overview =
        CaseOverview.of(
            designCase(still, HandMade.requirement("bright", Sense.AT_LEAST, "0.9", Unit.NONE)));
    assertEquals(List.of(OptionalDouble.empty()), overview.nominalValues());
    assertTrue(CaseText.of(overview).contains("  not unique to rounding\n"));
  }

  @Test
  void jsonHasTheSameFacts() {
    String json = new String(CaseJson.of(CaseOverview.of(designCase())), StandardCharsets.UTF_8);
    assertTrue(json.startsWith("{\n  \"format\": \"blochbound-show/1\",\n  \"case\": {"), json);
    // [closed form] N = 2 has N^2 - 1 = 3 unknowns
    assertTrue(json.contains("\"levels\": 2,\n  \"unknowns\": 3,"), json);
    assertTrue(
        json.contains("\"rate\": \"pump\",\n      \"operator\": [\n        \"|e><g|\""), json);
    assertTrue(json.contains("\"target\": null"), json);
    assertTrue(json.contains("\"moment\": \"in every device\",\n      \"nominal\": null"), json);
  }

  @Test
  void everyLineFitsAHundredColumns() {
    String name = "n".repeat(120);
    Device device =
        HandMade.emitter(
            HandMade.parameter(name, "1.0", "0.8", "1.2"),
            HandMade.parameter("m" + name, "0.02", "0.01", "0.03000000000000000000000000001"),
            HandMade.parameter("k" + name, "0", "0", "0"));
    String text = CaseText.of(CaseOverview.of(designCase(device, gap(), later())));
    text.lines().forEach(line -> assertTrue(line.length() <= 100, line));
  }
}
