package blochbound.search;

import blochbound.linalg.ComplexBall;
import blochbound.linalg.ComplexMatrix;
import blochbound.linalg.Hermitian;
import blochbound.model.Ball;
import blochbound.model.Device;
import blochbound.model.Distribution;
import blochbound.model.HilbertSpace;
import blochbound.model.Jump;
import blochbound.model.OperatorForm;
import blochbound.model.Parameter;
import blochbound.model.Scalar;
import blochbound.model.Site;
import blochbound.model.Unit;
import java.math.BigDecimal;
import java.util.ArrayList;
import java.util.List;
import java.util.SplittableRandom;

/** Devices of one and two two-level sites; the ground state comes first and has Z = +1. */
final class SmallDevices {
  static final ComplexMatrix UNIT = ComplexMatrix.identity(2);
  static final ComplexMatrix X = ComplexMatrix.real(new double[][] {{0, 1}, {1, 0}});
  static final ComplexMatrix Y = ComplexMatrix.of(2, 2, new double[4], new double[] {0, -1, 1, 0});
  static final ComplexMatrix Z = ComplexMatrix.real(new double[][] {{1, 0}, {0, -1}});
  static final ComplexMatrix LOWERING = ComplexMatrix.unit(2, 0, 1);
  static final ComplexMatrix EXCITED = ComplexMatrix.unit(2, 1, 1);

  private SmallDevices() {}

  static Parameter parameter(String name, String nominal, String lower, String upper) {
    return new Parameter(
        name,
        new BigDecimal(nominal),
        new BigDecimal(lower),
        new BigDecimal(upper),
        Unit.NONE,
        new Distribution.Uniform());
  }

  static HilbertSpace sites(int count) {
    List<Site> sites = new ArrayList<>();
    for (int k = 0; k < count; k++) {
      sites.add(new Site("q" + k, List.of("g", "e")));
    }
    return new HilbertSpace(sites);
  }

  static OperatorForm constant(ComplexMatrix matrix) {
    return OperatorForm.constant(ComplexBall.exact(matrix));
  }

  static OperatorForm scaled(int parameter, ComplexMatrix matrix) {
    return constant(matrix).times(Scalar.parameter(parameter));
  }

  /** Driven emitter with decay: parameters decay rate, drive, detuning in this order. */
  static Device emitter(Parameter decay, Parameter drive, Parameter detuning, Ball ball) {
    OperatorForm hamiltonian = scaled(1, X.scale(0.5)).minus(scaled(2, EXCITED));
    return new Device(
        sites(1),
        List.of(decay, drive, detuning),
        ball,
        hamiltonian,
        List.of(new Jump(Scalar.parameter(0), constant(LOWERING))));
  }

  /** Two emitters with one common decay, driven alike with opposite detunings. */
  static Device oppositeDetunings(Parameter drive, Parameter detuning) {
    ComplexMatrix first = LOWERING.kron(UNIT);
    ComplexMatrix second = UNIT.kron(LOWERING);
    ComplexMatrix common = first.plus(second);
    OperatorForm hamiltonian =
        scaled(0, common.plus(common.adjoint()))
            .plus(scaled(1, EXCITED.kron(UNIT).minus(UNIT.kron(EXCITED))));
    return new Device(
        sites(2),
        List.of(drive, detuning),
        Ball.unitBox(),
        hamiltonian,
        List.of(new Jump(Scalar.ONE, constant(common))));
  }

  /**
   * A pair kept in (|ge> + |eg>)/sqrt2 by a parity pump and a phase pump, with decay, dephasing and
   * stray fields: ten parameters.
   */
  static Device pumpedPair(Ball ball) {
    ComplexMatrix unit = ComplexMatrix.identity(4);
    ComplexMatrix evenParity = unit.plus(Z.kron(Z)).scale(0.5);
    ComplexMatrix oddPhase = unit.minus(X.kron(X)).scale(0.5);
    List<Parameter> parameters =
        List.of(
            parameter("parityPump", "1", "0.8", "1.2"),
            parameter("phasePump", "1", "0.8", "1.2"),
            parameter("decay1", "0.02", "0.01", "0.03"),
            parameter("decay2", "0.02", "0.01", "0.03"),
            parameter("dephasing1", "0.01", "0.005", "0.015"),
            parameter("dephasing2", "0.01", "0.005", "0.015"),
            parameter("detuning1", "0", "-0.05", "0.05"),
            parameter("detuning2", "0", "-0.05", "0.05"),
            parameter("transverse", "0", "-0.05", "0.05"),
            parameter("shift", "0", "-0.05", "0.05"));
    OperatorForm hamiltonian =
        scaled(6, EXCITED.kron(UNIT))
            .plus(scaled(7, UNIT.kron(EXCITED)))
            .plus(scaled(8, X.kron(UNIT)))
            .plus(scaled(9, Z.kron(Z)));
    ComplexMatrix[] jumps = {
      X.kron(UNIT).times(evenParity),
      Z.kron(UNIT).times(oddPhase),
      LOWERING.kron(UNIT),
      UNIT.kron(LOWERING),
      Z.kron(UNIT),
      UNIT.kron(Z)
    };
    List<Jump> list = new ArrayList<>();
    for (int k = 0; k < jumps.length; k++) {
      list.add(new Jump(Scalar.parameter(k), constant(jumps[k])));
    }
    return new Device(sites(2), parameters, ball, hamiltonian, list);
  }

  /**
   * A device with random operators: an uncertain field, an uncertain coupling amplitude inside a
   * jump, and two uncertain rates.
   */
  static Device random(int sites, Ball ball, List<Parameter> parameters, SplittableRandom random) {
    int n = 1 << sites;
    OperatorForm hamiltonian =
        constant(hermitian(random, n).matrix())
            .plus(scaled(0, hermitian(random, n).matrix()))
            .plus(scaled(1, hermitian(random, n).matrix()).times(Scalar.parameter(0)));
    OperatorForm jump = constant(complex(random, n)).plus(scaled(1, complex(random, n)));
    return new Device(
        sites(sites),
        parameters,
        ball,
        hamiltonian,
        List.of(
            new Jump(Scalar.ONE, jump),
            new Jump(Scalar.parameter(2), constant(complex(random, n))),
            new Jump(
                Scalar.parameter(3).times(Scalar.parameter(2)), constant(complex(random, n)))));
  }

  static Hermitian hermitian(SplittableRandom random, int n) {
    return Hermitian.part(complex(random, n));
  }

  private static ComplexMatrix complex(SplittableRandom random, int n) {
    double[] re = random.doubles((long) n * n, -1, 1).toArray();
    double[] im = random.doubles((long) n * n, -1, 1).toArray();
    return ComplexMatrix.of(n, n, re, im);
  }
}
