package blochbound.casefile;

import blochbound.casefile.Value.Numeric;
import blochbound.interval.ExactNumber;
import blochbound.model.Atom.Function;
import blochbound.model.Coefficient;
import blochbound.model.Scalar;
import java.util.Optional;

/** Reciprocal, square root, exponential, sine and cosine of numbers of one passage. */
final class ScalarFunctions {
  private final Passage passage;

  ScalarFunctions(Passage passage) {
    this.passage = passage;
  }

  /** The reciprocal; a complex one is conj(z) / |z|^2. */
  Numeric reciprocal(Numeric n, int at) {
    Dimension dimension = new Dimension(-n.dimension().halves());
    try {
      if (n.isReal()) {
        return Numeric.real(n.re().reciprocal(), dimension);
      }
      Scalar square = n.re().times(n.re()).plus(n.im().times(n.im())).reciprocal();
      return new Numeric(n.re().times(square), n.im().negate().times(square), dimension);
    } catch (ArithmeticException e) {
      throw passage.fault(at, "the divisor is zero or cannot be told from zero");
    }
  }

  /** A function by its name in the case file. */
  Numeric apply(String function, Numeric n, int at) {
    if (function.equals("sqrt")) {
      return squareRoot(n, at);
    }
    if (!n.isZero() && !n.dimension().equals(Dimension.NONE)) {
      throw passage.fault(
          at, "the argument of " + function + " must be a pure number, not " + n.dimension());
    }
    if (function.equals("exp")) {
      Scalar size = n.re().isZero() ? Scalar.ONE : n.re().apply(Function.EXP);
      return n.isReal()
          ? Numeric.real(size, Dimension.NONE)
          : new Numeric(
              size.times(n.im().apply(Function.COS)),
              size.times(n.im().apply(Function.SIN)),
              Dimension.NONE);
    }
    requireReal(function, n, at);
    return Numeric.real(
        n.re().apply(function.equals("sin") ? Function.SIN : Function.COS), Dimension.NONE);
  }

  private void requireReal(String function, Numeric n, int at) {
    if (!n.isReal()) {
      throw passage.fault(at, "the argument of " + function + " must be real");
    }
  }

  private Numeric squareRoot(Numeric n, int at) {
    requireReal("sqrt", n, at);
    if (n.dimension().halves() % 2 != 0) {
      throw passage.fault(at, "the square root of " + n.dimension() + " is no known dimension");
    }
    Dimension dimension = new Dimension(n.dimension().halves() / 2);
    if (!n.isConstant()) {
      return Numeric.real(n.re().apply(Function.SQRT), dimension);
    }
    Coefficient value = n.re().constantTerm();
    if (value.enclosure().lower() < 0) {
      throw passage.fault(
          at, "the square root of a number that is negative or cannot be told from negative");
    }
    Scalar root =
        value
            .exact()
            .flatMap(ScalarFunctions::exactRoot)
            .map(Scalar::constant)
            .orElseGet(() -> n.re().apply(Function.SQRT));
    return Numeric.real(root, dimension);
  }

  /** The root when it is a fraction times a power of pi. */
  private static Optional<ExactNumber> exactRoot(ExactNumber x) {
    if (x.piPower() % 2 != 0) {
      return Optional.empty();
    }
    ExactNumber root = ExactNumber.of(x.numerator().sqrt(), x.denominator().sqrt());
    for (int k = 0; k < Math.abs(x.piPower()) / 2; k++) {
      root = x.piPower() > 0 ? root.times(ExactNumber.PI) : root.dividedBy(ExactNumber.PI);
    }
    return root.times(root).equals(x) ? Optional.of(root) : Optional.empty();
  }
}
