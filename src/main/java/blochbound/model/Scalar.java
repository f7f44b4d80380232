package blochbound.model;

import blochbound.check.Check;
import blochbound.interval.ExactNumber;
import blochbound.interval.Interval;
import blochbound.model.Atom.Function;
import blochbound.model.Atom.FunctionAtom;
import blochbound.model.Atom.ParameterAtom;
import java.util.ArrayList;
import java.util.Collections;
import java.util.List;
import java.util.Map;
import java.util.NavigableMap;
import java.util.Optional;
import java.util.SortedMap;
import java.util.TreeMap;
import java.util.stream.Collectors;

/**
 * A real expression in the parameters as a sum of monomials, in internal units.
 *
 * <p>Sums and products are exact, also of square roots: sqrt(x) * sqrt(x) is x. A quotient by a
 * single monomial has negative exponents; a quotient by a sum is a reciprocal atom. Where an
 * expression is defined is told by {@link #conditions()}.
 */
public final class Scalar {
  /** Zero. */
  public static final Scalar ZERO = new Scalar(new TreeMap<>());

  /** One. */
  public static final Scalar ONE = constant(Coefficient.ONE);

  private final NavigableMap<Monomial, Coefficient> terms;

  private Scalar(NavigableMap<Monomial, Coefficient> terms) {
    this.terms = terms;
  }

  /** A constant. */
  public static Scalar constant(Coefficient value) {
    return term(Monomial.ONE, value);
  }

  /** An exact constant. */
  public static Scalar constant(ExactNumber value) {
    return constant(Coefficient.of(value));
  }

  /** The parameter at position {@code index}. */
  public static Scalar parameter(int index) {
    return term(Monomial.parameter(index), Coefficient.ONE);
  }

  /** A multiple of a monomial. */
  public static Scalar term(Monomial monomial, Coefficient coefficient) {
    TreeMap<Monomial, Coefficient> terms = new TreeMap<>();
    if (!coefficient.isZero()) {
      terms.put(monomial, coefficient);
    }
    return new Scalar(terms);
  }

  /** The monomials with their coefficients, in a fixed order. */
  public SortedMap<Monomial, Coefficient> terms() {
    return Collections.unmodifiableSortedMap(terms);
  }

  /** Tells whether the expression is exactly zero. */
  public boolean isZero() {
    return terms.isEmpty();
  }

  /** Tells whether no parameter occurs. */
  public boolean isConstant() {
    return terms.isEmpty() || (terms.size() == 1 && terms.firstKey().isOne());
  }

  /** The constant term. */
  public Coefficient constantTerm() {
    return terms.getOrDefault(Monomial.ONE, Coefficient.ZERO);
  }

  /** Sum. */
  public Scalar plus(Scalar other) {
    TreeMap<Monomial, Coefficient> sum = new TreeMap<>(terms);
    other.terms.forEach((m, c) -> sum.merge(m, c, Coefficient::plus));
    sum.values().removeIf(Coefficient::isZero);
    return new Scalar(sum);
  }

  /** Difference. */
  public Scalar minus(Scalar other) {
    return plus(other.negate());
  }

  /** The negative. */
  public Scalar negate() {
    return times(constant(ExactNumber.of(-1)));
  }

  /** Product; even powers of a square root become powers of its argument. */
  public Scalar times(Scalar other) {
    TreeMap<Monomial, Coefficient> sum = new TreeMap<>();
    for (Map.Entry<Monomial, Coefficient> a : terms.entrySet()) {
      for (Map.Entry<Monomial, Coefficient> b : other.terms.entrySet()) {
        normal(a.getKey().times(b.getKey()))
            .scaled(a.getValue().times(b.getValue()))
            .terms
            .forEach((m, c) -> sum.merge(m, c, Coefficient::plus));
      }
    }
    sum.values().removeIf(Coefficient::isZero);
    return new Scalar(sum);
  }

  private Scalar scaled(Coefficient factor) {
    TreeMap<Monomial, Coefficient> scaled = new TreeMap<>();
    terms.forEach((m, c) -> scaled.put(m, c.times(factor)));
    scaled.values().removeIf(Coefficient::isZero);
    return new Scalar(scaled);
  }

  /** Rewrites sqrt(a)^k with |k| of 2 or more. */
  private static Scalar normal(Monomial monomial) {
    for (Map.Entry<Atom, Integer> e : monomial.powers().entrySet()) {
      if (e.getKey() instanceof FunctionAtom f
          && f.function() == Function.SQRT
          && Math.abs(e.getValue()) >= 2) {
        int whole = e.getValue() / 2;
        Monomial rest = monomial.without(f).times(Monomial.of(f, e.getValue() % 2));
        return normal(rest).times(f.argument().power(whole));
      }
    }
    return term(monomial, Coefficient.ONE);
  }

  /**
   * Quotient.
   *
   * @throws ArithmeticException when {@code other} is a constant that is or may be zero
   */
  public Scalar dividedBy(Scalar other) {
    return times(other.reciprocal());
  }

  /**
   * Reciprocal.
   *
   * @throws ArithmeticException when this is a constant that is or may be zero
   */
  public Scalar reciprocal() {
    if (terms.isEmpty()) {
      throw new ArithmeticException("division by zero");
    }
    if (terms.size() > 1) {
      return term(Monomial.of(new FunctionAtom(Function.RECIPROCAL, this), 1), Coefficient.ONE);
    }
    Scalar product = constant(terms.firstEntry().getValue().reciprocal());
    for (Map.Entry<Atom, Integer> e : terms.firstKey().powers().entrySet()) {
      boolean undo = e.getKey() instanceof FunctionAtom f && f.function() == Function.RECIPROCAL;
      product =
          product.times(
              undo
                  ? ((FunctionAtom) e.getKey()).argument().power(e.getValue())
                  : term(Monomial.of(e.getKey(), -e.getValue()), Coefficient.ONE));
    }
    return product;
  }

