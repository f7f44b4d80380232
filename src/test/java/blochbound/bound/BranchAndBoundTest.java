package blochbound.bound;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import blochbound.bound.BranchOutcome.Reason;
import blochbound.certificate.RegionCertificate;
import blochbound.interval.Interval;
import blochbound.model.Ball.Norm;
import blochbound.model.Region;
import java.time.Duration;
import java.util.Optional;
import java.util.SplittableRandom;
import java.util.concurrent.atomic.AtomicBoolean;
import java.util.function.Function;
import java.util.function.Supplier;
import java.util.stream.Stream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.EnumSource;
import org.junit.jupiter.params.provider.MethodSource;
import org.junit.jupiter.params.provider.ValueSource;

class BranchAndBoundTest {
  /** A textbook problem with its published minimum and the gap that is to be reached. */
  private record Problem(
      String name,
      Function<Interval[], Interval> function,
      double[] low,
      double[] high,
      Norm norm,
      double minimum,
      double gap) {
    Supplier<CellBound> cells() {
      return () -> new FunctionCell(function, low, high, norm);
    }

    BranchOutcome run(BranchOptions options) {
      return BranchAndBound.minimise(
          cells(), low.length, norm, options, BranchAndBound.Start.none(), new AtomicBoolean());
    }

    void brackets(BranchOutcome outcome) {
      // The published digits are rounded at the fifteenth.
      assertTrue(outcome.certifiedLower() <= minimum + 1e-14, name);
      assertTrue(outcome.attained() >= minimum - 1e-9, name);
    }

    @Override
    public String toString() {
      return name;
    }
  }

  private static double[] both(double value) {
    return new double[] {value, value};
  }

  private static Problem camelProblem() {
    return new Problem(
        "six-hump camel",
        TextbookFunctions::camel,
        new double[] {-3, -2},
        new double[] {3, 2},
        Norm.BOX,
        -1.031628453489877,
        0.02);
  }

  // [published] Dixon, Szego, Towards Global Optimisation 2 (1978); Jamil, Yang (2013); Rosenbrock
  // (1960) on the unit disc from the root on the circle; all from memory, minima recomputed
  static Stream<Problem> problems() {
    return Stream.of(
        camelProblem(),
        new Problem(
            "Branin",
            TextbookFunctions::branin,
            new double[] {-5, 0},
            new double[] {10, 15},
            Norm.BOX,
            0.397887357729738,
            0.02),
        new Problem(
            "Goldstein-Price",
            TextbookFunctions::goldsteinPrice,
            both(-2),
            both(2),
            Norm.BOX,
            3,
            1000),
        new Problem(
            "McCormick",
            TextbookFunctions::mcCormick,
            new double[] {-1.5, -3},
            both(4),
            Norm.BOX,
            -1.913222954981037,
            0.02),
        new Problem(
            "Styblinski-Tang",
            TextbookFunctions::styblinskiTang,
            both(-5),
            both(5),
            Norm.BOX,
            -78.33233140754284,
            2),
        new Problem(
            "Rosenbrock on the disc",
            TextbookFunctions::rosenbrock,
            both(-1),
            both(1),
            Norm.ELLIPSOID,
            0.0456748087195002,
            0.005));
  }

  @ParameterizedTest
  @MethodSource("problems")
  void textbookMinimaAreBracketedToTheGap(Problem problem) {
    BranchOutcome outcome = problem.run(BranchOptions.toGap(problem.gap).withRegions(60000));
    problem.brackets(outcome);
    assertEquals(Reason.NARROW, outcome.reason(), "" + outcome.regions());
    assertTrue(outcome.attained() - outcome.certifiedLower() <= problem.gap);
  }

  @ParameterizedTest
  @MethodSource("problems")
  void bracketsHoldAtEveryBudget(Problem problem) {
    double lower = Double.NEGATIVE_INFINITY;
    for (long regions : new long[] {1, 2, 3, 9, 40, 200}) {
      BranchOutcome outcome = problem.run(BranchOptions.toGap(0).withRegions(regions));
      problem.brackets(outcome);
      assertEquals(Reason.REGIONS, outcome.reason());
      assertTrue(outcome.regions() <= regions + 1);
      // [invariant] the same order of work: more regions never give a worse bound
      assertTrue(outcome.certifiedLower() >= lower);
      lower = outcome.certifiedLower();
    }
  }

  @Test
  void theCertificatesCoverTheBallWithTheBoundOfTheOutcome() {
    for (Problem problem : problems().toList()) {
      BranchOutcome outcome = problem.run(BranchOptions.toGap(0).withRegions(300));
      double least =
          outcome.certificates().stream()
              .mapToDouble(RegionCertificate::certifiedLower)
              .min()
              .orElseThrow();
      // A half may be worse than its parent in intervals: what holds on the parent counts.
      assertTrue(least <= outcome.certifiedLower());
      SplittableRandom random = new SplittableRandom(3);
      BallConstraint ball = new BallConstraint(problem.norm);
      FunctionCell cell = (FunctionCell) problem.cells().get();
      for (int k = 0; k < 500; k++) {
        double[] z = ball.project(random.doubles(2, -1, 1).toArray());
        assertTrue(cell.value(z) >= outcome.certifiedLower() - 1e-9);
        assertTrue(
            outcome.certificates().stream().anyMatch(c -> holds(c.region(), z)), problem.name);
      }
    }
  }

