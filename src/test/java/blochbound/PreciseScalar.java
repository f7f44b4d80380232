package blochbound;

import blochbound.interval.ExactNumber;
import blochbound.model.Atom;
import blochbound.model.Atom.FunctionAtom;
import blochbound.model.Atom.ParameterAtom;
import blochbound.model.Coefficient;
import blochbound.model.Monomial;
import blochbound.model.Scalar;
import java.math.BigDecimal;
import java.util.List;
import java.util.Map;

/** Scalar expressions with exact coefficients to about 60 digits: the reference of the tests. */
public final class PreciseScalar {
  private PreciseScalar() {}

  /** Value of an expression at exact parameters in internal units. */
  public static BigDecimal value(Scalar scalar, List<BigDecimal> p) {
    BigDecimal sum = BigDecimal.ZERO;
    for (Map.Entry<Monomial, Coefficient> e : scalar.terms().entrySet()) {
      ExactNumber exact = e.getValue().exact().orElseThrow();
      if (exact.piPower() != 0) {
        throw new IllegalArgumentException("powers of pi are not covered");
      }
      BigDecimal factor =
          new BigDecimal(exact.numerator())
              .divide(new BigDecimal(exact.denominator()), BigReference.DIGITS);
      sum = sum.add(factor.multiply(value(e.getKey(), p), BigReference.DIGITS));
    }
    return sum;
  }

  /** Value of a monomial at exact parameters in internal units. */
  public static BigDecimal value(Monomial monomial, List<BigDecimal> p) {
    BigDecimal product = BigDecimal.ONE;
    for (Map.Entry<Atom, Integer> e : monomial.powers().entrySet()) {
      BigDecimal base =
          e.getKey() instanceof ParameterAtom a
              ? p.get(a.index())
              : function((FunctionAtom) e.getKey(), p);
      for (int k = 0; k < Math.abs(e.getValue()); k++) {
        product =
            e.getValue() > 0
                ? product.multiply(base, BigReference.DIGITS)
                : product.divide(base, BigReference.DIGITS);
      }
    }
    return product;
  }

  private static BigDecimal function(FunctionAtom atom, List<BigDecimal> p) {
    BigDecimal x = value(atom.argument(), p);
    return switch (atom.function()) {
      case SQRT -> x.sqrt(BigReference.DIGITS);
      case EXP -> BigReference.exp(x);
      case SIN -> BigReference.sin(x);
      case COS -> BigReference.cos(x);
      case RECIPROCAL -> BigDecimal.ONE.divide(x, BigReference.DIGITS);
    };
  }
}
