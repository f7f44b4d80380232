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
import blochbound.measure.ExactStates;
import blochbound.measure.LocatedMeasure;
import blochbound.measure.Measures;
import blochbound.measure.PreciseDevice;
import blochbound.measure.StationaryMeasure;
import blochbound.model.Ball.Norm;
import blochbound.model.Device;
import blochbound.model.MeasureSpec;
import blochbound.model.Requirement.Sense;
import blochbound.model.StateSpec;
import java.math.BigDecimal;
import java.util.ArrayList;
import java.util.List;
import java.util.SplittableRandom;
import java.util.concurrent.atomic.AtomicBoolean;
import java.util.stream.IntStream;
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
  @MethodSource("blochbound.Draws#seeds")
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
