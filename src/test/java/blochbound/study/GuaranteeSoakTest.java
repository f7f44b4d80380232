package blochbound.study;

import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import blochbound.RandomDevices;
import blochbound.bound.BranchAndBound;
import blochbound.bound.BranchOptions;
import blochbound.bound.BranchOutcome;
import blochbound.bound.SteadyCellBound;
import blochbound.generator.BlochGenerator;
import blochbound.linalg.ComplexBall;
import blochbound.linalg.ComplexMatrix;
import blochbound.measure.ExactStates;
import blochbound.measure.LocatedMeasure;
import blochbound.measure.Measures;
import blochbound.measure.PreciseDevice;
import blochbound.measure.StationaryMeasure;
import blochbound.model.Ball;
import blochbound.model.Ball.Norm;
import blochbound.model.Device;
import blochbound.model.Distribution;
import blochbound.model.Jump;
import blochbound.model.MeasureSpec;
import blochbound.model.OperatorForm;
import blochbound.model.Parameter;
import blochbound.model.Requirement.Sense;
import blochbound.model.Scalar;
import blochbound.model.StateSpec;
import blochbound.model.Unit;
import java.math.BigDecimal;
import java.util.ArrayList;
import java.util.List;
import java.util.SplittableRandom;
import java.util.concurrent.atomic.AtomicBoolean;
import java.util.stream.IntStream;
import java.util.stream.LongStream;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;

/**
 * The guarantee on random devices: no device of the ball, sampled or sought, lies beyond the bound.
 *
 * <p>Samples are rounded; those within 1e-9 of the bound, or beyond it, are computed again in 50
 * digits at a decimal point that lies in the ball exactly.
 */
class GuaranteeSoakTest {
  private static final double NEAR_TIE = 1e-9;

  /** Error of the 50-digit reference. */
  private static final BigDecimal REFERENCE_ERROR = new BigDecimal("1e-20");

  private static final int SAMPLES = 200;

  static LongStream seeds() {
    return LongStream.range(0, Integer.getInteger("blochbound.soak", 200));
  }

  private record Trial(
      int[] shape, Device device, BlochGenerator generator, MeasureSpec spec, Sense sense) {
    LocatedMeasure located() {
      return Measures.of(spec, device.space());
    }

    StationaryMeasure evaluator() {
      return new StationaryMeasure(generator, located(), sense);
    }
  }

  private static Trial draw(SplittableRandom random) {
    // Eight levels are beyond the size up to which inverses are used.
    boolean isLarge = random.nextInt(40) == 0;
    int[] shape = isLarge ? new int[] {2, 2, 2} : RandomDevices.shape(random);
    Device device =
        RandomDevices.draw(random, shape, isLarge ? 2 : 6, RandomDevices.ball(random, 1));
    if (random.nextInt(3) == 0 && device.ball().norm() == Norm.ELLIPSOID) {
      device =
          new Device(
              device.space(),
              device.parameters(),
              RandomDevices.ball(random, device.parameters().size()),
              device.hamiltonian(),
              device.jumps());
    }
    Sense sense = random.nextBoolean() ? Sense.AT_LEAST : Sense.AT_MOST;
    return new Trial(
        shape, device, BlochGenerator.stationary(device), measure(random, shape), sense);
  }

  private static MeasureSpec measure(SplittableRandom random, int[] shape) {
    int n = IntStream.of(shape).reduce(1, (a, b) -> a * b);
    ExactStates states = new ExactStates(random.nextLong(), n, 1);
    boolean isPair = shape.length > 1;
    boolean isTwoByTwo = isPair && n == 4;
    StateSpec reference =
        random.nextBoolean()
            ? new StateSpec.Pure(ComplexBall.exact(states.ket()))
            : new StateSpec.Mixed(ComplexBall.exact(states.mixed(n + 1).matrix()));
    return switch (random.nextInt(isTwoByTwo ? 10 : isPair ? 8 : 6)) {
      case 0 -> new MeasureSpec.Mean(ComplexBall.exact(RandomDevices.hermitian(random, n)));
      case 1 -> new MeasureSpec.Population(shape.length - 1, List.of(0));
      case 2 -> new MeasureSpec.Fidelity(reference);
      case 3 -> new MeasureSpec.TraceDistance(reference);
      case 4 -> new MeasureSpec.Purity();
      case 5 -> new MeasureSpec.Entropy();
      case 6, 7 -> new MeasureSpec.Negativity(List.of(0));
      default -> new MeasureSpec.Concurrence(0, 1);
    };
  }

