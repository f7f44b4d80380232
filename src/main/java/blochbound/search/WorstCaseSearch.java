package blochbound.search;

import blochbound.check.Check;
import blochbound.model.Ball.Norm;
import blochbound.search.SearchOptions.Effort;
import blochbound.search.SearchStart.Origin;
import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;
import java.util.SplittableRandom;
import java.util.function.Supplier;

/**
 * Finds a point of the tolerance ball where the objective is as small as the search can make it: an
 * attained value, without any guarantee that none is smaller.
 *
 * <p>All runs are independent and joined in a fixed order: the same seed gives the same result on
 * any number of threads, as long as the time does not run out.
 */
public final class WorstCaseSearch {
  private static final int RANDOM_STARTS = 3;
  private static final int RANDOM_VERTICES = 3;
  private static final int SCREENED_STARTS = 16;
  private static final int SCREENED_PER_COORDINATE = 64;
  private static final int EVOLUTIONS = 8;

  /** Share of the spread of all values within which two runs count as having met. */
  private static final double AGREEMENT = 1e-6;

  private final int coordinates;
  private final BallProjection ball;
  private final LocalSearch local;
  private final SearchOptions options;
  private final Runs runs;
  private final SplittableRandom random;

  private WorstCaseSearch(
      Supplier<Objective> objectives, int coordinates, Norm norm, SearchOptions options) {
    this.coordinates = coordinates;
    this.options = options;
    ball = new BallProjection(norm);
    local = new LocalSearch(ball);
    runs = new Runs(objectives, coordinates, options);
    random = new SplittableRandom(options.seed());
  }

  /**
   * Makes an objective small over |z| at most 1.
   *
   * @param objectives makes one objective for each thread; all must be the same function
   * @param coordinates number of coordinates; with none the one point there is gets evaluated
   * @param norm norm of the ball
   * @param options how far to go
   * @throws IllegalArgumentException when an extra start has another number of coordinates
   */
  public static SearchResult run(
      Supplier<Objective> objectives, int coordinates, Norm norm, SearchOptions options) {
    Check.atLeast(coordinates, 0, "coordinates");
    for (double[] start : options.extraStarts()) {
      Check.that(
          start.length == coordinates,
          "an extra start has " + start.length + " coordinates instead of " + coordinates);
    }
    return new WorstCaseSearch(objectives, coordinates, norm, options).result();
  }

  private SearchResult result() {
    double[] centre = new double[coordinates];
    Task fromCentre = new Task(new SearchStart(Origin.CENTRE, 0), e -> local.run(e, centre));
    if (coordinates == 0) {
      runs.carryOut(List.of(fromCentre), 1);
      return joined();
    }
    boolean isThorough = options.effort() == Effort.THOROUGH;
    List<Task> first = new ArrayList<>(List.of(fromCentre));
    addGivenStarts(first);
    addVertices(first, options.extraStarts().isEmpty() ? centre : options.extraStarts().get(0));
    addRandomStarts(first);
    // A tenth is kept for the flips at the end, which seldom need it.
    runs.carryOut(
        first, isThorough ? Math.max(1, runs.left() / 4) : runs.left() - runs.left() / 10);
    if (isThorough) {
      screen();
      if (isRugged()) {
        evolve();
      }
    }
    flipBest();
    return joined();
  }

  private void addGivenStarts(List<Task> tasks) {
    List<double[]> given = options.extraStarts();
    for (int k = 0; k < given.size(); k++) {
      double[] start = given.get(k);
      tasks.add(new Task(new SearchStart(Origin.GIVEN, k), e -> local.run(e, start)));
    }
  }

  private void addVertices(List<Task> tasks, double[] reference) {
    SearchStart start = new SearchStart(Origin.GRADIENT_VERTEX, 0);
    switch (ball.norm()) {
      case BOX -> {
        tasks.add(new Task(start, e -> fromVertex(e, reference)));
        for (int k = 0; k < RANDOM_VERTICES; k++) {
          double[] point = ball.random(random.split(), coordinates);
          SearchStart other = new SearchStart(Origin.RANDOM_VERTEX, k);
          tasks.add(new Task(other, e -> fromVertex(e, point)));
        }
      }
      case DIAMOND -> tasks.add(new Task(start, this::fromBestCorner));
      case ELLIPSOID -> {
        // The ball has no vertices; the first step of the local search goes where one would be.
      }
    }
  }

  private void addRandomStarts(List<Task> tasks) {
    for (int k = 0; k < RANDOM_STARTS; k++) {
      double[] start = ball.random(random.split(), coordinates);
      tasks.add(new Task(new SearchStart(Origin.RANDOM, k), e -> local.run(e, start)));
    }
  }

