package blochbound.casefile;

import blochbound.interval.ExactNumber;
import blochbound.linalg.ComplexBall;
import blochbound.model.Coefficient;
import blochbound.model.Monomial;
import blochbound.model.OperatorForm;
import blochbound.model.Scalar;
import java.util.Optional;

/**
 * Limits the work and the memory that the expressions of one case may take.
 *
 * <p>Every operation is charged before it runs; a complaint ends the expression. The limits lie far
 * above real devices and keep a hostile file within seconds.
 */
final class WorkLimit {
  /** Most monomials of one product. */
  static final int MOST_MONOMIALS = 10_000;

  private static final long MOST_SCALAR_STEPS = 20_000_000L;
  private static final long STEPS_OF_A_PAIR = 100;
  private static final long MOST_MATRIX_STEPS = 1_000_000_000L;
  private static final long MOST_ENTRIES = 4_000_000L;
  private static final long MOST_KEPT_ENTRIES = 16_000_000L;
  private static final int LONGEST_KEY = 20_000;
  private static final int MOST_BITS = 4096;
  private static final int LARGEST_EXPONENT = 1000;
  private static final String HUGE_EXPONENT =
      "a parameter reaches a power over " + LARGEST_EXPONENT + ", which is the limit";
  private static final String TOO_LARGE = "the entries of an operator or a ket exceed 1e100";
  private static final double LARGEST_NUMBER = 1e300;
  private static final double LARGEST_NORM = 1e100;

  private final long mostScalarSteps;
  private final long mostMatrixSteps;
  private final long mostKeptEntries;
  private long scalarSteps;
  private long matrixSteps;
  private long keptEntries;

  /** The limits of a case. */
  WorkLimit() {
    this(MOST_SCALAR_STEPS, MOST_MATRIX_STEPS, MOST_KEPT_ENTRIES);
  }

  /**
   * Other limits.
   *
   * @param mostScalarSteps operations on monomials
   * @param mostMatrixSteps multiplications of matrix entries
   * @param mostKeptEntries matrix entries of all finished expressions together
   */
  WorkLimit(long mostScalarSteps, long mostMatrixSteps, long mostKeptEntries) {
    this.mostScalarSteps = mostScalarSteps;
    this.mostMatrixSteps = mostMatrixSteps;
    this.mostKeptEntries = mostKeptEntries;
  }

  /** Charges a product of two sums of monomials. */
  Optional<String> chargeProduct(int left, int right) {
    long pairs = (long) left * right;
    if (pairs > MOST_MONOMIALS) {
      return Optional.of(
          "the product has over " + MOST_MONOMIALS + " monomials, which is the limit");
    }
    scalarSteps += STEPS_OF_A_PAIR * pairs;
    return overWork();
  }

  /** Charges a sum of two sums of monomials. */
  Optional<String> chargeSum(int left, int right) {
    scalarSteps += left + right;
    return overWork();
  }

  /** Charges matrix operations: {@code count} of {@code steps} multiplications each. */
  Optional<String> chargeMatrices(long count, long steps) {
    matrixSteps += count * steps;
    return overWork();
  }

  private Optional<String> overWork() {
    return scalarSteps > mostScalarSteps || matrixSteps > mostMatrixSteps
        ? Optional.of("the expressions of this case take too much work to expand; simplify them")
        : Optional.empty();
  }

  /** Charges the memory of a finished expression. */
  Optional<String> chargeKept(Value value) {
    if (value instanceof Value.Array array) {
      for (ComplexBall m : array.form().terms().values()) {
        keptEntries += entries(m);
      }
    }
    return keptEntries > mostKeptEntries
        ? Optional.of("the operators of this case take too much memory; simplify them")
        : Optional.empty();
  }

  private static long entries(ComplexBall matrix) {
    return (long) matrix.centre().rows() * matrix.centre().columns();
  }

  /** What is wrong with the size of a computed value, if anything. */
  static Optional<String> complaint(Value value) {
    if (Math.abs(value.dimension().halves()) > 2 * LARGEST_EXPONENT) {
      return Optional.of("a power of time over " + LARGEST_EXPONENT + ", which is the limit");
    }
    return value instanceof Value.Numeric n
        ? complaint(n.re()).or(() -> complaint(n.im()))
        : complaint(((Value.Array) value).form());
  }

  /** What is wrong with a number that is to multiply matrices, if anything. */
  static Optional<String> factorComplaint(Value.Numeric factor) {
    boolean fits =
        java.util.stream.Stream.of(factor.re(), factor.im())
            .flatMap(s -> s.terms().values().stream())
            .allMatch(c -> c.enclosure().magnitude() <= LARGEST_NORM);
    return fits ? Optional.empty() : Optional.of(TOO_LARGE);
  }

  private static Optional<String> complaint(Scalar scalar) {
    long length = 0;
    for (var e : scalar.terms().entrySet()) {
      length += lengthBeyondPlain(e.getKey());
      if (hasHugeExponent(e.getKey())) {
        return Optional.of(HUGE_EXPONENT);
      }
      if (!isModerate(e.getValue())) {
        return Optional.of("a number in the expression leaves the range of 1e-300 to 1e300");
      }
    }
    return tooLong(length);
  }

  private static Optional<String> complaint(OperatorForm form) {
    long length = 0;
    long entries = 0;
    for (var e : form.terms().entrySet()) {
      length += lengthBeyondPlain(e.getKey());
      ComplexBall m = e.getValue();
      if (hasHugeExponent(e.getKey())) {
        return Optional.of(HUGE_EXPONENT);
      }
      entries += entries(m);
      if (!(m.normUp() <= LARGEST_NORM)) {
        return Optional.of(TOO_LARGE);
      }
    }
    return entries > MOST_ENTRIES
        ? Optional.of("the operator has too many terms to store; simplify it")
        : tooLong(length);
  }

  private static boolean hasHugeExponent(Monomial monomial) {
    return monomial.powers().values().stream().anyMatch(e -> Math.abs(e) > LARGEST_EXPONENT);
  }

  /** Plain products of parameters are counted by the other limits. */
  private static int lengthBeyondPlain(Monomial monomial) {
    return monomial.isPolynomial() ? 0 : monomial.key().length();
  }

  private static Optional<String> tooLong(long length) {
    return length > LONGEST_KEY
        ? Optional.of("the expression is too large when written out; simplify it")
        : Optional.empty();
  }

  private static boolean isModerate(Coefficient c) {
    return c.enclosure().magnitude() <= LARGEST_NUMBER
        && c.exact().map(WorkLimit::isShort).orElse(true);
  }

  private static boolean isShort(ExactNumber number) {
    return number.numerator().bitLength() <= MOST_BITS
        && number.denominator().bitLength() <= MOST_BITS
        && Math.abs(number.piPower()) <= 1000;
  }
}
