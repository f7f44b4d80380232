package blochbound.casefile;

import blochbound.casefile.Conditions.Condition;
import blochbound.casefile.Expression.Factor;
import blochbound.casefile.Expression.Join;
import blochbound.casefile.Value.Array;
import blochbound.casefile.Value.Ket;
import blochbound.casefile.Value.Numeric;
import blochbound.casefile.Value.Operator;
import blochbound.interval.ExactNumber;
import blochbound.linalg.ComplexBall;
import blochbound.model.OperatorForm;
import blochbound.model.Parameter;
import blochbound.model.Scalar;
import blochbound.model.SignProof.Claim;
import java.util.Optional;

/**
 * Computes the value of an expression and checks dimensions on the way.
 *
 * <p>Numbers stay exact as long as the model can hold them; matrices carry proved error bounds.
 */
final class Evaluator {
  /** Largest exponent of a power. */
  static final int LARGEST_EXPONENT = 64;

  private final Scope scope;
  private final Passage passage;
  private final ScalarFunctions functions;

  private Evaluator(Scope scope, Passage passage) {
    this.scope = scope;
    this.passage = passage;
    this.functions = new ScalarFunctions(passage);
  }

  /** The value of a passage. */
  static Value evaluate(Passage passage, Scope scope) {
    if (passage.isEmpty()) {
      throw passage.fault("an expression is missing");
    }
    Expression expression = ExpressionParser.parse(passage, scope.units());
    Evaluator evaluator = new Evaluator(scope, passage);
    Value value = expression.evaluate(evaluator);
    evaluator.charge(scope.limit().chargeKept(value), passage.from());
    return value;
  }

  Value number(Expression.Literal node) {
    ExactNumber value = ExactNumber.of(node.value()).times(node.unit().factor());
    return checked(Numeric.real(Scalar.constant(value), Dimension.of(node.unit())), node.at());
  }

  Value name(Expression.Name node) {
    String name = node.name();
    if (name.equals("pi")) {
      return Numeric.real(Scalar.constant(ExactNumber.PI), Dimension.NONE);
    }
    if (name.equals("i")) {
      return Numeric.I;
    }
    Optional<Integer> index = scope.parameterIndex(name);
    if (index.isPresent()) {
      Parameter p = scope.parameter(index.get());
      return Numeric.real(Scalar.parameter(index.get()), Dimension.of(p.unit()));
    }
    if (!scope.hasOperator(name)) {
      throw passage.fault(node.at(), scope.unknownName(name));
    }
    return scope.operator(name);
  }

  Value local(Expression.Local node) {
    return constant(scope.sites().standard(node, passage));
  }

  Value ket(Expression.Ket node) {
    LocalOperators sites = scope.sites();
    ComplexBall column = sites.basisKet(sites.basisIndex(node.labels(), passage));
    return new Ket(OperatorForm.constant(column), Dimension.NONE);
  }

  Value outer(Expression.Outer node) {
    LocalOperators sites = scope.sites();
    if (node.site().isEmpty()) {
      int a = sites.basisIndex(node.ket(), passage);
      return constant(sites.transition(a, sites.basisIndex(node.bra(), passage)));
    }
    Token name = node.site().get();
    int site = sites.site(name.text(), passage, name.at());
    if (node.ket().size() != 1 || node.bra().size() != 1) {
      throw passage.fault(node.at(), "a transition of one site has one label on each side");
    }
    Token.Label a = node.ket().get(0);
    Token.Label b = node.bra().get(0);
    return constant(
        sites.transition(
            site,
            sites.level(site, a.text(), passage, a.at()),
            sites.level(site, b.text(), passage, b.at())));
  }

  private static Operator constant(ComplexBall matrix) {
    return new Operator(OperatorForm.constant(matrix), Dimension.NONE);
  }

  Value negation(Expression.Negation node) {
    return node.operand().evaluate(this).negate();
  }

  Value sum(Expression.Sum node) {
    Value sum = node.terms().get(0).evaluate(this);
    for (Expression term : node.terms().subList(1, node.terms().size())) {
      sum = plus(sum, term.evaluate(this), term.at());
    }
    return sum;
  }

  private Value plus(Value a, Value b, int at) {
    Dimension dimension = a.isZero() ? b.dimension() : a.dimension();
    if (!b.isZero() && !b.dimension().equals(dimension)) {
      throw passage.fault(
          at,
          "the terms of a sum have different dimensions: " + dimension + " and " + b.dimension());
    }
    if (a instanceof Numeric x && b instanceof Numeric y) {
      charge(scope.limit().chargeSum(terms(x), terms(y)), at);
      return checked(x.plus(y).with(dimension), at);
    }
    if (a instanceof Ket != b instanceof Ket) {
      throw passage.fault(at, "a state |...> cannot be added to a number or an operator");
    }
    Array x = array(a, at);
    Array y = array(b, at);
    charge(scope.limit().chargeMatrices(y.form().terms().size(), entries()), at);
    charge(scope.limit().chargeSum(x.form().terms().size(), y.form().terms().size()), at);
    return checked(x.of(x.form().plus(y.form()), dimension), at);
  }

  /** A number becomes that multiple of the identity. */
  private Array array(Value value, int at) {
    if (value instanceof Array array) {
      return array;
    }
    return (Array) times(constant(scope.sites().identity()), value, at);
  }

