package blochbound.sample;

import blochbound.sample.SampleResult.Outcome;
import java.time.Duration;
import java.util.List;
import java.util.concurrent.atomic.AtomicBoolean;

/**
 * Hands out batches of devices in the order of one sequence until enough are out, or time or
 * candidates run out. Batches handed out are finished by whoever took them, so those done are
 * always the first ones of the sequence.
 */
final class BatchQueue {
  /**
   * Some devices that follow each other in the sequence.
   *
   * @param index number of the batch
   * @param devices coordinates z of its devices; empty after the last one
   */
  record Batch(int index, List<double[]> devices) {}

  private final DeviceSampler sampler;
  private final int batchSize;
  private final AtomicBoolean stop;
  private final long start = System.nanoTime();
  private final Duration time;
  private int remaining;
  private int next;
  private Outcome outcome = Outcome.COMPLETE;

  BatchQueue(DeviceSampler sampler, int batchSize, int count, Duration time, AtomicBoolean stop) {
    this.sampler = sampler;
    this.batchSize = batchSize;
    this.remaining = count;
    this.time = time;
    this.stop = stop;
  }

  /** The next batch, without devices when there is none. */
  synchronized Batch take() {
    if (remaining > 0 && stop.get()) {
      end(Outcome.STOPPED);
    } else if (remaining > 0 && next > 0 && isLate()) {
      end(Outcome.OUT_OF_TIME);
    }
    int wanted = Math.min(batchSize, remaining);
    List<double[]> devices = wanted == 0 ? List.of() : sampler.next(wanted);
    remaining -= devices.size();
    if (devices.size() < wanted) {
      end(Outcome.OUT_OF_CANDIDATES);
    }
    return new Batch(next++, devices);
  }

  private boolean isLate() {
    return Duration.ofNanos(System.nanoTime() - start).compareTo(time) > 0;
  }

  private void end(Outcome reason) {
    outcome = reason;
    remaining = 0;
  }

  /** Hands out no more. */
  synchronized void close() {
    remaining = 0;
  }

  /** Why the last batch was the last. */
  synchronized Outcome outcome() {
    return outcome;
  }
}
