package blochbound.sample;

import blochbound.generator.BlochGenerator;
import blochbound.linalg.ComplexBall;
import blochbound.linalg.ComplexMatrix;
import blochbound.model.Ball;
import blochbound.model.Device;
import blochbound.model.Distribution;
import blochbound.model.HilbertSpace;
import blochbound.model.Jump;
import blochbound.model.OperatorForm;
import blochbound.model.Parameter;
import blochbound.model.ParameterSpace;
import blochbound.model.Scalar;
import blochbound.model.Site;
import blochbound.model.Unit;
import java.math.BigDecimal;
import java.util.ArrayList;
import java.util.List;
import java.util.SplittableRandom;
import java.util.stream.IntStream;

/** Builds devices for tests: parameters first, then terms on a space of levels. */
final class Chips {
  private final HilbertSpace space;
  private final List<Parameter> parameters = new ArrayList<>();
  private final List<Jump> jumps = new ArrayList<>();
  private OperatorForm hamiltonian;

  /** A device of sites with the given level counts. */
  Chips(int... levels) {
    space =
        new HilbertSpace(
            IntStream.range(0, levels.length)
                .mapToObj(
                    s ->
                        new Site(
                            "site" + s,
                            IntStream.range(0, levels[s]).mapToObj(k -> "l" + k).toList()))
                .toList());
    hamiltonian = OperatorForm.zero(space.dimension());
  }

  /** Adds a uniform parameter over a range with its nominal value in the middle. */
  Scalar between(String low, String high) {
    BigDecimal a = new BigDecimal(low);
    BigDecimal b = new BigDecimal(high);
    return parameter(a, a.add(b).divide(BigDecimal.valueOf(2)), b, new Distribution.Uniform());
  }

  private Scalar parameter(
      BigDecimal low, BigDecimal nominal, BigDecimal high, Distribution distribution) {
    String name = "p" + parameters.size();
    parameters.add(new Parameter(name, nominal, low, high, Unit.NONE, distribution));
    return Scalar.parameter(parameters.size() - 1);
  }

  /** Adds a Hamiltonian term. */
  Chips energy(Scalar factor, ComplexMatrix operator) {
    hamiltonian =
        hamiltonian.plus(OperatorForm.constant(ComplexBall.exact(operator)).times(factor));
    return this;
  }

  /** Adds a jump. */
  Chips jump(Scalar rate, ComplexMatrix operator) {
    jumps.add(new Jump(rate, OperatorForm.constant(ComplexBall.exact(operator))));
    return this;
  }

  /** An operator on one site as an operator on all. */
  ComplexMatrix at(int site, ComplexMatrix local) {
    return space.lift(site, ComplexBall.exact(local)).centre();
  }

  HilbertSpace space() {
    return space;
  }

  /** The generator over a box of radius 1. */
  BlochGenerator generator() {
    return generator(Ball.unitBox());
  }

  BlochGenerator generator(Ball ball) {
    return BlochGenerator.of(new Device(space, parameters, ball, hamiltonian, jumps));
  }

  /** The matrix |row><column|. */
  static ComplexMatrix unit(int size, int row, int column) {
    return ComplexMatrix.unit(size, row, column);
  }

  /** |a><b| + |b><a|. */
  static ComplexMatrix exchange(int size, int a, int b) {
    return unit(size, a, b).plus(unit(size, b, a));
  }

  /** Chain of two-level sites with drives, neighbour exchange, decay and heating. */
  static Chips chain(int sites) {
    Chips chips = new Chips(IntStream.range(0, sites).map(s -> 2).toArray());
    for (int s = 0; s < sites; s++) {
      ComplexMatrix x = chips.at(s, exchange(2, 0, 1));
      chips.energy(chips.between("0.1", "0.7"), chips.at(s, unit(2, 1, 1)));
      chips.energy(chips.between("0.3", "0.6"), x);
      if (s > 0) {
        chips.energy(chips.between("0.2", "0.5"), x.times(chips.at(s - 1, exchange(2, 0, 1))));
      }
      chips.jump(chips.between("0.6", "1.1"), chips.at(s, unit(2, 0, 1)));
      chips.jump(chips.between("0.05", "0.15"), chips.at(s, unit(2, 1, 0)));
    }
    return chips;
  }

  /** One site with dense random Hamiltonians and jumps, each with a parameter of its own. */
  static Chips random(int levels, int terms, SplittableRandom random) {
    Chips chips = new Chips(levels);
    for (int t = 0; t < terms; t++) {
      ComplexMatrix m = random(levels, random);
      chips.energy(chips.between("-0.5", "1.5"), m.plus(m.adjoint()));
      chips.jump(chips.between("0.2", "0.9"), random(levels, random));
    }
    return chips;
  }

  private static ComplexMatrix random(int levels, SplittableRandom random) {
    double[] re = random.doubles((long) levels * levels, -1, 1).toArray();
    double[] im = random.doubles((long) levels * levels, -1, 1).toArray();
    return ComplexMatrix.of(levels, levels, re, im);
  }

  /** Coordinates equally likely in a box. */
  static List<double[]> devices(int count, int coordinates, SplittableRandom random) {
    return IntStream.range(0, count)
        .mapToObj(d -> random.doubles(coordinates, -1, 1).toArray())
        .toList();
  }

  /** A space of parameters that all have the range [-1, 1] and the nominal value 0. */
  static ParameterSpace symmetric(Ball ball, Distribution... distributions) {
    Chips chips = new Chips(1);
    for (Distribution d : distributions) {
      chips.parameter(BigDecimal.ONE.negate(), BigDecimal.ZERO, BigDecimal.ONE, d);
    }
    return ParameterSpace.of(chips.parameters, ball);
  }

  /** A space of one parameter over a box. */
  static ParameterSpace single(String low, String nominal, String high, Distribution scatter) {
    Chips chips = new Chips(1);
    chips.parameter(new BigDecimal(low), new BigDecimal(nominal), new BigDecimal(high), scatter);
    return ParameterSpace.of(chips.parameters, Ball.unitBox());
  }
}
