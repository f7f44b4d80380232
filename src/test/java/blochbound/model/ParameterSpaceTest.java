package blochbound.model;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import blochbound.BigReference;
import blochbound.interval.Interval;
import blochbound.model.Ball.Norm;
import java.math.BigDecimal;
import java.util.ArrayList;
import java.util.List;
import java.util.SplittableRandom;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;

/** Coordinates of the tolerance ball. */
class ParameterSpaceTest {
  private static List<BigDecimal> decimals(String... texts) {
    List<BigDecimal> out = new ArrayList<>();
    for (String text : texts) {
      out.add(new BigDecimal(text));
    }
    return out;
  }

  private static ParameterSpace pair(Norm norm, String radius, String... correlation) {
    List<Ball.Correlation> correlations =
        correlation.length == 0
            ? List.of()
            : List.of(new Ball.Correlation(0, 1, new BigDecimal(correlation[0])));
    return ParameterSpace.of(
        List.of(Parameters.of("a", "0", "1", "2"), Parameters.of("b", "9", "10", "11")),
        new Ball(norm, new BigDecimal(radius), correlations));
  }

  @Test
  void anOffCentreBoxIsCentredOnItsRange() {
    ParameterSpace space =
        ParameterSpace.of(
            List.of(Parameters.of("a", "0.9", "1", "1.3")),
            new Ball(Norm.BOX, new BigDecimal("0.5"), List.of()));
    // [closed form] at radius 1/2 the range is [0.95, 1.15], its centre 1.05
    assertEquals(List.of(new BigDecimal("1.15")), space.decimalPointInside(new double[] {1}));
    assertEquals(List.of(new BigDecimal("0.95")), space.decimalPointInside(new double[] {-1}));
    assertEquals(1.05, space.parametersAt(new double[] {0})[0], 1e-15);
    // [closed form] the nominal value 1 is at (1 - 1.05)/0.1 = -1/2
    assertEquals(-0.5, space.nominalCoordinates()[0], 1e-15);
    assertTrue(space.contains(decimals("1.15")));
    assertFalse(space.contains(decimals("1.1500000000000000000000001")));
  }

  @Test
  void onlyABoxMayBeOffCentre() {
    List<Parameter> offCentre = List.of(Parameters.of("a", "0.9", "1", "1.3"));
    for (Norm norm : List.of(Norm.ELLIPSOID, Norm.DIAMOND)) {
      Ball ball = new Ball(norm, BigDecimal.ONE, List.of());
      IllegalArgumentException fault =
          assertThrows(IllegalArgumentException.class, () -> ParameterSpace.of(offCentre, ball));
      assertEquals("an off-centre nominal value of a needs the norm inf", fault.getMessage());
    }
  }

  @Test
  void constantsHaveNoCoordinate() {
    ParameterSpace space =
        ParameterSpace.of(
            List.of(Parameters.of("c", "3", "3", "3"), Parameters.of("a", "0", "1", "2")),
            Ball.unitBox());
    assertEquals(1, space.coordinates());
    assertEquals(1, space.parameterOf(0));
    assertEquals(-1, space.coordinateOf(0));
    assertEquals(decimals("3", "2"), space.decimalPointInside(new double[] {1}));
    assertFalse(space.contains(decimals("3.1", "1")));
  }

  @Test
  void aBallOfRadiusZeroIsTheNominalPoint() {
    ParameterSpace space = pair(Norm.BOX, "0");
    assertEquals(0, space.coordinates());
    assertTrue(space.contains(decimals("1", "10")));
    assertFalse(space.contains(decimals("1", "10.001")));
    assertEquals(decimals("1", "10"), space.decimalPointInside(new double[0]));
  }

