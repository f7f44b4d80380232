package blochbound.measure;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import blochbound.interval.Interval;
import blochbound.linalg.ComplexBall;
import blochbound.linalg.ComplexMatrix;
import blochbound.linalg.Hermitian;
import blochbound.model.HilbertSpace;
import blochbound.model.MeasureSpec;
import blochbound.model.Site;
import blochbound.model.StateSpec;
import java.util.List;
import java.util.SplittableRandom;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

class MeasuresTest {
  private static final HilbertSpace CHIP =
      new HilbertSpace(
          List.of(
              new Site("emitter", List.of("g", "e")),
              new Site("resonator", List.of("0", "1", "2")),
              new Site("probe", List.of("g", "e"))));
  private static final HilbertSpace QUBIT =
      new HilbertSpace(List.of(new Site("emitter", List.of("g", "e"))));

  @Test
  void populationLivesOnItsSite() {
    LocatedMeasure located = Measures.of(new MeasureSpec.Population(1, List.of(0, 2)), CHIP);
    assertEquals(List.of(1), located.sites());
    assertEquals(3, located.measure().dimension());
    Hermitian state =
        new Hermitian(
            ComplexMatrix.real(new double[][] {{0.5, 0, 0}, {0, 0.375, 0}, {0, 0, 0.125}}));
    // [closed form] 0.5 + 0.125.
    assertEquals(0.625, located.measure().value(state));
    // The observable is exact: no slack at all.
    assertEquals(0, located.measure().lowerBounds(state).get(0).excess().applyAsDouble(1));
  }

  @Test
  void concurrenceLivesOnItsSitesInAscendingOrder() {
    LocatedMeasure located = Measures.of(new MeasureSpec.Concurrence(2, 0), CHIP);
    assertEquals(List.of(0, 2), located.sites());
    assertEquals(4, located.measure().dimension());
  }

  @Test
  void otherMeasuresLiveOnAllSites() {
    for (MeasureSpec spec :
        List.of(
            new MeasureSpec.Purity(),
            new MeasureSpec.Entropy(),
            new MeasureSpec.Negativity(List.of(0, 2)))) {
      LocatedMeasure located = Measures.of(spec, CHIP);
      assertEquals(List.of(0, 1, 2), located.sites());
      assertEquals(12, located.measure().dimension());
    }
  }

  @Test
  void propertiesOfTheGeneratorAreRefused() {
    ComplexBall gate = ComplexBall.exact(ComplexMatrix.identity(2));
    for (MeasureSpec spec :
        List.of(
            new MeasureSpec.Gap(),
            new MeasureSpec.Settling(0.01),
            new MeasureSpec.GateFidelity(gate, List.of()))) {
      assertThrows(IllegalArgumentException.class, () -> Measures.of(spec, QUBIT));
    }
  }

  @Test
  void specificationsThatDoNotFitTheSitesAreRefused() {
    ComplexBall four = ComplexBall.exact(ComplexMatrix.identity(4));
    ComplexBall nilpotent = ComplexBall.exact(ComplexMatrix.unit(2, 0, 1));
    for (MeasureSpec spec :
        List.of(
            new MeasureSpec.Population(3, List.of(0)),
            new MeasureSpec.Population(0, List.of(2)),
            new MeasureSpec.Concurrence(0, 0),
            new MeasureSpec.Concurrence(0, 1),
            new MeasureSpec.Negativity(List.of()),
            new MeasureSpec.Negativity(List.of(0, 1, 2)),
            new MeasureSpec.Mean(four))) {
      assertThrows(IllegalArgumentException.class, () -> Measures.of(spec, CHIP), spec.toString());
    }
    assertThrows(
        IllegalArgumentException.class, () -> Measures.of(new MeasureSpec.Mean(nilpotent), QUBIT));
  }

  @Test
  void radiusOfAnObservableIsInTheSlack() {
    Hermitian z = new Hermitian(ComplexMatrix.real(new double[][] {{1, 0}, {0, -1}}));
    Measure measure =
        Measures.of(new MeasureSpec.Mean(new ComplexBall(z.matrix(), 0.125)), QUBIT).measure();
    assertTrue(measure.lowerBounds(z).get(0).excess().applyAsDouble(0) >= 0.125);
    Hermitian ground = new Hermitian(ComplexMatrix.unit(2, 0, 0));
    Interval enclosure = measure.enclosure(ground, 0);
    // [closed form] an observable within 0.125 of Z has ground-state means of 0.875 to 1.125.
    assertTrue(enclosure.lower() <= 0.875 && enclosure.upper() >= 1.125, enclosure.toString());
    assertTrue(measure.range().lower() <= -1.125 && measure.range().upper() >= 1.125);
  }

  @ParameterizedTest
  // [published] Vidal, Werner (2002); Horodecki, Horodecki, PRA 59 (1999) 4206 (from memory):
  // isotropic states F P + (1 - F)(1 - P)/(d^2 - 1) have N = max(0, (d F - 1)/2).
  @CsvSource({"2, 0.4, 0", "2, 0.7, 0.2", "2, 1, 0.5", "3, 0.4, 0.1", "3, 0.7, 0.55", "3, 1, 1"})
  void isotropicStates(int d, double f, double expected) {
    double[][] projector = new double[d * d][d * d];
    for (int i = 0; i < d; i++) {
      for (int j = 0; j < d; j++) {
        projector[i * (d + 1)][j * (d + 1)] = 1.0 / d;
      }
    }
    double rest = (1 - f) / (d * d - 1);
    Hermitian state =
        new Hermitian(ComplexMatrix.real(projector))
            .combine(f - rest, Hermitian.identity(d * d), rest);
    Negativity negativity = new Negativity(new int[] {d, d}, new boolean[] {true, false});
    assertEquals(expected, negativity.value(state), 1e-12);
    Interval enclosure = negativity.enclosure(state, 1e-15);
    assertTrue(enclosure.lower() <= expected + 1e-15 && enclosure.upper() >= expected - 1e-15);
  }