  private void fromVertex(Evaluator evaluator, double[] point) {
    Iterate at = Iterate.at(evaluator, ball.project(point));
    local.run(evaluator, VertexFlips.run(evaluator, VertexFlips.downhill(at)));
  }

  /** All corners of the diamond, then a local search: exact for objectives that bulge upwards. */
  private void fromBestCorner(Evaluator evaluator) {
    for (int k = 0; k < 2 * coordinates; k++) {
      double[] corner = new double[coordinates];
      corner[k / 2] = k % 2 == 0 ? 1 : -1;
      evaluator.value(corner);
    }
    local.run(evaluator, evaluator.bestPoint());
  }

  /** Many random points, then local searches from the best of them. */
  private void screen() {
    int count = Math.min(SCREENED_PER_COORDINATE * (coordinates + 1), runs.left() / 4);
    List<Task> draws = new ArrayList<>();
    for (int k = 0; k < count; k++) {
      double[] point = ball.random(random.split(), coordinates);
      draws.add(new Task(new SearchStart(Origin.DRAWN, k), e -> e.value(point)));
    }
    List<Task> tasks =
        runs.carryOut(draws, count).stream()
            .sorted(Comparator.comparingDouble(Outcome::value))
            .limit(SCREENED_STARTS)
            .map(
                draw ->
                    new Task(
                        new SearchStart(Origin.SCREENED, draw.start().ordinal()),
                        e -> local.run(e, draw.point())))
            .toList();
    runs.carryOut(tasks, runs.left() / 3);
  }

  /**
   * Whether gradients are a poor guide: local searches end at different values, or none of them
   * falls below its start.
   */
  private boolean isRugged() {
    double tolerance = AGREEMENT * spread();
    double best = best().value();
    List<Outcome> locals = descents();
    boolean isApart = locals.stream().anyMatch(o -> o.value() > best + tolerance);
    boolean isDescended = locals.stream().anyMatch(o -> o.value() < o.firstValue() - tolerance);
    return isApart || !isDescended;
  }

  /** Adaptations with growing populations from the best and from random points, then descent. */
  private void evolve() {
    List<Task> tasks = new ArrayList<>();
    for (int k = 0; k < EVOLUTIONS; k++) {
      SplittableRandom own = random.split();
      double[] start = k == 0 ? best().point() : ball.random(own, coordinates);
      int population = CmaEs.smallestPopulation(coordinates) << (k / 2);
      SearchStart named = new SearchStart(Origin.EVOLUTION, k);
      tasks.add(new Task(named, e -> evolveFrom(e, start, population, own)));
    }
    runs.carryOut(tasks, runs.left() - runs.left() / 10);
  }

  private void evolveFrom(
      Evaluator evaluator, double[] start, int population, SplittableRandom own) {
    int kept = evaluator.left() / 5;
    new CmaEs(ball, population).run(evaluator, start, kept, own);
    local.run(evaluator, evaluator.bestPoint());
  }

  private void flipBest() {
    if (ball.norm() == Norm.BOX && runs.left() > 0) {
      double[] start = best().point();
      Task task =
          new Task(
              new SearchStart(Origin.FLIPPED_BEST, 0),
              e -> local.run(e, VertexFlips.run(e, start)));
      runs.carryOut(List.of(task), runs.left());
    }
  }

  private List<Outcome> descents() {
    return runs.outcomes().stream().filter(o -> o.start().origin() != Origin.DRAWN).toList();
  }

  private Outcome best() {
    return runs.outcomes().stream()
        .min(Comparator.comparingDouble(Outcome::value))
        .orElseThrow(IllegalStateException::new);
  }

  /** Largest finite difference between values seen, at least the rounding of the values. */
  private double spread() {
    double best = best().value();
    double largest =
        runs.outcomes().stream()
            .mapToDouble(Outcome::firstValue)
            .filter(Double::isFinite)
            .max()
            .orElse(best);
    return Math.max(largest - best, 0x1p-40 * Math.abs(best));
  }

  private SearchResult joined() {
    Outcome best = best();
    double reach = best.value() + AGREEMENT * spread();
    List<SearchStart> met =
        descents().stream().filter(o -> o.value() <= reach).map(Outcome::start).toList();
    int evaluations = runs.outcomes().stream().mapToInt(Outcome::evaluations).sum();
    return new SearchResult(best, evaluations, met, descents().size(), runs.ending());
  }
}
