package blochbound.model;

import blochbound.interval.ExactNumber;
import blochbound.interval.Interval;
import java.nio.charset.StandardCharsets;
import java.security.MessageDigest;
import java.security.NoSuchAlgorithmException;
import java.util.HexFormat;
import java.util.Optional;

/**
 * A real constant: always enclosed, and exact where it is a fraction times a power of pi.
 *
 * <p>Different constants may share an enclosure; the name tells them apart, so that only equal
 * constants cancel. It is the number itself when exact, and otherwise a digest of how the constant
 * was made.
 *
 * @param enclosure interval that holds the constant
 * @param exact the constant itself, when known exactly
 * @param name text that no two different constants share
 */
public record Coefficient(Interval enclosure, Optional<ExactNumber> exact, String name) {
  /** Zero. */
  public static final Coefficient ZERO = of(ExactNumber.ZERO);

  /** One. */
  public static final Coefficient ONE = of(ExactNumber.ONE);

  /** An exact constant. */
  public static Coefficient of(ExactNumber value) {
    String pi = value.piPower() == 0 ? "" : "pi^" + value.piPower();
    return new Coefficient(value.enclosure(), Optional.of(value), value.ratio() + pi);
  }

  /**
   * A constant that is only enclosed.
   *
   * @param enclosure interval that holds the constant
   * @param origin text that tells how it was made, from the names of what it was made from
   */
  public static Coefficient of(Interval enclosure, String origin) {
    return new Coefficient(enclosure, Optional.empty(), digest(origin));
  }

  private static String digest(String origin) {
    try {
      byte[] hash =
          MessageDigest.getInstance("SHA-256").digest(origin.getBytes(StandardCharsets.UTF_8));
      return "#" + HexFormat.of().formatHex(hash);
    } catch (NoSuchAlgorithmException e) {
      throw new IllegalStateException("every Java platform has SHA-256", e);
    }
  }

  private String with(char operation, Coefficient other) {
    boolean inOrder = name.compareTo(other.name) <= 0;
    return (inOrder ? name : other.name) + operation + (inOrder ? other.name : name);
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
    return sum.map(Coefficient::of)
        .orElseGet(() -> of(enclosure.plus(other.enclosure), with('+', other)));
  }

  /** Product. */
  public Coefficient times(Coefficient other) {
    Optional<ExactNumber> product = exact.flatMap(a -> other.exact.map(a::times));
    return product
        .map(Coefficient::of)
        .orElseGet(() -> of(enclosure.times(other.enclosure), with('*', other)));
  }

  /** The negative. */
  public Coefficient negate() {
    return exact.map(a -> of(a.negate())).orElseGet(() -> of(enclosure.negate(), "-" + name));
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
        .orElseGet(() -> of(Interval.ONE.dividedBy(enclosure), "1/" + name));
  }
}
