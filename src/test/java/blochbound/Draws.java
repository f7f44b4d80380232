package blochbound;

import java.math.BigDecimal;
import java.util.SplittableRandom;
import java.util.stream.LongStream;

/** Seeds and random numbers of the property tests. */
public final class Draws {
  private Draws() {}

  /** Seeds of a parameterised test: a few hundred, or as many as profile soak asks for. */
  public static LongStream seeds() {
    return LongStream.range(0, Integer.getInteger("blochbound.soak", 200));
  }

  /** A number of any sign and of widely varying size, at times zero or a small whole number. */
  public static double number(SplittableRandom random) {
    return switch (random.nextInt(8)) {
      case 0 -> 0;
      case 1, 2 -> random.nextInt(-9, 10);
      case 3 -> random.nextDouble(-1, 1) * Math.scalb(1.0, random.nextInt(-60, 61));
      default -> random.nextDouble(-2, 2);
    };
  }

  /** A decimal of few digits, such as a case file holds. */
  public static BigDecimal decimal(SplittableRandom random, int mostUnscaled) {
    return BigDecimal.valueOf(random.nextInt(-mostUnscaled, mostUnscaled + 1), random.nextInt(5));
  }
}
