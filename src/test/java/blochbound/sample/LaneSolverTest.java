package blochbound.sample;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import blochbound.generator.BlochGenerator;
import blochbound.generator.SteadyStateSolver;
import blochbound.interval.ExactNumber;
import blochbound.linalg.ComplexMatrix;
import blochbound.linalg.Hermitian;
import blochbound.model.Atom.Function;
import blochbound.model.Scalar;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Optional;
import java.util.SplittableRandom;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.ValueSource;

/** Steady states in lanes against closed forms and against the solver of single devices. */
class LaneSolverTest {
  private static Hermitian state(BlochGenerator generator, LaneSolver solver, int lane) {
    double[] r = new double[generator.basis().size()];
    solver.state(lane, r);
    return generator.basis().matrix(r);
  }

  private static double[] z(BlochGenerator generator, double... parameters) {
    double[] z = new double[parameters.length];
    for (int j = 0; j < z.length; j++) {
      double slope = generator.space().slope(j, j).middle();
      z[j] = (parameters[j] - generator.space().centre(j).middle()) / slope;
    }
    return z;
  }

  private static void assertEqualsSingle(BlochGenerator generator, List<double[]> devices) {
    LaneSolver solver = new LaneSolver(generator);
    assertTrue(solver.entries() >= 0);
    solver.solve(devices);
    SteadyStateSolver single = new SteadyStateSolver(generator);
    double[] r = new double[generator.basis().size()];
    for (int l = 0; l < devices.size(); l++) {
      assertTrue(single.solve(generator.space().parametersAt(devices.get(l))));
      assertTrue(solver.isUnique(l));
      solver.state(l, r);
      // [invariant] both solve the same equations; 1e-10 covers condition numbers up to 1e4
      assertArrayEquals(single.state(), r, 1e-10);
    }
    // [invariant] re-solving every lane would pass too, so most must have come from the lanes
    assertTrue(solver.solvedAgain() <= devices.size() / 4, "again: " + solver.solvedAgain());
  }

  @ParameterizedTest(name = "{0} levels, seed {1}")
  @CsvSource({"2,1", "2,2", "3,3", "4,4", "5,5", "6,6", "7,7", "8,8"})
  void randomDevicesAgreeWithTheSingleSolver(int levels, long seed) {
    SplittableRandom random = new SplittableRandom(seed);
    BlochGenerator generator = Chips.random(levels, 3, random).generator();
    assertEqualsSingle(generator, Chips.devices(LaneArithmetic.LANES, 6, random));
  }

  @ParameterizedTest(name = "{0} sites")
  @ValueSource(ints = {1, 2, 3})
  void chainsAgreeWithTheSingleSolver(int sites) {
    BlochGenerator generator = Chips.chain(sites).generator();
    SplittableRandom random = new SplittableRandom(sites);
    int m = generator.space().coordinates();
    assertEqualsSingle(generator, Chips.devices(LaneArithmetic.LANES, m, random));
    // A batch that is not full.
    assertEqualsSingle(generator, Chips.devices(5, m, random));
  }

  /** Power of an excited two-level site: H = -D|e><e| + Om/2 (|e><g| + |g><e|), decay G. */
  private static BlochGenerator driven() {
    Chips chips = new Chips(2);
    Scalar decay = chips.between("1", "2");
    Scalar drive = chips.between("0.5", "3");
    Scalar detuning = chips.between("0", "1.5");
    return chips
        .energy(drive, Chips.exchange(2, 0, 1).scale(0.5))
        .energy(detuning, Chips.unit(2, 1, 1).scale(-1))
        .jump(decay, Chips.unit(2, 0, 1))
        .generator();
  }

  @Test
  void drivenAtomHasTheRadiativeSteadyState() {
    BlochGenerator generator = driven();
    LaneSolver solver = new LaneSolver(generator);
    double[][] points = {{1, 1, 0}, {1, 0.5, 0.7}, {2, 3, 1.5}};
    solver.solve(Arrays.stream(points).map(p -> z(generator, p)).toList());
    // [published] Metcalf & van der Straten, Laser Cooling and Trapping (1999), ch. 2, from memory
    double[] excited = {1 / 3.0, 0.0722543352601156, 0.290322580645161};
    double[] coherence = {1 / 3.0, 0.248622117544585, 0.348924316980386};
    for (int l = 0; l < points.length; l++) {
      Hermitian rho = state(generator, solver, l);
      assertEquals(excited[l], rho.re(1, 1), 1e-12);
      assertEquals(coherence[l], Math.hypot(rho.re(1, 0), rho.im(1, 0)), 1e-12);
    }
  }

