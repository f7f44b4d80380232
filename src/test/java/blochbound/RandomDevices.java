package blochbound;

import blochbound.interval.ExactNumber;
import blochbound.linalg.ComplexBall;
import blochbound.linalg.ComplexMatrix;
import blochbound.model.Atom.Function;
import blochbound.model.Ball;
import blochbound.model.Coefficient;
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

/**
 * Random devices whose operators have few binary digits, so that their doubles are exact and a
 * reference in decimals speaks of the very same device.
 */
public final class RandomDevices {
  private static final int[][] SHAPES = {{2}, {3}, {2, 2}, {4}, {5}, {2, 3}, {6}, {3, 2}};

  private final SplittableRandom random;
  private final int[] shape;
  private final List<Parameter> parameters = new ArrayList<>();

  private RandomDevices(SplittableRandom random, int[] shape) {
    this.random = random;
    this.shape = shape.clone();
  }

  /** Level counts of 2 to 6 levels in all. */
  public static int[] shape(SplittableRandom random) {
    return SHAPES[random.nextInt(SHAPES.length)].clone();
  }

  /** A space of sites with the given level counts. */
  public static HilbertSpace space(int... shape) {
    return new HilbertSpace(
        IntStream.range(0, shape.length)
            .mapToObj(
                s ->
                    new Site("s" + s, IntStream.range(0, shape[s]).mapToObj(k -> "l" + k).toList()))
            .toList());
  }

  /** A complex matrix with entries of sixteenths between -1 and 1, many of them zero. */
  public static ComplexMatrix matrix(SplittableRandom random, int n) {
    double[] re = new double[n * n];
    double[] im = new double[n * n];
    for (int k = 0; k < re.length; k++) {
      re[k] = random.nextInt(3) == 0 ? 0 : random.nextInt(-16, 17) / 16.0;
      im[k] = random.nextInt(3) == 0 ? 0 : random.nextInt(-16, 17) / 16.0;
    }
    return ComplexMatrix.of(n, n, re, im);
  }

  /** A Hermitian matrix with entries of eighths. */
  public static ComplexMatrix hermitian(SplittableRandom random, int n) {
    ComplexMatrix m = matrix(random, n);
    return m.plus(m.adjoint());
  }

  /**
   * A device with 1 to {@code most} parameters: fields, amplitudes inside jumps, rates that are
   * polynomials, reciprocals or smooth functions.
   *
   * @param random source of the draws
   * @param shape level counts
   * @param most most parameters
   * @param ball the ball; off-centre nominal values occur for a box only
   */
  public static Device draw(SplittableRandom random, int[] shape, int most, Ball ball) {
    RandomDevices draws = new RandomDevices(random, shape);
    return draws.device(random.nextInt(1, most + 1), ball);
  }

  private Device device(int count, Ball ball) {
    int n = IntStream.of(shape).reduce(1, (a, b) -> a * b);
    boolean isCentred = ball.norm() != Ball.Norm.BOX;
    OperatorForm hamiltonian = exact(hermitian(random, n));
    OperatorForm amplitude = exact(matrix(random, n));
    Scalar rate = Scalar.constant(ExactNumber.of(1));
    List<Jump> jumps = new ArrayList<>();
    for (int k = 0; k < count; k++) {
      Scalar p = Scalar.parameter(k);
      switch (random.nextInt(6)) {
        case 0 -> {
          parameters.add(parameter(k, -1, 1, isCentred));
          hamiltonian = hamiltonian.plus(exact(hermitian(random, n)).times(p));
        }
        case 1 -> {
          parameters.add(parameter(k, -1, 1, isCentred));
          amplitude = amplitude.plus(exact(matrix(random, n)).times(p));
        }
        case 2 -> {
          parameters.add(parameter(k, 0.02, 1, isCentred));
          jumps.add(new Jump(p, exact(matrix(random, n))));
        }
        case 3 -> {
          parameters.add(parameter(k, 0.02, 1, isCentred));
          rate = rate.times(p).plus(Scalar.constant(half()));
        }
        case 4 -> {
          // A weak jump makes a slow device; a power of two keeps its entries exact.
          parameters.add(parameter(k, 0.1, 1, isCentred));
          ComplexMatrix weak = matrix(random, n).scale(Math.scalb(1.0, -random.nextInt(12)));
          jumps.add(new Jump(p.reciprocal(), exact(weak)));
        }
        default -> {
          parameters.add(parameter(k, 0.1, 1, isCentred));
          jumps.add(new Jump(smooth(p), exact(matrix(random, n))));
        }
      }
    }
    jumps.add(new Jump(rate, amplitude));
    return new Device(space(shape), parameters, ball, hamiltonian, jumps);
  }

  /** A positive function of a positive parameter that is no polynomial. */
  private Scalar smooth(Scalar p) {
    return switch (random.nextInt(4)) {
      case 0 -> p.apply(Function.EXP);
      case 1 -> p.apply(Function.SQRT);
      case 2 -> p.apply(Function.COS);
      default -> p.plus(Scalar.constant(half())).reciprocal();
    };
  }

  private static Coefficient half() {
    return Coefficient.of(ExactNumber.of(new BigDecimal("0.5")));
  }

  /** A parameter whose whole range lies between two numbers. */
  private Parameter parameter(int k, double least, double most, boolean isCentred) {
    double a = random.nextDouble(least, most);
    double width = random.nextDouble(0.02, 0.5) * (most - a);
    BigDecimal low = decimal(a);
    BigDecimal high = low.add(decimal(width)).add(new BigDecimal("0.002"));
    BigDecimal middle = low.add(high).divide(BigDecimal.valueOf(2));
    BigDecimal nominal =
        isCentred || random.nextBoolean()
            ? middle
            : low.add(high.subtract(low).multiply(decimal(random.nextDouble())));
    return new Parameter("p" + k, nominal, low, high, Unit.NONE, new Distribution.Uniform());
  }

  private static BigDecimal decimal(double value) {
    return BigDecimal.valueOf(Math.round(value * 1000), 3);
  }

  /** A constant operator without error. */
  public static OperatorForm exact(ComplexMatrix matrix) {
    return OperatorForm.constant(ComplexBall.exact(matrix));
  }

  /** A ball of any norm; correlated ellipsoids occur when there are two parameters or more. */
  public static Ball ball(SplittableRandom random, int parameters) {
    int kind = random.nextInt(4);
    if (kind == 3 && parameters > 1) {
      BigDecimal value = BigDecimal.valueOf(random.nextInt(-9, 10), 1);
      return new Ball(
          Ball.Norm.ELLIPSOID, BigDecimal.ONE, List.of(new Ball.Correlation(0, 1, value)));
    }
    return new Ball(Ball.Norm.values()[kind % 3], BigDecimal.ONE, List.of());
  }
}