  @Test
  void qubitFidelityAndTraceDistance() {
    Hermitian a = qubit(0.3, 0.2, 0.5);
    Hermitian b = qubit(-0.1, 0.4, 0.6);
    StateSpec reference = new StateSpec.Mixed(ComplexBall.exact(b.matrix()));
    Measure fidelity = Measures.of(new MeasureSpec.Fidelity(reference), QUBIT).measure();
    Measure distance = Measures.of(new MeasureSpec.TraceDistance(reference), QUBIT).measure();
    // [published] Jozsa, J. Mod. Opt. 41 (1994) 2315 (from memory): F^2 of two Bloch vectors.
    assertEquals(0.944907391525316, fidelity.value(a), 1e-12);
    // [closed form] half the distance of the Bloch vectors.
    assertEquals(0.229128784747792, distance.value(a), 1e-12);
  }

  @Test
  void fidelityAndTraceDistanceKeepTheirInequalities() {
    ExactStates states = new ExactStates(31, 2, 2);
    for (int k = 0; k < 60; k++) {
      Hermitian a = states.next(k);
      StateSpec reference = new StateSpec.Mixed(ComplexBall.exact(states.mixed(4).matrix()));
      Interval f = new MixedFidelity((StateSpec.Mixed) reference).enclosure(a, 0);
      Interval t = new TraceDistance(reference).enclosure(a, 0);
      // [published] Fuchs, van de Graaf, IEEE Trans. Inf. Theory 45 (1999) 1216 (from memory):
      // 1 - sqrt(F) <= T <= sqrt(1 - F), F the squared fidelity.
      assertTrue(1 - Math.sqrt(f.upper()) <= t.upper() + 1e-15);
      assertTrue(t.lower() <= Math.sqrt(1 - f.lower()) + 1e-15);
    }
  }

  @ParameterizedTest
  // [published] Kimura, Phys. Lett. A 314 (2003) 339; Byrd, Khaneja, PRA 68 (2003) 062322 (from
  // memory): pure |r| = sqrt(2 (n-1)/n), and every |r| <= sqrt(2/(n (n-1))) is a state.
  @CsvSource({
    "2, 1, 1",
    "3, 1.15470053837925, 0.577350269189626",
    "4, 1.22474487139159, 0.408248290463863"
  })
  void purityIsTheSquaredBlochLength(int n, double pure, double safe) {
    SplittableRandom random = new SplittableRandom(32);
    ExactStates draws = new ExactStates(33, 1, n);
    Purity purity = new Purity(n);
    // [published] the same: tr(rho^2) = 1/n + |r|^2/2.
    assertEquals(1, 1.0 / n + pure * pure / 2, 1e-14);
    assertEquals(1, purity.value(new Hermitian(ComplexMatrix.unit(n, 0, 0))), 1e-15);
    for (int k = 0; k < 50; k++) {
      Hermitian direction = draws.noise(1);
      Hermitian traceless = direction.shift(-direction.trace() / n);
      // rho = 1/n + r.l/2 with tr l_i l_j = 2: |r| = sqrt(2) times the Frobenius norm of r.l/2.
      double length = safe * random.nextDouble();
      Hermitian state =
          Hermitian.identity(n)
              .combine(1.0 / n, traceless, length / Math.sqrt(2 * traceless.inner(traceless)));
      assertEquals(1.0 / n + length * length / 2, purity.value(state), 1e-14);
      assertTrue(state.eigen().largest().upper() <= 1);
      assertTrue(state.eigen().smallest().upper() >= 0);
    }
  }

  @Test
  void fixedPointOfAmplitudeDampingIsApproachedAsPublished() {
    // Fixed point diag(p, 1-p), the excited level first; sites list the lowest level first, so here
    // it is diag(1-p, p) and the sign of y and z is turned.
    double p = 0.7;
    double g = 0.3;
    Hermitian fixed = qubit(0, 0, -(2 * p - 1));
    StateSpec reference = new StateSpec.Mixed(ComplexBall.exact(fixed.matrix()));
    Measure distance = Measures.of(new MeasureSpec.TraceDistance(reference), QUBIT).measure();
    Hermitian before = qubit(0.3, -0.2, -0.4);
    // [published] Nielsen, Chuang (2000) sec. 8.3.5 (from memory): image of (0.3, 0.2, 0.4).
    Hermitian after = qubit(0.250998007960223, -0.167332005306815, -0.4);
    // [closed form] half the Bloch distance, which shrinks by sqrt(1 - g) in x and y.
    assertEquals(Math.sqrt(0.13) / 2, distance.value(before), 1e-13);
    assertEquals(Math.sqrt(0.13 * (1 - g)) / 2, distance.value(after), 1e-13);
    // [closed form] -0.7 log 0.7 - 0.3 log 0.3.
    assertEquals(0.610864302054894, new Entropy(2).value(fixed), 1e-14);
    // [closed form] Z = +1 on the ground state: 1 - 2p.
    Hermitian z = qubit(0, 0, 1).combine(2, Hermitian.identity(2), -1);
    assertEquals(-0.4, z.inner(fixed), 1e-15);
  }

  /** The state (1 + x X + y Y + z Z)/2. */
  private static Hermitian qubit(double x, double y, double z) {
    return Hermitian.part(
        ComplexMatrix.of(
            2,
            2,
            new double[] {(1 + z) / 2, x / 2, x / 2, (1 - z) / 2},
            new double[] {0, -y / 2, y / 2, 0}));
  }
}
