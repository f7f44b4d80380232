package blochbound.bound;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertInstanceOf;

import blochbound.RandomDevices;
import blochbound.TestCases;
import blochbound.bound.UniquenessProof.Outcome;
import blochbound.generator.BlochGenerator;
import blochbound.linalg.ComplexMatrix;
import blochbound.model.Ball;
import blochbound.model.Device;
import blochbound.model.Distribution;
import blochbound.model.Jump;
import blochbound.model.OperatorForm;
import blochbound.model.Parameter;
import blochbound.model.Scalar;
import blochbound.model.Unit;
import java.math.BigDecimal;
import java.time.Duration;
import java.util.ArrayList;
import java.util.List;
import java.util.SplittableRandom;
import java.util.stream.LongStream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;
import org.junit.jupiter.params.provider.ValueSource;

class UniquenessProofTest {
  private static Outcome run(Device device, long regions) {
    return UniquenessProof.run(BlochGenerator.stationary(device), regions, Duration.ofSeconds(20));
  }

  @Test
  void thePumpedPairIsProvedUnique() {
    Device device =
        TestCases.device(
            "sites: {l: {levels: [g, e]}, r: {levels: [g, e]}}",
            "parameters:",
            "  pump: {nominal: 1, tolerance: 20 %}",
            "  decay: {nominal: 0.02, tolerance: 0.01}",
            "hamiltonian: 0.05*X@l",
            "jumps:",
            "  - {rate: pump, operator: \"X@l*(1-Z@l*Z@r)/2\"}",
            "  - {rate: pump, operator: \"Z@l*(1-X@l*X@r)/2\"}",
            "  - {rate: decay, operator: lower@l}",
            "  - {rate: decay, operator: lower@r}");
    assertInstanceOf(Outcome.Unique.class, run(device, 4000));
  }

  @Test
  void collectiveDecayAloneIsSingular() {
    Device device =
        TestCases.device(
            "sites: {l: {levels: [g, e]}, r: {levels: [g, e]}}",
            "parameters: {om: {nominal: 0.4, tolerance: 0.1}}",
            "hamiltonian: om*(X@l+X@r)",
            "jumps: [{operator: lower@l + lower@r}]");
    // [published] Dicke, Phys. Rev. 93 (1954) 99: the singlet stays, driven or not
    assertInstanceOf(Outcome.Singular.class, run(device, 100));
  }

  @Test
  void aRateThatReachesZeroIsSingularThere() {
    Device device =
        TestCases.device(
            "sites: {q: {levels: [g, e]}}",
            "parameters: {down: {nominal: 0.05, range: [0, 0.1]}, up: {nominal: 1, tolerance: 0.1}}",
            "jumps: [{rate: down, operator: lower@q}, {rate: down*up, operator: raise@q}]");
    Outcome.Singular singular = assertInstanceOf(Outcome.Singular.class, run(device, 100));
    // [closed form] both rates vanish at the lower end of the first range
    assertEquals(-1, singular.point()[0], 0);
  }

  @ParameterizedTest
  @ValueSource(strings = {"0.3", "0.37", "0.0625"})
  void aHiddenSingularPointIsNeverCalledUnique(String where) {
    Device device =
        TestCases.device(
            "sites: {q: {levels: [g, e]}}",
            "parameters: {a: {nominal: 0.4, tolerance: 0.6}, b: {nominal: 1, tolerance: 0.1}}",
            "jumps: [{rate: 0.3, operator: Z@q}, {rate: b, operator: (a-" + where + ")*lower@q}]");
    // [closed form] at a = where only the dephasing is left, which keeps every diagonal state
    assertFalse(run(device, 4000) instanceof Outcome.Unique);
  }

  @Test
  void aSlowDeviceIsStillUnique() {
    Device device =
        TestCases.device(
            "sites: {q: {levels: [g, e]}}",
            "parameters: {slow: {nominal: 2e-10, tolerance: 1e-10}}",
            "hamiltonian: 0.5*Z@q",
            "jumps: [{rate: 1, operator: Z@q}, {rate: slow, operator: lower@q}]");
    // [closed form] the decay rate of the population is slow > 0 on the whole range
    assertInstanceOf(Outcome.Unique.class, run(device, 4000));
  }

  @Test
  void noBudgetMeansNoClaim() {
    Device device =
        TestCases.device(
            "sites: {q: {levels: [g, e]}}",
            "parameters: {d: {nominal: 0, tolerance: 10}, g: {nominal: 0.5, range: [0.01, 1]}}",
            "hamiltonian: d*Z@q + X@q",
            "jumps: [{rate: g, operator: lower@q}]");
    assertInstanceOf(Outcome.Unproved.class, run(device, 0));
    assertInstanceOf(Outcome.Unique.class, run(device, 4000));
  }

  @Test
  void withoutParametersTheSingleDeviceIsDecided() {
    Device device =
        TestCases.device("sites: {q: {levels: [g, e]}}", "jumps: [{rate: 0.4, operator: lower@q}]");
    assertInstanceOf(Outcome.Unique.class, run(device, 10));
  }

  static LongStream seeds() {
    return LongStream.range(0, Math.min(2000, Integer.getInteger("blochbound.soak", 25)));
  }

  /** Operators that never lead from the first levels to the last ones: two stationary states. */
  private static ComplexMatrix blocks(SplittableRandom random, int n, int first) {
    ComplexMatrix m = RandomDevices.matrix(random, n);
    double[] re = m.realParts();
    double[] im = m.imaginaryParts();
    for (int k = 0; k < n * n; k++) {
      if (k / n < first != k % n < first) {
        re[k] = 0;
        im[k] = 0;
      }
    }
    return ComplexMatrix.of(n, n, re, im);
  }

  @ParameterizedTest(name = "seed {0}")
  @MethodSource("seeds")
  void devicesWithAConservedSectorAreNeverCalledUnique(long seed) {
    SplittableRandom random = new SplittableRandom(seed);
    int n = random.nextInt(2, 6);
    int first = random.nextInt(1, n);
    List<Parameter> parameters = new ArrayList<>();
    OperatorForm hamiltonian = OperatorForm.zero(n);
    List<Jump> jumps = new ArrayList<>();
    for (int k = 0; k < 3; k++) {
      parameters.add(
          new Parameter(
              "p" + k,
              new BigDecimal("0.5"),
              new BigDecimal("0.3"),
              new BigDecimal("0.7"),
              Unit.NONE,
              new Distribution.Uniform()));
      ComplexMatrix h = blocks(random, n, first);
      Scalar p = Scalar.parameter(k);
      hamiltonian = hamiltonian.plus(RandomDevices.exact(h.plus(h.adjoint())).times(p));
      OperatorForm v =
          RandomDevices.exact(blocks(random, n, first))
              .plus(RandomDevices.exact(blocks(random, n, first)).times(p));
      jumps.add(new Jump(Scalar.ONE, v));
    }
    Device device =
        new Device(RandomDevices.space(n), parameters, Ball.unitBox(), hamiltonian, jumps);
    // [closed form] the projector on either sector is conserved: each has its stationary state
    assertFalse(run(device, 60) instanceof Outcome.Unique);
  }
}
