package blochbound.measure;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import blochbound.check.BrokenGuaranteeException;
import blochbound.interval.Interval;
import blochbound.linalg.Hermitian;
import java.math.BigDecimal;
import java.util.ArrayList;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.TestInstance;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

/**
 * What every measure must do, run by each implementation.
 *
 * <p>States are exact in their doubles ({@link ExactStates}); the true value comes from the
 * definition in 50-digit decimals ({@link PreciseMeasures}), which errs by less than 1e-20 (roots
 * of eigenvalues that err by 1e-45), and tr(W rho) is evaluated exactly. So one-sided claims are
 * held without any tolerance for double rounding; 1e-20 stands for the error of the reference
 * itself.
 */
@TestInstance(TestInstance.Lifecycle.PER_CLASS)
abstract class MeasureContract {
  private static final BigDecimal REFERENCE_ERROR = new BigDecimal("1e-20");
  private static final int STATES = 48;

  abstract Measure measure();

  /** Level counts of the two factors the states are drawn on. */
  int[] factors() {
    return new int[] {2, 2};
  }

  /** The measure by its definition. */
  abstract BigDecimal precise(PreciseMatrix state);

  /** Bound of the error of {@code value} at exact states. */
  double valueError() {
    return 1e-13;
  }

  /** Bound of what the best lower bound loses at the state itself, or infinity. */
  abstract double lowerLoss();

  /** Bound of what the best upper bound loses at the state itself, or infinity. */
  abstract double upperLoss();

  private ExactStates states(long seed) {
    return new ExactStates(seed, factors()[0], factors()[1]);
  }

  /** An exact state, a matrix to make bounds at, their distance, and the true value. */
  private record Draw(Hermitian state, Hermitian near, double distance, BigDecimal truth) {}

  private final Map<Long, List<Draw>> drawn = new HashMap<>();

  private List<Draw> draws(long seed) {
    return drawn.computeIfAbsent(seed, this::draw);
  }

  private List<Draw> draw(long seed) {
    ExactStates states = states(seed);
    List<Draw> draws = new ArrayList<>();
    for (int k = 0; k < STATES; k++) {
      Hermitian state = states.next(k);
      Hermitian near = states.near(state, k / 8);
      BigDecimal truth = precise(PreciseMatrix.of(state));
      draws.add(new Draw(state, near, distanceUp(state, near), truth));
    }
    return draws;
  }

  private static double distanceUp(Hermitian a, Hermitian b) {
    double norm = PreciseMatrix.of(a).minus(PreciseMatrix.of(b)).frobeniusNorm().doubleValue();
    return norm == 0 ? 0 : Math.nextUp(norm);
  }

  private static BigDecimal affine(AffineBound bound, Hermitian state) {
    return PreciseMatrix.of(bound.operator()).inner(PreciseMatrix.of(state));
  }

  @ParameterizedTest(name = "seed {0}")
  @ValueSource(longs = {1, 2, 3})
  void lowerBoundsStayBelowTheMeasureAtExactStates(long seed) {
    for (Draw draw : draws(seed)) {
      BigDecimal truth = draw.truth.add(REFERENCE_ERROR);
      for (AffineBound bound : measure().lowerBounds(draw.near)) {
        double excess = bound.excess().applyAsDouble(draw.distance);
        assertFalse(Double.isNaN(excess));
        if (excess < Double.POSITIVE_INFINITY) {
          BigDecimal claim = affine(bound, draw.state).subtract(new BigDecimal(excess));
          assertTrue(claim.compareTo(truth) <= 0, claim + " above " + truth + draw);
        }
      }
    }
  }

  @ParameterizedTest(name = "seed {0}")
  @ValueSource(longs = {1, 2, 3})
  void upperBoundsStayAboveTheMeasureAtExactStates(long seed) {
    for (Draw draw : draws(seed)) {
      BigDecimal truth = draw.truth.subtract(REFERENCE_ERROR);
      for (AffineBound bound : measure().upperBounds(draw.near)) {
        double excess = bound.excess().applyAsDouble(draw.distance);
        assertFalse(Double.isNaN(excess));
        if (excess < Double.POSITIVE_INFINITY) {
          BigDecimal claim = affine(bound, draw.state).add(new BigDecimal(excess));
          assertTrue(claim.compareTo(truth) >= 0, claim + " below " + truth + draw);
        }
      }
    }
  }

  @ParameterizedTest(name = "seed {0}")
  @ValueSource(longs = {1, 2, 3})
  void enclosureContainsTheMeasureOfEveryStateInReach(long seed) {
    for (Draw draw : draws(seed)) {
      Interval enclosure = measure().enclosure(draw.near, draw.distance);
      BigDecimal lower = new BigDecimal(enclosure.lower()).subtract(REFERENCE_ERROR);
      BigDecimal upper = new BigDecimal(enclosure.upper()).add(REFERENCE_ERROR);
      assertTrue(
          lower.compareTo(draw.truth) <= 0 && upper.compareTo(draw.truth) >= 0,
          enclosure + " misses " + draw);
      assertTrue(measure().range().contains(enclosure));
    }
  }

