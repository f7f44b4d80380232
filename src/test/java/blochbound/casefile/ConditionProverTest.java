package blochbound.casefile;

import org.junit.jupiter.api.Test;

/** Rates, roots and divisors must be defined on the whole ball. */
class ConditionProverTest {
  private static CaseText with(String parameters, String jump) {
    return CaseText.dimensionless()
        .set("parameters", parameters)
        .set("hamiltonian", "X@a")
        .set("jumps", "[" + jump + "]");
  }

  @Test
  void ratesThatBecomeNegativeNameThePoint() {
    // [closed form] 0.5 - 1 = -0.5 at the lower end
    with("{k: {nominal: 0.5, tolerance: 1}}", "{rate: §k, operator: lower@a}")
        .hasFaults(
            "the rate is not proved to stay at or above 0 inside the ball: it is about -0.5000 at"
                + " k = -0.5; narrow the tolerance or move the nominal value");
    // [closed form] 1 - 0.6 - 0.6 = -0.2 at the upper ends
    with(
            "{k: {nominal: 0.5, tolerance: 20 %}, l: {nominal: 0.5, tolerance: 0.1}, m: {nominal:"
                + " 1, tolerance: 0.1}}",
            "{rate: §1 - k - l, operator: lower@a}")
        .hasFaults(
            "the rate is not proved to stay at or above 0 inside the ball: it is about -0.2000 at"
                + " k = 0.6, l = 0.6; narrow the tolerance or move the nominal value");
  }

  @Test
  void unitsAreShownAtThePoint() {
    CaseText.pair()
        .set("parameters", "{g: {nominal: 2 kHz, tolerance: 3 kHz}, kappa: {nominal: 1 /us}}")
        .set("jumps", "[{rate: §g, operator: lower@a}]")
        .hasFaults(
            // [closed form] -1 kHz is -2 pi / 1000 per us, 0.0062832
            "the rate is not proved to stay at or above 0 inside the ball: it is about -0.006283"
                + " (with time in us) at g = -1 kHz; narrow the tolerance or move the nominal"
                + " value");
  }

  @Test
  void ratesMayTouchZero() throws CaseFaultException {
    with("{k: {nominal: 0.1, tolerance: 100 %}}", "{rate: k, operator: lower@a}").read();
    with("{k: {nominal: 0.1, tolerance: 100 %}}", "{rate: 0.2 - k, operator: lower@a}").read();
    with("{k: {nominal: 0.1, tolerance: 100 %}}", "{operator: sqrt(k) * lower@a}").read();
    with("{k: {nominal: 0.1, tolerance: 100 %}}", "{rate: k * (k + 1), operator: lower@a}").read();
  }

  @Test
  void divisorsThatMayVanishNameThePoint() {
    with("{k: {nominal: 1, tolerance: 100 %}}", "{rate: 1 / §k, operator: lower@a}")
        .hasFaults(
            "the divisor is not proved to stay away from 0 inside the ball: it is about 0.000 at"
                + " k = 0; narrow the tolerance or move the nominal value");
    with(
            "{k: {nominal: 1, tolerance: 50 %}, l: {nominal: 1, tolerance: 50 %}}",
            "{operator: lower@a / §(k - l + 1/2)}")
        .hasFaults(
            "the divisor is not proved to stay away from 0 inside the ball: it is about -0.5000 at"
                + " k = 0.5, l = 1.5; narrow the tolerance or move the nominal value");
  }

  @Test
  void rootsOfNegativeNumbersNameThePoint() {
    with("{k: {nominal: 0.1, tolerance: 0.2}}", "{operator: sqrt(§k) * lower@a}")
        .hasFaults(
            "the argument of sqrt is not proved to stay at or above 0 inside the ball: it is about"
                + " -0.1000 at k = -0.1; narrow the tolerance or move the nominal value");
  }

  @Test
  void conditionsOutliveCancellation() {
    // sqrt(k)^2 is k and k/k is 1, yet neither is defined on the whole ball
    with("{k: {nominal: 0.1, tolerance: 0.2}}", "{rate: 1 + sqrt(§k)^2, operator: lower@a}")
        .hasFaults(
            "the argument of sqrt is not proved to stay at or above 0 inside the ball: it is about"
                + " -0.1000 at k = -0.1; narrow the tolerance or move the nominal value");
    with("{k: {nominal: 0.1, tolerance: 0.1}}", "{rate: k / §k, operator: lower@a}")
        .hasFaults(
            "the divisor is not proved to stay away from 0 inside the ball: it is about 0.000 at"
                + " k = 0; narrow the tolerance or move the nominal value");
  }

  @Test
  void theShapeOfTheBallCounts() throws CaseFaultException {
    String parameters = "{k: {nominal: 1, tolerance: 0.8}, l: {nominal: 1, tolerance: 0.8}}";
    String jump = "{rate: k + l - 0.5, operator: lower@a}";
    // [closed form] least value 2 - 0.5 - 1.6 in the box, - 0.8 sqrt(2) in the disc, - 0.8 in the
    // diamond
    with(parameters, jump.replace("k +", "§k +"))
        .hasFaults(
            "the rate is not proved to stay at or above 0 inside the ball: it is about -0.1000 at"
                + " k = 0.2, l = 0.2; narrow the tolerance or move the nominal value");
    with(parameters, jump).set("ball", "{norm: 2}").read();
    with(parameters, jump).set("ball", "{norm: 1}").read();
    with(parameters, jump).set("ball", "{norm: inf, radius: 0.9}").read();
  }

  @Test
  void constantParametersCountAsWell() {
    with("{k: {nominal: -1}}", "{rate: §k, operator: lower@a}")
        .hasFaults(
            "the rate is not proved to stay at or above 0 inside the ball: it is about -1.000 at"
                + " k = -1; narrow the tolerance or move the nominal value");
  }
}
