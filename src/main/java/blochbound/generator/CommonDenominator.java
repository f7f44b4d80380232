package blochbound.generator;

import blochbound.model.Atom;
import blochbound.model.Atom.FunctionAtom;
import blochbound.model.Atom.ParameterAtom;
import blochbound.model.Coefficient;
import blochbound.model.Device;
import blochbound.model.Jump;
import blochbound.model.Monomial;
import blochbound.model.OperatorForm;
import blochbound.model.Scalar;
import blochbound.model.SignProof;
import java.util.Map;
import java.util.Set;
import java.util.TreeMap;

/**
 * A common denominator q of the generator's rational coefficients, positive on the whole ball.
 *
 * <p>q L has the same stationary states as L and polynomial coefficients. Only divisors whose sign
 * is proved enter q; others stay as they are and are expanded with a remainder.
 */
final class CommonDenominator {
  private final Device device;
  private final TreeMap<Atom, Integer> powers = new TreeMap<>();

  private CommonDenominator(Device device) {
    this.device = device;
  }

  static CommonDenominator of(Device device) {
    CommonDenominator search = new CommonDenominator(device);
    for (Jump jump : device.jumps()) {
      for (Monomial a : jump.operator().terms().keySet()) {
        for (Monomial b : jump.operator().terms().keySet()) {
          Scalar product =
              Scalar.term(a, Coefficient.ONE)
                  .times(Scalar.term(b, Coefficient.ONE))
                  .times(jump.rate());
          search.note(product.terms().keySet());
        }
      }
    }
    OperatorForm hamiltonian = device.hamiltonian();
    search.note(hamiltonian.terms().keySet());
    search.powers.keySet().removeIf(atom -> search.sign(base(atom)) == 0);
    return search;
  }

  private void note(Set<Monomial> monomials) {
    for (Monomial monomial : monomials) {
      for (Map.Entry<Atom, Integer> e : monomial.powers().entrySet()) {
        if (e.getKey() instanceof ParameterAtom && e.getValue() < 0) {
          powers.merge(e.getKey(), -e.getValue(), Math::max);
        } else if (e.getKey() instanceof FunctionAtom f
            && f.function() == Atom.Function.RECIPROCAL) {
          powers.merge(f, e.getValue(), Math::max);
        }
      }
    }
  }

  private static Scalar base(Atom atom) {
    return atom instanceof FunctionAtom f
        ? f.argument()
        : Scalar.term(Monomial.of(atom, 1), Coefficient.ONE);
  }

  /** Proved sign of a divisor on the ball, or 0. */
  private int sign(Scalar divisor) {
    return SignProof.of(divisor, device.parameterSpace(), SignProof.Claim.NONZERO)
            instanceof SignProof.Outcome.Proved proved
        ? proved.sign()
        : 0;
  }

  /** The coefficient times q, with divisors cancelled. */
  Scalar clear(Scalar coefficient) {
    Scalar sum = Scalar.ZERO;
    for (Map.Entry<Monomial, Coefficient> e : coefficient.terms().entrySet()) {
      Scalar product = Scalar.constant(e.getValue());
      Monomial rest = e.getKey();
      for (Map.Entry<Atom, Integer> d : powers.entrySet()) {
        int left = d.getValue();
        if (d.getKey() instanceof FunctionAtom) {
          left -= rest.exponent(d.getKey());
          rest = rest.without(d.getKey());
        }
        Scalar base = base(d.getKey());
        product = product.times(base.power(left));
        if (d.getValue() % 2 != 0 && sign(base) < 0) {
          product = product.negate();
        }
      }
      sum = sum.plus(product.times(Scalar.term(rest, Coefficient.ONE)));
    }
    return sum;
  }
}