  @ParameterizedTest(name = "seed {0}")
  @MethodSource("seeds")
  void noDeviceOfTheBallLiesBeyondTheCertifiedBound(long seed) {
    SplittableRandom random = new SplittableRandom(seed);
    Trial trial = draw(random);
    int most = SteadyCellBound.suitableOrder(trial.generator);
    int order = random.nextInt(1, most + 1);
    BranchOutcome outcome =
        BranchAndBound.minimise(
            () -> new SteadyCellBound(trial.generator, trial.located(), trial.sense, order),
            trial.generator.space().coordinates(),
            trial.generator.space().norm(),
            BranchOptions.toGap(1e-6).withRegions(random.nextInt(1, 40)),
            BranchAndBound.Start.none(),
            new AtomicBoolean());
    double bound = outcome.certifiedLower();
    assertFalse(Double.isNaN(bound));
    StationaryMeasure evaluator = trial.evaluator();
    double[] worst = outcome.point();
    double least = trial.sense.sign() * evaluator.value(worst);
    for (double[] z : points(random, trial)) {
      double value = trial.sense.sign() * evaluator.value(z);
      if (value < least) {
        least = value;
        worst = z;
      }
    }
    worst = sought(trial, evaluator, worst);
    least = trial.sense.sign() * evaluator.value(worst);
    if (least < bound + NEAR_TIE) {
      isAboveInDecimals(trial, worst, bound, seed);
    }
  }

  /** The value at a decimal point near z, in 50 digits, against the bound. */
  private static void isAboveInDecimals(Trial trial, double[] z, double bound, long seed) {
    List<BigDecimal> point = trial.generator.space().decimalPointInside(z);
    assertTrue(trial.generator.space().contains(point));
    BigDecimal value =
        new PreciseDevice(trial.device, point).steadyState().value(trial.spec, trial.shape);
    BigDecimal signed = value.multiply(BigDecimal.valueOf(trial.sense.sign()));
    assertTrue(
        signed.add(REFERENCE_ERROR).compareTo(new BigDecimal(bound)) >= 0,
        () -> "seed " + seed + ", " + trial.spec + " at " + point + ": " + signed + ", " + bound);
  }

  static LongStream sectorSeeds() {
    return LongStream.range(0, Integer.getInteger("blochbound.soak", 200) / 8);
  }

  /** A matrix with a given part on some levels and another on the rest. */
  private static ComplexMatrix joined(ComplexMatrix first, ComplexMatrix second) {
    int n = first.rows() + second.rows();
    double[] re = new double[n * n];
    double[] im = new double[n * n];
    for (int i = 0; i < n; i++) {
      for (int j = 0; j < n; j++) {
        boolean isFirst = i < first.rows();
        if (isFirst == j < first.rows()) {
          ComplexMatrix part = isFirst ? first : second;
          int shift = isFirst ? 0 : first.rows();
          re[i * n + j] = part.re(i - shift, j - shift);
          im[i * n + j] = part.im(i - shift, j - shift);
        }
      }
    }
    return ComplexMatrix.of(n, n, re, im);
  }

  @ParameterizedTest(name = "seed {0}")
  @MethodSource("sectorSeeds")
  void theStationaryStateOfEachConservedSectorCounts(long seed) {
    SplittableRandom random = new SplittableRandom(seed);
    int[] sizes = {random.nextInt(2, 4), random.nextInt(2, 4)};
    Device[] sectors = new Device[2];
    ComplexMatrix[] observables = new ComplexMatrix[2];
    List<List<ComplexMatrix>> operators = new ArrayList<>();
    List<Parameter> parameters = sectorParameters();
    for (int k = 0; k < 2; k++) {
      List<ComplexMatrix> parts = new ArrayList<>();
      for (int t = 0; t < 4; t++) {
        boolean isField = t < 2;
        parts.add(
            isField
                ? RandomDevices.hermitian(random, sizes[k])
                : RandomDevices.matrix(random, sizes[k]));
      }
      operators.add(parts);
      sectors[k] = sectorDevice(parameters, parts);
      observables[k] = RandomDevices.hermitian(random, sizes[k]);
    }
    List<ComplexMatrix> whole = new ArrayList<>();
    for (int t = 0; t < 4; t++) {
      whole.add(joined(operators.get(0).get(t), operators.get(1).get(t)));
    }
    Device device = sectorDevice(parameters, whole);
    MeasureSpec spec =
        new MeasureSpec.Mean(ComplexBall.exact(joined(observables[0], observables[1])));
    Sense sense = random.nextBoolean() ? Sense.AT_LEAST : Sense.AT_MOST;
    BlochGenerator generator = BlochGenerator.stationary(device);
    BranchOutcome outcome =
        BranchAndBound.minimise(
            () -> new SteadyCellBound(generator, Measures.of(spec, device.space()), sense, 2),
            2,
            Norm.BOX,
            BranchOptions.toGap(1e-6).withRegions(12),
            BranchAndBound.Start.none(),
            new AtomicBoolean());
    for (int draw = 0; draw < 3; draw++) {
      double[] z = random.doubles(2, -1, 1).toArray();
      List<BigDecimal> point = generator.space().decimalPointInside(z);
      for (int k = 0; k < 2; k++) {
        MeasureSpec part = new MeasureSpec.Mean(ComplexBall.exact(observables[k]));
        // [independent] the sector alone, by elimination in 50-digit decimals
        BigDecimal value = new PreciseDevice(sectors[k], point).steadyState().value(part);
        BigDecimal signed = value.multiply(BigDecimal.valueOf(sense.sign()));
        assertTrue(
            signed.add(REFERENCE_ERROR).compareTo(new BigDecimal(outcome.certifiedLower())) >= 0,
            () -> "seed " + seed + ": " + signed + " below " + outcome.certifiedLower());
      }
    }
  }

