package blochbound.bound;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import blochbound.RandomDevices;
import blochbound.TestCases;
import blochbound.generator.BlochGenerator;
import blochbound.interval.Interval;
import blochbound.linalg.Hermitian;
import blochbound.measure.LocatedMeasure;
import blochbound.measure.Measures;
import blochbound.measure.PreciseDevice;
import blochbound.measure.PreciseDevice.PreciseState;
import blochbound.measure.StationaryMeasure;
import blochbound.model.Ball;
import blochbound.model.Device;
import blochbound.model.MeasureSpec;
import blochbound.model.Requirement.Sense;
import java.math.BigDecimal;
import java.util.List;
import java.util.Optional;
import java.util.SplittableRandom;
import java.util.stream.LongStream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;
import org.junit.jupiter.params.provider.ValueSource;

class VerifiedSteadyStateTest {
  /** Error of the 50-digit references, far below everything compared here. */
  private static final BigDecimal REFERENCE_ERROR = new BigDecimal("1e-20");

  static LongStream seeds() {
    return LongStream.range(0, Math.min(400, Integer.getInteger("blochbound.soak", 14)));
  }

  private static void contains(
      BlochGenerator generator, VerifiedSteadyState verified, PreciseState truth) {
    Hermitian state = generator.basis().matrix(verified.state());
    BigDecimal transform = new BigDecimal(2 * generator.basis().transformError());
    BigDecimal allowed = new BigDecimal(verified.distance()).add(transform);
    BigDecimal distance = truth.distance(state);
    assertTrue(distance.compareTo(allowed) <= 0, distance + " above " + allowed);
  }

  @ParameterizedTest(name = "seed {0}")
  @MethodSource("seeds")
  void randomDevicesHaveTheirPreciseStateAndValuesInside(long seed) {
    SplittableRandom random = new SplittableRandom(seed);
    int[] shape = RandomDevices.shape(random);
    Device device = RandomDevices.draw(random, shape, 4, Ball.unitBox());
    BlochGenerator generator = BlochGenerator.stationary(device);
    double[] z = random.doubles(generator.space().coordinates(), -1, 1).toArray();
    List<BigDecimal> point = generator.space().decimalPointInside(z);
    Optional<VerifiedSteadyState> verified =
        VerifiedSteadyState.at(generator, generator.space().internalValues(point));
    // [independent] elimination in 50-digit decimals straight from the operators
    PreciseState truth = new PreciseDevice(device, point).steadyState();
    contains(generator, verified.orElseThrow(), truth);
    // [common practice, no source] a well-conditioned device is known to a few digits less than u
    assertTrue(verified.get().distance() < 1e-9);
    for (MeasureSpec spec :
        List.of(
            new MeasureSpec.Purity(),
            new MeasureSpec.Entropy(),
            new MeasureSpec.Population(shape.length - 1, List.of(0)))) {
      LocatedMeasure located = Measures.of(spec, device.space());
      Interval enclosure =
          verified
              .get()
              .enclosure(
                  located, new StationaryMeasure(generator, located, Sense.AT_LEAST), generator);
      BigDecimal value = truth.value(spec, shape);
      assertTrue(
          value.add(REFERENCE_ERROR).compareTo(new BigDecimal(enclosure.lower())) >= 0
              && value.subtract(REFERENCE_ERROR).compareTo(new BigDecimal(enclosure.upper())) <= 0,
          spec + ": " + value + " outside " + enclosure);
    }
  }

  @ParameterizedTest
  @ValueSource(strings = {"1e-6", "1e-9", "1e-10", "1e-11"})
  void slowDevicesAreEnclosedToo(String slow) {
    Device device =
        TestCases.device(
            "sites: {q: {levels: [g, e]}}",
            "parameters: {slow: {nominal: " + slow + "}}",
            "hamiltonian: 0.75*Z@q + 0.125*slow*X@q",
            "jumps:",
            "  - {rate: 1, operator: Z@q}",
            "  - {rate: slow, operator: lower@q}",
            "  - {rate: 0.25*slow, operator: raise@q}");
    BlochGenerator generator = BlochGenerator.stationary(device);
    List<BigDecimal> point = List.of(new BigDecimal(slow));
    VerifiedSteadyState verified =
        VerifiedSteadyState.at(generator, generator.space().internalValues(point)).orElseThrow();
    // [independent] elimination in 50-digit decimals
    contains(generator, verified, new PreciseDevice(device, point).steadyState());
    // [common practice, no source] u over the gap, and a few digits of margin
    assertTrue(verified.distance() < 1e-13 / Double.parseDouble(slow));
  }

  @ParameterizedTest
  @ValueSource(strings = {"0.1", "1e-3", "1e-5"})
  void pairsNearTheSingletAreEnclosedOrRefused(String detuning) {
    Device device =
        TestCases.device(
            "sites: {l: {levels: [g, e]}, r: {levels: [g, e]}}",
            "parameters: {d: {nominal: " + detuning + "}}",
            "hamiltonian: \"0.25*(X@l+X@r) + d*(|e><e|@l - |e><e|@r)\"",
            "jumps: [{operator: lower@l + lower@r}]");
    BlochGenerator generator = BlochGenerator.stationary(device);
    List<BigDecimal> point = List.of(new BigDecimal(detuning));
    VerifiedSteadyState verified =
        VerifiedSteadyState.at(generator, generator.space().internalValues(point)).orElseThrow();
    PreciseState truth = new PreciseDevice(device, point).steadyState();
    contains(generator, verified, truth);
    double d = Double.parseDouble(detuning);
    // [published] Stannigel, Rabl, Zoller, New J. Phys. 14 (2012) 063014, from memory: concurrence
    // 2 a^2/(d^2 + 2 a^2) with a = 1/4
    assertEquals(
        0.125 / (d * d + 0.125),
        truth.value(new MeasureSpec.Concurrence(0, 1)).doubleValue(),
        1e-12);
  }

  @Test
  void aSingularDeviceIsRefused() {
    Device device =
        TestCases.device(
            "sites: {l: {levels: [g, e]}, r: {levels: [g, e]}}",
            "jumps: [{operator: lower@l + lower@r}]");
    BlochGenerator generator = BlochGenerator.stationary(device);
    // [published] Dicke, Phys. Rev. 93 (1954) 99: the singlet is stationary, too
    assertTrue(VerifiedSteadyState.at(generator, new Interval[0]).isEmpty());
  }

  @Test
  void widerParametersGiveAWiderEnclosureThatHoldsTheirMiddle() {
    Device device =
        TestCases.device(
            "sites: {q: {levels: [g, e]}}",
            "parameters: {om: {nominal: 0.5}}",
            "hamiltonian: om*X@q",
            "jumps: [{operator: lower@q}]");
    BlochGenerator generator = BlochGenerator.stationary(device);
    Interval[] wide = {Interval.of(0.4999, 0.5001)};
    VerifiedSteadyState verified = VerifiedSteadyState.at(generator, wide).orElseThrow();
    for (String om : List.of("0.4999", "0.49996", "0.5", "0.50003", "0.5001")) {
      PreciseDevice precise = new PreciseDevice(device, List.of(new BigDecimal(om)));
      contains(generator, verified, precise.steadyState());
    }
  }
}
