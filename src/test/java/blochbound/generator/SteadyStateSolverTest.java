package blochbound.generator;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import blochbound.RandomDevices;
import blochbound.TestCases;
import blochbound.linalg.ComplexMatrix;
import blochbound.linalg.Hermitian;
import blochbound.measure.LocatedMeasure;
import blochbound.measure.Measures;
import blochbound.measure.StationaryMeasure;
import blochbound.model.Ball;
import blochbound.model.Device;
import blochbound.model.MeasureSpec;
import blochbound.model.Requirement.Sense;
import java.util.Arrays;
import java.util.List;
import java.util.Locale;
import java.util.SplittableRandom;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.ValueSource;

class SteadyStateSolverTest {
  private static Hermitian steadyState(Device device) {
    BlochGenerator generator = BlochGenerator.of(device);
    SteadyStateSolver solver = new SteadyStateSolver(generator);
    assertTrue(solver.solve(generator.space().parametersAt(new double[0])));
    // [common practice, no source] a backward stable solve leaves a few units of rounding
    assertTrue(solver.relativeResidual() < 1e-15);
    return generator.basis().matrix(solver.state());
  }

  private static Hermitian emitter(String hamiltonian, String... jumps) {
    return steadyState(
        TestCases.device(
            "sites: {q: {levels: [g, e]}}",
            "hamiltonian: \"" + hamiltonian + "\"",
            "jumps: [" + String.join(", ", jumps) + "]"));
  }

  private static String jump(double rate, String operator) {
    return String.format(Locale.ROOT, "{rate: %s, operator: %s}", rate, operator);
  }

  private static String drive(double rabi, double detuning) {
    return String.format(Locale.ROOT, "%s*X@q - (%s)*|e><e|@q", rabi / 2, detuning);
  }

  // [published] Metcalf, van der Straten, Laser Cooling and Trapping (1999) ch. 2 and Foot, Atomic
  // Physics (2005) ch. 7, from memory: p_e = (s/2)/(1+s), s = 2 Om^2/G^2/(1 + 4 D^2/G^2)
  @ParameterizedTest
  @CsvSource({
    "1, 1, 0, 0.333333333333333333, 0.333333333333333333, 0.777777777777777778",
    "1, 0.5, 0.7, 0.0722543352601156, 0.248622117544585, 0.989558622072238",
    "2, 3, 1.5, 0.290322580645161, 0.348924316980386, 0.831425598335068"
  })
  void aDrivenEmitterHasTheKnownSaturation(
      double g, double om, double d, double excited, double coherence, double purity) {
    Hermitian rho = emitter(drive(om, d), jump(g, "lower@q"));
    assertEquals(excited, rho.re(1, 1), 1e-12);
    assertEquals(coherence, Math.hypot(rho.re(0, 1), rho.im(0, 1)), 1e-12);
    assertEquals(purity, rho.inner(rho), 1e-12);
  }

  // [published] Bloch, Phys. Rev. 70 (1946) 460; Allen, Eberly (1975), from memory: p_e =
  // Om^2 T1 T2/(2 den), u = Om D T2^2/den, v = Om T2/den, den = 1 + D^2 T2^2 + Om^2 T1 T2
  @ParameterizedTest
  @CsvSource({
    "2, 2.4, 0.8, 0.3, 0.307445956765412, 0.172938350680544, 0.384307445956765, -0.385108086469175",
    "1, 0.5, 2, 1, 0.289855072463768, 0.115942028985507, 0.289855072463768, -0.420289855072464"
  })
  void relaxationTimesGiveTheBlochSteadyState(
      double t1, double tPhi, double om, double d, double excited, double u, double v, double w) {
    Hermitian rho = emitter(drive(om, d), jump(1 / t1, "lower@q"), jump(1 / (2 * tPhi), "Z@q"));
    assertEquals(excited, rho.re(1, 1), 1e-12);
    // Here the ground state comes first: Y and Z change their signs.
    assertEquals(u, 2 * rho.re(0, 1), 1e-12);
    assertEquals(-v, -2 * rho.im(0, 1), 1e-12);
    assertEquals(-w, rho.re(0, 0) - rho.re(1, 1), 1e-12);
  }