  @Test
  void membershipFollowsTheNorm() {
    // [closed form] (0.6, 0.8) lies on the circle, outside the diamond, inside the square
    List<BigDecimal> point = decimals("1.6", "10.8");
    assertTrue(pair(Norm.BOX, "1").contains(point));
    assertTrue(pair(Norm.ELLIPSOID, "1").contains(point));
    assertFalse(pair(Norm.DIAMOND, "1").contains(point));
    assertFalse(pair(Norm.ELLIPSOID, "1").contains(decimals("1.6", "10.80000000000000000001")));
    assertTrue(pair(Norm.DIAMOND, "1").contains(decimals("1.6", "10.4")));
    assertFalse(pair(Norm.DIAMOND, "1").contains(decimals("1.6", "10.40000000000000000001")));
  }

  @Test
  void aCorrelatedEllipsoidIsLongAlongItsDiagonal() {
    ParameterSpace space = pair(Norm.ELLIPSOID, "1", "0.6");
    // [closed form] t' R^-1 t = (t1^2 + t2^2 - 2 r t1 t2)/(1 - r^2): (s, s) has 2 s^2/(1 + r)
    assertTrue(space.contains(decimals("1.89", "10.89")));
    assertFalse(space.contains(decimals("1.9", "10.9")));
    // [closed form] (s, -s) has 2 s^2/(1 - r): the rim is at sqrt(0.2) = 0.4472...
    assertTrue(space.contains(decimals("1.447", "9.553")));
    assertFalse(space.contains(decimals("1.448", "9.552")));
    // [closed form] the Cholesky factor of [[1, r], [r, 1]] is [[1, 0], [r, sqrt(1 - r^2)]]
    assertTrue(space.slope(1, 0).contains(0.6) && space.slope(1, 1).contains(0.8));
    assertTrue(space.slope(1, 0).radius() < 1e-15 && space.slope(1, 1).radius() < 1e-15);
    assertEquals(0, space.slope(0, 1).magnitude());
  }

  @Test
  void correlationsThatAreNotPositiveDefiniteAreRefused() {
    List<Parameter> three =
        List.of(
            Parameters.of("a", "0", "1", "2"),
            Parameters.of("b", "0", "1", "2"),
            Parameters.of("c", "0", "1", "2"));
    BigDecimal r = new BigDecimal("0.9");
    List<Ball.Correlation> impossible =
        List.of(
            new Ball.Correlation(0, 1, r),
            new Ball.Correlation(1, 2, r),
            new Ball.Correlation(0, 2, r.negate()));
    Ball ball = new Ball(Norm.ELLIPSOID, BigDecimal.ONE, impossible);
    String message =
        assertThrows(IllegalArgumentException.class, () -> ParameterSpace.of(three, ball))
            .getMessage();
    assertTrue(message.contains("positive definite (at c)"), message);
  }

  @Test
  void aCorrelationIsBetweenTwoParametersThatMayDiffer() {
    assertThrows(
        IllegalArgumentException.class, () -> new Ball.Correlation(1, 1, new BigDecimal("0.5")));
    assertThrows(IllegalArgumentException.class, () -> new Ball.Correlation(0, 1, BigDecimal.ONE));
    List<Ball.Correlation> one = List.of(new Ball.Correlation(0, 1, BigDecimal.ZERO));
    assertThrows(IllegalArgumentException.class, () -> new Ball(Norm.BOX, BigDecimal.ONE, one));
  }

  @Test
  void cyclesAreEnclosedInRadians() {
    ParameterSpace space =
        ParameterSpace.of(
            List.of(Parameters.of("shift", "-8", "0", "8", Parameters.KILOHERTZ)), Ball.unitBox());
    Interval range = space.ranges()[0];
    // [closed form] 8 kHz are 0.016 pi rad/us
    BigDecimal end = BigReference.PI.multiply(new BigDecimal("0.016"));
    assertTrue(new BigDecimal(range.upper()).compareTo(end) >= 0);
    assertTrue(new BigDecimal(range.lower()).compareTo(end.negate()) <= 0);
    assertEquals(decimals("8"), space.decimalPointInside(new double[] {1}));
  }

  @Test
  void aRangeThatTouchesZeroKeepsItsEndAtZero() {
    ParameterSpace space =
        ParameterSpace.of(
            List.of(Parameters.of("rate", "0", "0.3", "0.6", Parameters.KILOHERTZ)),
            Ball.unitBox());
    assertEquals(0, space.ranges()[0].lower());
  }

