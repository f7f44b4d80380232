package blochbound.interval;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.math.BigDecimal;
import org.apache.commons.math3.fraction.BigFraction;
import org.junit.jupiter.api.Test;

/**
 * Facts of interval arithmetic.
 *
 * <p>Source of the facts marked IEEE: IEEE Std 1788-2015; Moore, Kearfott, Cloud, <i>Introduction
 * to Interval Analysis</i> (2009); citations from memory.
 */
class IntervalTest {
  private static final double INFINITY = Double.POSITIVE_INFINITY;

  private static void assertTight(double lower, double upper, Interval actual) {
    assertTight(lower, upper, actual, 1);
  }

  /** Each operation may widen the exact set by one unit in the last place at each end. */
  private static void assertTight(double lower, double upper, Interval actual, int operations) {
    assertTrue(actual.lower() <= lower && upper <= actual.upper(), actual + " misses a member");
    double below = lower;
    double above = upper;
    for (int i = 0; i < operations; i++) {
      below = Math.nextDown(below);
      above = Math.nextUp(above);
    }
    assertTrue(actual.lower() >= below, actual + " is too wide below");
    assertTrue(actual.upper() <= above, actual + " is too wide above");
  }

  @Test
  void aDifferenceOfEqualIntervalsIsNotZero() {
    // [published] IEEE: [1,2] - [1,2] = [-1,1]
    assertTight(-1, 1, Interval.of(1, 2).minus(Interval.of(1, 2)));
  }

  @Test
  void theSquareKnowsThatItsFactorsAreEqual() {
    Interval x = Interval.of(-1, 2);
    // [published] IEEE: square([-1,2]) = [0,4]
    assertTight(0, 4, x.square());
    assertTrue(x.square().lower() >= 0);
    // [published] IEEE: [-1,2] * [-1,2] = [-2,4]
    assertTight(-2, 4, x.times(x));
  }

  @Test
  void theSquareRootActsOnThePartInsideItsDomain() {
    // [published] IEEE: sqrt([-1,4]) = [0,2]
    assertTight(0, 2, Interval.of(-1, 4).sqrt());
    assertEquals(0, Interval.of(-1, 4).sqrt().lower());
    assertTrue(Interval.of(-2, -1).sqrt().isEmpty());
    assertEquals(Interval.ZERO, Interval.ZERO.sqrt());
  }

  @Test
  void aDivisorWithZeroAtItsEndGivesAHalfLine() {
    Interval quotient = Interval.of(1, 2).dividedBy(Interval.of(0, 1));
    // [published] IEEE: [1,2]/[0,1] = [1,+inf]
    assertTight(1, INFINITY, quotient);
    // [closed form] mirror images of the same fact
    assertTight(-INFINITY, -1, Interval.of(-2, -1).dividedBy(Interval.of(0, 1)));
    assertTight(-INFINITY, -1, Interval.of(1, 2).dividedBy(Interval.of(-1, 0)));
    assertTight(1, INFINITY, Interval.of(-2, -1).dividedBy(Interval.of(-1, -0.0)));
  }

  @Test
  void aDivisorWithZeroInsideGivesAllReals() {
    // [published] IEEE: [1,2]/[-1,1] = entire
    assertEquals(Interval.ENTIRE, Interval.of(1, 2).dividedBy(Interval.of(-1, 1)));
    // [published] IEEE: 1/[0,0] = empty
    assertTrue(Interval.ONE.dividedBy(Interval.ZERO).isEmpty());
  }

  @Test
  void theEmptySetAbsorbsEveryOperation() {
    Interval x = Interval.of(1, 2);
    // [published] IEEE: the empty set absorbs every operation
    assertTrue(Interval.EMPTY.plus(x).isEmpty() && x.plus(Interval.EMPTY).isEmpty());
    assertTrue(Interval.EMPTY.minus(x).isEmpty() && x.minus(Interval.EMPTY).isEmpty());
    assertTrue(Interval.EMPTY.times(x).isEmpty() && x.times(Interval.EMPTY).isEmpty());
    assertTrue(Interval.EMPTY.dividedBy(x).isEmpty() && x.dividedBy(Interval.EMPTY).isEmpty());
    assertTrue(Interval.EMPTY.square().isEmpty() && Interval.EMPTY.sqrt().isEmpty());
    assertTrue(Interval.EMPTY.exp().isEmpty() && Interval.EMPTY.negate().isEmpty());
    assertTrue(Interval.EMPTY.sin().isEmpty() && Interval.EMPTY.cos().isEmpty());
    for (int exponent = -3; exponent <= 3; exponent++) {
      assertTrue(Interval.EMPTY.power(exponent).isEmpty());
    }
  }

