package blochbound.casefile;

import blochbound.casefile.Expression.Factor;
import blochbound.casefile.Expression.Join;
import blochbound.casefile.Token.Kind;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;

/**
 * Parses expressions by recursive descent.
 *
 * <pre>
 * sum      = product { (+ | -) product }
 * product  = unary { (* | /) unary }
 * unary    = { - } power
 * power    = primary [ ^ { - } power ]
 * primary  = number [unit] | name | function ( sum ) | operator @ site | ket [bra [@ site]] | ( sum )
 * </pre>
 */
final class ExpressionParser {
  /** Longest allowed text. */
  static final int MOST_CHARACTERS = 20_000;

  /** Deepest allowed nesting. */
  static final int MOST_LEVELS = 200;

  private final Passage passage;
  private final UnitTable units;
  private final List<Token> tokens;
  private int position;
  private int depth;

  private ExpressionParser(Passage passage, UnitTable units) {
    this.passage = passage;
    this.units = units;
    this.tokens = Lexer.tokens(passage);
  }

  /** Parses a passage wholly. */
  static Expression parse(Passage passage, UnitTable units) {
    if (passage.to() - passage.from() > MOST_CHARACTERS) {
      throw passage.fault(
          "an expression of more than "
              + MOST_CHARACTERS
              + " characters; split it with named operators");
    }
    ExpressionParser parser = new ExpressionParser(passage, units);
    Expression whole = parser.sum();
    if (parser.peek().kind() != Kind.END) {
      throw parser.trailing();
    }
    return whole;
  }

  private Expression sum() {
    Expression first = product();
    List<Expression> terms = new ArrayList<>(List.of(first));
    while (peek().is("+") || peek().is("-")) {
      Token sign = take();
      Expression term = product();
      terms.add(sign.is("+") ? term : new Expression.Negation(term, term.at()));
    }
    return terms.size() == 1 ? first : new Expression.Sum(List.copyOf(terms), first.at());
  }

  private Expression product() {
    Expression first = unary();
    List<Factor> rest = new ArrayList<>();
    while (peek().is("*") || peek().is("/")) {
      Join join = take().is("*") ? Join.TIMES : Join.DIVIDED_BY;
      Token start = peek();
      Expression factor = unary();
      if (join == Join.DIVIDED_BY
          && factor instanceof Expression.Literal n
          && n.unit().symbol().contains("/")) {
        throw passage.fault(
            start.at(),
            "`/ "
                + start.text()
                + n.unit().symbol()
                + "` can be read in two ways; set brackets, such as x / ("
                + start.text()
                + " /us) or (x / "
                + start.text()
                + ") * 1 /us");
      }
      rest.add(new Factor(join, factor));
    }
    return rest.isEmpty() ? first : new Expression.Product(first, List.copyOf(rest), first.at());
  }

  private Expression unary() {
    int at = peek().at();
    boolean negative = minusSigns();
    Expression operand = power();
    return negative ? new Expression.Negation(operand, at) : operand;
  }

  /** Takes minus signs; tells whether their number is odd. */
  private boolean minusSigns() {
    boolean negative = false;
    while (peek().is("-")) {
      take();
      negative = !negative;
    }
    return negative;
  }

  private Expression power() {
    Expression base = primary();
    if (!peek().is("^")) {
      return base;
    }
    Token caret = take();
    if (base instanceof Expression.Literal n && !n.unit().symbol().isEmpty()) {
      throw passage.fault(
          caret.at(), "a power of a number with a unit needs brackets, such as (3 kHz)^2");
    }
    enter(caret);
    int at = peek().at();
    boolean negative = minusSigns();
    Expression size = power();
    depth--;
    Expression exponent = negative ? new Expression.Negation(size, at) : size;
    return new Expression.Power(base, exponent, base.at());
  }

  private Expression primary() {
    Token token = take();
    return switch (token.kind()) {
      case NUMBER -> new UnitSuffix(token).read();
      case NAME -> named(token);
      case KET -> ket(token);
      case BRA ->
          throw passage.fault(
              token.at(),
              "a bra stands behind a ket only, as in |a><b|; inner products are unknown");
      case SYMBOL, END -> {
        if (!token.is("(")) {
          throw passage.fault(
              token.at(), "expected a number, a name, a ket or a bracket, not " + token.shown());
        }
        yield new Expression.Group(inBrackets(token), token.at());
      }
    };
  }

