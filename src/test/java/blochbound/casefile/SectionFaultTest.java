package blochbound.casefile;

import static org.junit.jupiter.api.Assertions.assertEquals;

import blochbound.casefile.CaseReader.RequirementRule;
import java.nio.file.Path;
import java.util.stream.Collectors;
import java.util.stream.IntStream;
import org.junit.jupiter.api.Assertions;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

/** Faults of the case's sections other than expressions. */
class SectionFaultTest {
  private static final String KEYS =
      "; allowed: format, title, timeUnit, sites, parameters, operators, hamiltonian, jumps,"
          + " target, ball, requirements, sequence, generator, unmodelled";
  private static final String BAD_NAME =
      "` is no name; a name is a letter, then letters, digits and _, at most 64";

  private static CaseText parameter(String fields) {
    return CaseText.pair()
        .set("parameters", "{g: {" + fields + "}}")
        .set("hamiltonian", "g * X@a")
        .set("jumps", "[]");
  }

  @Test
  void allFaultsOfAPassAreReportedTogether() {
    CaseText.textHasFaults(
        """
        format: §blochbound-case/2
        timeUnit: §uss
        sites: {a: {levels: [g, §g]}, b: {levels: §65}}
        parameters: {k: {nominal: 1 §/uss}, l: {nominal: 1 /us, tolerance: §-5 %}}
        §hamiltonain: "k * X@a"
        jumps: [{rate: k, §opertor: lower@a}, §{rate: l}]
        """,
        "unknown format `blochbound-case/2`; this version reads blochbound-case/1",
        "unknown time unit `uss`; the nearest known is `us`; allowed: s, ms, us, ns, none",
        "the level label `g` occurs twice",
        "a site has 1 to 64 levels, not 65",
        "unknown unit `/uss`; the nearest known is `/us`; units are Hz kHz MHz GHz (cycles), /s /ms"
            + " /us /ns, rad/s rad/ms rad/us rad/ns, s ms us ns",
        "a tolerance must not be negative; write 5 %, or +0 % -5 %",
        "unknown key `hamiltonain` in the case; the nearest known is `hamiltonian`" + KEYS,
        "unknown key `opertor` in a jump; the nearest known is `operator`; allowed: rate, operator",
        "`operator` is missing in a jump");
  }

  @Test
  void missingSectionsAreNamed() {
    assertEquals(
        "pair.yaml:1:1: `format` is missing in the case\n",
        CaseText.faults(CaseText.pair().without("format").text()));
    assertEquals(
        "pair.yaml:1:1: `timeUnit` is missing in the case\n",
        CaseText.faults(CaseText.pair().without("timeUnit").text()));
    assertEquals(
        "pair.yaml:1:1: `sites` is missing in the case\n",
        CaseText.faults(CaseText.pair().without("sites").text()));
    assertEquals(
        "pair.yaml:1:1: the device has no dynamics; add `hamiltonian` or `jumps`, or both\n",
        CaseText.faults(CaseText.pair().without("hamiltonian").without("jumps").text()));
  }

  @Test
  void keysWithoutValuesAreFaults() {
    CaseText.textHasFaults(
        CaseText.pair().set("§ball", "").set("§target", "").text(),
        "`ball` has no value",
        "`target` has no value");
    parameter("§nominal: , tolerance: 1 %").hasFaults("`nominal` has no value");
  }

  @Test
  void casesWithoutRequirementsAreReadOrRefusedAsAsked() throws CaseFaultException {
    assertEquals(0, CaseText.pair().read().requirements().size());
    CaseFaultException e =
        Assertions.assertThrows(
            CaseFaultException.class,
            () ->
                CaseReader.read(
                    CaseText.pair().text(), CaseText.NAME, Path.of("."), RequirementRule.REQUIRED));
    assertEquals(
        "pair.yaml:1:1: there is no requirement; add `requirements` to certify", e.getMessage());
  }

  @Test
  void partsOfTheFormatThatAreNotHandledAreRefused() {
    CaseText.pair()
        .set("sequence", "§[{for: 40 ns}]")
        .set("unmodelled", "§{hamiltonian: 2 kHz}")
        .hasFaults(notYet("sequence"), notYet("unmodelled"));
    CaseText.textHasFaults(
        "format: blochbound-case/1\ntimeUnit: us\ngenerator: §{nominal: A0.mtx}\n",
        notYet("generator"));
    parameter("nominal: 1 /us, drift: §fast").hasFaults(notYet("drift"));
    CaseText.pair()
        .requirement("measure: §functional(w.mtx), atLeast: 1")
        .hasFaults(notYet("functional"));
  }