  @Test
  void drivenAtomFollowsTheClosedFormInEveryLane() {
    BlochGenerator generator = driven();
    LaneSolver solver = new LaneSolver(generator);
    List<double[]> devices = Chips.devices(LaneArithmetic.LANES, 3, new SplittableRandom(11));
    solver.solve(devices);
    for (int l = 0; l < devices.size(); l++) {
      double[] p = generator.space().parametersAt(devices.get(l));
      // [closed form] p_e = Om^2 / (G^2 + 4 D^2 + 2 Om^2)
      double expected = p[1] * p[1] / (p[0] * p[0] + 4 * p[2] * p[2] + 2 * p[1] * p[1]);
      assertEquals(expected, state(generator, solver, l).re(1, 1), 1e-12);
    }
    assertEquals(0, solver.solvedAgain());
  }

  @Test
  void dephasedAtomHasTheBlochSteadyState() {
    Chips chips = new Chips(2);
    Scalar t1 = chips.between("1", "2");
    Scalar pure = chips.between("0.5", "2.4");
    Scalar drive = chips.between("0.8", "2");
    Scalar detuning = chips.between("0.3", "1");
    ComplexMatrix sign = Chips.unit(2, 1, 1).minus(Chips.unit(2, 0, 0));
    BlochGenerator generator =
        chips
            .energy(drive, Chips.exchange(2, 0, 1).scale(0.5))
            .energy(detuning, Chips.unit(2, 1, 1).scale(-1))
            .jump(t1.reciprocal(), Chips.unit(2, 0, 1))
            .jump(pure.reciprocal(), sign.scale(Math.sqrt(0.5)))
            .generator();
    LaneSolver solver = new LaneSolver(generator);
    double[][] points = {{2, 2.4, 0.8, 0.3}, {1, 0.5, 2, 1}};
    solver.solve(Arrays.stream(points).map(p -> z(generator, p)).toList());
    // [published] F. Bloch, Phys. Rev. 70 (1946) 460, from memory; 1/T2 = 1/(2 T1) + 1/Tphi
    double[][] expected = {
      {0.172938350680544, 0.384307445956765, -0.385108086469175},
      {0.115942028985507, 0.289855072463768, -0.420289855072464}
    };
    for (int l = 0; l < points.length; l++) {
      Hermitian rho = state(generator, solver, l);
      // The source writes the excited level first: s_x = |e><g| + |g><e|, s_y = -i|e><g| + i|g><e|.
      double[] uvw = {2 * rho.re(1, 0), -2 * rho.im(1, 0), rho.re(1, 1) - rho.re(0, 0)};
      assertArrayEquals(expected[l], uvw, 1e-12);
    }
  }

  @Test
  void thermalSiteHasTheThermalPopulation() {
    Chips chips = new Chips(2);
    Scalar rate = chips.between("0.5", "1.5");
    Scalar quanta = chips.between("0.1", "0.5");
    BlochGenerator generator =
        chips
            .jump(rate.times(quanta.plus(Scalar.ONE)), Chips.unit(2, 0, 1))
            .jump(rate.times(quanta), Chips.unit(2, 1, 0))
            .generator();
    LaneSolver solver = new LaneSolver(generator);
    List<double[]> devices =
        new ArrayList<>(Chips.devices(LaneArithmetic.LANES - 1, 2, new SplittableRandom(6)));
    devices.add(z(generator, 1, 0.3));
    solver.solve(devices);
    for (int l = 0; l < devices.size(); l++) {
      double n = generator.space().parametersAt(devices.get(l))[1];
      // [closed form] p_e = n / (2 n + 1); Breuer & Petruccione (2002), sec. 3.4, from memory
      assertEquals(n / (2 * n + 1), state(generator, solver, l).re(1, 1), 1e-12);
    }
    // [published] the same at n = 0.3
    assertEquals(0.1875, state(generator, solver, devices.size() - 1).re(1, 1), 1e-12);
  }

