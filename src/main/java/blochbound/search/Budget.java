package blochbound.search;

/**
 * What one run may spend.
 *
 * @param evaluations most evaluations of the objective
 * @param deadlineNanos {@link System#nanoTime} after which no evaluation starts
 */
record Budget(int evaluations, long deadlineNanos) {
  boolean isOutOfTime() {
    return System.nanoTime() - deadlineNanos > 0;
  }
}