  @Test
  void aThermalQubitHasTheKnownPopulation() {
    Hermitian rho = emitter("0*X@q", jump(1.3, "lower@q"), jump(0.3, "raise@q"));
    // [published] Breuer, Petruccione (2002) sec. 3.4, from memory: p_e = n/(2n+1), n = 0.3
    assertEquals(0.1875, rho.re(1, 1), 1e-14);
    assertEquals(0, Math.hypot(rho.re(0, 1), rho.im(0, 1)), 1e-15);
  }

  @ParameterizedTest
  @ValueSource(doubles = {0, 1.3})
  void aThreeLevelCellSettlesInTheDarkState(double detuning) {
    Hermitian rho =
        steadyState(
            TestCases.device(
                "sites: {c: {levels: [a, b, e]}}",
                String.format(
                    Locale.ROOT,
                    "hamiltonian: \"0.3*(|a><e|@c+|e><a|@c)+0.4*(|b><e|@c+|e><b|@c)-%s*|e><e|@c\"",
                    detuning),
                "jumps: [{operator: \"|a><e|@c\"}, {operator: \"|b><e|@c\"}]"));
    // [published] Arimondo, Prog. Opt. 35 (1996) 257, from memory: dark state (Oc|1> - Op|2>)/norm
    // with Op = 0.6 and Oc = 0.8, whatever the one-photon detuning
    assertEquals(0.64, rho.re(0, 0), 1e-12);
    assertEquals(0.36, rho.re(1, 1), 1e-12);
    assertEquals(-0.48, rho.re(0, 1), 1e-12);
    assertEquals(0, rho.im(0, 1), 1e-12);
    assertEquals(0, rho.re(2, 2), 1e-12);
    assertEquals(1, rho.inner(rho), 1e-12);
  }

  // [published] Walls, Milburn, Quantum Optics ch. 7; Gardiner, Collett, Phys. Rev. A 31 (1985)
  // 3761, from memory: alpha = -i e/(k/2 + i D), n = |alpha|^2
  @Test
  void aDrivenResonatorHasTheKnownAmplitude() {
    Hermitian rho =
        steadyState(
            TestCases.device(
                "sites: {r: {levels: 30}}",
                "hamiltonian: \"0.8*number@r + 0.5*(lower@r + raise@r)\"",
                "jumps: [{operator: lower@r}]"));
    double photons = 0;
    double re = 0;
    double im = 0;
    for (int k = 1; k < 30; k++) {
      photons += k * rho.re(k, k);
      // tr(a rho) = sum sqrt(k) rho_(k, k-1)
      re += Math.sqrt(k) * rho.re(k, k - 1);
      im += Math.sqrt(k) * rho.im(k, k - 1);
    }
    assertEquals(0.280898876404494, photons, 1e-12);
    assertEquals(-0.449438202247191, re, 1e-12);
    assertEquals(-0.280898876404494, im, 1e-12);
  }

  // [published] Stannigel, Rabl, Zoller, New J. Phys. 14 (2012) 063014, from memory; the formula
  // C = 2 a^2/(D^2 + 2 a^2) follows from its pure state
  @ParameterizedTest
  @CsvSource({
    "0.2, 0.1, 0.888888888888889",
    "0.5, 1, 0.333333333333333",
    "1, 0.3, 0.956937799043062"
  })
  void aPairWithOppositeDetuningsSettlesInAPureEntangledState(double a, double d, double c) {
    Device device =
        TestCases.device(
            "sites: {l: {levels: [g, e]}, r: {levels: [g, e]}}",
            String.format(
                Locale.ROOT, "hamiltonian: \"%s*(X@l+X@r) + %s*(|e><e|@l - |e><e|@r)\"", a, d),
            "jumps: [{operator: lower@l + lower@r}]");
    Hermitian rho = steadyState(device);
    assertEquals(1, rho.inner(rho), 1e-12);
    LocatedMeasure measure = Measures.of(new MeasureSpec.Concurrence(0, 1), device.space());
    assertEquals(c, measure.measure().value(rho), 1e-9);
  }