  private static List<Parameter> sectorParameters() {
    List<Parameter> parameters = new ArrayList<>();
    for (String name : List.of("field", "rate")) {
      parameters.add(
          new Parameter(
              name,
              new BigDecimal("0.5"),
              new BigDecimal("0.3"),
              new BigDecimal("0.7"),
              Unit.NONE,
              new Distribution.Uniform()));
    }
    return parameters;
  }

  private static Device sectorDevice(List<Parameter> parameters, List<ComplexMatrix> parts) {
    OperatorForm field = RandomDevices.exact(parts.get(1)).times(Scalar.parameter(0));
    return new Device(
        RandomDevices.space(parts.get(0).rows()),
        parameters,
        Ball.unitBox(),
        RandomDevices.exact(parts.get(0)).plus(field),
        List.of(
            new Jump(Scalar.ONE, RandomDevices.exact(parts.get(2))),
            new Jump(Scalar.parameter(1), RandomDevices.exact(parts.get(3)))));
  }

  private static List<double[]> points(SplittableRandom random, Trial trial) {
    int m = trial.generator.space().coordinates();
    Norm norm = trial.generator.space().norm();
    List<double[]> points = new ArrayList<>();
    for (int k = 0; k < SAMPLES; k++) {
      int kind = k % 4;
      double[] z = random.doubles(m, -1, 1).toArray();
      for (int j = 0; j < m; j++) {
        z[j] = kind == 0 ? Math.copySign(1, z[j]) : z[j];
      }
      if (kind == 1) {
        // A point on an axis: a vertex of the diamond.
        int axis = random.nextInt(m);
        for (int j = 0; j < m; j++) {
          z[j] = j == axis ? Math.copySign(1, z[j]) : 0;
        }
      }
      points.add(inside(norm, z, kind == 2));
    }
    return points;
  }

  /** The point itself, drawn onto the rim when it lies outside or when the rim is asked for. */
  private static double[] inside(Norm norm, double[] z, boolean onRim) {
    double size = 0;
    for (double x : z) {
      size =
          switch (norm) {
            case BOX -> Math.max(size, Math.abs(x));
            case ELLIPSOID -> Math.hypot(size, x);
            case DIAMOND -> size + Math.abs(x);
          };
    }
    double scale = size > 1 || (onRim && size > 0) ? size : 1;
    return java.util.Arrays.stream(z).map(x -> x / scale).toArray();
  }

  /** Pattern search from the worst sample: as near to the true worst case as is cheap. */
  private static double[] sought(Trial trial, StationaryMeasure evaluator, double[] start) {
    Norm norm = trial.generator.space().norm();
    double[] best = start;
    double least = trial.sense.sign() * evaluator.value(best);
    for (double step = 0.3; step > 1e-3; step *= 0.4) {
      for (int j = 0; j < start.length; j++) {
        for (int side = -1; side <= 1; side += 2) {
          double[] z = best.clone();
          z[j] += side * step;
          double[] next = inside(norm, z, false);
          double value = trial.sense.sign() * evaluator.value(next);
          if (value < least) {
            least = value;
            best = next;
          }
        }
      }
    }
    return best;
  }
}
