package blochbound.casefile;

import java.util.List;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.Arguments;
import org.junit.jupiter.params.provider.FieldSource;

/** Faults of expressions: each text has the sign § in front of the place of its fault. */
class ExpressionFaultTest {
  static final List<Arguments> SYNTAX =
      List.of(
          Arguments.of("g * §(X@a", "the bracket `(` is not closed"),
          Arguments.of(
              "2 §X@a",
              "an operator such as * is missing before `X` (there is no implicit product); unknown unit `X`; units are Hz kHz MHz GHz (cycles), /s /ms /us /ns, rad/s rad/ms rad/us rad/ns, s ms us ns"),
          Arguments.of(
              "3 §khz * Z@a",
              "an operator such as * is missing before `khz` (there is no implicit product); unknown unit `khz`; the nearest known is `kHz`; units are Hz kHz MHz GHz (cycles), /s /ms /us /ns, rad/s rad/ms rad/us rad/ns, s ms us ns"),
          Arguments.of(
              "X@a §X@b",
              "an operator such as * is missing before `X` (there is no implicit product)"),
          Arguments.of(
              "g §(1 + 2)",
              "an operator such as * is missing before `(` (there is no implicit product); functions are sqrt exp sin cos adj"),
          Arguments.of(
              "g §2", "an operator such as * is missing before `2` (there is no implicit product)"),
          Arguments.of(
              "(g) §|e><e|@a",
              "an operator such as * is missing before `|e>` (there is no implicit product)"),
          Arguments.of(
              "g +§", "expected a number, a name, a ket or a bracket, not the end of the text"),
          Arguments.of("g §** 2", "`**` is unknown; a power is written with ^"),
          Arguments.of("§+ g", "expected a number, a name, a ket or a bracket, not `+`"),
          Arguments.of("(§)", "expected a number, a name, a ket or a bracket, not `)`"),
          Arguments.of("g * X@a§)", "the bracket `)` has no opening one"),
          Arguments.of(
              "g §? 2",
              "unexpected `?`; allowed are names, numbers, + - * / ^ ( ) @, kets |a> and bras <a|"),
          Arguments.of("g * |g>§>", "unexpected `>`; a ket is written |a,b>, a transition |a><b|"),
          Arguments.of("§X", "the operator X needs a site, such as X@left"),
          Arguments.of("§sqrt 2", "the function sqrt needs ( ) around its argument"),
          Arguments.of("g * X§@", "`@` needs the name of a site behind it"),
          Arguments.of("g * X§@2", "`@` needs the name of a site behind it"),
          Arguments.of("g§@a", "`@` stands only behind X Y Z lower raise number and |a><b|"),
          Arguments.of(
              "g * adj(X@a)§@a", "`@` stands only behind X Y Z lower raise number and |a><b|"),
          Arguments.of("§us * g", "the unit us must stand directly behind a number, as in 3 kHz"),
          Arguments.of("g / §us", "the unit us must stand directly behind a number, as in 3 kHz"),
          Arguments.of(
              "3 kHz§^2", "a power of a number with a unit needs brackets, such as (3 kHz)^2"),
          Arguments.of(
              "g / §3 /us",
              "`/ 3/us` can be read in two ways; set brackets, such as x / (3 /us) or (x / 3) * 1 /us"),
          Arguments.of(
              "§<g,g|", "a bra stands behind a ket only, as in |a><b|; inner products are unknown"),
          Arguments.of(
              "g * |g,§,g>", "a ket is written |a,b> with labels of letters, digits, _ + -"),
          Arguments.of(
              "g * |g§?e>", "a ket is written |a,b> with labels of letters, digits, _ + -"),
          Arguments.of("g * §|g,g", "a ket is written |a,b> with labels of letters, digits, _ + -"),
          Arguments.of(
              "g * |g><§>", "a bra is written <a,b| with labels of letters, digits, _ + -"),
          Arguments.of("§", "an expression is missing"));

  static final List<Arguments> NAMES =
      List.of(
          Arguments.of("g * §Q", "unknown name `Q`; parameters and operators above are g, kappa"),
          Arguments.of(
              "g * §kapa",
              "unknown name `kapa`; the nearest known is `kappa`; parameters and operators above are g, kappa"),
          Arguments.of(
              "g * §lowerr",
              "unknown name `lowerr`; the nearest known is `lower`; parameters and operators above are g, kappa"),
          Arguments.of("g * §a", "`a` is a site; it stands behind @, as in Z@a"),
          Arguments.of("g * §steady", "`steady` cannot stand here"),
          Arguments.of("g * X@§c", "unknown site `c`; sites are a, b"),
          Arguments.of("g * |§x><e|@a", "the site a has no level `x`; its levels are g, e"),
          Arguments.of(
              "g * |e><§G|@a",
              "the site a has no level `G`; the nearest known is `g`; its levels are g, e"),
          Arguments.of(
              "g * |e,e><e,§ground|", "the site b has no level `ground`; its levels are g, e"),
          Arguments.of("g * §|e,g><e,g|@a", "a transition of one site has one label on each side"),
          Arguments.of(
              "g * |§e><e|",
              "expected one label for each of the sites (a, b), not 1; for one site write |a><b|@site"),
          Arguments.of(
              "g * |§e,e,e><e,e,e|", "expected one label for each of the sites (a, b), not 3"));

