package blochbound.measure;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import blochbound.interval.Interval;
import blochbound.linalg.ComplexMatrix;
import blochbound.linalg.Hermitian;
import java.math.BigDecimal;
import java.util.List;
import java.util.SplittableRandom;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.ValueSource;

/**
 * Concurrence and negativity of published families. The states are symmetric under exchange of the
 * two levels of both sites, or the formula is, so the order of the levels does not matter.
 */
class ConcurrenceTest {
  private final Concurrence concurrence = new Concurrence();
  private final Negativity negativity =
      new Negativity(new int[] {2, 2}, new boolean[] {false, true});

  @ParameterizedTest
  // [published] Werner, Phys. Rev. A 40 (1989) 4277; Wootters, PRL 80 (1998) 2245; Vidal, Werner,
  // PRA 65 (2002) 032314 (from memory): C = max(0, (3p-1)/2), N = C/2, purity (1 + 3 p^2)/4.
  @CsvSource({
    "0.2, 0, 0.28",
    "0.3333333333333333, 0, 0.3333333333333333",
    "0.5, 0.25, 0.4375",
    "0.9, 0.85, 0.8575"
  })
  void wernerStates(double p, double c, double purity) {
    Hermitian singlet = xState(0, 0.5, 0.5, 0, -0.5, 0);
    Hermitian state = singlet.combine(p, Hermitian.identity(4), (1 - p) / 4);
    assertValue(c, concurrence, state);
    assertValue(c / 2, negativity, state);
    assertValue(purity, new Purity(4), state);
  }

  @ParameterizedTest
  // [published] Bennett et al., PRA 54 (1996) 3824 (from memory): C = max(0, 2 lmax - 1), N = C/2.
  @CsvSource({"0.7, 0.1, 0.15, 0.05, 0.4", "0.4, 0.3, 0.2, 0.1, 0", "0.1, 0.55, 0.3, 0.05, 0.1"})
  void bellDiagonalStates(double a, double b, double c, double d, double expected) {
    Hermitian state =
        xState((a + b) / 2, (c + d) / 2, (c + d) / 2, (a + b) / 2, (c - d) / 2, (a - b) / 2);
    assertValue(expected, concurrence, state);
    assertValue(expected / 2, negativity, state);
  }

  @Test
  void xStates() {
    Hermitian first = xState(0.1, 0.4, 0.3, 0.2, 0.3, 0.02);
    // [published] Yu, Eberly, Quantum Inf. Comput. 7 (2007) 459 (from memory), closed form.
    assertValue(0.317157287525381, concurrence, first);
    assertValue(0.154138126514911, negativity, first);
    Hermitian second = new Hermitian(complexX());
    // [published] the same.
    assertValue(0.459250451276788, concurrence, second);
    assertValue(0.220156211871642, negativity, second);
    Hermitian third = xState(1 / 3.0, 1 / 3.0, 1 / 3.0, 0, 1 / 3.0, 0);
    // [published] the same: 2/3 and (sqrt 5 - 1)/6.
    assertValue(2 / 3.0, concurrence, third);
    assertValue(0.206011329583298, negativity, third);
  }

  private static ComplexMatrix complexX() {
    double[] re = new double[16];
    double[] im = new double[16];
    re[0] = 0.4;
    re[5] = 0.05;
    re[10] = 0.15;
    re[15] = 0.4;
    re[3] = 0.3;
    re[12] = 0.3;
    im[3] = 0.1;
    im[12] = -0.1;
    im[6] = 0.05;
    im[9] = -0.05;
    return ComplexMatrix.of(4, 4, re, im);
  }

  @ParameterizedTest
  // [published] Munro, James, White, Kwiat, PRA 64 (2001) 030302 (from memory): C = g.
  @CsvSource({"0.4, 0.413333333333333", "0.6666666666666666, 0.555555555555556", "0.8, 0.68"})
  void maximallyEntangledMixedStates(double g, double purity) {
    double h = g >= 2 / 3.0 ? g / 2 : 1 / 3.0;
    Hermitian state = xState(h, 1 - 2 * h, 0, h, 0, g / 2);
    assertValue(g, concurrence, state);
    assertValue(purity, new Purity(4), state);
  }