  private Expression inBrackets(Token opening) {
    enter(opening);
    Expression inner = sum();
    if (!peek().is(")")) {
      throw peek().kind() == Kind.END
          ? passage.fault(opening.at(), "the bracket `(` is not closed")
          : trailing();
    }
    take();
    depth--;
    return inner;
  }

  private void enter(Token token) {
    if (++depth > MOST_LEVELS) {
      throw passage.fault(token.at(), "nested more than " + MOST_LEVELS + " levels deep");
    }
  }

  private Expression named(Token token) {
    String name = token.text();
    if (Vocabulary.FUNCTIONS.contains(name)) {
      Token opening = take();
      if (!opening.is("(")) {
        throw passage.fault(token.at(), "the function " + name + " needs ( ) around its argument");
      }
      return new Expression.Call(name, inBrackets(opening), token.at());
    }
    if (Vocabulary.LOCAL_OPERATORS.contains(name)) {
      if (!peek().is("@")) {
        throw passage.fault(
            token.at(), "the operator " + name + " needs a site, such as " + name + "@left");
      }
      return new Expression.Local(name, site(), token.at());
    }
    if (UnitTable.WORDS.contains(name)) {
      throw passage.fault(
          token.at(), "the unit " + name + " must stand directly behind a number, as in 3 kHz");
    }
    return new Expression.Name(name, token.at());
  }

  private Expression ket(Token ket) {
    if (peek().kind() != Kind.BRA) {
      return new Expression.Ket(ket.labels(), ket.at());
    }
    Token bra = take();
    Optional<Token> site = peek().is("@") ? Optional.of(site()) : Optional.empty();
    return new Expression.Outer(ket.labels(), bra.labels(), site, ket.at());
  }

  private Token site() {
    Token at = take();
    Token site = take();
    if (site.kind() != Kind.NAME) {
      throw passage.fault(at.at(), "`@` needs the name of a site behind it");
    }
    return site;
  }

  private Token peek() {
    return tokens.get(position);
  }

  private Token peek(int ahead) {
    return tokens.get(Math.min(position + ahead, tokens.size() - 1));
  }

  private Token take() {
    Token token = tokens.get(position);
    position = Math.min(position + 1, tokens.size() - 1);
    return token;
  }

  /** A fault at a word that cannot stand behind a complete operand. */
  private FaultSignal trailing() {
    Token token = peek();
    if (token.is("@")) {
      return passage.fault(
          token.at(), "`@` stands only behind X Y Z lower raise number and |a><b|");
    }
    if (token.is(")")) {
      return passage.fault(token.at(), "the bracket `)` has no opening one");
    }
    boolean behindNumber = tokens.get(position - 1).kind() == Kind.NUMBER;
    String hint =
        behindNumber && token.kind() == Kind.NAME
            ? "; " + units.unknown(token.text())
            : token.is("(") ? "; functions are " + String.join(" ", Vocabulary.FUNCTIONS) : "";
    return passage.fault(
        token.at(),
        "an operator such as * is missing before "
            + token.shown()
            + " (there is no implicit product)"
            + hint);
  }

  /** The unit behind a number: a word, a bar with a time, 1/time or rad/time. */
  private final class UnitSuffix {
    private final Token number;

    UnitSuffix(Token number) {
      this.number = number;
    }

    Expression read() {
      Token next = peek();
      if (next.kind() == Kind.NAME && !next.text().equals("rad")) {
        return UnitTable.WORDS.contains(next.text()) ? with(1) : with(0);
      }
      if (next.is("/") && isTime(peek(1))) {
        return with(2);
      }
      boolean prefix =
          next.isName("rad") || (next.kind() == Kind.NUMBER && next.text().equals("1"));
      return prefix && peek(1).is("/") && isTime(peek(2)) ? with(3) : with(0);
    }

    private boolean isTime(Token token) {
      return token.kind() == Kind.NAME && UnitTable.isTime(token.text());
    }

    private Expression with(int words) {
      int at = peek().at();
      StringBuilder symbol = new StringBuilder();
      for (int k = 0; k < words; k++) {
        symbol.append(take().text());
      }
      return new Expression.Literal(
          DecimalText.value(number.text()),
          units
              .find(symbol.toString())
              .orElseThrow(() -> passage.fault(at, units.unknown(symbol.toString()))),
          number.at());
    }
  }
}