  @ParameterizedTest(name = "seed {0}")
  @MethodSource("blochbound.Draws#seeds")
  void decimalPointsLieInTheBallExactlyAndNearTheirCoordinates(long seed) {
    SplittableRandom random = new SplittableRandom(seed);
    ParameterSpace space = Parameters.random(random);
    double[] z = Parameters.coordinates(random, space);
    List<BigDecimal> point = space.decimalPointInside(z);
    // [invariant] what is printed is a device of the ball
    assertTrue(space.contains(point), () -> point + " is outside");
    double[] back = space.coordinatesOf(point);
    assertArrayEquals(z, back, 1e-9);
  }

  @ParameterizedTest(name = "seed {0}")
  @MethodSource("blochbound.Draws#seeds")
  void coordinatesUndoParameters(long seed) {
    SplittableRandom random = new SplittableRandom(seed);
    ParameterSpace space = Parameters.random(random);
    double[] z = Parameters.coordinates(random, space);
    double[] p = space.parametersAt(z);
    List<BigDecimal> point = new ArrayList<>();
    for (int i = 0; i < p.length; i++) {
      Parameter parameter = space.parameters().get(i);
      double factor = parameter.unit().factor().doubleValue();
      point.add(parameter.isConstant() ? parameter.nominal() : new BigDecimal(p[i] / factor));
    }
    // Correlations up to 0.99 and nominal values far larger than the tolerance cost a few digits.
    assertArrayEquals(z, space.coordinatesOf(point), 1e-9);
  }

  @ParameterizedTest(name = "seed {0}")
  @MethodSource("blochbound.Draws#seeds")
  void rangesHoldEveryPointOfTheBall(long seed) {
    SplittableRandom random = new SplittableRandom(seed);
    ParameterSpace space = Parameters.random(random);
    List<BigDecimal> point = space.decimalPointInside(Parameters.coordinates(random, space));
    Interval[] ranges = space.ranges();
    Interval[] values = space.internalValues(point);
    for (int i = 0; i < ranges.length; i++) {
      BigDecimal exact = internal(space.parameters().get(i), point.get(i));
      assertTrue(new BigDecimal(ranges[i].lower()).compareTo(exact) <= 0);
      assertTrue(new BigDecimal(ranges[i].upper()).compareTo(exact) >= 0);
      assertTrue(new BigDecimal(values[i].lower()).compareTo(exact) <= 0);
      assertTrue(new BigDecimal(values[i].upper()).compareTo(exact) >= 0);
    }
  }

  /** The exact value in internal units, pi to 90 digits. */
  private static BigDecimal internal(Parameter parameter, BigDecimal value) {
    return parameter.unit().equals(Parameters.KILOHERTZ)
        ? value.multiply(BigReference.PI).multiply(new BigDecimal("0.002"))
        : value;
  }

  @ParameterizedTest(name = "seed {0}")
  @MethodSource("blochbound.Draws#seeds")
  void slopesEncloseTheEllipsoid(long seed) {
    SplittableRandom random = new SplittableRandom(seed);
    BigDecimal r = BigDecimal.valueOf(random.nextInt(-999, 1000), 3);
    ParameterSpace space = pair(Norm.ELLIPSOID, "1", r.toPlainString());
    // [closed form] rows of the Cholesky factor: (1, 0) and (r, sqrt(1 - r^2))
    BigDecimal second = BigDecimal.ONE.subtract(r.pow(2)).sqrt(BigReference.DIGITS);
    assertTrue(new BigDecimal(space.slope(1, 0).lower()).compareTo(r) <= 0);
    assertTrue(new BigDecimal(space.slope(1, 0).upper()).compareTo(r) >= 0);
    assertTrue(new BigDecimal(space.slope(1, 1).lower()).compareTo(second) <= 0);
    assertTrue(new BigDecimal(space.slope(1, 1).upper()).compareTo(second) >= 0);
  }
}
