package blochbound.casefile;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import blochbound.linalg.ComplexBall;
import blochbound.linalg.ComplexMatrix;
import java.math.BigDecimal;
import java.math.MathContext;
import java.util.Optional;
import java.util.SplittableRandom;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

class KetNormaliserTest {
  private static final MathContext DIGITS = new MathContext(60);

  private static ComplexBall ket(double radius, double... parts) {
    int n = parts.length / 2;
    double[] re = new double[n];
    double[] im = new double[n];
    for (int k = 0; k < n; k++) {
      re[k] = parts[2 * k];
      im[k] = parts[2 * k + 1];
    }
    return new ComplexBall(ComplexMatrix.of(n, 1, re, im), radius);
  }

  @ParameterizedTest(name = "seed {0}")
  @ValueSource(longs = {1, 2, 3})
  void theErrorBoundHoldsForEveryMember(long seed) {
    SplittableRandom random = new SplittableRandom(seed);
    for (int draw = 0; draw < 200; draw++) {
      double size = Math.scalb(1.0, random.nextInt(-600, 300));
      double[] parts = new double[2 * random.nextInt(1, 9)];
      double[] member = new double[parts.length];
      double radius = random.nextBoolean() ? 0 : 1e-3 * size;
      for (int k = 0; k < parts.length; k++) {
        parts[k] = size * (random.nextDouble() - 0.5);
        double reach = radius / Math.sqrt(parts.length);
        member[k] = parts[k] + 0.999 * reach * (2 * random.nextDouble() - 1);
      }
      Optional<ComplexBall> unit = KetNormaliser.normalised(ket(radius, parts));
      if (unit.isPresent()) {
        // [invariant] |k/|k| - u| in 60 digits against the proved bound
        assertTrue(distance(member, unit.get().centre()).doubleValue() <= unit.get().radius());
      } else {
        assertTrue(norm(parts).doubleValue() <= 1.0001 * radius);
      }
    }
  }

  @Test
  void basisKetsAreExact() {
    assertEquals(ket(0, 0, 0, 1, 0), KetNormaliser.normalised(ket(0, 0, 0, 3, 0)).orElseThrow());
    assertEquals(ket(0, 0, 0, 0, -1), KetNormaliser.normalised(ket(0, 0, 0, 0, -.1)).orElseThrow());
  }

  @Test
  void boundsAreNearRoundingForExactKets() {
    double radius = KetNormaliser.normalised(ket(0, 1, 0, 0, 1)).orElseThrow().radius();
    assertTrue(radius > 0 && radius < 1e-15);
  }

  @Test
  void ketsThatMayBeZeroAreRefused() {
    assertEquals(Optional.empty(), KetNormaliser.normalised(ket(0, 0, 0)));
    assertEquals(Optional.empty(), KetNormaliser.normalised(ket(1e-16, 1e-17, 0)));
  }

  private static BigDecimal norm(double[] parts) {
    BigDecimal sum = BigDecimal.ZERO;
    for (double p : parts) {
      sum = sum.add(new BigDecimal(p).pow(2));
    }
    return sum.sqrt(DIGITS);
  }

  private static BigDecimal distance(double[] member, ComplexMatrix unit) {
    BigDecimal norm = norm(member);
    BigDecimal sum = BigDecimal.ZERO;
    for (int k = 0; k < unit.rows(); k++) {
      BigDecimal re = new BigDecimal(member[2 * k]).divide(norm, DIGITS);
      BigDecimal im = new BigDecimal(member[2 * k + 1]).divide(norm, DIGITS);
      sum = sum.add(re.subtract(new BigDecimal(unit.re(k, 0))).pow(2));
      sum = sum.add(im.subtract(new BigDecimal(unit.im(k, 0))).pow(2));
    }
    return sum.sqrt(DIGITS);
  }
}
