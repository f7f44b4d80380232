package blochbound.casefile;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.SplittableRandom;
import java.util.stream.Collectors;
import java.util.stream.IntStream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

/** Input that is made to exhaust the stack, the memory or the patience of a reader. */
class HostileInputTest {
  private static final String DEEP = "nested more than 200 levels deep";

  private static void hamiltonian(String marked, String message) {
    CaseText.dimensionless().set("hamiltonian", "\"" + marked + "\"").hasFaults(message);
  }

  @Test
  void bracketsPowersAndFunctionsAreLimitedInDepth() throws CaseFaultException {
    hamiltonian("(".repeat(200) + "§(" + "(".repeat(15_000), DEEP);
    hamiltonian("exp(".repeat(200) + "exp§(1", DEEP);
    hamiltonian("1^".repeat(200) + "1§^1", DEEP);
    String nested = "(".repeat(200) + "x" + ")".repeat(200);
    CaseText.dimensionless().set("hamiltonian", nested).read();
    CaseText.dimensionless().set("hamiltonian", "-".repeat(19_000) + "x").read();
    CaseText.dimensionless().set("hamiltonian", "0" + "+x".repeat(9_000)).read();
  }

  @Test
  void expressionsAreLimitedInLength() {
    hamiltonian(
        "§" + "x + ".repeat(5000) + "x",
        "an expression of more than 20000 characters; split it with named operators");
  }

  @Test
  void productsAreLimitedInMonomials() {
    String sum = names("p", 64, " + ");
    String text =
        CaseText.dimensionless()
            .set("parameters", "{" + names("p", 64, ": {nominal: 1}, ") + ": {nominal: 1}}")
            .set("hamiltonian", "(" + sum + ") * (" + sum + ") * (" + sum + ")")
            .set("jumps", "[]")
            .text();
    Fault fault = CaseText.faultList(text).get(0);
    assertEquals("the product has over 10000 monomials, which is the limit", fault.message());
    assertEquals(5, fault.line());
  }

  private static String names(String prefix, int count, String joint) {
    return IntStream.range(0, count).mapToObj(k -> prefix + k).collect(Collectors.joining(joint));
  }

  @Test
  void namedNumbersCannotGrowWithoutLimit() {
    String doubling =
        "{a0: x, "
            + IntStream.range(1, 60)
                .mapToObj(k -> "a" + k + ": exp(a" + (k - 1) + " * x + a" + (k - 1) + ")")
                .collect(Collectors.joining(", "))
            + "}";
    String faults = CaseText.faults(CaseText.dimensionless().set("operators", doubling).text());
    assertTrue(faults.contains("too large when written out; simplify it"), faults);
    assertEquals(1, faults.lines().count(), "what follows is not reported");
  }

  @Test
  void powersOfPowersStayInRange() {
    hamiltonian(
        "((§1e300^64)^64)^64 * X@a",
        "a number in the expression leaves the range of 1e-300 to 1e300");
    hamiltonian(
        "(((§1e-300^64)^64)^64)^64 * X@a",
        "a number in the expression leaves the range of 1e-300 to 1e300");
    hamiltonian(
        "((§(x^64)^64)^64)^64 * X@a", "a parameter reaches a power over 1000, which is the limit");
    CaseText.pair()
        .set("hamiltonian", "(§((1 us)^64)^64)^64 * X@a")
        .hasFaults("a power of time over 1000, which is the limit");
  }

  @Test
  void sumsOfAwkwardFractionsStayShort() {
    String sum =
        IntStream.range(0, 1500)
            .mapToObj(k -> "1/" + (10007 + 2 * k))
            .collect(Collectors.joining("+"));
    String faults = CaseText.faults(CaseText.dimensionless().set("hamiltonian", sum).text());
    assertTrue(faults.contains("leaves the range"), faults);
  }

  @Test
  void manyFaultsAreCut() {
    String many =
        IntStream.range(0, 1000).mapToObj(k -> "k" + k + ": 1").collect(Collectors.joining("\n"));
    var faults = CaseText.faultList(many);
    assertEquals(FaultLog.MOST_FAULTS + 1, faults.size());
    assertEquals(
        "there are more than 200 faults; the rest is not listed",
        faults.get(FaultLog.MOST_FAULTS).message());
  }

  @Test
  void longMessagesAreCut() {
    String faults = CaseText.faults("§: x\n".replace("§", "k".repeat(1000)) + "a: b\n");
    assertTrue(faults.lines().allMatch(l -> l.length() < 1100), faults);
  }

  @ParameterizedTest(name = "seed {0}")
  @ValueSource(longs = {11, 12, 13, 14})
  void damagedFilesAreReadOrHaveFaultsButNeverFail(long seed) {
    SplittableRandom random = new SplittableRandom(seed);
    String alphabet = "{}[]()|<>@*&!%?-+:,#\"'`\\/^ \n\tgeX1.0iéu";
    for (int draw = 0; draw < 150; draw++) {
      StringBuilder text = new StringBuilder(SampleCaseTest.TEXT);
      for (int change = random.nextInt(1, 6); change > 0; change--) {
        int at = random.nextInt(text.length());
        char c = alphabet.charAt(random.nextInt(alphabet.length()));
        switch (random.nextInt(3)) {
          case 0 -> text.setCharAt(at, c);
          case 1 -> text.insert(at, c);
          default -> text.delete(at, Math.min(text.length(), at + random.nextInt(1, 20)));
        }
      }
      try {
        assertEquals(64, CaseText.read(text.toString()).sha256().length());
      } catch (CaseFaultException e) {
        for (Fault fault : e.faults()) {
          assertTrue(fault.line() >= 1 && fault.column() >= 1, fault::toString);
          assertTrue(fault.line() <= text.toString().lines().count() + 1, fault::toString);
        }
      }
    }
  }
}
