package blochbound.interval;

import java.math.BigDecimal;
import java.math.BigInteger;
import java.util.Optional;
import org.apache.commons.math3.fraction.BigFraction;

/**
 * A real number of the form ratio * pi^power, kept exactly: decimals of a case file and unit
 * factors (cycles are 2 pi radians) are of this form.
 *
 * @param ratio the rational factor
 * @param piPower the power of pi; 0 when the ratio is zero
 */
public record ExactNumber(BigFraction ratio, int piPower) {
  /** Zero. */
  public static final ExactNumber ZERO = new ExactNumber(BigFraction.ZERO, 0);

  /** One. */
  public static final ExactNumber ONE = new ExactNumber(BigFraction.ONE, 0);

  /** The number pi. */
  public static final ExactNumber PI = new ExactNumber(BigFraction.ONE, 1);

  /** Gives zero one form. */
  public ExactNumber {
    if (ratio.getNumerator().signum() == 0) {
      piPower = 0;
    }
  }

  /** The whole number {@code value}. */
  public static ExactNumber of(long value) {
    return new ExactNumber(new BigFraction(value), 0);
  }

  /** The decimal number {@code value}. */
  public static ExactNumber of(BigDecimal value) {
    BigFraction unscaled = new BigFraction(value.unscaledValue());
    BigFraction ten = new BigFraction(BigInteger.TEN);
    return new ExactNumber(
        value.scale() >= 0
            ? unscaled.divide(ten.pow(value.scale()))
            : unscaled.multiply(ten.pow(-value.scale())),
        0);
  }

  /**
   * The fraction {@code numerator} / {@code denominator}.
   *
   * @throws ArithmeticException when the denominator is zero
   */
  public static ExactNumber of(BigInteger numerator, BigInteger denominator) {
    if (denominator.signum() == 0) {
      throw new ArithmeticException("division by zero");
    }
    return new ExactNumber(new BigFraction(numerator, denominator), 0);
  }

  /** Numerator of the reduced ratio, with the sign of the number. */
  public BigInteger numerator() {
    return ratio.getNumerator();
  }

  /** Denominator of the reduced ratio, positive. */
  public BigInteger denominator() {
    return ratio.getDenominator();
  }

  /** Sign of the number: -1, 0 or 1. */
  public int signum() {
    return ratio.getNumerator().signum();
  }

  /** Product, exactly. */
  public ExactNumber times(ExactNumber other) {
    return new ExactNumber(ratio.multiply(other.ratio), piPower + other.piPower);
  }

  /**
   * Quotient, exactly.
   *
   * @throws ArithmeticException when {@code other} is zero
   */
  public ExactNumber dividedBy(ExactNumber other) {
    return new ExactNumber(ratio.divide(other.ratio), piPower - other.piPower);
  }

  /** Sum, or empty when the two carry different powers of pi. */
  public Optional<ExactNumber> plus(ExactNumber other) {
    if (signum() == 0) {
      return Optional.of(other);
    }
    return other.signum() == 0 || piPower == other.piPower
        ? Optional.of(
            new ExactNumber(ratio.add(other.ratio), other.signum() == 0 ? piPower : other.piPower))
        : Optional.empty();
  }

  /** The negative. */
  public ExactNumber negate() {
    return new ExactNumber(ratio.negate(), piPower);
  }

  /** Enclosure in double precision, a few units in the last place wide. */
  public Interval enclosure() {
    Interval rational = Interval.fromFraction(ratio);
    return piPower == 0 ? rational : rational.times(Interval.PI.power(piPower));
  }

  /** A double within a few units in the last place. */
  public double doubleValue() {
    return enclosure().middle();
  }
}
