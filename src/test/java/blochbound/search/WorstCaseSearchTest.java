package blochbound.search;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertSame;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import blochbound.model.Ball.Norm;
import blochbound.search.SearchOptions.Effort;
import blochbound.search.SearchResult.Ending;
import blochbound.search.SearchStart.Origin;
import java.time.Duration;
import java.util.ArrayList;
import java.util.Collections;
import java.util.List;
import java.util.concurrent.atomic.AtomicInteger;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.EnumSource;

/** What every search keeps, whatever the objective. */
class WorstCaseSearchTest {
  private static final SearchOptions QUICK = SearchOptions.withDefaults();
  private static final SearchOptions THOROUGH = QUICK.withEffort(Effort.THOROUGH);

  @ParameterizedTest(name = "{0}")
  @EnumSource(Norm.class)
  void everyPointEvaluatedLiesInTheBall(Norm norm) {
    BallProjection ball = new BallProjection(norm);
    for (SearchOptions options : List.of(QUICK, THOROUGH.withEvaluations(6000))) {
      List<double[]> outside = new ArrayList<>();
      AtomicInteger count = new AtomicInteger();
      Objective watched =
          new Watched(
              wavy(3),
              z -> {
                count.incrementAndGet();
                if (!ball.contains(z)) {
                  outside.add(z.clone());
                }
              });
      List<double[]> starts = List.of(new double[] {5, -7, 2}, new double[] {0.1, 0.2, -0.1});
      SearchResult found =
          WorstCaseSearch.run(() -> watched, 3, norm, options.withExtraStarts(starts));
      assertEquals(0, outside.size(), () -> "first outside: " + outside.get(0)[0]);
      assertEquals(count.get(), found.evaluations());
      assertTrue(found.evaluations() <= options.evaluationsFor(3));
      assertTrue(ball.contains(found.z()));
      assertEquals(wavy(3).value(found.z()), found.value());
    }
  }

  @ParameterizedTest(name = "{0}")
  @EnumSource(Norm.class)
  void sameSeedGivesTheSameResultOnAnyNumberOfThreads(Norm norm) {
    for (SearchOptions options : List.of(QUICK, THOROUGH.withEvaluations(8000))) {
      SearchResult one = WorstCaseSearch.run(() -> wavy(4), 4, norm, options.withSeed(9));
      for (int threads : new int[] {1, 2, 3}) {
        SearchResult again =
            WorstCaseSearch.run(() -> wavy(4), 4, norm, options.withSeed(9).withThreads(threads));
        assertEquals(one.value(), again.value());
        assertArrayEquals(one.z(), again.z(), 0.0);
        assertEquals(one.evaluations(), again.evaluations());
        assertEquals(one.reachedFrom(), again.reachedFrom());
        assertEquals(one.ending(), again.ending());
      }
    }
  }

  @Test
  void eachThreadHasItsOwnObjective() {
    List<Confined> made = Collections.synchronizedList(new ArrayList<>());
    WorstCaseSearch.run(
        () -> {
          made.add(new Confined());
          return made.get(made.size() - 1);
        },
        3,
        Norm.BOX,
        THOROUGH.withThreads(3));
    assertEquals(3, made.size());
    assertTrue(made.stream().noneMatch(o -> o.isShared));
  }

  @Test
  void withoutCoordinatesTheOnlyPointIsEvaluatedOnce() {
    Objective constant = new DifferenceObjective(z -> 0.25 + z.length, 1e-6);
    for (SearchOptions options : List.of(QUICK, THOROUGH)) {
      for (Norm norm : Norm.values()) {
        SearchResult found = WorstCaseSearch.run(() -> constant, 0, norm, options);
        assertEquals(0, found.z().length);
        assertEquals(0.25, found.value());
        assertEquals(1, found.evaluations());
        assertEquals(List.of(new SearchStart(Origin.CENTRE, 0)), found.reachedFrom());
        assertEquals(Ending.SETTLED, found.ending());
      }
    }
  }

