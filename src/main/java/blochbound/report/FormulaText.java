package blochbound.report;

import blochbound.model.Atom;
import blochbound.model.Atom.FunctionAtom;
import blochbound.model.Atom.ParameterAtom;
import blochbound.model.Coefficient;
import blochbound.model.Monomial;
import blochbound.model.Parameter;
import blochbound.model.Scalar;
import java.math.RoundingMode;
import java.util.List;
import java.util.Locale;
import java.util.Map;

/** Scalar expressions with the parameter names of a case, in the syntax of case files. */
final class FormulaText {
  private static final int DIGITS = 6;

  private final List<Parameter> parameters;

  FormulaText(List<Parameter> parameters) {
    this.parameters = parameters;
  }

  /** A product such as {@code g^2 * sqrt(kappa) / delta}; {@code 1} for the empty one. */
  String monomial(Monomial monomial) {
    StringBuilder above = new StringBuilder();
    StringBuilder below = new StringBuilder();
    for (Map.Entry<Atom, Integer> e : monomial.powers().entrySet()) {
      int exponent = isReciprocal(e.getKey()) ? -e.getValue() : e.getValue();
      String power = Math.abs(exponent) == 1 ? "" : "^" + Math.abs(exponent);
      if (exponent > 0) {
        above.append(above.isEmpty() ? "" : " * ").append(atom(e.getKey())).append(power);
      } else {
        below.append(" / ").append(atom(e.getKey())).append(power);
      }
    }
    return (above.isEmpty() ? "1" : above) + below.toString();
  }

  /** A sum such as {@code 2 * g - 0.5 * delta^2}; coefficients are in internal units, rounded. */
  String scalar(Scalar scalar) {
    StringBuilder sum = new StringBuilder();
    for (Map.Entry<Monomial, Coefficient> e : scalar.terms().entrySet()) {
      double value = e.getValue().value();
      sum.append(sum.isEmpty() ? (value < 0 ? "-" : "") : (value < 0 ? " - " : " + "));
      sum.append(term(Math.abs(value), e.getKey()));
    }
    return sum.isEmpty() ? "0" : sum.toString();
  }

  private String term(double size, Monomial monomial) {
    String number = number(size);
    if (monomial.isOne()) {
      return number;
    }
    return number.equals("1") ? monomial(monomial) : number + " * " + monomial(monomial);
  }

  private String atom(Atom atom) {
    if (atom instanceof ParameterAtom p) {
      return parameters.get(p.index()).name();
    }
    FunctionAtom f = (FunctionAtom) atom;
    String name = isReciprocal(f) ? "" : f.function().name().toLowerCase(Locale.ROOT);
    return name + "(" + scalar(f.argument()) + ")";
  }

  private static boolean isReciprocal(Atom atom) {
    return atom instanceof FunctionAtom f && f.function() == Atom.Function.RECIPROCAL;
  }

  /** A coefficient with a few digits. */
  static String number(double value) {
    return NumberText.significant(value, DIGITS, RoundingMode.HALF_EVEN);
  }
}