  private static String notYet(String key) {
    return "this version does not handle `" + key + "` yet; remove it to study the case without it";
  }

  @Test
  void sitesAreChecked() {
    String shape = "a list of labels such as [g, e], or a number of levels";
    sites("§{}").hasFaults("there is no site; a device needs at least one");
    sites("§left").hasFaults("expected sites as a mapping, such as left: {levels: [g, e]}");
    sites("{§a: }").hasFaults("a site needs {levels: " + shape + "}");
    sites("{a: §[g, e]}").hasFaults("expected a site as {levels: " + shape + "}");
    sites("{a: §{}}").hasFaults("`levels` is missing in a site");
    sites("{a: {levels: §two}}").hasFaults("`two` is neither " + shape);
    sites("{a: {levels: §0}}").hasFaults("a site has 1 to 64 levels, not 0");
    sites("{a: {levels: §[]}}").hasFaults("a site has 1 to 64 levels, not 0");
    sites("{a: {levels: [g, §'e f', §[x]]}}")
        .hasFaults(
            "`e f` is no level label; labels hold letters, digits, _ + -, at most 64",
            "expected a level label, not a list or a mapping");
    sites("§{a: {levels: 8}, b: {levels: 9}}")
        .hasFaults("the sites have 72 levels together; this version handles up to 64");
  }

  private static CaseText sites(String sites) {
    return CaseText.pair().set("sites", sites).set("hamiltonian", "g").set("jumps", "[]");
  }

  @Test
  void namesShareOneNameSpace() {
    CaseText.pair()
        .set("sites", "{a: {levels: 2}, b: {levels: 2}}")
        .set("parameters", "{g: {nominal: 2 /us}, kappa: {nominal: 1 /us}, §a: {nominal: 1}}")
        .set("operators", "{§g: X@a, h: X@a}")
        .hasFaults(
            "the name `a` is already taken at line 3, column 9; parameters, sites and operators"
                + " share one name space",
            "the name `g` is already taken at line 4, column 14; parameters, sites and operators"
                + " share one name space");
  }

  @ParameterizedTest
  @ValueSource(
      strings = {
        "i", "pi", "sqrt", "exp", "sin", "cos", "adj", "X", "Y", "Z", "lower", "raise", "number",
        "steady", "end", "any", "Hz", "kHz", "MHz", "GHz", "s", "ms", "us", "ns", "rad"
      })
  void reservedWordsAreNoNames(String word) {
    CaseText.pair()
        .set("operators", "{§" + word + ": X@a}")
        .hasFaults("`" + word + "` is a reserved word; choose another name");
  }

  @Test
  void namesAreLettersDigitsAndUnderscores() {
    CaseText.pair()
        .set("operators", "{§1a: X@a, §a-b: X@a, §_c: X@a, §ä: X@a, ok_1: X@a}")
        .hasFaults("`1a" + BAD_NAME, "`a-b" + BAD_NAME, "`_c" + BAD_NAME, "`ä" + BAD_NAME);
  }

  @Test
  void countsAreLimited() {
    String many =
        IntStream.range(0, 65)
            .mapToObj(k -> (k == 64 ? "§" : "") + "p" + k + ": {nominal: 1}")
            .collect(Collectors.joining(", ", "{", "}"));
    CaseText.dimensionless()
        .set("parameters", many)
        .set("hamiltonian", "X@a")
        .set("jumps", "[]")
        .hasFaults("there are 65 parameters; this version handles up to 64");
    String jump = "{operator: X@a}";
    CaseText.dimensionless()
        .set("jumps", "[" + (jump + ", ").repeat(1024) + "§" + jump + "]")
        .hasFaults("there are 1025 jumps; this version handles up to 1024");
    String requirement = "{name: r, measure: purity, atLeast: 0}";
    CaseText.dimensionless()
        .set("requirements", "[" + (requirement + ", ").repeat(256) + "§" + requirement + "]")
        .hasFaults("there are 257 requirements; this version handles up to 256");
  }
}
