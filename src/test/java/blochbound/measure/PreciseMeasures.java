package blochbound.measure;

import java.math.BigDecimal;
import java.math.MathContext;

/** The measures from their textbook definitions in 50-digit decimals, for the tests. */
final class PreciseMeasures {
  private static final MathContext DIGITS = PreciseMatrix.DIGITS;

  private PreciseMeasures() {}

  static BigDecimal purity(PreciseMatrix rho) {
    return rho.inner(rho);
  }

  /** Minus the sum of the negative eigenvalues after the transpose of the second of two factors. */
  static BigDecimal negativity(PreciseMatrix rho, int second) {
    PreciseMatrix transposed = new PreciseMatrix(rho.rows, rho.rows);
    for (int i = 0; i < rho.rows; i++) {
      for (int j = 0; j < rho.rows; j++) {
        int row = i / second * second + j % second;
        int column = j / second * second + i % second;
        transposed.re[row][column] = rho.re[i][j];
        transposed.im[row][column] = rho.im[i][j];
      }
    }
    BigDecimal sum = BigDecimal.ZERO;
    for (BigDecimal value : transposed.eigenvalues()) {
      sum = sum.add(value.negate().max(BigDecimal.ZERO));
    }
    return sum;
  }

  static BigDecimal traceDistance(PreciseMatrix rho, PreciseMatrix reference) {
    BigDecimal sum = BigDecimal.ZERO;
    for (BigDecimal value : rho.minus(reference).eigenvalues()) {
      sum = sum.add(value.abs());
    }
    return sum.divide(BigDecimal.valueOf(2));
  }

  /** Roots of the eigenvalues of sqrt(rho) rho~ sqrt(rho), largest minus the others, or zero. */
  static BigDecimal concurrence(PreciseMatrix rho) {
    PreciseMatrix flip = new PreciseMatrix(4, 4);
    for (int i = 0; i < 4; i++) {
      flip.re[i][3 - i] = BigDecimal.valueOf(i == 0 || i == 3 ? -1 : 1);
    }
    PreciseMatrix root = rho.squareRoot();
    PreciseMatrix flipped = flip.times(rho.conjugate()).times(flip);
    BigDecimal sum = BigDecimal.ZERO;
    BigDecimal most = BigDecimal.ZERO;
    for (BigDecimal value : root.times(flipped).times(root).eigenvalues()) {
      BigDecimal length = value.max(BigDecimal.ZERO).sqrt(DIGITS);
      sum = sum.add(length);
      most = most.max(length);
    }
    return most.add(most).subtract(sum).max(BigDecimal.ZERO);
  }

  static BigDecimal fidelity(PreciseMatrix rho, PreciseMatrix reference) {
    PreciseMatrix root = reference.squareRoot();
    BigDecimal sum = BigDecimal.ZERO;
    for (BigDecimal value : root.times(rho).times(root).eigenvalues()) {
      sum = sum.add(value.max(BigDecimal.ZERO).sqrt(DIGITS));
    }
    return sum.pow(2);
  }

  static BigDecimal entropy(PreciseMatrix rho) {
    BigDecimal sum = BigDecimal.ZERO;
    for (BigDecimal p : rho.eigenvalues()) {
      // Zero eigenvalues come out as decimals of the size 1e-50.
      if (p.compareTo(new BigDecimal("1e-40")) > 0) {
        sum = sum.subtract(p.multiply(log(p)));
      }
    }
    return sum;
  }

  /** Natural logarithm: log x = n log 2 + 2 artanh((y - 1)/(y + 1)), x = 2^n y. */
  static BigDecimal log(BigDecimal x) {
    BigDecimal y = x;
    int n = 0;
    while (y.compareTo(new BigDecimal("0.75")) < 0) {
      y = y.multiply(BigDecimal.valueOf(2));
      n--;
    }
    while (y.compareTo(new BigDecimal("1.5")) > 0) {
      y = y.divide(BigDecimal.valueOf(2));
      n++;
    }
    BigDecimal third = BigDecimal.ONE.divide(BigDecimal.valueOf(3), DIGITS);
    BigDecimal argument = y.subtract(BigDecimal.ONE).divide(y.add(BigDecimal.ONE), DIGITS);
    return artanh(argument)
        .add(artanh(third).multiply(BigDecimal.valueOf(n)))
        .multiply(BigDecimal.valueOf(2));
  }

  private static BigDecimal artanh(BigDecimal z) {
    BigDecimal square = z.multiply(z, DIGITS);
    BigDecimal power = z;
    BigDecimal sum = z;
    for (int k = 3; power.abs().compareTo(new BigDecimal("1e-50")) > 0; k += 2) {
      power = power.multiply(square, DIGITS);
      sum = sum.add(power.divide(BigDecimal.valueOf(k), DIGITS));
    }
    return sum;
  }
}