  @Test
  void valuesThatAreNotFiniteAreNeverReported() {
    // Undefined on the half z0 > 0.2, where the function would be smallest.
    for (double bad : new double[] {Double.NaN, Double.NEGATIVE_INFINITY, 1.0 / 0}) {
      Objective holed = new DifferenceObjective(z -> z[0] > 0.2 ? bad : z[1] * z[1] - z[0], 1e-9);
      for (SearchOptions options : List.of(QUICK, THOROUGH)) {
        SearchResult found = WorstCaseSearch.run(() -> holed, 2, Norm.BOX, options);
        assertTrue(found.value() >= -0.2, "" + found.value());
        assertTrue(found.value() <= -0.2 + 1e-4, "" + found.value());
      }
    }
  }

  @Test
  void anObjectiveWithoutAnyValueEndsWithPlusInfinity() {
    Objective never = new DifferenceObjective(z -> Double.NaN, 1e-6);
    for (SearchOptions options : List.of(QUICK, THOROUGH.withEvaluations(3000))) {
      SearchResult found = WorstCaseSearch.run(() -> never, 2, Norm.ELLIPSOID, options);
      assertEquals(Double.POSITIVE_INFINITY, found.value());
      assertArrayEquals(new double[2], found.z());
    }
  }

  @ParameterizedTest(name = "{0}")
  @EnumSource(Norm.class)
  void evaluationBudgetIsNeverExceededAndItsEndIsTold(Norm norm) {
    for (Effort effort : Effort.values()) {
      for (int budget : new int[] {1, 2, 3, 7, 20, 55}) {
        SearchOptions options = QUICK.withEffort(effort).withEvaluations(budget);
        SearchResult found = WorstCaseSearch.run(() -> wavy(5), 5, norm, options);
        assertTrue(found.evaluations() <= budget && found.evaluations() >= 1);
        assertEquals(Ending.OUT_OF_EVALUATIONS, found.ending());
        assertTrue(found.value() <= wavy(5).value(new double[5]));
      }
    }
  }

  @Test
  void timeBudgetCutsTheSearchShortAndIsTold() {
    for (Effort effort : Effort.values()) {
      SearchOptions options = QUICK.withEffort(effort).withTime(Duration.ofNanos(1));
      SearchResult found = WorstCaseSearch.run(() -> wavy(3), 3, Norm.BOX, options);
      assertEquals(Ending.OUT_OF_TIME, found.ending());
      assertEquals(1, found.evaluations());
      assertEquals(wavy(3).value(new double[3]), found.value());
    }
    SearchOptions forever = QUICK.withTime(Duration.ofDays(400_000));
    Objective bowl = QuadraticObjective.diagonal(new double[] {1, 1}, new double[] {0.2, 0});
    assertEquals(Ending.SETTLED, WorstCaseSearch.run(() -> bowl, 2, Norm.BOX, forever).ending());
  }

  @Test
  void givenStartInANarrowBasinIsUsedAndNamed() {
    // A dip of width 1e-3 at (0.7, -0.3) that no other start meets.
    Objective dip =
        new DifferenceObjective(
            z -> {
              double a = (z[0] - 0.7) / 1e-3;
              double b = (z[1] + 0.3) / 1e-3;
              return 0.01 * (z[0] * z[0] + z[1] * z[1]) - Math.exp(-a * a - b * b);
            },
            1e-7);
    List<double[]> starts = List.of(new double[] {-1, 0}, new double[] {0.7005, -0.3});
    SearchResult without = WorstCaseSearch.run(() -> dip, 2, Norm.BOX, QUICK);
    SearchResult with = WorstCaseSearch.run(() -> dip, 2, Norm.BOX, QUICK.withExtraStarts(starts));
    assertEquals(0, without.value(), 1e-9);
    // [closed form] depth 1 less 0.01 (0.49 + 0.09), up to the shift by the slope 0.014.
    assertEquals(-1 + 0.0058, with.value(), 1e-6);
    assertTrue(with.reachedFrom().contains(new SearchStart(Origin.GIVEN, 1)));
    assertFalse(with.reachedFrom().contains(new SearchStart(Origin.CENTRE, 0)));
  }