  @Test
  void lambdaSystemEndsInItsDarkState() {
    Chips chips = new Chips(3);
    Scalar probe = chips.between("0.4", "0.8");
    Scalar control = chips.between("0.6", "1");
    Scalar detuning = chips.between("0", "2.6");
    BlochGenerator generator =
        chips
            .energy(probe, Chips.exchange(3, 0, 2).scale(0.5))
            .energy(control, Chips.exchange(3, 1, 2).scale(0.5))
            .energy(detuning, Chips.unit(3, 2, 2).scale(-1))
            .jump(Scalar.ONE, Chips.unit(3, 0, 2))
            .jump(Scalar.ONE, Chips.unit(3, 1, 2))
            .generator();
    LaneSolver solver = new LaneSolver(generator);
    solver.solve(List.of(z(generator, 0.6, 0.8, 0), z(generator, 0.6, 0.8, 1.3)));
    for (int l = 0; l < 2; l++) {
      Hermitian rho = state(generator, solver, l);
      // [published] E. Arimondo, Prog. Opt. 35 (1996) 257, from memory
      assertEquals(0.64, rho.re(0, 0), 1e-12);
      assertEquals(0.36, rho.re(1, 1), 1e-12);
      assertEquals(-0.48, rho.re(0, 1), 1e-12);
      assertEquals(0, rho.re(2, 2), 1e-12);
    }
  }

  @Test
  void drivenCavityHoldsTheCoherentPhotonNumber() {
    int levels = 12;
    double[][] lower = new double[levels][levels];
    for (int k = 1; k < levels; k++) {
      lower[k - 1][k] = Math.sqrt(k);
    }
    ComplexMatrix a = ComplexMatrix.real(lower);
    Chips chips = new Chips(levels);
    Scalar drive = chips.between("0.1", "0.2");
    Scalar detuning = chips.between("0.3", "0.5");
    Scalar decay = chips.between("0.4", "0.6");
    BlochGenerator generator =
        chips
            .energy(drive, a.plus(a.adjoint()))
            .energy(detuning, a.adjoint().times(a))
            .jump(decay, a)
            .generator();
    LaneSolver solver = new LaneSolver(generator);
    List<double[]> devices = new ArrayList<>(Chips.devices(20, 3, new SplittableRandom(18)));
    devices.add(z(generator, 0.2, 0.3, 0.4));
    solver.solve(devices);
    Hermitian number = Hermitian.part(a.adjoint().times(a));
    for (int l = 0; l < devices.size(); l++) {
      double[] p = generator.space().parametersAt(devices.get(l));
      // [closed form] n = e^2 / (D^2 + kappa^2/4); twelve levels cut off less than 1e-11 of it
      double expected = p[0] * p[0] / (p[1] * p[1] + 0.25 * p[2] * p[2]);
      assertEquals(expected, number.inner(state(generator, solver, l)), 1e-10);
    }
    // [published] Walls & Milburn, Quantum Optics, ch. 7, from memory
    assertEquals(4 / 13.0, number.inner(state(generator, solver, devices.size() - 1)), 1e-10);
  }

  /** Decay from 1e-9 on, and a detuning of up to one: diagonal pivots fail at the lower end. */
  private static BlochGenerator fragile() {
    Chips chips = new Chips(2);
    return chips
        .energy(chips.between("-1", "1"), Chips.unit(2, 1, 1))
        .energy(Scalar.ONE, Chips.exchange(2, 0, 1).scale(0.05))
        .jump(chips.between("0.000000001", "2"), Chips.unit(2, 0, 1))
        .generator();
  }

  @Test
  void badlyPivotedLaneIsSolvedAgain() {
    BlochGenerator generator = fragile();
    LaneSolver solver = new LaneSolver(generator);
    double[] bad = {1, -1};
    solver.solve(List.of(new double[] {0.1, 0.2}, bad, new double[] {-0.3, 0.5}));
    // [invariant] the second lane alone has multipliers near 1 / 1e-9
    assertEquals(1, solver.solvedAgain());
    SteadyStateSolver single = new SteadyStateSolver(generator);
    assertTrue(single.solve(generator.space().parametersAt(bad)));
    double[] r = new double[4];
    solver.state(1, r);
    // [invariant] the very same computation
    assertArrayEquals(single.state(), r, 0.0);
  }

  @Test
  void kernelReportsItsOwnFailures() {
    BlochGenerator generator = fragile();
    LaneKernel kernel = new LaneKernel(LaneProgram.of(generator).orElseThrow());
    LaneCoefficients coefficients = new LaneCoefficients(generator);
    coefficients.set(List.of(new double[] {1, -1}, new double[] {0.1, 0.2}));
    kernel.solve(coefficients.values());
    // [closed form] the first multiplier is the detuning 1 over the pivot 1e-9 / 2
    assertTrue(kernel.growth(0) > 1e9);
    assertTrue(kernel.growth(0) > LaneSolver.GROWTH_LIMIT);
    assertTrue(kernel.growth(1) < LaneSolver.GROWTH_LIMIT);
  }