  @Test
  void enclosureAtTheAccuracyOfASolveIsNarrowForEveryKindOfState() {
    ExactStates states = states(9);
    for (int k = 0; k < STATES; k++) {
      Hermitian near = states.next(k).combine(1, states.noise(3e-14), 1);
      Interval enclosure = measure().enclosure(near, 1e-13);
      // [invariant] square-root continuity allows 2 sqrt(2e-13) = 9e-7 on either side.
      assertTrue(
          enclosure.upper() - enclosure.lower() <= 2e-6, k + ": " + enclosure + " at " + near);
    }
  }

  @Test
  void valueMeetsTheDefinition() {
    List<Draw> draws = draws(1);
    for (int k = 0; k < STATES; k++) {
      // Kind 4 has an eigenvalue of about 1e-12, which square roots of doubles blur.
      double allowed = k % 8 == 4 ? Math.max(valueError(), 1e-9) : valueError();
      double value = measure().value(draws.get(k).state);
      assertEquals(draws.get(k).truth.doubleValue(), value, allowed, "" + draws.get(k));
    }
  }

  @Test
  void bestBoundsMeetTheMeasureAtTheStateTheyAreMadeAt() {
    ExactStates states = states(11);
    for (int k = 0; k < STATES; k++) {
      Hermitian state = states.next(k);
      double truth = measure().value(state);
      AffineBound lower = measure().lowerBounds(state).get(0);
      double below = lower.operator().inner(state) - lower.excess().applyAsDouble(0);
      AffineBound upper = measure().upperBounds(state).get(0);
      double above = upper.operator().inner(state) + upper.excess().applyAsDouble(0);
      assertTrue(below >= truth - lowerLoss(), k + ": " + below + " far below " + truth);
      assertTrue(above <= truth + upperLoss(), k + ": " + above + " far above " + truth);
    }
  }

  @Test
  void boundsAreOrderedByTheirValueAtTheMatrix() {
    ExactStates states = states(12);
    for (int k = 0; k < STATES; k++) {
      Hermitian near = states.next(k);
      double last = Double.POSITIVE_INFINITY;
      List<AffineBound> bounds = measure().lowerBounds(near);
      // The constant bound stands last whatever its value.
      for (AffineBound bound : bounds.subList(0, Math.max(1, bounds.size() - 1))) {
        double value = bound.operator().inner(near) - bound.excess().applyAsDouble(0);
        assertTrue(value <= last);
        last = value;
      }
    }
  }

  @Test
  void excessDoesNotDecreaseWithTheDistance() {
    ExactStates states = states(13);
    for (int k = 0; k < 16; k++) {
      Hermitian near = states.near(states.next(k), k);
      for (List<AffineBound> bounds :
          List.of(measure().lowerBounds(near), measure().upperBounds(near))) {
        for (AffineBound bound : bounds) {
          double last = 0;
          for (double distance = 1e-15; distance < 2; distance *= 3) {
            double excess = bound.excess().applyAsDouble(distance);
            assertTrue(excess >= last, excess + " after " + last);
            assertTrue(!bound.isGlobal() || excess == bound.excess().applyAsDouble(0));
            last = excess;
          }
        }
      }
    }
  }

  @Test
  void gradientMeetsCentralDifferences() {
    ExactStates states = states(14);
    for (int k = 0; k < 12; k++) {
      // Well inside the states, where the measure is smooth unless two branches meet.
      int n = states.size();
      Hermitian state =
          states
              .mixed(1)
              .combine(0.8, Hermitian.identity(n), 0.2 / n)
              .combine(1, states.noise(1e-3), 1);
      Hermitian direction = states.noise(1);
      double h = 1e-5;
      double difference =
          (measure().value(state.combine(1, direction, h))
                  - measure().value(state.combine(1, direction, -h)))
              / (2 * h);
      // [invariant] error h^2 of the third derivative and 1e-16/h of rounding.
      assertEquals(difference, measure().gradient(state).inner(direction), 2e-6, "" + k);
    }
  }

  @Test
  void distantMatrixIsToldToBeNoState() {
    int n = states(15).size();
    Hermitian far = Hermitian.identity(n).scale(7).shift(0.5);
    // A tight distance around a matrix of trace 7.5 n contradicts itself for any measure but one
    // whose bounds do not notice; then the enclosure still lies in the range.
    try {
      assertTrue(measure().range().contains(measure().enclosure(far, 1e-13)));
    } catch (BrokenGuaranteeException contradiction) {
      assertTrue(contradiction.getMessage().startsWith("no state lies that near"));
    }
  }

  @Test
  void matrixOfAnotherSizeIsRefused() {
    Hermitian other = Hermitian.identity(measure().dimension() + 1);
    assertThrows(IllegalArgumentException.class, () -> measure().enclosure(other, 0.1));
    assertThrows(
        IllegalArgumentException.class,
        () -> measure().enclosure(Hermitian.identity(measure().dimension()), Double.NaN));
  }
}
