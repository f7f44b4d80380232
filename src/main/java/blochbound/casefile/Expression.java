package blochbound.casefile;

import blochbound.casefile.Token.Label;
import blochbound.model.Unit;
import java.math.BigDecimal;
import java.util.List;
import java.util.Optional;

/** A parsed expression; each node knows the offset of its first character. */
sealed interface Expression {
  /** Offset of the first character. */
  int at();

  /** The value, computed by the evaluator's method for this kind of node. */
  Value evaluate(Evaluator evaluator);

  /**
   * A number with its unit.
   *
   * @param value the number
   * @param unit its unit, perhaps none
   * @param at its offset
   */
  record Literal(BigDecimal value, Unit unit, int at) implements Expression {
    @Override
    public Value evaluate(Evaluator evaluator) {
      return evaluator.number(this);
    }
  }

  /**
   * A parameter, a named operator or a constant.
   *
   * @param name its name
   * @param at its offset
   */
  record Name(String name, int at) implements Expression {
    @Override
    public Value evaluate(Evaluator evaluator) {
      return evaluator.name(this);
    }
  }

  /**
   * A function of one argument.
   *
   * @param function its name
   * @param argument its argument
   * @param at its offset
   */
  record Call(String function, Expression argument, int at) implements Expression {
    @Override
    public Value evaluate(Evaluator evaluator) {
      return evaluator.call(this);
    }
  }

  /**
   * A standard operator of one site.
   *
   * @param operator its name
   * @param site the site
   * @param at its offset
   */
  record Local(String operator, Token site, int at) implements Expression {
    @Override
    public Value evaluate(Evaluator evaluator) {
      return evaluator.local(this);
    }
  }

  /**
   * A ket over all sites.
   *
   * @param labels one label for each site
   * @param at its offset
   */
  record Ket(List<Label> labels, int at) implements Expression {
    @Override
    public Value evaluate(Evaluator evaluator) {
      return evaluator.ket(this);
    }
  }

  /**
   * A projector or transition of one site or of all.
   *
   * @param ket labels of the ket
   * @param bra labels of the bra
   * @param site the site, or empty for all
   * @param at its offset
   */
  record Outer(List<Label> ket, List<Label> bra, Optional<Token> site, int at)
      implements Expression {
    @Override
    public Value evaluate(Evaluator evaluator) {
      return evaluator.outer(this);
    }
  }

  /**
   * An expression in brackets, which is never taken for a bare number.
   *
   * @param inner the expression
   * @param at offset of the opening bracket
   */
  record Group(Expression inner, int at) implements Expression {
    @Override
    public Value evaluate(Evaluator evaluator) {
      return inner.evaluate(evaluator);
    }
  }

  /**
   * The negative.
   *
   * @param operand of which expression
   * @param at its offset
   */
  record Negation(Expression operand, int at) implements Expression {
    @Override
    public Value evaluate(Evaluator evaluator) {
      return evaluator.negation(this);
    }
  }

  /**
   * A sum; differences are sums with negations.
   *
   * @param terms two or more terms
   * @param at its offset
   */
  record Sum(List<Expression> terms, int at) implements Expression {
    @Override
    public Value evaluate(Evaluator evaluator) {
      return evaluator.sum(this);
    }
  }

  /**
   * A product of factors and divisors, from left to right.
   *
   * @param first the first factor
   * @param rest the further ones
   * @param at its offset
   */
  record Product(Expression first, List<Factor> rest, int at) implements Expression {
    @Override
    public Value evaluate(Evaluator evaluator) {
      return evaluator.product(this);
    }
  }

  /** How a factor joins a product. */
  enum Join {
    /** It multiplies. */
    TIMES,
    /** It divides. */
    DIVIDED_BY
  }

  /**
   * A further factor.
   *
   * @param join how it joins
   * @param operand the factor
   */
  record Factor(Join join, Expression operand) {}

  /**
   * An integer power.
   *
   * @param base the base
   * @param exponent the exponent
   * @param at its offset
   */
  record Power(Expression base, Expression exponent, int at) implements Expression {
    @Override
    public Value evaluate(Evaluator evaluator) {
      return evaluator.power(this);
    }
  }
}
