package blochbound.model;

import blochbound.interval.Interval;
import java.util.List;
import java.util.Map;
import java.util.NavigableMap;
import java.util.TreeMap;
import java.util.stream.Collectors;

/**
 * A product of integer powers of atoms with the coefficient one.
 *
 * <p>Exponents are never zero; a square root occurs with exponent 1 or -1 only and a reciprocal
 * with positive ones (see {@link Scalar#times}).
 */
public final class Monomial implements Comparable<Monomial> {
  /** The empty product. */
  public static final Monomial ONE = new Monomial(new TreeMap<>());

  private final NavigableMap<Atom, Integer> powers;
  private final String key;

  private Monomial(NavigableMap<Atom, Integer> powers) {
    this.powers = powers;
    this.key =
        powers.entrySet().stream()
            .map(e -> e.getKey().key() + "^" + e.getValue())
            .collect(Collectors.joining("*"));
  }

  /** A power of one atom. */
  public static Monomial of(Atom atom, int exponent) {
    TreeMap<Atom, Integer> powers = new TreeMap<>();
    if (exponent != 0) {
      powers.put(atom, exponent);
    }
    return new Monomial(powers);
  }

  /** The parameter at position {@code index}. */
  public static Monomial parameter(int index) {
    return of(new Atom.ParameterAtom(index), 1);
  }

  /** Product, with exponents added. */
  public Monomial times(Monomial other) {
    TreeMap<Atom, Integer> sum = new TreeMap<>(powers);
    other.powers.forEach((atom, e) -> sum.merge(atom, e, Integer::sum));
    sum.values().removeIf(e -> e == 0);
    return new Monomial(sum);
  }

  /** The product of all factors but {@code atom}. */
  public Monomial without(Atom atom) {
    TreeMap<Atom, Integer> rest = new TreeMap<>(powers);
    rest.remove(atom);
    return new Monomial(rest);
  }

  /** The factors with their exponents, in a fixed order. */
  public Map<Atom, Integer> powers() {
    return java.util.Collections.unmodifiableMap(powers);
  }

  /** The atoms, in a fixed order. */
  public List<Atom> atoms() {
    return List.copyOf(powers.keySet());
  }

  /** Exponent of an atom, zero when absent. */
  public int exponent(Atom atom) {
    return powers.getOrDefault(atom, 0);
  }

  /** Tells whether this is the empty product. */
  public boolean isOne() {
    return powers.isEmpty();
  }

  /** Tells whether all factors are positive powers of parameters. */
  public boolean isPolynomial() {
    return powers.entrySet().stream()
        .allMatch(e -> e.getKey() instanceof Atom.ParameterAtom && e.getValue() > 0);
  }

  /** Sum of the exponents. */
  public int degree() {
    return powers.values().stream().mapToInt(Integer::intValue).sum();
  }

  /** Value at the parameters {@code p} in internal units. */
  public double value(double[] p) {
    double product = 1;
    for (Map.Entry<Atom, Integer> e : powers.entrySet()) {
      double base = e.getKey().value(p);
      int exponent = e.getValue();
      product *= exponent == 1 ? base : Math.pow(base, exponent);
    }
    return product;
  }

  /** Derivative with respect to parameter {@code index} at the parameters {@code p}, rounded. */
  public double derivative(double[] p, int index) {
    double sum = 0;
    for (Map.Entry<Atom, Integer> e : powers.entrySet()) {
      double inner = e.getKey().derivative(p, index);
      if (inner != 0) {
        double base = e.getKey().value(p);
        int exponent = e.getValue();
        sum += without(e.getKey()).value(p) * exponent * Math.pow(base, exponent - 1) * inner;
      }
    }
    return sum;
  }

  /** Enclosure of the values over parameter ranges. */
  public Interval enclosure(Interval[] p) {
    Interval product = Interval.ONE;
    for (Map.Entry<Atom, Integer> e : powers.entrySet()) {
      product = product.times(e.getKey().enclosure(p).power(e.getValue()));
    }
    return product;
  }

  /** Text that names the monomial uniquely. */
  public String key() {
    return key;
  }

  @Override
  public int compareTo(Monomial other) {
    return key.compareTo(other.key);
  }

  @Override
  public boolean equals(Object other) {
    return other instanceof Monomial that && key.equals(that.key);
  }

  @Override
  public int hashCode() {
    return key.hashCode();
  }

  @Override
  public String toString() {
    return isOne() ? "1" : key;
  }
}
