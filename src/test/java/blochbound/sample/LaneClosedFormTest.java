package blochbound.sample;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import blochbound.generator.BlochGenerator;
import blochbound.interval.ExactNumber;
import blochbound.linalg.ComplexMatrix;
import blochbound.linalg.Hermitian;
import blochbound.model.Scalar;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.SplittableRandom;
import org.junit.jupiter.api.Test;

/** Steady states in lanes against closed forms. */
class LaneClosedFormTest {
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

  /** Power of an excited two-level site: H = -D|e><e| + Om/2 (|e><g| + |g><e|), decay G. */
  static BlochGenerator driven() {
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
}
