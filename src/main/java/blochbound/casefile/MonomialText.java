package blochbound.casefile;

import blochbound.model.Atom;
import blochbound.model.Monomial;
import java.util.Locale;
import java.util.Map;
import java.util.stream.Collectors;

/** Writes monomials with the parameter names of a case, for messages. */
final class MonomialText {
  private final Scope scope;

  MonomialText(Scope scope) {
    this.scope = scope;
  }

  /** The monomial such as {@code g^2 * sqrt(kappa)}; arguments of several terms are shortened. */
  String of(Monomial monomial) {
    return monomial.powers().entrySet().stream()
        .map(this::factor)
        .collect(Collectors.joining(" * "));
  }

  private String factor(Map.Entry<Atom, Integer> e) {
    return atom(e.getKey()) + (e.getValue() == 1 ? "" : "^" + e.getValue());
  }

  private String atom(Atom atom) {
    if (atom instanceof Atom.ParameterAtom p) {
      return scope.parameter(p.index()).name();
    }
    Atom.FunctionAtom f = (Atom.FunctionAtom) atom;
    String name =
        f.function() == Atom.Function.RECIPROCAL
            ? "1/"
            : f.function().name().toLowerCase(Locale.ROOT);
    Monomial first = f.argument().terms().firstKey();
    boolean single = f.argument().terms().size() == 1 && first.isPolynomial();
    return name + "(" + (single ? of(first) : "...") + ")";
  }
}
