package blochbound.generator;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import blochbound.TestCases;
import blochbound.model.Device;
import blochbound.model.Monomial;
import java.util.List;
import java.util.SplittableRandom;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

class CommonDenominatorTest {
  private static Device device(String hamiltonian, String first, String second) {
    return TestCases.device(
        "sites: {q: {levels: [g, e]}}",
        "parameters:",
        "  a: {nominal: 1.5, tolerance: 0.4}",
        "  b: {nominal: 0.7, tolerance: 0.2}",
        "  c: {nominal: -1.3, tolerance: 0.25}",
        "  d: {nominal: 2, tolerance: 0.5}",
        "hamiltonian: \"" + hamiltonian + "\"",
        "jumps:",
        "  - {rate: \"" + first + "\", operator: lower@q}",
        "  - {rate: \"" + second + "\", operator: Z@q}");
  }

  private static List<Monomial> monomials(BlochGenerator generator) {
    return generator.terms().stream().map(GeneratorTerm::monomial).toList();
  }

  private static boolean isPolynomial(BlochGenerator generator) {
    return generator.terms().stream()
        .map(GeneratorTerm::monomial)
        .allMatch(m -> m.isOne() || m.isPolynomial());
  }

  private static void hasTheSameStationaryStates(Device device) {
    BlochGenerator asWritten = BlochGenerator.of(device);
    BlochGenerator cleared = BlochGenerator.stationary(device);
    SteadyStateSolver first = new SteadyStateSolver(asWritten);
    SteadyStateSolver second = new SteadyStateSolver(cleared);
    SplittableRandom random = new SplittableRandom(8);
    for (int k = 0; k < 10; k++) {
      double[] z = random.doubles(asWritten.space().coordinates(), -1, 1).toArray();
      assertTrue(first.solve(asWritten.space().parametersAt(z)));
      assertTrue(second.solve(cleared.space().parametersAt(z)));
      // [invariant] q L has the stationary states of L for any q > 0
      assertArrayEquals(first.state(), second.state(), 1e-13);
    }
  }

  @ParameterizedTest
  @CsvSource({
    "0.3*X@q, 1/a, b",
    "0.3*X@q, 4*b^2/a, 0.1",
    "0.3*X@q, 1/(a+b), b",
    "0.3*X@q, -1/c, b",
    "X@q/(a+d), 1/(2+c), 0.2",
    "X@q/a^2, 1/a, 0.2",
    "X@q/c, b, 0.3/a",
    "X@q, 1/(a+b), 1/(a+b)^2",
    "X@q, 1/a + 1/b, 0.1",
  })
  void rationalCoefficientsBecomePolynomials(String hamiltonian, String first, String second) {
    Device device = device(hamiltonian, first, second);
    assertFalse(isPolynomial(BlochGenerator.of(device)));
    assertTrue(isPolynomial(BlochGenerator.stationary(device)));
    hasTheSameStationaryStates(device);
  }

  @ParameterizedTest
  @CsvSource({
    "X@q/d, 1/a, 1/(b*d)^2",
    "X@q/(a+1/b), 1/a, b",
    "exp(b)*X@q/a, 1/a, b",
    "sqrt(b)*X@q, 1/a, b",
  })
  void whatWouldNotBecomeAnEasyPolynomialStaysAsWritten(String h, String first, String second) {
    Device device = device(h, first, second);
    BlochGenerator cleared = BlochGenerator.stationary(device);
    assertEquals(monomials(BlochGenerator.of(device)), monomials(cleared));
    hasTheSameStationaryStates(device);
  }

  @Test
  void polynomialsStayAsTheyAre() {
    Device device = device("a*X@q + b^2*Z@q", "a", "b*d");
    assertEquals(
        monomials(BlochGenerator.of(device)), monomials(BlochGenerator.stationary(device)));
  }
}