  @Test
  void adaptationRunsOnlyWhereLocalSearchesDisagreeOrDoNotDescend() {
    Objective bowl = QuadraticObjective.diagonal(new double[] {1, 2}, new double[] {0.3, 0.1});
    assertFalse(hasOrigin(WorstCaseSearch.run(() -> bowl, 2, Norm.BOX, THOROUGH)));
    // Stairs: the gradient is zero almost everywhere.
    Objective stairs =
        new DifferenceObjective(
            z -> Math.floor(20 * Math.abs(z[0] - 0.52)) + Math.floor(20 * Math.abs(z[1])), 1e-9);
    SearchResult found = WorstCaseSearch.run(() -> stairs, 2, Norm.ELLIPSOID, THOROUGH);
    assertTrue(hasOrigin(found));
    // [closed form] 0 on the lowest step.
    assertEquals(0, found.value());
  }

  private static boolean hasOrigin(SearchResult found) {
    return found.reachedFrom().stream().anyMatch(s -> s.origin() == Origin.EVOLUTION);
  }

  @Test
  void failuresOfTheObjectiveReachTheCallerOnAnyThread() {
    ArithmeticException failure = new ArithmeticException("broken");
    Objective broken =
        new DifferenceObjective(
            z -> {
              throw failure;
            },
            1e-6);
    for (int threads : new int[] {1, 2}) {
      ArithmeticException seen =
          assertThrows(
              ArithmeticException.class,
              () -> WorstCaseSearch.run(() -> broken, 2, Norm.BOX, QUICK.withThreads(threads)));
      assertSame(failure, seen);
    }
  }

  @Test
  void badArgumentsAreRefused() {
    SearchOptions wrong = QUICK.withExtraStarts(List.of(new double[3]));
    IllegalArgumentException e =
        assertThrows(
            IllegalArgumentException.class,
            () -> WorstCaseSearch.run(() -> wavy(2), 2, Norm.BOX, wrong));
    assertEquals("an extra start has 3 coordinates instead of 2", e.getMessage());
    assertThrows(IllegalArgumentException.class, () -> QUICK.withThreads(0));
    assertThrows(IllegalArgumentException.class, () -> QUICK.withEvaluations(-1));
    assertThrows(IllegalArgumentException.class, () -> QUICK.withTime(Duration.ZERO));
  }

  @Test
  void optionsAndResultsAreNotChangedFromOutside() {
    double[] start = {0.5, 0.5};
    SearchOptions options = QUICK.withExtraStarts(List.of(start));
    start[0] = 9;
    options.extraStarts().get(0)[1] = 9;
    assertArrayEquals(new double[] {0.5, 0.5}, options.extraStarts().get(0));
    SearchResult found = WorstCaseSearch.run(() -> wavy(2), 2, Norm.BOX, QUICK);
    double first = found.z()[0];
    found.z()[0] = 9;
    assertEquals(first, found.z()[0]);
  }

  /** A bowl with ripples: many local minima. */
  private static Objective wavy(int m) {
    return new DifferenceObjective(
        z -> {
          double sum = 0;
          for (int j = 0; j < m; j++) {
            sum += (z[j] - 0.2 * j) * (z[j] - 0.2 * j) + 0.2 * Math.sin(9 * z[j] + j);
          }
          return sum + 0.1 * Math.cos(5 * z[0] * z[m - 1]);
        },
        1e-6);
  }

  private record Watched(Objective inner, java.util.function.Consumer<double[]> watch)
      implements Objective {
    @Override
    public double value(double[] z) {
      watch.accept(z);
      return inner.value(z);
    }

    @Override
    public double value(double[] z, double[] gradientOut) {
      watch.accept(z);
      return inner.value(z, gradientOut);
    }
  }

  /** Notices when two threads are inside at once. */
  private static final class Confined implements Objective {
    private final AtomicInteger inside = new AtomicInteger();
    private volatile boolean isShared;

    @Override
    public double value(double[] z) {
      return value(z, new double[z.length]);
    }

    @Override
    public double value(double[] z, double[] gradientOut) {
      if (inside.incrementAndGet() > 1) {
        isShared = true;
      }
      Thread.onSpinWait();
      double value = wavy(3).value(z, gradientOut);
      inside.decrementAndGet();
      return value;
    }
  }
}
