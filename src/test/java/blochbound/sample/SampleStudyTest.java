package blochbound.sample;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import blochbound.generator.BlochGenerator;
import blochbound.measure.LocatedMeasure;
import blochbound.measure.Measures;
import blochbound.measure.StationaryMeasure;
import blochbound.model.Ball;
import blochbound.model.MeasureSpec;
import blochbound.model.Requirement.Sense;
import blochbound.model.Scalar;
import blochbound.sample.SampleResult.Outcome;
import java.math.BigDecimal;
import java.time.Duration;
import java.util.Arrays;
import java.util.List;
import java.util.concurrent.atomic.AtomicBoolean;
import java.util.stream.DoubleStream;
import java.util.stream.IntStream;
import java.util.stream.Stream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.EnumSource;

/** Statistics of sampled devices against closed forms, and independence of the threads. */
class SampleStudyTest {
  private static final SampleOptions OPTIONS = SampleOptions.withDefaults().withThreads(2);

  private static LocatedMeasure excited(Chips chips) {
    return Measures.of(new MeasureSpec.Population(0, List.of(1)), chips.space());
  }

  private static SampleResult run(Chips chips, Ball ball, SampleOptions options) {
    LocatedMeasure excited = excited(chips);
    LocatedMeasure purity = Measures.of(new MeasureSpec.Purity(), chips.space());
    return SampleStudy.run(
        chips.generator(ball),
        List.of(excited, excited, purity),
        List.of(Sense.AT_LEAST, Sense.AT_MOST, Sense.AT_LEAST),
        options,
        new AtomicBoolean());
  }

  /** Thermal site whose number of quanta is equally likely between 0.2 and 0.4. */
  private static Chips thermal() {
    Chips chips = new Chips(2);
    Scalar quanta = chips.between("0.2", "0.4");
    return chips
        .jump(quanta.plus(Scalar.ONE), Chips.unit(2, 0, 1))
        .jump(quanta, Chips.unit(2, 1, 0));
  }

  private static double thermalPopulation(double quanta) {
    return quanta / (2 * quanta + 1);
  }

  @ParameterizedTest
  @EnumSource(SamplePoints.class)
  void quantilesAndMeanFollowTheClosedForm(SamplePoints kind) {
    SampleResult result = run(thermal(), Ball.unitBox(), OPTIONS.withKind(kind).withCount(20_000));
    assertEquals(20_000, result.count());
    assertEquals(Outcome.COMPLETE, result.outcome());
    MeasureSample sample = result.measures().get(0);
    for (MeasureSample.Quantile q : sample.quantiles()) {
      double p = q.probability();
      double sigma = Math.sqrt(p * (1 - p) / result.count());
      // [closed form] the population rises with the number of quanta; five sigmas of the rank
      assertTrue(q.value() >= thermalPopulation(0.2 + 0.2 * (p - 5 * sigma)));
      assertTrue(q.value() <= thermalPopulation(0.2 + 0.2 * (p + 5 * sigma)));
    }
    // [closed form] mean of x/(2x + 1) over [0.2, 0.4] is (0.2 - ln(1.8/1.4)/2) / 0.4
    double mean = (0.2 - 0.5 * Math.log(1.8 / 1.4)) / 0.4;
    // [closed form] all values lie within a range of 0.08, so sigma is at most 0.04/sqrt(count)
    assertEquals(mean, sample.mean(), 5 * 0.04 / Math.sqrt(result.count()));
  }

  @Test
  void worstDevicesLieOnTheForbiddenSideAndAttainTheirValues() {
    Chips chips = Chips.chain(2);
    SampleResult result = run(chips, Ball.unitBox(), OPTIONS.withCount(1_000));
    BlochGenerator generator = chips.generator();
    StationaryMeasure single = new StationaryMeasure(generator, excited(chips), Sense.AT_LEAST);
    for (int k = 0; k < 2; k++) {
      MeasureSample sample = result.measures().get(k);
      double sign = k == 0 ? 1 : -1;
      assertEquals(SampleStudy.WORST_KEPT, sample.worst().size());
      assertEquals(sample.worst().get(0).value(), sample.worstValue());
      for (int i = 0; i < sample.worst().size(); i++) {
        SampledDevice device = sample.worst().get(i);
        double[] z = device.z().stream().mapToDouble(Double::doubleValue).toArray();
        // [invariant] the single solver gives the same value at the same device
        assertEquals(single.value(z), device.value(), 1e-12);
        assertTrue(i == 0 || sign * sample.worst().get(i - 1).value() <= sign * device.value());
      }
      for (MeasureSample.Quantile q : sample.quantiles()) {
        assertTrue(sign * sample.worstValue() <= sign * q.value());
      }
    }
  }