  static final List<Arguments> DIMENSIONS =
      List.of(
          Arguments.of(
              "g * X@a + §1",
              "the terms of a sum have different dimensions: 1/time and a pure number"),
          Arguments.of(
              "g + §2 us", "the terms of a sum have different dimensions: 1/time and a time"),
          Arguments.of("§g^2 * X@a", "the Hamiltonian must be 1/time, not time^(-2)"),
          Arguments.of("§X@a", "the Hamiltonian must be 1/time, not a pure number"),
          Arguments.of("g * exp(§g)", "the argument of exp must be a pure number, not 1/time"),
          Arguments.of(
              "g * sin(§1 us) * X@a", "the argument of sin must be a pure number, not a time"),
          Arguments.of(
              "g * sqrt(§sqrt(g))", "the square root of 1/sqrt(time) is no known dimension"),
          Arguments.of(
              "§g * lower@a",
              "the Hamiltonian is not Hermitian in its part with g; add the adjoint, as in a + adj(a)"),
          Arguments.of(
              "§g * X@a + i * 1 kHz",
              "the Hamiltonian is not Hermitian in its constant part; add the adjoint, as in a + adj(a)"),
          Arguments.of(
              "§g^2 / kappa * i * X@a",
              "the Hamiltonian is not Hermitian in its part with g^2 * kappa^-1; add the adjoint, as in a + adj(a)"),
          Arguments.of(
              "§sqrt(g * kappa) * lower@a",
              "the Hamiltonian is not Hermitian in its part with sqrt(g * kappa); add the adjoint, as in a + adj(a)"),
          Arguments.of(
              "§g / (g + kappa) * g * lower@a",
              "the Hamiltonian is not Hermitian in its part with g^2 * 1/(...); add the adjoint, as in a + adj(a)"),
          Arguments.of("§|g,g>", "the Hamiltonian must be an operator, not a state |...>"));

  static final List<Arguments> KINDS =
      List.of(
          Arguments.of("X@a / §X@b", "only numbers can divide, not operators or states"),
          Arguments.of("1 / §0 * X@a", "the divisor is zero or cannot be told from zero"),
          Arguments.of("1 / §(1 - 1) * X@a", "the divisor is zero or cannot be told from zero"),
          Arguments.of("1 / §sin(pi) * X@a", "the divisor is zero or cannot be told from zero"),
          Arguments.of("§0^-1 * X@a", "the divisor is zero or cannot be told from zero"),
          Arguments.of("X@a^§-1", "the exponent of an operator must be 0 or more"),
          Arguments.of("X@a^§0.5", "an exponent must be a whole number; roots are sqrt( )"),
          Arguments.of("x^§x * X@a", "an exponent must be a whole number; roots are sqrt( )"),
          Arguments.of("x^§X@a", "an exponent must be a whole number; roots are sqrt( )"),
          Arguments.of("X@a^§1000000", "an exponent must lie between -64 and 64"),
          Arguments.of("x^§-65 * X@a", "an exponent must lie between -64 and 64"),
          Arguments.of("§exp(X@a)", "exp is for numbers, not for operators or states"),
          Arguments.of("§sqrt(|g,g>)", "sqrt is for numbers, not for operators or states"),
          Arguments.of("§adj(|g,g>)", "adj is for operators; write a transition as |a><b|"),
          Arguments.of("sqrt(§i) * X@a", "the argument of sqrt must be real"),
          Arguments.of("cos(§i) * X@a", "the argument of cos must be real"),
          Arguments.of(
              "sqrt(§-2) * X@a",
              "the square root of a number that is negative or cannot be told from negative"),
          Arguments.of("X@a + §|g,g>", "a state |...> cannot be added to a number or an operator"),
          Arguments.of("|g,g> * §X@a", "a state |...> can be multiplied with numbers only"),
          Arguments.of("§|g,g>^2", "a state |...> has no powers"),
          Arguments.of("§|g,g>", "the operator of a jump must be an operator, not a state |...>"),
          Arguments.of(
              "3 §kHz * X@a", "the unit `kHz` in a case with timeUnit none; leave the unit out"),
          Arguments.of("1e200 * §X@a", "the entries of an operator or a ket exceed 1e100"),
          Arguments.of(
              "1e300 * §1e300 * X@a",
              "a number in the expression leaves the range of 1e-300 to 1e300"));

