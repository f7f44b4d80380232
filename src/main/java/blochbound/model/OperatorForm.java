package blochbound.model;

import blochbound.linalg.ComplexBall;
import java.util.Collections;
import java.util.Map;
import java.util.SortedMap;
import java.util.TreeMap;

/**
 * An operator that depends on the parameters: a sum of monomials times constant matrices, collected
 * exactly, each matrix with a proved error bound.
 */
public final class OperatorForm {
  private final int dimension;
  private final SortedMap<Monomial, ComplexBall> terms;

  private OperatorForm(int dimension, SortedMap<Monomial, ComplexBall> terms) {
    this.dimension = dimension;
    this.terms = terms;
  }

  /** The zero operator on {@code dimension} levels. */
  public static OperatorForm zero(int dimension) {
    return new OperatorForm(dimension, new TreeMap<>());
  }

  /** A constant operator. */
  public static OperatorForm constant(ComplexBall matrix) {
    TreeMap<Monomial, ComplexBall> terms = new TreeMap<>();
    terms.put(Monomial.ONE, matrix);
    return new OperatorForm(matrix.centre().rows(), terms);
  }

  /** Number N of levels. */
  public int dimension() {
    return dimension;
  }

  /** The monomials with their matrices, in a fixed order. */
  public SortedMap<Monomial, ComplexBall> terms() {
    return Collections.unmodifiableSortedMap(terms);
  }

  /** Tells whether no parameter occurs. */
  public boolean isConstant() {
    return terms.keySet().stream().allMatch(Monomial::isOne);
  }

  /** Sum. */
  public OperatorForm plus(OperatorForm other) {
    TreeMap<Monomial, ComplexBall> sum = new TreeMap<>(terms);
    other.terms.forEach((m, b) -> sum.merge(m, b, ComplexBall::plus));
    return new OperatorForm(dimension, sum);
  }

  /** Difference. */
  public OperatorForm minus(OperatorForm other) {
    return plus(other.negate());
  }

  /** The negative. */
  public OperatorForm negate() {
    return map(ComplexBall::negate);
  }

  /** Multiple with the imaginary unit. */
  public OperatorForm timesI() {
    return map(ComplexBall::timesI);
  }

  /** Conjugate transpose. */
  public OperatorForm adjoint() {
    return map(ComplexBall::adjoint);
  }

  /** Multiple with a scalar expression. */
  public OperatorForm times(Scalar factor) {
    TreeMap<Monomial, ComplexBall> sum = new TreeMap<>();
    terms.forEach(
        (m, matrix) -> addMultiples(sum, matrix, Scalar.term(m, Coefficient.ONE).times(factor)));
    return new OperatorForm(dimension, sum);
  }

  /** Operator product. */
  public OperatorForm times(OperatorForm other) {
    TreeMap<Monomial, ComplexBall> sum = new TreeMap<>();
    for (Map.Entry<Monomial, ComplexBall> a : terms.entrySet()) {
      for (Map.Entry<Monomial, ComplexBall> b : other.terms.entrySet()) {
        Scalar monomials =
            Scalar.term(a.getKey(), Coefficient.ONE)
                .times(Scalar.term(b.getKey(), Coefficient.ONE));
        addMultiples(sum, a.getValue().times(b.getValue()), monomials);
      }
    }
    return new OperatorForm(dimension, sum);
  }

  private static void addMultiples(
      Map<Monomial, ComplexBall> sum, ComplexBall matrix, Scalar factor) {
    factor.terms().forEach((m, c) -> sum.merge(m, matrix.times(c.enclosure()), ComplexBall::plus));
  }

  /** Tells whether every matrix may be Hermitian within its error bound. */
  public boolean mayBeHermitian() {
    return terms.values().stream().allMatch(ComplexBall::mayBeHermitian);
  }

  private OperatorForm map(java.util.function.UnaryOperator<ComplexBall> operation) {
    TreeMap<Monomial, ComplexBall> mapped = new TreeMap<>();
    terms.forEach((m, b) -> mapped.put(m, operation.apply(b)));
    return new OperatorForm(dimension, mapped);
  }
}
