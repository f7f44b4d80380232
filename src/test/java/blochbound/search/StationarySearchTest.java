package blochbound.search;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import blochbound.generator.BlochGenerator;
import blochbound.linalg.ComplexBall;
import blochbound.linalg.ComplexMatrix;
import blochbound.measure.LocatedMeasure;
import blochbound.measure.Measures;
import blochbound.measure.StationaryMeasure;
import blochbound.model.Ball;
import blochbound.model.Ball.Norm;
import blochbound.model.Device;
import blochbound.model.MeasureSpec;
import blochbound.model.Parameter;
import blochbound.model.Requirement.Sense;
import blochbound.model.StateSpec;
import java.math.BigDecimal;
import java.util.List;
import java.util.SplittableRandom;
import java.util.function.Supplier;
import java.util.stream.Stream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.Arguments;
import org.junit.jupiter.params.provider.EnumSource;
import org.junit.jupiter.params.provider.MethodSource;

/** Worst cases of steady states, and the gradients that lead to them. */
class StationarySearchTest {
  private static final SearchOptions QUICK = SearchOptions.withDefaults();
  private static final MeasureSpec EXCITED = new MeasureSpec.Population(0, List.of(1));

  @Test
  void worstExcitationOverABoxIsAtTheClosedFormPoint() {
    Device emitter =
        SmallDevices.emitter(
            SmallDevices.parameter("decay", "1", "0.9", "1.1"),
            SmallDevices.parameter("drive", "0.5", "0.45", "0.55"),
            SmallDevices.parameter("detuning", "0", "-0.1", "0.1"),
            Ball.unitBox());
    // [closed form] Om^2/(G^2 + 4 D^2 + 2 Om^2): largest at (0.9, 0.55, 0), D inside the box.
    SearchResult most = search(emitter, EXCITED, Sense.AT_MOST);
    assertEquals(-0.213780918727915, most.value(), 1e-12);
    assertArrayEquals(new double[] {-1, 1, 0}, most.z(), 1e-6);
    // [closed form] smallest at (1.1, 0.45, +-0.1).
    SearchResult least = search(emitter, EXCITED, Sense.AT_LEAST);
    assertEquals(0.122356495468278, least.value(), 1e-12);
    assertArrayEquals(
        new double[] {1, -1, 1}, new double[] {least.z()[0], least.z()[1], Math.abs(least.z()[2])});
  }

  @Test
  void largestCoherenceInsideTheRangeIsNotMissedForTheEnds() {
    Device emitter =
        SmallDevices.emitter(
            SmallDevices.parameter("decay", "1", "1", "1"),
            SmallDevices.parameter("drive", "0.75", "0.5", "1"),
            SmallDevices.parameter("detuning", "0", "0", "0"),
            Ball.unitBox());
    MeasureSpec coherence = mean(SmallDevices.Y.scale(-0.5));
    StationaryMeasure atEnds = stationary(emitter, coherence, Sense.AT_MOST);
    // [closed form] both ends of the range have the coherence 1/3.
    assertEquals(1.0 / 3, atEnds.value(new double[] {-1}), 1e-13);
    assertEquals(1.0 / 3, atEnds.value(new double[] {1}), 1e-13);
    // [closed form] the maximum 1/(2 sqrt2) at Om = G/sqrt2.
    SearchResult most = search(emitter, coherence, Sense.AT_MOST);
    assertEquals(-1 / (2 * Math.sqrt(2)), most.value(), 1e-10);
    assertEquals(Math.sqrt(0.5), 0.75 + 0.25 * most.z()[0], 1e-6);
  }

  @Test
  void concurrenceOfOppositelyDetunedEmittersIsWorstAtWeakDriveAndWideDetuning() {
    Device pair =
        SmallDevices.oppositeDetunings(
            SmallDevices.parameter("drive", "0.3", "0.2", "0.4"),
            SmallDevices.parameter("detuning", "0.3", "0.1", "0.5"));
    MeasureSpec concurrence = new MeasureSpec.Concurrence(0, 1);
    // [published] pure steady state of Stannigel, Rabl, Zoller, New J. Phys. 14 (2012) 063014, from
    // memory; its concurrence 2 a^2/(De^2 + 2 a^2) in [closed form], worst at (0.2, 0.5).
    SearchResult least = search(pair, concurrence, Sense.AT_LEAST);
    assertEquals(0.08 / (0.25 + 0.08), least.value(), 1e-9);
    // [closed form] best at (0.4, 0.1).
    SearchResult most = search(pair, concurrence, Sense.AT_MOST);
    assertEquals(-0.32 / (0.01 + 0.32), most.value(), 1e-9);
  }