  @ParameterizedTest
  @FieldSource({"SYNTAX", "NAMES", "DIMENSIONS"})
  void faultsOfHamiltoniansHaveTheirPlace(String marked, String message) {
    CaseText.pair().set("hamiltonian", "\"" + marked + "\"").hasFaults(message);
  }

  @ParameterizedTest
  @FieldSource("KINDS")
  void faultsOfJumpOperatorsHaveTheirPlace(String marked, String message) {
    CaseText.dimensionless().set("jumps", "[{operator: \"" + marked + "\"}]").hasFaults(message);
  }

  @Test
  void theFormsThatFaultsAdviseAreRead() throws CaseFaultException {
    String sum =
        "g * X@a + (3 kHz)^2 * 1 us + g^2 / (3 /us) + (g / 3) * 2 us * 1 /us + (1 + adj(1)) * g"
            + " + 3/us * Z@a + 0.1 1/us + 2 rad / us + |g,e><g,e| * g + |e><e|@b * g";
    CaseText.pair().set("hamiltonian", "\"" + sum + "\"").read();
  }

  @Test
  void standardOperatorsFitTheirSite() {
    CaseText.dimensionless()
        .set("sites", "{a: {levels: 3}, b: {levels: 2}}")
        .set("hamiltonian", "x * §Y@a")
        .hasFaults("Y is for two-level sites, a has 3 levels; use lower, raise, number or |a><b|");
  }

  @Test
  void jumpsHaveTheDimensionOfARate() throws CaseFaultException {
    CaseText.pair().set("jumps", "[{operator: sqrt(kappa) * lower@a}]").read();
    CaseText.pair().set("jumps", "[{rate: 1 / (3 us), operator: lower@a}]").read();
    CaseText.pair().set("jumps", "[{rate: 0.1 /us, operator: 2 * lower@a}]").read();
    CaseText.pair().set("jumps", "[{rate: 0.1 1/us, operator: lower@a}]").read();
    CaseText.pair().set("jumps", "[{rate: 0, operator: lower@a}]").read();
    CaseText.pair()
        .set("jumps", "[{operator: §kappa * lower@a}]")
        .hasFaults(
            "rate x operator^2 must be 1/time, not time^(-2); the rate is a pure number, the"
                + " operator 1/time");
    CaseText.pair()
        .set("jumps", "[{rate: kappa, operator: §sqrt(kappa) * lower@a}]")
        .hasFaults(
            "rate x operator^2 must be 1/time, not time^(-2); the rate is 1/time, the operator"
                + " 1/sqrt(time)");
    CaseText.pair()
        .set("jumps", "[{operator: §lower@a}]")
        .hasFaults(
            "rate x operator^2 must be 1/time, not a pure number; the rate is a pure number, the"
                + " operator a pure number");
  }

  @Test
  void ratesAreRealAndNotNegative() {
    CaseText.pair()
        .set("jumps", "[{rate: §-1 /us, operator: lower@a}]")
        .hasFaults("the rate is negative or cannot be told from negative; it must be 0 or more");
    CaseText.pair()
        .set("jumps", "[{rate: §i * kappa, operator: lower@a}, {rate: §X@a, operator: lower@a}]")
        .hasFaults(
            "the rate must be a real number, not an operator or a state",
            "the rate must be a real number, not an operator or a state");
  }

  @Test
  void namedOperatorsMayOnlyUseThoseAboveThem() {
    CaseText.dimensionless()
        .set("operators", "{one: §two, two: X@a, three: §three * two}")
        .hasFaults(
            "unknown name `two`; parameters and operators above are x, y",
            "unknown name `three`; parameters and operators above are x, y, one, two");
    CaseText.dimensionless()
        .set("operators", "{one: '§|g,g>', §two: }")
        .hasFaults(
            "a state |...> cannot be a named operator",
            "the operator needs an expression or {file: ...}");
  }

  @Test
  void whatFollowsFromAnotherFaultIsNotReported() {
    CaseText.pair()
        .set("operators", "{o: §Q}")
        .set("hamiltonian", "o + o")
        .set("jumps", "[{rate: kappa, operator: o * lower@a}]")
        .hasFaults("unknown name `Q`; parameters and operators above are g," + " kappa");
    CaseText.pair()
        .set("parameters", "{g: {nominal: §x}, kappa: {nominal: 1 /us}}")
        .hasFaults(
            "`x` is no number; allowed is a finite decimal such as 0.5 or 2e-3, with a unit where"
                + " it has one");
    CaseText.pair()
        .set("sites", "{a: {levels: §x}}")
        .set("hamiltonian", "g * X@a * Q")
        .hasFaults("`x` is neither a list of labels such as [g, e], or a number of levels");
  }
}