  /** Integer power; the zeroth is one. */
  public Scalar power(int exponent) {
    if (exponent < 0) {
      return power(-exponent).reciprocal();
    }
    Scalar product = ONE;
    for (int k = 0; k < exponent; k++) {
      product = product.times(this);
    }
    return product;
  }

  /** A function of this expression; constants are evaluated, the rest becomes an atom. */
  public Scalar apply(Function function) {
    if (function == Function.RECIPROCAL) {
      return reciprocal();
    }
    if (!isConstant()) {
      return term(Monomial.of(new FunctionAtom(function, this), 1), Coefficient.ONE);
    }
    Interval value = function.enclosure(constantTerm().enclosure());
    Check.that(!value.isEmpty(), "square root of a negative number");
    return constant(
        value.lower() == value.upper()
            ? Coefficient.of(ExactNumber.of(new java.math.BigDecimal(value.lower())))
            : Coefficient.of(value, function + "(" + constantTerm().name() + ")"));
  }

  /** Value at the parameters {@code p}, rounded. */
  public double value(double[] p) {
    double sum = 0;
    for (Map.Entry<Monomial, Coefficient> e : terms.entrySet()) {
      sum += e.getValue().value() * e.getKey().value(p);
    }
    return sum;
  }

  /** Derivative with respect to parameter {@code index} at the parameters {@code p}, rounded. */
  public double derivative(double[] p, int index) {
    double sum = 0;
    for (Map.Entry<Monomial, Coefficient> e : terms.entrySet()) {
      sum += e.getValue().value() * e.getKey().derivative(p, index);
    }
    return sum;
  }

  /** Enclosure of the values over parameter ranges. */
  public Interval enclosure(Interval[] p) {
    Interval sum = Interval.ZERO;
    for (Map.Entry<Monomial, Coefficient> e : terms.entrySet()) {
      sum = sum.plus(e.getValue().enclosure().times(e.getKey().enclosure(p)));
    }
    return sum;
  }

  /** Tells whether the value depends on parameter {@code index}. */
  public boolean dependsOn(int index) {
    return terms.keySet().stream()
        .anyMatch(m -> m.atoms().stream().anyMatch(a -> a.dependsOn(index)));
  }

  /**
   * The exact affine form c_0 + sum c_i p_i, when the expression is one with exact coefficients.
   *
   * @param parameters number of parameters
   * @return c_0 at position 0 and c_i at position i + 1
   */
  public Optional<List<ExactNumber>> affine(int parameters) {
    List<ExactNumber> out = new ArrayList<>(Collections.nCopies(parameters + 1, ExactNumber.ZERO));
    for (Map.Entry<Monomial, Coefficient> e : terms.entrySet()) {
      Monomial m = e.getKey();
      if (e.getValue().exact().isEmpty()) {
        return Optional.empty();
      }
      if (m.isOne()) {
        out.set(0, e.getValue().exact().get());
      } else if (m.degree() == 1
          && m.powers().size() == 1
          && m.atoms().get(0) instanceof ParameterAtom p) {
        out.set(p.index() + 1, e.getValue().exact().get());
      } else {
        return Optional.empty();
      }
    }
    return Optional.of(out);
  }

  /** Where an expression is defined. */
  public enum Condition {
    /** The expression must not be zero: it is a divisor. */
    NONZERO,
    /** The expression must not be negative: it stands under a square root. */
    NONNEGATIVE
  }

  /**
   * A condition on a part of an expression.
   *
   * @param condition what must hold
   * @param expression of which part
   */
  public record Domain(Condition condition, Scalar expression) {}

  /** All conditions under which the expression is defined, inner ones first. */
  public List<Domain> conditions() {
    List<Domain> found = new ArrayList<>();
    for (Monomial m : terms.keySet()) {
      for (Map.Entry<Atom, Integer> e : m.powers().entrySet()) {
        if (e.getKey() instanceof FunctionAtom f) {
          found.addAll(f.argument().conditions());
          if (f.function() == Function.SQRT) {
            found.add(new Domain(Condition.NONNEGATIVE, f.argument()));
          }
        }
        divisor(e.getKey(), e.getValue())
            .ifPresent(zero -> found.add(new Domain(Condition.NONZERO, zero)));
      }
    }
    return found;
  }

  /** What must not be zero for a power of an atom to be defined. */
  private static Optional<Scalar> divisor(Atom atom, int exponent) {
    boolean divides =
        exponent < 0 || (atom instanceof FunctionAtom f && f.function() == Function.RECIPROCAL);
    if (!divides) {
      return Optional.empty();
    }
    if (atom instanceof FunctionAtom f) {
      // The exponential has no zero; a sine or cosine stands for itself.
      return switch (f.function()) {
        case EXP -> Optional.empty();
        case SQRT, RECIPROCAL -> Optional.of(f.argument());
        case SIN, COS -> Optional.of(term(Monomial.of(atom, 1), Coefficient.ONE));
      };
    }
    return Optional.of(term(Monomial.of(atom, 1), Coefficient.ONE));
  }

  /** Text that names the expression uniquely. */
  public String key() {
    return terms.entrySet().stream()
        .map(e -> e.getValue().name() + "*" + e.getKey().key())
        .collect(Collectors.joining("+"));
  }

  @Override
  public boolean equals(Object other) {
    return other instanceof Scalar that && key().equals(that.key());
  }

  @Override
  public int hashCode() {
    return key().hashCode();
  }

  @Override
  public String toString() {
    return isZero() ? "0" : key();
  }
}