  @Test
  void residualIsThatOfTheAssembledEquations() {
    BlochGenerator generator = fragile();
    LaneProgram program = LaneProgram.of(generator).orElseThrow();
    LaneKernel kernel = new LaneKernel(program);
    LaneCoefficients coefficients = new LaneCoefficients(generator);
    double[] device = {1, -1};
    coefficients.set(List.of(device));
    kernel.solve(coefficients.values());
    double[][] a = new double[3][3];
    double[] b = new double[3];
    double[] mu = generator.coefficients(generator.space().parametersAt(device));
    generator.assemble(mu, a, b);
    double squares = 0;
    for (int i = 0; i < 3; i++) {
      double sum = b[i];
      for (int k = 0; k < 3; k++) {
        sum += a[i][program.unknownOf(k)] * kernel.unknown(k)[0];
      }
      squares += sum * sum;
    }
    // [invariant] |A x + b| summed by other code; rounding of the sums is near 1e-16
    assertEquals(Math.sqrt(squares), kernel.residual(0), 1e-15);
  }

  @Test
  void singularLaneIsNotUniqueAndItsNeighboursAre() {
    Chips chips = new Chips(2);
    Scalar rate = chips.between("0", "2");
    Scalar tenth = Scalar.constant(ExactNumber.of(10)).reciprocal();
    BlochGenerator generator =
        chips
            .jump(rate, Chips.unit(2, 0, 1))
            .jump(rate.times(tenth), Chips.unit(2, 1, 0))
            .generator();
    LaneSolver solver = new LaneSolver(generator);
    solver.solve(List.of(new double[] {-0.999}, new double[] {-1}, new double[] {1}));
    assertFalse(solver.isUnique(1));
    double[] r = new double[4];
    solver.state(1, r);
    assertTrue(Double.isNaN(r[3]));
    for (int l : new int[] {0, 2}) {
      assertTrue(solver.isUnique(l));
      // [closed form] rates 1 down and 0.1 up leave 10/11 in the lower level at any common factor
      assertEquals(10 / 11.0, state(generator, solver, l).re(0, 0), 1e-12);
    }
  }

  @Test
  void coefficientsEqualThoseOfSingleDevices() {
    Chips chips = new Chips(2);
    Scalar amplitude = chips.between("0.5", "1.5");
    Scalar time = chips.between("2", "3");
    Scalar off = chips.between("-0.2", "0.4");
    Scalar smooth = amplitude.plus(off).apply(Function.EXP).plus(time.apply(Function.SQRT));
    BlochGenerator generator =
        chips
            .energy(smooth.times(amplitude), Chips.exchange(2, 0, 1))
            .jump(amplitude.power(3).dividedBy(time.power(2)), Chips.unit(2, 0, 1))
            .generator();
    LaneCoefficients lanes = new LaneCoefficients(generator);
    List<double[]> devices = Chips.devices(7, 3, new SplittableRandom(3));
    lanes.set(devices);
    for (int l = 0; l < devices.size(); l++) {
      int lane = l;
      double[] expected = generator.coefficients(generator.space().parametersAt(devices.get(l)));
      double[] found = Arrays.stream(lanes.values()).mapToDouble(v -> v[lane]).toArray();
      // [invariant] the same operations in the same order
      assertArrayEquals(expected, found, 0.0);
    }
  }

  @Test
  void withoutPlanDevicesAreSolvedOneByOne() {
    BlochGenerator generator = driven();
    LaneSolver solver = new LaneSolver(generator, Optional.empty());
    List<double[]> devices = Chips.devices(solver.lanes(), 3, new SplittableRandom(4));
    solver.solve(devices);
    LaneSolver lanes = new LaneSolver(generator).another();
    lanes.solve(devices);
    double[] expected = new double[4];
    double[] found = new double[4];
    for (int l = 0; l < devices.size(); l++) {
      lanes.state(l, expected);
      solver.state(l, found);
      // [invariant] both solve the same equations
      assertArrayEquals(expected, found, 1e-13);
    }
    assertEquals(solver.lanes(), solver.solvedAgain());
  }

  @Test
  void emptyAndOversizedBatchesAreRefused() {
    LaneSolver solver = new LaneSolver(driven());
    assertThrows(IllegalArgumentException.class, () -> solver.solve(List.of()));
    int limit = solver.lanes();
    List<double[]> many = Chips.devices(limit + 1, 3, new SplittableRandom(1));
    String message =
        assertThrows(IllegalArgumentException.class, () -> solver.solve(many)).getMessage();
    assertEquals("a batch has 1 to 128 devices", message);
  }
}