  @ParameterizedTest
  // [published] Ishizaka, Hiroshima, PRA 62 (2000) 022310; Verstraete, Audenaert, De Moor, PRA 64
  // (2001) 012316 (from memory): most concurrence at a spectrum max(0, l1 - l3 - 2 sqrt(l2 l4)).
  @CsvSource({
    "0.6, 0.25, 0.1, 0.05, 0.276393202250021",
    "0.5, 0.3, 0.15, 0.05, 0.105051025721682",
    "0.45, 0.25, 0.2, 0.1, 0"
  })
  void noUnitaryExceedsTheMostConcurrenceAtASpectrum(
      double a, double b, double c, double d, double most) {
    Hermitian best = xState(b, (a + c) / 2, (a + c) / 2, d, (a - c) / 2, 0);
    assertValue(most, concurrence, best);
    ExactStates states = new ExactStates(21, 2, 2);
    for (int k = 0; k < 40; k++) {
      ComplexMatrix u = states.noise(1).eigen().vectors();
      Hermitian turned = Hermitian.part(u.times(best.matrix()).times(u.adjoint()));
      // The matrix is within 1e-14 of a state of that spectrum: its enclosure must reach the limit.
      assertTrue(concurrence.enclosure(turned, 1e-14).lower() <= most + 1e-15);
    }
  }

  @Test
  void everyMatrixGivesALowerWitness() {
    SplittableRandom random = new SplittableRandom(22);
    ExactStates states = new ExactStates(23, 2, 2);
    for (int k = 0; k < 40; k++) {
      PreciseMatrix state = PreciseMatrix.of(states.next(k));
      BigDecimal truth = PreciseMeasures.concurrence(state).add(new BigDecimal("1e-20"));
      for (int draw = 0; draw < 25; draw++) {
        AffineBound bound = random(random).bound();
        BigDecimal claim =
            PreciseMatrix.of(bound.operator())
                .inner(state)
                .subtract(new BigDecimal(bound.excess().applyAsDouble(0)));
        // [published] Verstraete, Dehaene, De Moor, PRA 64 (2001) 010101 (from memory).
        assertTrue(claim.compareTo(truth) <= 0, claim + " above " + truth);
      }
    }
  }

  private static TwoSiteWitness random(SplittableRandom random) {
    TwoSiteWitness witness = new TwoSiteWitness();
    double scale = Math.exp(random.nextDouble(-5, 5));
    for (int i = 0; i < 4; i++) {
      witness.re[i] = scale * random.nextDouble(-1, 1);
      witness.im[i] = scale * random.nextDouble(-1, 1);
    }
    return witness;
  }

  @Test
  void nearlySingularWitnessStaysFiniteAndValid() {
    TwoSiteWitness witness = new TwoSiteWitness();
    // det = 1e-9 - 1e-9 up to rounding of the products: t becomes small, not infinite.
    System.arraycopy(new double[] {1, 1e-3, 1e-6, 1e-9}, 0, witness.re, 0, 4);
    AffineBound bound = witness.bound();
    assertTrue(bound.operator().matrix().isFinite());
    assertFalse(witness.normalise());
  }

  @Test
  void bellStateIsWitnessedByTheSinglet() {
    Hermitian bell = xState(0.5, 0, 0, 0.5, 0, 0.5);
    AffineBound best = concurrence.lowerBounds(bell).get(0);
    // [closed form] |A> = sqrt(2) |psi->, value 1.
    assertEquals(1, best.operator().inner(bell), 1e-9);
    TwoSiteWitness singlet = new TwoSiteWitness();
    singlet.re[1] = 1;
    singlet.re[2] = -1;
    assertEquals(1, singlet.bound().operator().inner(bell), 1e-14);
  }

  @ParameterizedTest(name = "ground share {0}")
  @ValueSource(doubles = {0.05, 0.3, 0.7})
  void coldDecayStateLosesTheRootOfTheMixture(double p) {
    Hermitian state = xState(p, (1 - p) / 2, (1 - p) / 2, 0, (1 - p) / 2, 0);
    for (double mixture : new double[] {1e-5, 1e-11}) {
      ConcurrenceKernel kernel = new ConcurrenceKernel();
      kernel.prepare(state, mixture);
      kernel.formGradient();
      TwoSiteWitness witness = new TwoSiteWitness();
      assertTrue(witness.takeFrom(kernel));
      double loss = 1 - p - witness.bound().operator().inner(state);
      // [closed form] C = 2 (|r23| - sqrt(r11 r44)), tangent at r11 = p, r44 = mixture/4 taken at
      // r44 = 0: sqrt(p mixture)/2, at most 1.6e-3 and 1.6e-6, to first order in sqrt(mixture).
      assertEquals(Math.sqrt(p * mixture) / 2, loss, 0.02 * Math.sqrt(p * mixture));
    }
  }