  private static boolean holds(Region region, double[] z) {
    for (int j = 0; j < z.length; j++) {
      // Points on the rim are rounded: a unit of rounding is allowed.
      if (Math.abs(z[j] - region.centre(j)) > region.halfWidth(j) + 1e-15) {
        return false;
      }
    }
    return true;
  }

  /** Minus the cut of a graph on variables in [-1, 1]: a multilinear form. */
  private static Function<Interval[], Interval> cut(int[][] edges) {
    return x -> {
      Interval sum = Interval.ZERO;
      for (int[] e : edges) {
        sum = sum.plus(x[e[0]].times(x[e[1]]).minus(Interval.ONE).times(Interval.of(0.5)));
      }
      return sum;
    };
  }

  @Test
  void maximumCutsAreBracketed() {
    int[][] cycle = {{0, 1}, {1, 2}, {2, 3}, {3, 4}, {4, 0}};
    int[][] complete = {{0, 1}, {0, 2}, {0, 3}, {1, 2}, {1, 3}, {2, 3}};
    // [published] max-cut relaxation (folklore): 5-cycle 4, K_4 floor(16/4) = 4, all on vertices
    for (int[][] edges : new int[][][] {cycle, complete}) {
      int m = edges == cycle ? 5 : 4;
      double[] low = new double[m];
      double[] high = new double[m];
      java.util.Arrays.fill(low, -1);
      java.util.Arrays.fill(high, 1);
      CellBound inner = new FunctionCell(cut(edges), low, high, Norm.BOX);
      BranchOutcome outcome =
          BranchAndBound.minimise(
              () -> (region, enough) -> atVertex(inner, region, cut(edges)),
              m,
              Norm.BOX,
              BranchOptions.toGap(0.6).withRegions(40000),
              BranchAndBound.Start.none(),
              new AtomicBoolean());
      assertEquals(-4, outcome.attained(), 1e-12);
      assertTrue(outcome.certifiedLower() <= -4);
      assertEquals(Reason.NARROW, outcome.reason(), "" + outcome.certifiedLower());
    }
  }

  private static CellBound.Cell atVertex(
      CellBound inner, Region region, Function<Interval[], Interval> f) {
    CellBound.Cell cell = inner.bound(region, 0);
    double[] vertex = java.util.Arrays.stream(region.centre()).map(c -> c < 0 ? -1 : 1).toArray();
    Interval[] x = java.util.Arrays.stream(vertex).mapToObj(Interval::of).toArray(Interval[]::new);
    return new CellBound.Cell(
        cell.certifiedLower(), vertex, f.apply(x).middle(), cell.split(), cell.certificate());
  }

  private static BranchOptions deciding(double limit) {
    return new BranchOptions(
        Double.POSITIVE_INFINITY, 0, Double.NaN, limit, Duration.ofMinutes(1), 100000, 1);
  }

  @Test
  void aLimitBelowTheMinimumIsCertifiedAndOneAboveRefuted() {
    Problem camel = camelProblem();
    BranchOutcome below = camel.run(deciding(-1.2));
    assertEquals(Reason.CERTIFIED, below.reason());
    assertTrue(below.certifiedLower() >= -1.2);
    BranchOutcome above = camel.run(deciding(-0.9));
    assertEquals(Reason.REFUTED, above.reason());
    assertTrue(above.attained() < -0.9);
    camel.brackets(below);
    camel.brackets(above);
  }

  @Test
  void aGapGoesOnPastTheDecision() {
    Problem camel = camelProblem();
    BranchOptions options =
        new BranchOptions(0.05, 0, Double.NaN, -5, Duration.ofMinutes(1), 100000, 1);
    BranchOutcome outcome = camel.run(options);
    assertEquals(Reason.NARROW, outcome.reason());
    assertTrue(outcome.attained() - outcome.certifiedLower() <= 0.05);
    camel.brackets(outcome);
  }

  @Test
  void aRelativeGapIsAShareOfTheLoss() {
    Problem camel = camelProblem();
    // The reference 8.9684 makes the loss 10: a tenth of it is 1.
    BranchOptions options =
        new BranchOptions(
            Double.POSITIVE_INFINITY, 0.1, 8.9684, Double.NaN, Duration.ofMinutes(1), 100000, 1);
    BranchOutcome outcome = camel.run(options);
    assertEquals(Reason.NARROW, outcome.reason());
    assertTrue(outcome.attained() - outcome.certifiedLower() <= 1.0001);
    BranchOutcome finer =
        camel.run(
            new BranchOptions(
                Double.POSITIVE_INFINITY,
                0.005,
                8.9684,
                Double.NaN,
                Duration.ofMinutes(1),
                100000,
                1));
    assertTrue(finer.regions() > outcome.regions());
    assertTrue(finer.attained() - finer.certifiedLower() <= 0.0501);
  }

