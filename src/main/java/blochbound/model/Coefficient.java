package blochbound.model;

import blochbound.interval.ExactNumber;
import blochbound.interval.Interval;
import java.util.Optional;

/**
 * A real constant: always enclosed, and exact where it is a fraction times a power of pi.
 *
 * @param enclosure interval that holds the constant
 * @param exact the constant itself, when known exactly
 */
public record Coefficient(Interval enclosure, Optional<ExactNumber> exact) {
  /** Zero. */
  public static final Coefficient ZERO = of(ExactNumber.ZERO);

  /** One. */
  public static final Coefficient ONE = of(ExactNumber.ONE);

  /** An exact constant. */
  public static Coefficient of(ExactNumber value) {
    return new Coefficient(value.enclosure(), Optional.of(value));
  }

  /** A constant that is only enclosed. */
  public static Coefficient of(Interval enclosure) {
    return new Coefficient(enclosure, Optional.empty());
  }

  /** Tells whether the constant is exactly zero. */
  public boolean isZero() {
    return exact.isPresent() && exact.get().signum() == 0;
  }

  /** A double within the enclosure. */
  public double value() {
    return enclosure.middle();
  }

  /** Sum. */
  public Coefficient plus(Coefficient other) {
    Optional<ExactNumber> sum = exact.flatMap(a -> other.exact.flatMap(a::plus));
    return sum.map(Coefficient::of).orElseGet(() -> of(enclosure.plus(other.enclosure)));
  }

  /** Product. */
  public Coefficient times(Coefficient other) {
    Optional<ExactNumber> product = exact.flatMap(a -> other.exact.map(a::times));
    return product.map(Coefficient::of).orElseGet(() -> of(enclosure.times(other.enclosure)));
  }

  /** The negative. */
  public Coefficient negate() {
    return new Coefficient(enclosure.negate(), exact.map(ExactNumber::negate));
  }

  /**
   * Reciprocal.
   *
   * @throws ArithmeticException when the enclosure holds zero
   */
  public Coefficient reciprocal() {
    if (enclosure.contains(0)) {
      throw new ArithmeticException("division by zero");
    }
    return exact
        .map(a -> of(ExactNumber.ONE.dividedBy(a)))
        .orElseGet(() -> of(Interval.ONE.dividedBy(enclosure)));
  }
}
