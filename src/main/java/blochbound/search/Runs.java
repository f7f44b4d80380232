package blochbound.search;

import blochbound.search.SearchResult.Ending;
import java.time.Duration;
import java.util.ArrayList;
import java.util.List;
import java.util.concurrent.ExecutionException;
import java.util.concurrent.ExecutorService;
import java.util.concurrent.Executors;
import java.util.concurrent.Future;
import java.util.concurrent.atomic.AtomicInteger;
import java.util.concurrent.atomic.AtomicReferenceArray;
import java.util.function.IntConsumer;
import java.util.function.Supplier;
import org.jspecify.annotations.Nullable;

/**
 * Carries out independent runs on several threads, with results in the order of the tasks: each
 * task has its own share of the budget and its own random numbers, so that the number of threads
 * does not change them.
 */
final class Runs {
  private final Supplier<Objective> objectives;
  private final int threads;
  private final long deadlineNanos;
  private final List<Objective> workspaces = new ArrayList<>();
  private final List<Outcome> outcomes = new ArrayList<>();
  private Ending ending = Ending.SETTLED;
  private int left;

  Runs(Supplier<Objective> objectives, int coordinates, SearchOptions options) {
    this.objectives = objectives;
    threads = options.threads();
    // Durations beyond some centuries would overflow.
    long most = Long.MAX_VALUE / 4;
    boolean isLong = options.time().compareTo(Duration.ofNanos(most)) > 0;
    deadlineNanos = System.nanoTime() + (isLong ? most : options.time().toNanos());
    left = options.evaluationsFor(coordinates);
  }

  /** Everything that has been run, in order. */
  List<Outcome> outcomes() {
    return outcomes;
  }

  /** The worst ending of all runs, counting those that were left out. */
  Ending ending() {
    return ending;
  }

  /** Evaluations not yet spent. */
  int left() {
    return left;
  }

  /**
   * Runs the tasks, each with an equal share of {@code evaluations}; tasks beyond the number of
   * evaluations, or after the time is over, are left out. The very first task always runs.
   *
   * @return the outcomes in the order of the tasks
   */
  List<Outcome> carryOut(List<Task> tasks, int evaluations) {
    int total = Math.min(evaluations, left);
    int count = Math.min(tasks.size(), total);
    if (count < tasks.size()) {
      note(Ending.OUT_OF_EVALUATIONS);
    }
    AtomicReferenceArray<@Nullable Outcome> results = new AtomicReferenceArray<>(count);
    AtomicInteger next = new AtomicInteger();
    int workers = Math.min(threads, count);
    while (workspaces.size() < workers) {
      workspaces.add(objectives.get());
    }
    IntConsumer work =
        worker -> {
          for (int k = next.getAndIncrement(); k < count; k = next.getAndIncrement()) {
            int share = total / count + (k < total % count ? 1 : 0);
            results.set(k, outcome(tasks.get(k), workspaces.get(worker), share, k));
          }
        };
    if (workers <= 1) {
      work.accept(0);
    } else {
      onThreads(workers, work);
    }
    return collected(results);
  }

  private @Nullable Outcome outcome(Task task, Objective objective, int share, int position) {
    Budget budget = new Budget(share, deadlineNanos);
    boolean isVeryFirst = outcomes.isEmpty() && position == 0;
    if (!isVeryFirst && budget.isOutOfTime()) {
      return null;
    }
    Evaluator evaluator = new Evaluator(objective, budget);
    task.method().accept(evaluator);
    return new Outcome(task.start(), evaluator);
  }

  private List<Outcome> collected(AtomicReferenceArray<@Nullable Outcome> results) {
    List<Outcome> list = new ArrayList<>();
    for (int k = 0; k < results.length(); k++) {
      Outcome outcome = results.get(k);
      if (outcome == null) {
        note(Ending.OUT_OF_TIME);
      } else {
        list.add(outcome);
        note(outcome.ending());
        left -= outcome.evaluations();
      }
    }
    outcomes.addAll(list);
    return list;
  }

  private void note(Ending seen) {
    ending = seen.compareTo(ending) > 0 ? seen : ending;
  }

  private static void onThreads(int workers, IntConsumer work) {
    ExecutorService pool = Executors.newFixedThreadPool(workers - 1);
    try {
      List<Future<?>> others = new ArrayList<>();
      for (int worker = 1; worker < workers; worker++) {
        int number = worker;
        others.add(pool.submit(() -> work.accept(number)));
      }
      work.accept(0);
      for (Future<?> other : others) {
        other.get();
      }
    } catch (ExecutionException e) {
      throw e.getCause() instanceof RuntimeException cause
          ? cause
          : new IllegalStateException("a search run failed", e.getCause());
    } catch (InterruptedException e) {
      Thread.currentThread().interrupt();
      throw new IllegalStateException("the search was interrupted", e);
    } finally {
      pool.shutdownNow();
    }
  }
}
