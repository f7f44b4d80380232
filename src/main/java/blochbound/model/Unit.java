package blochbound.model;

import blochbound.interval.ExactNumber;

/**
 * A unit of the case file.
 *
 * @param symbol as written, such as {@code kHz}, {@code /us} or {@code rad/us}; empty for none
 * @param factor exact value of one such unit in the internal unit of the case
 * @param timePower power of time: -1 for rates and frequencies, 1 for times, 0 for pure numbers
 */
public record Unit(String symbol, ExactNumber factor, int timePower) {
  /** The pure number one. */
  public static final Unit NONE = new Unit("", ExactNumber.ONE, 0);
}