  Value product(Expression.Product node) {
    Value product = node.first().evaluate(this);
    for (Factor factor : node.rest()) {
      int at = factor.operand().at();
      Value next = factor.operand().evaluate(this);
      product = times(product, factor.join() == Join.TIMES ? next : reciprocal(next, at), at);
    }
    return product;
  }

  private Value times(Value a, Value b, int at) {
    if (a instanceof Numeric x && b instanceof Numeric y) {
      charge(scope.limit().chargeProduct(terms(x), terms(y)), at);
      return checked(x.times(y), at);
    }
    if (a instanceof Array x && b instanceof Numeric y) {
      return multiple(x, y, at);
    }
    if (a instanceof Numeric x && b instanceof Array y) {
      return multiple(y, x, at);
    }
    if (!(a instanceof Operator)) {
      throw passage.fault(at, "a state |...> can be multiplied with numbers only");
    }
    OperatorForm x = ((Array) a).form();
    OperatorForm y = ((Array) b).form();
    int pairs = x.terms().size() * y.terms().size();
    charge(scope.limit().chargeProduct(x.terms().size(), y.terms().size()), at);
    charge(scope.limit().chargeMatrices(pairs, entries() * dimension()), at);
    Dimension dimension = a.dimension().plus(b.dimension());
    return checked(((Array) b).of(x.times(y), dimension), at);
  }

  private Value multiple(Array array, Numeric factor, int at) {
    int matrices = array.form().terms().size();
    charge(WorkLimit.factorComplaint(factor), at);
    charge(scope.limit().chargeProduct(matrices, terms(factor)), at);
    charge(scope.limit().chargeMatrices((long) matrices * terms(factor), entries()), at);
    return checked(array.times(factor), at);
  }

  private Value reciprocal(Value divisor, int at) {
    if (!(divisor instanceof Numeric n)) {
      throw passage.fault(at, "only numbers can divide, not operators or states");
    }
    charge(scope.limit().chargeProduct(terms(n), terms(n)), at);
    Numeric inverse = functions.reciprocal(n, at);
    if (!n.isConstant()) {
      Scalar must = n.isReal() ? n.re() : n.re().times(n.re()).plus(n.im().times(n.im()));
      scope.conditions().add(new Condition(Claim.NONZERO, must, passage, at, "the divisor"));
    }
    return checked(inverse, at);
  }

  Value power(Expression.Power node) {
    int exponent = exponent(node.exponent());
    Value base = node.base().evaluate(this);
    int at = node.at();
    if (base instanceof Ket) {
      throw passage.fault(at, "a state |...> has no powers");
    }
    if (base instanceof Operator && exponent < 0) {
      throw passage.fault(node.exponent().at(), "the exponent of an operator must be 0 or more");
    }
    Value factor = exponent < 0 ? reciprocal(base, at) : base;
    Value product = base instanceof Operator ? constant(scope.sites().identity()) : Numeric.ONE;
    for (int k = 0; k < Math.abs(exponent); k++) {
      product = k == 0 ? factor : times(product, factor, at);
    }
    return product;
  }

  private int exponent(Expression node) {
    Value value = node.evaluate(this);
    Optional<ExactNumber> exact =
        value instanceof Numeric n
                && n.isReal()
                && n.isConstant()
                && n.dimension().equals(Dimension.NONE)
            ? n.re().constantTerm().exact()
            : Optional.empty();
    boolean whole =
        exact
            .filter(x -> x.piPower() == 0)
            .filter(x -> x.denominator().equals(java.math.BigInteger.ONE))
            .isPresent();
    if (!whole) {
      throw passage.fault(node.at(), "an exponent must be a whole number; roots are sqrt( )");
    }
    var size = exact.orElseThrow().numerator();
    if (size.abs().compareTo(java.math.BigInteger.valueOf(LARGEST_EXPONENT)) > 0) {
      throw passage.fault(
          node.at(), "an exponent must lie between -" + LARGEST_EXPONENT + " and 64");
    }
    return size.intValueExact();
  }

  Value call(Expression.Call node) {
    Value argument = node.argument().evaluate(this);
    int at = node.at();
    if (node.function().equals("adj")) {
      if (argument instanceof Ket) {
        throw passage.fault(at, "adj is for operators; write a transition as |a><b|");
      }
      return argument instanceof Operator o
          ? new Operator(o.form().adjoint(), o.dimension())
          : ((Numeric) argument).conjugate();
    }
    if (!(argument instanceof Numeric n)) {
      throw passage.fault(at, node.function() + " is for numbers, not for operators or states");
    }
    if (node.function().equals("sqrt") && n.isReal() && !n.isConstant()) {
      scope
          .conditions()
          .add(
              new Condition(
                  Claim.NONNEGATIVE,
                  n.re(),
                  passage,
                  node.argument().at(),
                  "the argument of sqrt"));
    }
    return checked(functions.apply(node.function(), n, node.argument().at()), at);
  }

  private static int terms(Numeric number) {
    return number.re().terms().size() + number.im().terms().size();
  }

  private long entries() {
    return (long) dimension() * dimension();
  }

  private int dimension() {
    return scope.sites().dimension();
  }

  private void charge(Optional<String> complaint, int at) {
    if (complaint.isPresent()) {
      throw passage.fault(at, complaint.get());
    }
  }

  private Value checked(Value value, int at) {
    charge(WorkLimit.complaint(value), at);
    return value;
  }
}
