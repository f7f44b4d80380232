package blochbound.sample;

import blochbound.check.Check;
import blochbound.generator.BlochGenerator;
import blochbound.measure.LocatedMeasure;
import blochbound.model.Requirement.Sense;
import java.time.Duration;
import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;
import java.util.concurrent.ExecutionException;
import java.util.concurrent.ExecutorService;
import java.util.concurrent.Executors;
import java.util.concurrent.Future;
import java.util.concurrent.atomic.AtomicBoolean;
import java.util.function.Supplier;

/**
 * Random devices inside the tolerance ball and their steady-state measures: estimates, reproducible
 * for a seed whatever the number of threads.
 *
 * <p>Devices come in batches of a size that depends on the generator only, in the order of one
 * sequence; batches are evaluated by any thread and put together in order.
 */
public final class SampleStudy {
  /** Number of worst devices kept for each measure. */
  public static final int WORST_KEPT = 5;

  /** Probabilities of the quantiles that are reported. */
  public static final List<Double> PROBABILITIES = List.of(0.01, 0.05, 0.5, 0.95, 0.99);

  private SampleStudy() {}

  /** Number of devices for n unknowns when the options leave it open. */
  public static int defaultCount(int unknowns) {
    return unknowns <= 15 ? 10_000 : unknowns <= 63 ? 5_000 : unknowns <= 255 ? 1_000 : 200;
  }

  /**
   * Samples devices and evaluates all measures, one steady state for each device.
   *
   * <p>Without coordinates there is one device, the nominal one.
   *
   * @param measures measures, whose methods several threads may call at once
   * @param senses for each measure which side is allowed: the worst values lie on the other side
   * @param stop set by the caller to end the study after the batches under way
   * @throws IllegalArgumentException when Sobol points do not reach the number of parameters
   * @throws IllegalStateException when a measure has no value at a device, or the calling thread is
   *     interrupted
   */
  public static SampleResult run(
      BlochGenerator generator,
      List<LocatedMeasure> measures,
      List<Sense> senses,
      SampleOptions options,
      AtomicBoolean stop) {
    Check.that(measures.size() == senses.size(), "one sense for each measure");
    long start = System.nanoTime();
    DeviceSampler sampler = new DeviceSampler(generator.space(), options.kind(), options.seed());
    LaneSolver solver = new LaneSolver(generator);
    int count = count(generator, options);
    Duration left = options.time().minusNanos(System.nanoTime() - start);
    BatchQueue queue = new BatchQueue(sampler, solver.lanes(), count, left, stop);
    List<BatchEvaluation.Values> batches =
        inParallel(
            options.threads(),
            queue,
            () -> new BatchEvaluation(solver.another(), generator, measures, senses));
    return SampleResult.of(batches, senses, sampler, queue.outcome());
  }

  /** Lets each thread work with its own evaluation; batches are returned in order. */
  private static List<BatchEvaluation.Values> inParallel(
      int threads, BatchQueue queue, Supplier<BatchEvaluation> evaluations) {
    ExecutorService workers = Executors.newFixedThreadPool(threads);
    try {
      List<Future<List<BatchEvaluation.Values>>> parts = new ArrayList<>();
      for (int t = 0; t < threads; t++) {
        parts.add(workers.submit(() -> evaluations.get().work(queue)));
      }
      List<BatchEvaluation.Values> all = new ArrayList<>();
      for (Future<List<BatchEvaluation.Values>> part : parts) {
        all.addAll(part.get());
      }
      all.sort(Comparator.comparingInt(BatchEvaluation.Values::index));
      return all;
    } catch (ExecutionException e) {
      if (e.getCause() instanceof RuntimeException failure) {
        throw failure;
      }
      throw new IllegalStateException("sampling failed", e);
    } catch (InterruptedException e) {
      Thread.currentThread().interrupt();
      throw new IllegalStateException("sampling was interrupted", e);
    } finally {
      queue.close();
      workers.shutdown();
    }
  }

  private static int count(BlochGenerator generator, SampleOptions options) {
    return generator.space().coordinates() == 0
        ? 1
        : options.count() > 0 ? options.count() : defaultCount(generator.unknowns());
  }
}
