package blochbound.casefile;

import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

/** Faults of parameters, numbers and the ball, each with its place. */
class ParameterFaultTest {
  private static CaseText parameter(String fields) {
    return CaseText.pair()
        .set("parameters", "{g: {" + fields + "}}")
        .set("hamiltonian", "g * X@a")
        .set("jumps", "[]");
  }

  @Test
  void parametersAreChecked() {
    CaseText.pair()
        .set("parameters", "{g: {nominal: 2 /us}, kappa: §5}")
        .hasFaults("expected a parameter as {nominal: ..., tolerance: ...}");
    parameter("nominal: 1 /us, §tol: 5 %")
        .hasFaults(
            "unknown key `tol` in a parameter; allowed: nominal, tolerance, range, distribution,"
                + " sigma, drift");
    parameter("nominal: 1 /us, range: §[0 /us]")
        .hasFaults("a range has two ends, as in [lowest, highest]");
    parameter("nominal: 1 /us, range: §[2 /us, 3 /us]")
        .hasFaults("the range must contain the nominal value 1 /us");
    parameter("nominal: 1 /us, range: §[2 /us, 0 /us]")
        .hasFaults("the ends of the range are in the wrong order");
    parameter("nominal: 1 /us, tolerance: 5 %, range: §[0 /us, 2 /us]")
        .hasFaults("a parameter has either `tolerance` or `range`, not both");
    parameter("nominal: 0 /us, tolerance: §5 %")
        .hasFaults("% of a nominal value of 0 is nothing; give the tolerance with a unit");
    parameter("nominal: 1 /us, tolerance: 5 % §6 %")
        .hasFaults(
            "`6 %` is no number; allowed is a finite decimal such as 0.5 or 2e-3, with a unit where"
                + " it has one");
    parameter("nominal: 1 /us, tolerance: +5 % §+6 %")
        .hasFaults("a tolerance is x %, a quantity, or two sides as in +10 % -5 %");
    parameter("nominal: 1 /us, tolerance: §1 us")
        .hasFaults("the tolerance is a time but the nominal value 1 /us is 1/time");
    parameter("nominal: 0, tolerance: §8 kHz")
        .hasFaults(
            "the tolerance is 1/time but the nominal value 0 is a pure number; write the nominal"
                + " value with its unit, too, as in 0 kHz");
    parameter("nominal: 1 §%").hasFaults("% is allowed in tolerances only");
    parameter("nominal: 1 /us §+2 /us").hasFaults("expected one number with a unit, not several");
    parameter("nominal: §[1]").hasFaults("expected a number with a unit, not a list or a mapping");
    parameter("nominal: '§'")
        .hasFaults(
            "a number is missing; allowed is a finite decimal such as 0.5 or 2e-3, with a unit"
                + " where it has one");
  }

  @Test
  void distributionsAreChecked() {
    parameter("nominal: 1 /us, distribution: §gauss")
        .hasFaults("unknown distribution `gauss`; allowed: uniform, normal, triangular");
    parameter("nominal: 1 /us, distribution: §normal")
        .hasFaults("the distribution normal needs `sigma`, its deviation");
    parameter("nominal: 1 /us, distribution: triangular, sigma: §1 /us")
        .hasFaults("`sigma` belongs to `distribution: normal` only, here it is triangular");
    parameter("nominal: 1 /us, distribution: normal, sigma: §0 /us")
        .hasFaults("sigma must be positive");
    parameter("nominal: 1 /us, distribution: normal, sigma: §1 us")
        .hasFaults("sigma is a time but the nominal value 1 /us is 1/time");
  }

  // [closed form] 1e999999999 and the others lie outside 1e-300 to 1e300
  @ParameterizedTest
  @ValueSource(
      strings = {
        "1e999999999",
        "1e-999999999",
        "1e301",
        "2e300",
        "9e-301",
        "1E99999999999999999999"
      })
  void numbersOutOfRangeAreFaults(String number) {
    String message = "the number " + number + " is out of range; allowed are 0 and 1e-300 to 1e300";
    parameter("nominal: §" + number + " /us").hasFaults(message);
    CaseText.dimensionless().set("hamiltonian", "x * X@a + §" + number).hasFaults(message);
  }