  // [published] Kimura, Phys. Lett. A 314 (2003) 339, from memory: tr rho^2 = 1/n + |r|^2/2 with
  // tr(l_i l_j) = 2 delta_ij; in the basis with tr(B_i B_j) = delta_ij a pure state has length
  // sqrt((n-1)/n) without the first coordinate
  @ParameterizedTest
  @CsvSource({"2, 1", "3, 1.15470053837925", "4, 1.22474487139159"})
  void aPureSteadyStateLiesOnTheSphere(int n, double length) {
    StringBuilder jumps = new StringBuilder("jumps: [");
    for (int k = 1; k < n; k++) {
      jumps.append(k > 1 ? ", " : "").append("{operator: \"|0><" + k + "|@site\"}");
    }
    BlochGenerator generator =
        BlochGenerator.of(
            TestCases.device("sites: {site: {levels: " + n + "}}", jumps.append(']').toString()));
    SteadyStateSolver solver = new SteadyStateSolver(generator);
    assertTrue(solver.solve(new double[0]));
    double square = Arrays.stream(solver.state()).skip(1).map(x -> x * x).sum();
    assertEquals(length, Math.sqrt(2 * square), 1e-14);
  }

  @Test
  void severalStationaryStatesAreToldToRounding() {
    BlochGenerator generator =
        BlochGenerator.of(
            TestCases.device(
                "sites: {l: {levels: [g, e]}, r: {levels: [g, e]}}",
                "hamiltonian: \"0.3*(X@l+X@r)\"",
                "jumps: [{operator: lower@l + lower@r}]"));
    // [published] Dicke, Phys. Rev. 93 (1954) 99: collective decay keeps the singlet
    assertFalse(new SteadyStateSolver(generator).solve(new double[0]));
  }

  @Test
  void theLongTimeAverageRemembersTheSinglet() {
    BlochGenerator generator =
        BlochGenerator.of(
            TestCases.device(
                "sites: {l: {levels: [g, e]}, r: {levels: [g, e]}}",
                "jumps: [{operator: lower@l + lower@r}]"));
    SteadyStateSolver solver = new SteadyStateSolver(generator);
    Hermitian start = new Hermitian(ComplexMatrix.unit(4, 1, 1));
    double[] r = solver.longTimeAverage(new double[0], generator.basis().coordinates(start));
    Hermitian end = generator.basis().matrix(r);
    double singlet = 0.5 * (end.re(1, 1) + end.re(2, 2)) - end.re(1, 2);
    // [published] Tanas, Ficek, J. Opt. B 6 (2004) S90, from memory: |ge> keeps half in the singlet
    assertEquals(0.5, singlet, 1e-7);
    assertEquals(0.5, end.re(0, 0), 1e-7);
  }

  @ParameterizedTest(name = "seed {0}")
  @ValueSource(longs = {1, 2, 3, 4, 5, 6})
  void sensitivitiesAreTheSlopesOfFiniteDifferences(long seed) {
    SplittableRandom random = new SplittableRandom(seed);
    int[] shape = RandomDevices.shape(random);
    Device device = RandomDevices.draw(random, shape, 4, Ball.unitBox());
    BlochGenerator generator = BlochGenerator.of(device);
    List<MeasureSpec> specs =
        List.of(
            new MeasureSpec.Purity(),
            new MeasureSpec.Entropy(),
            new MeasureSpec.Population(0, List.of(0)));
    for (MeasureSpec spec : specs) {
      StationaryMeasure measure =
          new StationaryMeasure(generator, Measures.of(spec, device.space()), Sense.AT_LEAST);
      int m = generator.space().coordinates();
      double[] z = random.doubles(m, -0.9, 0.9).toArray();
      double[] gradient = new double[m];
      measure.value(z, gradient);
      for (int j = 0; j < m; j++) {
        // [closed form] central difference, error of order h^2 and rounding of order 1e-16/h
        double h = 1e-5;
        double[] up = z.clone();
        double[] down = z.clone();
        up[j] += h;
        down[j] -= h;
        double slope = (measure.value(up) - measure.value(down)) / (2 * h);
        assertEquals(slope, gradient[j], 1e-7 * (1 + Math.abs(slope)));
      }
    }
  }
}
