package blochbound.bench;

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
import blochbound.model.Scalar;
import blochbound.model.Site;
import blochbound.model.Unit;
import java.math.BigDecimal;
import java.util.ArrayList;
import java.util.List;
import java.util.SplittableRandom;
import java.util.stream.IntStream;

/** Devices for benchmarks: chains of two-level sites, and one site with full random matrices. */
final class BenchDevices {
  private final HilbertSpace space;
  private final List<Parameter> parameters = new ArrayList<>();
  private final List<Jump> jumps = new ArrayList<>();
  private OperatorForm hamiltonian;

  private BenchDevices(List<Site> sites) {
    space = new HilbertSpace(sites);
    hamiltonian = OperatorForm.zero(space.dimension());
  }

  private static Site site(String name, int levels) {
    return new Site(name, IntStream.range(0, levels).mapToObj(k -> "l" + k).toList());
  }

  /** A device by name: "chain3" has three sites, "full8" one site of eight levels. */
  static BlochGenerator named(String name) {
    int number = Integer.parseInt(name.replaceAll("\\D", ""));
    return name.startsWith("chain") ? chain(number) : full(number);
  }

  /** Detuning, drive, decay and heating on every site and exchange between neighbours. */
  private static BlochGenerator chain(int sites) {
    BenchDevices d =
        new BenchDevices(IntStream.range(0, sites).mapToObj(s -> site("s" + s, 2)).toList());
    ComplexMatrix flip = ComplexMatrix.unit(2, 0, 1).plus(ComplexMatrix.unit(2, 1, 0));
    for (int s = 0; s < sites; s++) {
      ComplexMatrix x = d.at(s, flip);
      d.energy(0.3 + 0.1 * s, d.at(s, ComplexMatrix.unit(2, 1, 1)));
      d.energy(0.5, x);
      if (s > 0) {
        d.energy(0.4, x.times(d.at(s - 1, flip)));
      }
      d.jump(1, d.at(s, ComplexMatrix.unit(2, 0, 1)));
      d.jump(0.1, d.at(s, ComplexMatrix.unit(2, 1, 0)));
    }
    return d.generator();
  }

  /** Four full Hamiltonians and four full jumps: no zeros to profit from. */
  private static BlochGenerator full(int levels) {
    SplittableRandom random = new SplittableRandom(5);
    BenchDevices d = new BenchDevices(List.of(site("s", levels)));
    for (int t = 0; t < 4; t++) {
      ComplexMatrix m = random(levels, random);
      d.energy(0.25, m.plus(m.adjoint()));
      d.jump(0.5, random(levels, random));
    }
    return d.generator();
  }

  private static ComplexMatrix random(int levels, SplittableRandom random) {
    double[] re = random.doubles((long) levels * levels, -1, 1).toArray();
    double[] im = random.doubles((long) levels * levels, -1, 1).toArray();
    return ComplexMatrix.of(levels, levels, re, im);
  }

  private ComplexMatrix at(int site, ComplexMatrix local) {
    return space.lift(site, ComplexBall.exact(local)).centre();
  }

  private void energy(double nominal, ComplexMatrix operator) {
    OperatorForm form = OperatorForm.constant(ComplexBall.exact(operator));
    hamiltonian = hamiltonian.plus(form.times(parameter(nominal)));
  }

  private void jump(double nominal, ComplexMatrix operator) {
    jumps.add(new Jump(parameter(nominal), OperatorForm.constant(ComplexBall.exact(operator))));
  }

  /** A parameter with a tolerance of 20 %. */
  private Scalar parameter(double nominal) {
    BigDecimal value = BigDecimal.valueOf(nominal);
    BigDecimal width = value.multiply(new BigDecimal("0.2"));
    parameters.add(
        new Parameter(
            "p" + parameters.size(),
            value,
            value.subtract(width),
            value.add(width),
            Unit.NONE,
            new Distribution.Uniform()));
    return Scalar.parameter(parameters.size() - 1);
  }

  private BlochGenerator generator() {
    return BlochGenerator.of(new Device(space, parameters, Ball.unitBox(), hamiltonian, jumps));
  }
}
