package blochbound.check;

/** Argument checks that return the checked value. */
public final class Check {
  private Check() {}

  /**
   * Returns {@code value} when it is finite.
   *
   * @throws IllegalArgumentException when the value is NaN or infinite
   */
  public static double finite(double value, String name) {
    if (!Double.isFinite(value)) {
      throw new IllegalArgumentException(name + " must be finite, not " + value);
    }
    return value;
  }

  /**
   * Returns {@code value} when it is finite and not below zero.
   *
   * @throws IllegalArgumentException when the value is negative, NaN or infinite
   */
  public static double nonNegative(double value, String name) {
    if (finite(value, name) < 0) {
      throw new IllegalArgumentException(name + " must not be negative, not " + value);
    }
    return value;
  }

  /**
   * Returns {@code value} when it is at least {@code least}.
   *
   * @throws IllegalArgumentException when it is smaller
   */
  public static int atLeast(int value, int least, String name) {
    if (value < least) {
      throw new IllegalArgumentException(name + " must be at least " + least + ", not " + value);
    }
    return value;
  }

  /**
   * Throws when a condition on the arguments does not hold.
   *
   * @throws IllegalArgumentException with the message when {@code holds} is false
   */
  public static void that(boolean holds, String message) {
    if (!holds) {
      throw new IllegalArgumentException(message);
    }
  }
}