  @ParameterizedTest
  @EnumSource(SamplePoints.class)
  void resultDoesNotDependOnTheThreads(SamplePoints kind) {
    Ball ball = new Ball(Ball.Norm.ELLIPSOID, BigDecimal.ONE, List.of());
    SampleOptions options = OPTIONS.withKind(kind).withCount(1_500).withSeed(12);
    SampleResult one = run(Chips.chain(2), ball, options.withThreads(1));
    for (int threads = 2; threads <= 4; threads++) {
      // [invariant] to the last bit
      assertEquals(one, run(Chips.chain(2), ball, options.withThreads(threads)));
    }
    SampleResult other = run(Chips.chain(2), ball, options.withSeed(13));
    assertTrue(other.measures().get(0).mean() != one.measures().get(0).mean());
  }

  @Test
  void orderStatisticsAreCountedExactly() {
    double[] values = IntStream.rangeClosed(1, 200).mapToDouble(k -> 201 - k).toArray();
    Stream<SampledDevice> devices =
        Arrays.stream(values).mapToObj(v -> new SampledDevice(v, List.of()));
    MeasureSample sample = MeasureSample.of(values, devices, Sense.AT_MOST);
    // [closed form] the smallest k with k/200 at least p, for p = 0.01, 0.05, 0.5, 0.95, 0.99
    assertEquals(
        List.of(2.0, 10.0, 100.0, 190.0, 198.0),
        sample.quantiles().stream().map(MeasureSample.Quantile::value).toList());
    // [closed form] (n + 1) / 2
    assertEquals(100.5, sample.mean());
    assertEquals(
        DoubleStream.of(200, 199, 198, 197, 196).boxed().toList(),
        sample.worst().stream().map(SampledDevice::value).toList());
  }

  @Test
  void withoutTolerancesThereIsOneDevice() {
    Chips chips = new Chips(2);
    Scalar quanta = chips.between("0.3", "0.3");
    chips.jump(quanta.plus(Scalar.ONE), Chips.unit(2, 0, 1)).jump(quanta, Chips.unit(2, 1, 0));
    SampleResult result = run(chips, Ball.unitBox(), OPTIONS);
    assertEquals(1, result.count());
    assertEquals(1, result.acceptance());
    // [closed form] n / (2 n + 1) at n = 0.3
    assertEquals(0.1875, result.measures().get(0).worstValue(), 1e-14);
    assertEquals(0.1875, result.measures().get(0).quantiles().get(0).value(), 1e-14);
  }

  @Test
  void devicesWithoutUniqueSteadyStateCountWithTheirWorst() {
    Chips chips = new Chips(2);
    chips.energy(chips.between("1", "2"), Chips.unit(2, 1, 1));
    SampleResult result = run(chips, Ball.unitBox(), OPTIONS.withCount(20));
    assertEquals(20, result.notUnique());
    // [closed form] without jumps both levels are stationary
    assertEquals(0, result.measures().get(0).worstValue(), 1e-12);
    assertEquals(1, result.measures().get(1).worstValue(), 1e-12);
  }

  @Test
  void stoppedStudySaysSo() {
    Chips chips = thermal();
    SampleResult result =
        SampleStudy.run(
            chips.generator(),
            List.of(excited(chips)),
            List.of(Sense.AT_LEAST),
            OPTIONS,
            new AtomicBoolean(true));
    assertEquals(Outcome.STOPPED, result.outcome());
    assertEquals(0, result.count());
    assertTrue(result.measures().isEmpty());
    assertTrue(Double.isNaN(result.acceptance()));
  }

  @Test
  void withoutTimeTheFirstBatchIsEvaluatedAll() {
    SampleResult result = run(thermal(), Ball.unitBox(), OPTIONS.withTime(Duration.ZERO));
    assertEquals(Outcome.OUT_OF_TIME, result.outcome());
    assertEquals(LaneArithmetic.LANES, result.count());
  }

  @Test
  void countFollowsTheSize() {
    // [common practice, no source] chosen so that a default run takes about a second
    assertEquals(10_000, SampleStudy.defaultCount(15));
    assertEquals(5_000, SampleStudy.defaultCount(63));
    assertEquals(1_000, SampleStudy.defaultCount(255));
    assertEquals(200, SampleStudy.defaultCount(1023));
  }

  @Test
  void failureInAThreadReachesTheCaller() {
    Chips chips = thermal();
    LocatedMeasure wrong = new LocatedMeasure(excited(chips).measure(), List.of());
    BlochGenerator generator = chips.generator();
    // The reduced state of no site has one level, the measure two.
    assertThrows(
        RuntimeException.class,
        () ->
            SampleStudy.run(
                generator, List.of(wrong), List.of(Sense.AT_LEAST), OPTIONS, new AtomicBoolean()));
  }

  @Test
  void optionsAreChecked() {
    SampleOptions options = SampleOptions.withDefaults();
    assertThrows(IllegalArgumentException.class, () -> options.withThreads(0));
    assertThrows(IllegalArgumentException.class, () -> options.withCount(-1));
    assertThrows(IllegalArgumentException.class, () -> options.withTime(Duration.ofSeconds(-1)));
  }
}
