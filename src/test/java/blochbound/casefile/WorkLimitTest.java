package blochbound.casefile;

import static org.junit.jupiter.api.Assertions.assertEquals;

import blochbound.model.HilbertSpace;
import blochbound.model.Site;
import java.util.List;
import org.junit.jupiter.api.Test;

/** The work on all expressions of a case together is limited. */
class WorkLimitTest {
  private static final String WORK =
      "the expressions of this case take too much work to expand; simplify them";
  private static final String MEMORY =
      "the operators of this case take too much memory; simplify them";

  /** Reads one expression after the other on two levels; returns what the log holds. */
  private static String faults(WorkLimit limit, String... expressions) {
    FaultLog log = new FaultLog();
    Scope scope = new Scope(new UnitTable("none"), log, limit);
    scope.setSites(new HilbertSpace(List.of(new Site("a", List.of("g", "e")))));
    SourceText source = SourceText.of(CaseText.NAME, "");
    for (String expression : expressions) {
      YamlScalar scalar = new YamlScalar(source, 0, 1, 1, YamlScalar.Style.PLAIN, expression);
      log.attempt(() -> new Expressions(scope).value(scalar.passage()));
    }
    return String.join("; ", log.sorted().stream().map(Fault::message).toList());
  }

  @Test
  void matrixProductsAreCharged() {
    // [closed form] a product of 2 by 2 matrices has 8 multiplications of entries
    assertEquals("", faults(new WorkLimit(10_000, 16, 100), "X@a * X@a * X@a"));
    assertEquals(WORK, faults(new WorkLimit(10_000, 16, 100), "X@a * X@a * X@a * X@a"));
    assertEquals(WORK, faults(new WorkLimit(10_000, 16, 100), "X@a * X@a * X@a", "X@a * X@a"));
  }

  @Test
  void matrixSumsAndMultiplesAreCharged() {
    // [closed form] a sum and a multiple of 2 by 2 matrices have 4 operations each
    assertEquals("", faults(new WorkLimit(10_000, 8, 100), "2 * X@a + Z@a"));
    assertEquals(WORK, faults(new WorkLimit(10_000, 8, 100), "2 * X@a + Z@a + Z@a"));
  }

  @Test
  void productsAndSumsOfNumbersAreCharged() {
    // [closed form] a product of two monomials counts 100, a sum of two counts 2
    assertEquals("", faults(new WorkLimit(202, 0, 0), "2 * 3 * 4 + 5"));
    assertEquals(WORK, faults(new WorkLimit(202, 0, 0), "2 * 3 * 4 * 5"));
    assertEquals(WORK, faults(new WorkLimit(202, 0, 0), "2 * 3 * 4 + 5 + 6"));
  }

  @Test
  void theMemoryOfAllExpressionsIsCharged() {
    assertEquals("", faults(new WorkLimit(1000, 1000, 8), "X@a", "Z@a", "5"));
    assertEquals(MEMORY, faults(new WorkLimit(1000, 1000, 8), "X@a", "Z@a", "|g><g|"));
  }
}
