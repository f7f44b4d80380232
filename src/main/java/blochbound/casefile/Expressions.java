package blochbound.casefile;

import blochbound.casefile.Value.Array;
import blochbound.casefile.Value.Ket;
import blochbound.casefile.Value.Numeric;
import blochbound.casefile.Value.Operator;
import blochbound.linalg.ComplexBall;
import blochbound.model.Monomial;
import blochbound.model.OperatorForm;
import blochbound.model.Scalar;
import java.util.Objects;

/** Evaluates texts of a case file as real numbers, operators or constant matrices. */
final class Expressions {
  private final Scope scope;

  Expressions(Scope scope) {
    this.scope = scope;
  }

  /** Whatever the text stands for. */
  Value value(Passage passage) {
    return Evaluator.evaluate(passage, scope);
  }

  /** A real number that may depend on parameters. */
  Numeric real(Passage passage, String what) {
    Value value = value(passage);
    if (!(value instanceof Numeric n) || !n.mayBeReal()) {
      throw passage.fault(what + " must be a real number, not an operator or a state");
    }
    return Numeric.real(n.re(), n.dimension());
  }

  /** An operator; a number is that multiple of the identity. */
  Operator operator(Passage passage, String what) {
    Value value = value(passage);
    if (value instanceof Ket) {
      throw passage.fault(what + " must be an operator, not a state |...>");
    }
    if (value instanceof Operator operator) {
      return operator;
    }
    OperatorForm identity = OperatorForm.constant(scope.sites().identity());
    return new Operator(identity, Dimension.NONE).times((Numeric) value);
  }

  /** A Hermitian operator. */
  Operator hermitian(Passage passage, String what) {
    Operator operator = operator(passage, what);
    for (var e : operator.form().terms().entrySet()) {
      if (!e.getValue().mayBeHermitian()) {
        throw passage.fault(
            what
                + " is not Hermitian in "
                + part(e.getKey())
                + "; add the adjoint, as in a + adj(a)");
      }
    }
    return operator;
  }

  /** The matrix of a constant operator or ket. */
  ComplexBall constant(Array value, Passage passage, String what) {
    int rows = scope.sites().dimension();
    if (value.form().terms().isEmpty()) {
      return ComplexBall.exact(
          blochbound.linalg.ComplexMatrix.zero(rows, value instanceof Ket ? 1 : rows));
    }
    if (!value.form().isConstant()) {
      throw passage.fault(
          what + " must not depend on parameters, here on " + part(value.form().terms().lastKey()));
    }
    return Objects.requireNonNull(value.form().terms().get(Monomial.ONE));
  }

  /** Checks a dimension; a zero agrees with all. */
  void require(Dimension wanted, Value value, Passage passage, String what) {
    Dimension expected = scope.units().isDimensionless() ? Dimension.NONE : wanted;
    if (!value.isZero() && !value.dimension().equals(expected)) {
      throw passage.fault(what + " must be " + expected + ", not " + value.dimension());
    }
  }

  private String part(Monomial monomial) {
    return monomial.isOne()
        ? "its constant part"
        : "its part with " + new MonomialText(scope).of(monomial);
  }

  /** Notes that a real number must not become negative in the ball. */
  void requireNonNegative(Scalar number, Passage passage, String what) {
    scope
        .conditions()
        .add(
            new Conditions.Condition(
                blochbound.model.SignProof.Claim.NONNEGATIVE,
                number,
                passage,
                passage.from(),
                what));
  }
}