  @ParameterizedTest
  @ValueSource(strings = {"§NaN", "§.inf", "§-Infinity", "§inf", "§~", "1§_000", "1§,5", "§--1"})
  void onlyFiniteDecimalsAreNumbers(String marked) {
    String rest = marked.substring(marked.indexOf('§') + 1);
    CaseText.pair()
        .set("parameters", "\n  g:\n    nominal: " + marked)
        .set("jumps", "[]")
        .hasFaults(
            "`"
                + rest
                + "` is no number; allowed is a finite decimal such as 0.5 or 2e-3, with a unit"
                + " where it has one");
  }

  @Test
  void numbersOfManyDigitsAreFaults() {
    parameter("nominal: §" + "1".repeat(401) + " /us")
        .hasFaults("a number of more than 400 characters");
    parameter("nominal: §1e300 GHz")
        .hasFaults("the quantity is over 1e300 in the time unit of the case");
  }

  @Test
  void ballsAreChecked() {
    ball("{norm: §3}").hasFaults("unknown norm `3`; allowed: inf, 2, 1");
    ball("{norm: §max, radius: §-1}")
        .hasFaults("unknown norm `max`; allowed: inf, 2, 1", "the radius must not be negative");
    ball("{radius: §1 /us}").hasFaults("the radius is a number without a unit");
    ball("§1").hasFaults("expected a ball as {norm: inf, radius: 1}");
    ball("§{radius: 1e300}").hasFaults("the range of a1 reaches over 1e300");
    ball("{§radii: 1}")
        .hasFaults(
            "unknown key `radii` in `ball`; the nearest known is `radius`; allowed: norm, radius,"
                + " correlations");
  }

  private static CaseText ball(String ball) {
    return CaseText.pair()
        .set(
            "parameters",
            "{a1: {nominal: 9 /us, tolerance: 1 MHz}, a2: {nominal: 5 /us, tolerance: 1 %},"
                + " a3: {nominal: 1 /us}, a4: {nominal: 1 /us, tolerance: 1 %}}")
        .set("hamiltonian", "a1 * X@a")
        .set("jumps", "[]")
        .set("ball", ball);
  }

  @Test
  void correlationsAreChecked() {
    ball("{norm: 2, correlations: [{between: [a1, a2], value: §1}]}")
        .hasFaults(
            "a correlation must lie strictly between -1 and 1; parameters that always move together"
                + " are one shared parameter");
    ball("{norm: inf, correlations: §[{between: [a1, a2], value: 0.5}]}")
        .hasFaults("correlations need `norm: 2`, not inf");
    ball("{norm: 2, correlations: [{between: [a1, §a9], value: 0.5}]}")
        .hasFaults(
            "unknown parameter `a9`; the nearest known is `a1`; parameters are a1, a2, a3, a4");
    ball("{norm: 2, correlations: [{between: [a1, §a3], value: 0.5}]}")
        .hasFaults("`a3` has no tolerance, so it cannot be correlated");
    ball("{norm: 2, correlations: [{between: [a1, §a1], value: 0.5}]}")
        .hasFaults("a correlation is between two different parameters");
    ball("{norm: 2, correlations: [{between: §[a1], value: 0.5}]}")
        .hasFaults("a correlation is between two parameters, as in [a, b]");
    ball("{norm: 2, correlations: [{between: [a1, a2], value: 0.5},"
            + " §{between: [a2, a1], value: 0.4}]}")
        .hasFaults("the correlation of these two parameters is given twice");
    // [closed form] the matrix with all off-diagonal entries -0.6 has the eigenvalue 1 - 2 * 0.6
    ball("§{norm: 2, correlations: [{between: [a1, a2], value: -0.6},"
            + " {between: [a2, a4], value: -0.6}, {between: [a1, a4], value: -0.6}]}")
        .hasFaults(
            "the correlations are not positive definite (at a4); parameters that always move"
                + " together are one shared parameter");
  }

  @Test
  void offCentreNominalValuesNeedABox() throws CaseFaultException {
    String message =
        "the nominal value of g is not the middle of its range, which needs `norm: inf`, not ";
    parameter("nominal: 1 /us, tolerance: §+10 % -5 %")
        .set("ball", "{norm: 2}")
        .hasFaults(message + "2");
    parameter("nominal: 1 /us, range: §[0 /us, 3 /us]")
        .set("ball", "{norm: 1}")
        .hasFaults(message + "1");
    parameter("nominal: 1 /us, range: [0 /us, 3 /us]").set("ball", "{norm: inf}").read();
    parameter("nominal: 1 /us, range: [0 /us, 2 /us]").set("ball", "{norm: 1}").read();
  }
}
