package blochbound.study;

import static org.junit.jupiter.api.Assertions.assertTrue;

import blochbound.Draws;
import blochbound.RandomDevices;
import blochbound.bound.BranchAndBound;
import blochbound.bound.BranchOptions;
import blochbound.bound.BranchOutcome;
import blochbound.bound.SteadyCellBound;
import blochbound.generator.BlochGenerator;
import blochbound.linalg.ComplexBall;
import blochbound.linalg.ComplexMatrix;
import blochbound.measure.Measures;
import blochbound.measure.PreciseDevice;
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
import blochbound.model.Unit;
import java.math.BigDecimal;
import java.util.ArrayList;
import java.util.List;
import java.util.SplittableRandom;
import java.util.concurrent.atomic.AtomicBoolean;
import java.util.stream.LongStream;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;

/**
 * Devices with a conserved sector have several stationary states; the bound counts each of them,
 * although searches and samples may never meet it.
 */
class ConservedSectorTest {
  /** Error of the 50-digit reference. */
  private static final BigDecimal REFERENCE_ERROR = new BigDecimal("1e-20");

  static LongStream seeds() {
    return Draws.seeds().filter(s -> s % 8 == 0);
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
  @MethodSource("seeds")
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
}