  @ParameterizedTest(name = "ground share {0}")
  @ValueSource(doubles = {0.05, 0.3, 0.7})
  void coldDecayStateIsWitnessedToAMillionth(double p) {
    Hermitian state = xState(p, (1 - p) / 2, (1 - p) / 2, 0, (1 - p) / 2, 0);
    assertValue(1 - p, concurrence, state);
    List<AffineBound> bounds = concurrence.lowerBounds(state);
    AffineBound best = bounds.get(0);
    double value = best.operator().inner(state) - best.excess().applyAsDouble(0);
    // [closed form] 1 - p, less sqrt(p 1e-11)/2.
    assertTrue(value >= 1 - p - 1.6e-6, value + " for " + (1 - p));
    assertTrue(bounds.size() >= 4, "flat and sharp candidates are offered: " + bounds.size());
  }

  @Test
  void negativityAndConcurrenceKeepTheirSandwich() {
    ExactStates states = new ExactStates(24, 2, 2);
    for (int k = 0; k < 200; k++) {
      Hermitian state = states.next(k);
      Interval c = concurrence.enclosure(state, 0);
      Interval n = negativity.enclosure(state, 0);
      // [published] Verstraete, Audenaert, Dehaene, De Moor, J. Phys. A 34 (2001) 10327 (from
      // memory): sqrt((1-C)^2 + C^2) - (1-C) <= 2N <= C; the left side grows with C.
      assertTrue(2 * n.lower() <= c.upper());
      double low = c.lower();
      assertTrue(Math.sqrt((1 - low) * (1 - low) + low * low) - (1 - low) <= 2 * n.upper() + 1e-15);
    }
  }

  @Test
  void concurrenceIsConvex() {
    ExactStates states = new ExactStates(25, 2, 2);
    for (int k = 0; k < 200; k++) {
      Hermitian a = states.next(k);
      Hermitian b = states.next(k / 8);
      Hermitian half = a.combine(0.5, b, 0.5);
      // [published] Uhlmann, PRA 62 (2000) 032307; Wootters (1998) (from memory).
      double most =
          0.5 * concurrence.enclosure(a, 0).upper() + 0.5 * concurrence.enclosure(b, 0).upper();
      assertTrue(concurrence.enclosure(half, 0).lower() <= most);
    }
  }

  @Test
  void localTurnsLeaveTheValue() {
    ExactStates states = new ExactStates(26, 2, 2);
    ExactStates single = new ExactStates(27, 1, 2);
    for (int k = 0; k < 64; k++) {
      Hermitian state = states.mixed(1 + k % 5);
      ComplexMatrix u = single.noise(1).eigen().vectors().kron(single.noise(1).eigen().vectors());
      Hermitian turned = Hermitian.part(u.times(state.matrix()).times(u.adjoint()));
      // [invariant] under local unitaries; three digits lost where an eigenvalue is small.
      assertEquals(concurrence.value(state), concurrence.value(turned), 1e-12);
    }
  }

  @Test
  void upperTangentIsFirstOrderSharpInsideTheStates() {
    Hermitian bell = xState(0.5, 0, 0, 0.5, 0, 0.5);
    Hermitian state = bell.combine(0.8, Hermitian.identity(4), 0.05);
    Hermitian moved = state.combine(1, xState(1, 0, 0, -1, 0, 0), 1e-5);
    double above = 1;
    for (AffineBound bound : concurrence.upperBounds(state)) {
      double value = bound.operator().inner(moved) + bound.excess().applyAsDouble(1.5e-5);
      above = Math.min(above, value);
    }
    // [closed form] remainder about (delta/m)^2 with m = 0.05: 1e-7.
    assertEquals(concurrence.value(moved), above, 2e-7);
  }

  private static void assertValue(double expected, Measure measure, Hermitian state) {
    assertEquals(expected, measure.value(state), 1e-12);
    Interval enclosure = measure.enclosure(state, 1e-15);
    // Entries are decimals rounded to doubles: within 1e-15 of the state meant.
    assertTrue(
        enclosure.lower() <= expected + 1e-15 && enclosure.upper() >= expected - 1e-15,
        expected + " outside " + enclosure);
  }

  /** The real X-shaped matrix of four diagonal and two off-diagonal entries. */
  static Hermitian xState(double a, double b, double c, double d, double inner, double outer) {
    return new Hermitian(
        ComplexMatrix.real(
            new double[][] {
              {a, 0, 0, outer}, {0, b, inner, 0}, {0, inner, c, 0}, {outer, 0, 0, d}
            }));
  }
}
