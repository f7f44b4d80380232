package blochbound.interval;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import blochbound.BigReference;
import blochbound.Draws;
import java.math.BigDecimal;
import java.math.BigInteger;
import java.util.Optional;
import java.util.SplittableRandom;
import org.apache.commons.math3.fraction.BigFraction;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;

/** Exact decimals and powers of pi. */
class ExactNumberTest {
  private static ExactNumber decimal(String text) {
    return ExactNumber.of(new BigDecimal(text));
  }

  @Test
  void decimalsAddExactly() {
    // [closed form] 0.1 + 0.2 = 0.3, which doubles do not manage
    assertEquals(Optional.of(decimal("0.3")), decimal("0.1").plus(decimal("0.2")));
    assertEquals(decimal("100"), decimal("1e2"));
    assertEquals(decimal("0.10"), decimal("0.1"));
  }

  @Test
  void rumpsExpressionIsExact() {
    ExactNumber a = ExactNumber.of(77617);
    ExactNumber b = ExactNumber.of(33096);
    ExactNumber a2 = a.times(a);
    ExactNumber b2 = b.times(b);
    ExactNumber b4 = b2.times(b2);
    ExactNumber b6 = b4.times(b2);
    ExactNumber inner =
        sum(
            ExactNumber.of(11).times(a2).times(b2),
            b6.negate(),
            ExactNumber.of(-121).times(b4),
            ExactNumber.of(-2));
    ExactNumber value =
        sum(
            decimal("333.75").times(b6),
            a2.times(inner),
            decimal("5.5").times(b4).times(b4),
            a.dividedBy(ExactNumber.of(2).times(b)));
    // [published] Rump (1988), citation from memory: -54767/66192
    assertEquals(new ExactNumber(new BigFraction(-54767, 66192), 0), value);
  }

  private static ExactNumber sum(ExactNumber... terms) {
    ExactNumber sum = ExactNumber.ZERO;
    for (ExactNumber term : terms) {
      sum = sum.plus(term).orElseThrow();
    }
    return sum;
  }

  @Test
  void powersOfPiCombineInProductsOnly() {
    ExactNumber cycles = ExactNumber.of(2).times(ExactNumber.PI);
    assertEquals(ExactNumber.ONE, ExactNumber.PI.dividedBy(ExactNumber.PI));
    assertEquals(Optional.of(cycles), ExactNumber.PI.plus(ExactNumber.PI));
    assertEquals(Optional.empty(), ExactNumber.PI.plus(ExactNumber.ONE));
    assertEquals(Optional.of(ExactNumber.PI), ExactNumber.ZERO.plus(ExactNumber.PI));
    assertEquals(Optional.of(ExactNumber.PI), ExactNumber.PI.plus(ExactNumber.ZERO));
  }

  @Test
  void fractionsAreReducedAndKnowTheirParts() {
    ExactNumber number = ExactNumber.of(BigInteger.valueOf(6), BigInteger.valueOf(-4));
    // [closed form] 6/(-4) = -3/2
    assertEquals(BigInteger.valueOf(-3), number.numerator());
    assertEquals(BigInteger.TWO, number.denominator());
    assertEquals(-1.5, number.doubleValue());
    assertThrows(ArithmeticException.class, () -> ExactNumber.of(BigInteger.ONE, BigInteger.ZERO));
  }

  @Test
  void zeroHasOneForm() {
    assertEquals(ExactNumber.ZERO, ExactNumber.PI.times(ExactNumber.ZERO));
    assertEquals(Optional.of(ExactNumber.ZERO), ExactNumber.PI.plus(ExactNumber.PI.negate()));
    assertEquals(0, ExactNumber.ZERO.signum());
    assertThrows(ArithmeticException.class, () -> ExactNumber.ONE.dividedBy(ExactNumber.ZERO));
  }

  @ParameterizedTest(name = "seed {0}")
  @MethodSource("blochbound.Draws#seeds")
  void theEnclosureHoldsTheNumber(long seed) {
    SplittableRandom random = new SplittableRandom(seed);
    BigDecimal decimal = Draws.decimal(random, 1_000_000);
    int power = random.nextInt(-3, 4);
    ExactNumber number = ExactNumber.of(decimal);
    BigDecimal exact = decimal;
    for (int k = 0; k < Math.abs(power); k++) {
      number = power > 0 ? number.times(ExactNumber.PI) : number.dividedBy(ExactNumber.PI);
      exact =
          power > 0
              ? exact.multiply(BigReference.PI, BigReference.DIGITS)
              : exact.divide(BigReference.PI, BigReference.DIGITS);
    }
    Interval enclosure = number.enclosure();
    assertTrue(new BigDecimal(enclosure.lower()).compareTo(exact) <= 0);
    assertTrue(new BigDecimal(enclosure.upper()).compareTo(exact) >= 0);
    assertTrue(enclosure.radius() <= 1e-14 * enclosure.magnitude());
    assertEquals(decimal.signum(), number.signum());
  }

  @Test
  void piIsEnclosedByNeighbouringDoubles() {
    assertTrue(new BigDecimal(Interval.PI.lower()).compareTo(BigReference.PI) < 0);
    assertTrue(new BigDecimal(Interval.PI.upper()).compareTo(BigReference.PI) > 0);
    // [published] the first digits of pi, from memory
    assertTrue(BigReference.PI.toString().startsWith("3.14159265358979323846264338327950288419"));
  }
}
