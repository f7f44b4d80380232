package blochbound.cli;

import java.util.concurrent.CountDownLatch;
import java.util.concurrent.TimeUnit;
import java.util.concurrent.atomic.AtomicBoolean;

/**
 * Turns the first signal to end (Ctrl-C) into an early end with the results so far.
 *
 * <p>The virtual machine leaves with 130 after an interrupt once the hook returns, which is when
 * the results are out or a time limit has passed.
 */
final class Interruption implements AutoCloseable {
  private static final long MOST_SECONDS = 20;

  private final AtomicBoolean stop = new AtomicBoolean();
  private final CountDownLatch done = new CountDownLatch(1);
  private final Thread hook = new Thread(this::endEarly, "interruption");

  private Interruption() {}

  /** Watches for the signal until it is closed. */
  static Interruption watch() {
    Interruption interruption = new Interruption();
    Runtime.getRuntime().addShutdownHook(interruption.hook);
    return interruption;
  }

  /** Set once the signal has come. */
  AtomicBoolean stop() {
    return stop;
  }

  /** What the signal sets off: asks for the end and waits for it. */
  void endEarly() {
    stop.set(true);
    try {
      done.await(MOST_SECONDS, TimeUnit.SECONDS);
    } catch (InterruptedException e) {
      Thread.currentThread().interrupt();
    }
  }

  /** To be called when all results are out. */
  @Override
  public void close() {
    done.countDown();
    if (!stop.get()) {
      removeHook();
    }
  }

  private void removeHook() {
    try {
      Runtime.getRuntime().removeShutdownHook(hook);
    } catch (IllegalStateException e) {
      // The signal came this very moment: the hook finds the work done and returns at once.
    }
  }
}