  @Test
  void theEmptySetIsNeutralInAHullAndContainsNothing() {
    Interval x = Interval.of(1, 2);
    assertEquals(x, Interval.EMPTY.hull(x));
    assertEquals(x, x.hull(Interval.EMPTY));
    assertTrue(x.contains(Interval.EMPTY));
    assertFalse(Interval.EMPTY.contains(x));
    assertFalse(Interval.EMPTY.contains(0));
  }

  @Test
  void zeroTimesAllRealsIsZero() {
    // [published] IEEE: 0 * [entire] = [0,0]
    assertEquals(0, Interval.ZERO.times(Interval.ENTIRE).lower());
    assertEquals(0, Interval.ENTIRE.times(Interval.ZERO).upper());
  }

  @Test
  void theTextOneTenthIsEnclosedByNeighbouringDoubles() {
    // [published] IEEE 754: the double nearest 0.1 is 0.1000000000000000055511151231257827...
    Interval tenth = Interval.fromDecimal(new BigDecimal("0.1"));
    assertEquals(new Interval(Math.nextDown(0.1), 0.1), tenth);
  }

  @Test
  void oneThirdLiesBetweenItsNeighbours() {
    // [published] IEEE: 1/3 lies in [0x1.5555555555555p-2, next above]
    double below = 0x1.5555555555555p-2;
    assertEquals(
        new Interval(below, Math.nextUp(below)), Interval.fromFraction(new BigFraction(1, 3)));
    assertTrue(
        Interval.ONE.dividedBy(Interval.of(3)).contains(new Interval(below, Math.nextUp(below))));
  }

  @Test
  void naiveEvaluationOfAParabolaIsWiderThanItsRange() {
    Interval x = Interval.of(0, 1);
    // [published] Moore, Kearfott, Cloud: x(1-x) on [0,1] is [0,1] naively, [0,0.25] exactly
    assertTight(0, 1, x.times(Interval.ONE.minus(x)), 2);
    // [closed form] x(1-x) = 1/4 - (x-1/2)^2
    Interval completed = Interval.of(0.25).minus(x.minus(Interval.of(0.5)).square());
    assertTrue(completed.contains(Interval.of(0, 0.25)));
    assertTrue(completed.upper() <= Math.nextUp(0.25));
  }

  @Test
  void rumpsExpressionIsEnclosed() {
    Interval a = Interval.of(77617);
    Interval b = Interval.of(33096);
    Interval a2 = a.square();
    Interval b2 = b.square();
    Interval inner =
        Interval.of(11)
            .times(a2)
            .times(b2)
            .minus(b.power(6))
            .minus(Interval.of(121).times(b.power(4)))
            .minus(Interval.of(2));
    Interval value =
        Interval.of(333.75)
            .times(b.power(6))
            .plus(a2.times(inner))
            .plus(Interval.of(5.5).times(b.power(8)))
            .plus(a.dividedBy(Interval.of(2).times(b)));
    // [published] Rump (1988), citation from memory: -54767/66192 = -0.827396059946821368141165
    assertTrue(value.contains(Interval.fromFraction(new BigFraction(-54767, 66192))));
    assertTrue(value.lower() > Double.NEGATIVE_INFINITY && value.upper() < INFINITY);
  }

  @Test
  void overflowRoundsOutwardsToTheLargestDouble() {
    Interval most = Interval.of(Double.MAX_VALUE);
    // [invariant] a finite sum is never claimed to be infinite from below
    assertEquals(new Interval(Double.MAX_VALUE, INFINITY), most.plus(most));
    assertEquals(new Interval(-INFINITY, -Double.MAX_VALUE), most.negate().minus(most));
    assertEquals(new Interval(Double.MAX_VALUE, INFINITY), most.square());
    assertEquals(Double.MAX_VALUE, Interval.fromDecimal(new BigDecimal("1e400")).lower());
    assertEquals(-Double.MAX_VALUE, Interval.fromDecimal(new BigDecimal("-1e400")).upper());
    assertTrue(Interval.of(1000).exp().lower() > 1e308);
  }

