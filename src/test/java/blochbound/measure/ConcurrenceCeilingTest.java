package blochbound.measure;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import blochbound.linalg.Hermitian;
import java.math.BigDecimal;
import org.junit.jupiter.api.Test;

/** The bounds of the concurrence from above, where their slack is put to the test. */
class ConcurrenceCeilingTest {
  private final Concurrence concurrence = new Concurrence();

  @Test
  void boundsHoldAlongTheLinesThatBendTheConcurrenceMost() {
    // C = 2 (r23 - sqrt(r11 r44)) bends like r44^(-3/2) / 4 as the double excitation shrinks.
    Hermitian near = ConcurrenceTest.xState(0.25, 0.328125, 0.328125, 0.09375, 0.3125, 0);
    for (int k = 0; k <= 24; k++) {
      double moved = k * 0x1p-8;
      checkAgainst(
          near,
          ConcurrenceTest.xState(0.25 + moved, 0.328125, 0.328125, 0.09375 - moved, 0.3125, 0));
    }
  }

  @Test
  void boundsHoldTowardsEveryPureState() {
    ExactStates states = new ExactStates(51, 2, 2);
    for (int k = 0; k < 60; k++) {
      Hermitian near = states.mixed(6);
      Hermitian pure = states.mixed(1);
      for (int power = 2; power <= 11; power += 3) {
        double weight = Math.scalb(1.0, -power);
        checkAgainst(near, near.combine(1 - weight, pure, weight));
      }
    }
  }

  private void checkAgainst(Hermitian near, Hermitian state) {
    PreciseMatrix exact = PreciseMatrix.of(state);
    double distance =
        Math.nextUp(exact.minus(PreciseMatrix.of(near)).frobeniusNorm().doubleValue());
    BigDecimal truth = PreciseMeasures.concurrence(exact).subtract(new BigDecimal("1e-20"));
    for (AffineBound bound : concurrence.upperBounds(near)) {
      double excess = bound.excess().applyAsDouble(distance);
      BigDecimal claim =
          PreciseMatrix.of(bound.operator()).inner(exact).add(new BigDecimal(excess));
      assertTrue(claim.compareTo(truth) >= 0, claim + " below " + truth + " at " + distance);
    }
  }

  @Test
  void separableStatesStaySeparableNearby() {
    Hermitian mixed = Hermitian.identity(4).scale(0.25);
    double above = Double.POSITIVE_INFINITY;
    for (AffineBound bound : concurrence.upperBounds(mixed)) {
      above = Math.min(above, bound.operator().inner(mixed) + bound.excess().applyAsDouble(0.05));
    }
    // [closed form] l1 - l2 - l3 - l4 = -1/2 there, and it changes by at most 2 * 0.05/sqrt(1/4).
    assertEquals(0, above);
  }

  @Test
  void oneSiteBoundIsExactForEntangledPureStates() {
    // [closed form] cos|gg> + sin|ee> with cos = 0.8: C = 2 * 0.8 * 0.6 = 0.96.
    Hermitian pure = ConcurrenceTest.xState(0.64, 0, 0, 0.36, 0, 0.48);
    AffineBound best = concurrence.upperBounds(pure).get(0);
    double above = best.operator().inner(pure) + best.excess().applyAsDouble(0);
    assertEquals(0.96, above, 1e-14);
    assertTrue(best.isGlobal());
  }

  @Test
  void gradientOfTheTangentIsTheGradientOfTheConcurrence() {
    ExactStates states = new ExactStates(52, 2, 2);
    int compared = 0;
    for (int k = 0; k < 40; k++) {
      Hermitian state = states.mixed(1).combine(0.75, Hermitian.identity(4), 0.0625);
      if (concurrence.value(state) > 0.05) {
        compared++;
        Hermitian g = concurrence.gradient(state);
        boolean found = false;
        for (AffineBound bound : concurrence.upperBounds(state)) {
          // [invariant] two routes: singular vectors, and the optimal decomposition.
          found |= bound.operator().combine(1, g, -1).matrix().frobeniusNorm() < 1e-11;
        }
        assertTrue(found);
      }
    }
    assertTrue(compared >= 10, "only " + compared + " entangled states");
  }
}
