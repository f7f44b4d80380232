package blochbound;

import java.math.BigDecimal;
import java.math.MathContext;
import java.math.RoundingMode;

/**
 * Elementary functions to about 60 digits by series: the reference for outward rounding.
 *
 * <p>It shares no code with the program.
 */
public final class BigReference {
  /** Working precision. */
  public static final MathContext DIGITS = new MathContext(90, RoundingMode.HALF_EVEN);

  /** The number pi by Machin's formula 16 atan(1/5) - 4 atan(1/239). */
  public static final BigDecimal PI =
      arcusTangentOfReciprocal(5)
          .multiply(BigDecimal.valueOf(16))
          .subtract(arcusTangentOfReciprocal(239).multiply(BigDecimal.valueOf(4)));

  private static final BigDecimal NEGLIGIBLE = BigDecimal.ONE.movePointLeft(100);

  private BigReference() {}

  private static BigDecimal arcusTangentOfReciprocal(int n) {
    BigDecimal square = BigDecimal.valueOf((long) n * n);
    BigDecimal power = BigDecimal.ONE.divide(BigDecimal.valueOf(n), DIGITS);
    BigDecimal sum = power;
    for (int k = 1; k < 80; k++) {
      power = power.divide(square, DIGITS).negate();
      sum = sum.add(power.divide(BigDecimal.valueOf(2L * k + 1), DIGITS), DIGITS);
    }
    return sum;
  }

  /** Exponential of a number of modest size. */
  public static BigDecimal exp(BigDecimal x) {
    // exp(x) = exp(x / 2^k)^(2^k) keeps the series short.
    int halvings = 0;
    BigDecimal reduced = x;
    while (reduced.abs().compareTo(BigDecimal.ONE) > 0) {
      reduced = reduced.divide(BigDecimal.valueOf(2), DIGITS);
      halvings++;
    }
    BigDecimal power = series(reduced, BigDecimal.ONE, 0, 1);
    for (int k = 0; k < halvings; k++) {
      power = power.multiply(power, DIGITS);
    }
    return power;
  }

  /** Sine. */
  public static BigDecimal sin(BigDecimal x) {
    BigDecimal r = reduced(x);
    return series(r.multiply(r, DIGITS).negate(), r, 1, 2);
  }

  /** Cosine. */
  public static BigDecimal cos(BigDecimal x) {
    BigDecimal r = reduced(x);
    return series(r.multiply(r, DIGITS).negate(), BigDecimal.ONE, 0, 2);
  }

  private static BigDecimal reduced(BigDecimal x) {
    BigDecimal turn = PI.multiply(BigDecimal.valueOf(2));
    BigDecimal turns = x.divide(turn, 0, RoundingMode.HALF_EVEN);
    return x.subtract(turns.multiply(turn), DIGITS);
  }

  /** Sum of first * x^k / ((from + 1) (from + 2) ... (from + step k)). */
  private static BigDecimal series(BigDecimal x, BigDecimal first, int from, int step) {
    BigDecimal term = first;
    BigDecimal sum = first;
    int factor = from;
    while (term.abs().compareTo(NEGLIGIBLE) > 0) {
      term = term.multiply(x, DIGITS);
      for (int i = 0; i < step; i++) {
        factor++;
        term = term.divide(BigDecimal.valueOf(factor), DIGITS);
      }
      sum = sum.add(term, DIGITS);
    }
    return sum;
  }
}