  @Test
  void distanceToAStateOfTheBallFallsToZeroAtItsKink() {
    Device emitter =
        SmallDevices.emitter(
            SmallDevices.parameter("decay", "1", "0.8", "1.2"),
            SmallDevices.parameter("drive", "0.5", "0.3", "0.7"),
            SmallDevices.parameter("detuning", "0", "-0.3", "0.3"),
            Ball.unitBox());
    StationaryMeasure state = stationary(emitter, new MeasureSpec.Purity(), Sense.AT_LEAST);
    double purity = state.value(new double[] {0.3, -0.2, 0.5});
    ComplexMatrix reference = state.reduced(state.state()).matrix();
    assertTrue(purity < 1);
    MeasureSpec distance =
        new MeasureSpec.TraceDistance(new StateSpec.Mixed(new ComplexBall(reference, 1e-12)));
    // [closed form] the distance is 0 where the reference was made, and nowhere negative.
    SearchResult least = search(emitter, distance, Sense.AT_LEAST);
    assertTrue(least.value() >= 0);
    assertEquals(0, least.value(), 1e-6);
  }

  @ParameterizedTest(name = "{0}")
  @EnumSource(Norm.class)
  void pumpedPairIsWorseAtTheWorstPointThanAtRandomAndAtVertices(Norm norm) {
    Device pair = SmallDevices.pumpedPair(new Ball(norm, BigDecimal.ONE, List.of()));
    MeasureSpec concurrence = new MeasureSpec.Concurrence(0, 1);
    StationaryMeasure measure = stationary(pair, concurrence, Sense.AT_LEAST);
    SearchResult found = search(pair, concurrence, Sense.AT_LEAST);
    BallProjection ball = new BallProjection(norm);
    SplittableRandom random = new SplittableRandom(31);
    for (int draw = 0; draw < 500; draw++) {
      double[] z = ball.random(random, 10);
      double[] vertex =
          ball.project(random.doubles(10, -1, 1).map(x -> 9 * Math.signum(x)).toArray());
      assertTrue(found.value() <= measure.value(z));
      assertTrue(found.value() <= measure.value(vertex) + 1e-12);
    }
    assertEquals(found.value(), measure.value(found.z()), 1e-13);
    // [invariant] a thorough search cannot end above a quick one, and does not get far below here.
    SearchResult thorough =
        WorstCaseSearch.run(
            objectives(pair, concurrence, Sense.AT_LEAST),
            10,
            norm,
            QUICK.withEffort(SearchOptions.Effort.THOROUGH).withEvaluations(3000));
    assertTrue(thorough.value() <= found.value() + 1e-12);
    assertEquals(thorough.value(), found.value(), 1e-9);
  }

  /** Balls with their parameters: all norms, correlations, and a box with off-centre nominals. */
  static Stream<Arguments> balls() {
    List<Parameter> centred =
        List.of(
            SmallDevices.parameter("field", "0.3", "0.1", "0.5"),
            SmallDevices.parameter("amplitude", "0.8", "0.6", "1.0"),
            SmallDevices.parameter("rate", "0.5", "0.2", "0.8"),
            SmallDevices.parameter("ratio", "0.7", "0.4", "1.0"));
    List<Parameter> offCentre =
        List.of(
            SmallDevices.parameter("field", "0.3", "0.25", "0.5"),
            SmallDevices.parameter("amplitude", "0.8", "0.5", "0.9"),
            SmallDevices.parameter("rate", "0.5", "0.5", "0.8"),
            SmallDevices.parameter("ratio", "0.7", "0.7", "0.7"));
    List<Ball.Correlation> correlations =
        List.of(
            new Ball.Correlation(0, 1, new BigDecimal("0.6")),
            new Ball.Correlation(1, 3, new BigDecimal("-0.5")));
    BigDecimal one = BigDecimal.ONE;
    return Stream.of(
        Arguments.of("box", new Ball(Norm.BOX, one, List.of()), centred),
        Arguments.of("ellipsoid", new Ball(Norm.ELLIPSOID, one, List.of()), centred),
        Arguments.of("diamond", new Ball(Norm.DIAMOND, new BigDecimal("0.7"), List.of()), centred),
        Arguments.of("correlated", new Ball(Norm.ELLIPSOID, one, correlations), centred),
        Arguments.of("off-centre box", Ball.unitBox(), offCentre));
  }