  @Test
  void timeAndTheStopFlagEndTheWorkWithAValidBracket() {
    Problem camel = camelProblem();
    BranchOutcome late = camel.run(BranchOptions.toGap(0).withTime(Duration.ofNanos(1)));
    assertEquals(Reason.TIME, late.reason());
    camel.brackets(late);
    BranchOutcome stopped =
        BranchAndBound.minimise(
            camel.cells(),
            2,
            Norm.BOX,
            BranchOptions.toGap(0),
            BranchAndBound.Start.none(),
            new AtomicBoolean(true));
    assertEquals(Reason.STOPPED, stopped.reason());
    camel.brackets(stopped);
  }

  @Test
  void whatCannotBeSplitEndsTheWork() {
    CellBound constant =
        (region, enough) -> new CellBound.Cell(0, region.centre(), 1, -1, Optional.empty());
    BranchOutcome outcome =
        BranchAndBound.minimise(
            () -> constant,
            0,
            Norm.BOX,
            BranchOptions.toGap(0),
            BranchAndBound.Start.none(),
            new AtomicBoolean());
    assertEquals(Reason.RESOLUTION, outcome.reason());
    assertEquals(0, outcome.certifiedLower(), 0);
    assertEquals(1, outcome.attained(), 0);
    assertEquals(1, outcome.regions());
  }

  @Test
  void aStartThatIsNotBeatenIsKept() {
    Problem camel = camelProblem();
    double[] point = {0.089842013100318 / 3, -0.71265640302074 / 2};
    BranchOutcome outcome =
        BranchAndBound.minimise(
            camel.cells(),
            2,
            Norm.BOX,
            BranchOptions.toGap(0.02).withRegions(60000),
            new BranchAndBound.Start(point, camel.minimum),
            new AtomicBoolean());
    assertEquals(camel.minimum, outcome.attained(), 1e-12);
    camel.brackets(outcome);
  }

  @ParameterizedTest
  @ValueSource(ints = {2, 4})
  void severalThreadsGiveAValidBracket(int threads) {
    for (Problem problem : problems().toList()) {
      BranchOutcome outcome =
          problem.run(BranchOptions.toGap(2 * problem.gap).withThreads(threads).withRegions(60000));
      problem.brackets(outcome);
      assertEquals(Reason.NARROW, outcome.reason());
    }
  }

  @Test
  void oneThreadIsDeterministic() {
    for (Problem problem : problems().toList()) {
      BranchOptions options = BranchOptions.toGap(0).withRegions(500);
      BranchOutcome first = problem.run(options);
      BranchOutcome second = problem.run(options);
      assertEquals(first.certifiedLower(), second.certifiedLower(), 0);
      assertEquals(first.attained(), second.attained(), 0);
      assertArrayEquals(first.point(), second.point(), 0);
      assertEquals(first.regions(), second.regions());
    }
  }

  @Test
  void aFailedBoundClaimsNothing() {
    Problem camel = camelProblem();
    CellBound good = camel.cells().get();
    // Not a number wherever the minimum lies: the outcome must not be the bound of the rest.
    CellBound bad =
        (region, enough) -> {
          CellBound.Cell cell = good.bound(region, enough);
          boolean fails = Math.abs(region.centre(0)) < 0.3;
          return new CellBound.Cell(
              fails ? Double.NaN : cell.certifiedLower(),
              cell.candidate(),
              fails ? Double.NaN : cell.attained(),
              cell.split(),
              Optional.empty());
        };
    BranchOutcome outcome =
        BranchAndBound.minimise(
            () -> bad,
            2,
            Norm.BOX,
            BranchOptions.toGap(0.01).withRegions(400),
            BranchAndBound.Start.none(),
            new AtomicBoolean());
    assertTrue(outcome.certifiedLower() <= camel.minimum);
  }

  @ParameterizedTest
  @EnumSource(Norm.class)
  void theExceptionOfAWorkerComesOut(Norm norm) {
    CellBound failing =
        (region, enough) -> {
          if (region.halfWidth(0) < 0.3) {
            throw new IllegalStateException("broken");
          }
          return new CellBound.Cell(0, region.centre(), 1, 0, Optional.empty());
        };
    assertThrows(
        IllegalStateException.class,
        () ->
            BranchAndBound.minimise(
                () -> failing,
                1,
                norm,
                BranchOptions.toGap(0).withThreads(2),
                BranchAndBound.Start.none(),
                new AtomicBoolean()));
  }
}