  @Test
  void underflowRoundsOutwardsAroundZero() {
    Interval tiny = Interval.fromDecimal(new BigDecimal("1e-400"));
    assertTrue(tiny.lower() >= 0 && tiny.upper() > 0);
    assertTrue(Interval.of(1e-200).times(Interval.of(1e-200)).upper() > 0);
    assertTrue(Interval.of(-1e-200).times(Interval.of(1e-200)).lower() < 0);
    assertTrue(Interval.of(-2000).exp().upper() > 0);
    assertTrue(Interval.of(-2000).exp().lower() >= 0);
  }

  @Test
  void unboundedIntervalsHavePowersAndAFiniteMiddle() {
    Interval ray = new Interval(2, INFINITY);
    assertTight(8, INFINITY, ray.power(3), 4);
    assertEquals(Interval.ENTIRE, Interval.ENTIRE.power(3));
    assertEquals(INFINITY, Interval.ENTIRE.power(2).upper());
    for (Interval x : new Interval[] {ray, ray.negate(), Interval.ENTIRE}) {
      assertTrue(Double.isFinite(x.middle()) && x.contains(x.middle()), x.toString());
      assertEquals(INFINITY, x.radius());
    }
  }

  @Test
  void evenPowersOfIntervalsAroundZeroStartAtZero() {
    Interval x = Interval.of(-2, 1);
    assertTight(0, 4, x.power(2));
    assertTrue(x.power(4).contains(Interval.of(0, 16)) && x.power(4).lower() >= 0);
    assertTight(-8, 1, x.power(3), 4);
    assertEquals(Interval.ONE, x.power(0));
    // [closed form] 1/[1,2]^2 = [1/4, 1]
    assertTrue(Interval.of(1, 2).power(-2).contains(Interval.of(0.25, 1)));
  }

  @Test
  void cosineFindsItsExtremesInside() {
    // [closed form] cos has its maximum at 0 and its minimum at pi
    assertEquals(1, Interval.of(-0.1, 0.2).cos().upper());
    assertEquals(-1, Interval.of(3, 3.3).cos().lower());
    assertEquals(new Interval(-1, 1), Interval.of(0, 7).cos());
    assertEquals(new Interval(-1, 1), Interval.of(1e15, 1e15 + 1).cos());
    assertEquals(1, Interval.of(1.5, 1.6).sin().upper());
    assertTrue(Interval.of(0.1, 0.2).cos().upper() < 1);
  }

  @Test
  void cosineStaysNarrowFarFromZero() {
    // [closed form] the slope of cos is at most 1
    Interval wave = Interval.of(100, 100.1).cos();
    assertTrue(wave.upper() - wave.lower() <= 0.1 + 1e-15);
    assertTrue(wave.contains(Math.cos(100.05)));
  }

  @Test
  void zeroHasNoSign() {
    // [invariant] equal sets are equal intervals
    assertEquals(Interval.ZERO, new Interval(-0.0, -0.0));
    assertEquals(Interval.of(0, 1), Interval.of(-1, -0.0).negate());
  }

  @Test
  void endsOutOfOrderOrNotNumbersAreRefused() {
    assertThrows(IllegalArgumentException.class, () -> Interval.of(2, 1));
    assertThrows(IllegalArgumentException.class, () -> new Interval(Double.NaN, 1));
    assertThrows(IllegalArgumentException.class, () -> Interval.of(Double.NaN));
    assertThrows(IllegalArgumentException.class, () -> Interval.of(Double.NaN, Double.NaN));
    assertThrows(IllegalArgumentException.class, () -> Interval.of(INFINITY));
  }

  @Test
  void magnitudeAndMignitudeAreTheLargestAndSmallestDistanceFromZero() {
    assertEquals(3, Interval.of(-3, 2).magnitude());
    assertEquals(0, Interval.of(-3, 2).mignitude());
    assertEquals(2, Interval.of(-3, -2).mignitude());
  }
}
