package blochbound.sample;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import blochbound.generator.BlochGenerator;
import blochbound.generator.SteadyStateSolver;
import blochbound.linalg.ComplexMatrix;
import blochbound.model.Atom.Function;
import blochbound.model.Scalar;
import java.util.Arrays;
import java.util.List;
import java.util.Optional;
import java.util.SplittableRandom;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.ValueSource;

/** Steady states in lanes against the solver of single devices, and the guards of the lanes. */
class LaneSolverTest {
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

  /**
   * A pair that decays together only where one rate vanishes: its singlet is then stationary too.
   */
  @ParameterizedTest(name = "seed {0}")
  @ValueSource(longs = {1, 2, 3})
  void hiddenSingularLaneIsFound(long seed) {
    Chips chips = new Chips(2, 2);
    ComplexMatrix first = chips.at(0, Chips.unit(2, 0, 1));
    ComplexMatrix second = chips.at(1, Chips.unit(2, 0, 1));
    ComplexMatrix both = first.plus(second);
    BlochGenerator generator =
        chips
            .energy(chips.between("0.2", "0.9"), both.plus(both.adjoint()))
            .jump(chips.between("0.5", "1.5"), both)
            .jump(chips.between("0", "1"), first)
            .generator();
    LaneSolver solver = new LaneSolver(generator);
    List<double[]> devices = Chips.devices(LaneArithmetic.LANES, 3, new SplittableRandom(seed));
    for (int l = 0; l < devices.size(); l += 2) {
      devices.get(l)[2] = -1;
    }
    solver.solve(devices);
    for (int l = 0; l < devices.size(); l++) {
      // [published] R. H. Dicke, Phys. Rev. 93 (1954) 99, from memory: two stationary states
      assertEquals(l % 2 == 1, solver.isUnique(l), "lane " + l);
    }
    // [invariant] only singular lanes, and none of the others, needed the single solver
    assertEquals(devices.size() / 2, solver.solvedAgain());
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
    BlochGenerator generator = LaneClosedFormTest.driven();
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
    LaneSolver solver = new LaneSolver(LaneClosedFormTest.driven());
    assertThrows(IllegalArgumentException.class, () -> solver.solve(List.of()));
    int limit = solver.lanes();
    List<double[]> many = Chips.devices(limit + 1, 3, new SplittableRandom(1));
    String message =
        assertThrows(IllegalArgumentException.class, () -> solver.solve(many)).getMessage();
    assertEquals("a batch has 1 to 128 devices", message);
  }
}