  @ParameterizedTest(name = "{0}, seed 41")
  @MethodSource("balls")
  void gradientsAgreeWithCentralDifferences(String name, Ball ball, List<Parameter> parameters) {
    SplittableRandom random = new SplittableRandom(41);
    for (int draw = 0; draw < 8; draw++) {
      int sites = 1 + draw % 2;
      Device device = SmallDevices.random(sites, ball, parameters, random);
      BlochGenerator generator = BlochGenerator.of(device);
      int m = device.parameterSpace().coordinates();
      for (MeasureSpec spec :
          List.of(
              mean(SmallDevices.hermitian(random, 1 << sites).matrix()),
              new MeasureSpec.Purity(),
              new MeasureSpec.Entropy())) {
        LocatedMeasure measure = Measures.of(spec, device.space());
        for (Sense sense : Sense.values()) {
          StationaryMeasure plain = new StationaryMeasure(generator, measure, sense);
          Objective objective = Objective.stationary(generator, measure, sense);
          double[] z = new BallProjection(ball.norm()).random(random, m);
          double[] gradient = new double[m];
          double value = objective.value(z, gradient);
          assertEquals(objective.value(z), value);
          assertEquals(sense.sign() * plain.value(z), value, "sign of the sense");
          double[] expected = new double[m];
          new DifferenceObjective(objective::value, 1e-4).value(z, expected);
          // [independent] central differences: error step^2 times third derivatives below 10.
          assertArrayEquals(expected, gradient, 1e-7, name + " " + spec);
        }
      }
    }
  }

  @ParameterizedTest(name = "{0}, seed 42")
  @MethodSource("balls")
  void quickSearchIsBelowAllSamplesOfRandomDevices(
      String name, Ball ball, List<Parameter> parameters) {
    SplittableRandom random = new SplittableRandom(42);
    for (int draw = 0; draw < 6; draw++) {
      Device device = SmallDevices.random(1 + draw % 2, ball, parameters, random);
      MeasureSpec spec = mean(SmallDevices.hermitian(random, device.space().dimension()).matrix());
      Sense sense = draw % 2 == 0 ? Sense.AT_LEAST : Sense.AT_MOST;
      Supplier<Objective> objectives = objectives(device, spec, sense);
      int m = device.parameterSpace().coordinates();
      SearchResult found = WorstCaseSearch.run(objectives, m, ball.norm(), QUICK);
      Objective objective = objectives.get();
      for (int k = 0; k < 300; k++) {
        double[] z = new BallProjection(ball.norm()).random(random, m);
        assertTrue(found.value() <= objective.value(z));
      }
      // [invariant] the parameters found lie inside the ball in exact arithmetic.
      assertTrue(
          device.parameterSpace().contains(device.parameterSpace().decimalPointInside(found.z())));
    }
  }

  @Test
  void aDeviceWithoutTolerancesIsEvaluatedAtItsNominalPoint() {
    Device emitter =
        SmallDevices.emitter(
            SmallDevices.parameter("decay", "1", "1", "1"),
            SmallDevices.parameter("drive", "1", "1", "1"),
            SmallDevices.parameter("detuning", "0", "0", "0"),
            Ball.unitBox());
    // [closed form] p_e = Om^2/(G^2 + 2 Om^2) = 1/3.
    assertEquals(1.0 / 3, search(emitter, EXCITED, Sense.AT_LEAST).value(), 1e-14);
  }

  private static MeasureSpec mean(ComplexMatrix observable) {
    return new MeasureSpec.Mean(ComplexBall.exact(observable));
  }

  private static StationaryMeasure stationary(Device device, MeasureSpec spec, Sense sense) {
    return new StationaryMeasure(
        BlochGenerator.of(device), Measures.of(spec, device.space()), sense);
  }

  private static Supplier<Objective> objectives(Device device, MeasureSpec spec, Sense sense) {
    BlochGenerator generator = BlochGenerator.stationary(device);
    LocatedMeasure measure = Measures.of(spec, device.space());
    return () -> Objective.stationary(generator, measure, sense);
  }

  private static SearchResult search(Device device, MeasureSpec spec, Sense sense) {
    return WorstCaseSearch.run(
        objectives(device, spec, sense),
        device.parameterSpace().coordinates(),
        device.ball().norm(),
        QUICK);
  }
}
