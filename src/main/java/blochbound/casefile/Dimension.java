package blochbound.casefile;

import blochbound.model.Unit;

/**
 * Power of time that a quantity carries, counted in halves so that the square root of a rate has
 * one.
 *
 * @param halves twice the power of time
 */
record Dimension(int halves) {
  static final Dimension NONE = new Dimension(0);
  static final Dimension RATE = new Dimension(-2);
  static final Dimension TIME = new Dimension(2);

  /** Dimension of a unit. */
  static Dimension of(Unit unit) {
    return new Dimension(2 * unit.timePower());
  }

  /** Dimension of a product. */
  Dimension plus(Dimension other) {
    return new Dimension(halves + other.halves);
  }

  /** Dimension of an integer power. */
  Dimension times(int exponent) {
    return new Dimension(halves * exponent);
  }

  /** Words for messages. */
  @Override
  public String toString() {
    return switch (halves) {
      case 0 -> "a pure number";
      case 2 -> "a time";
      case -2 -> "1/time";
      case -1 -> "1/sqrt(time)";
      case 1 -> "sqrt(time)";
      default -> halves % 2 == 0 ? "time^(" + halves / 2 + ")" : "time^(" + halves + "/2)";
    };
  }
}
