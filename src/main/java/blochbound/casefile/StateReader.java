package blochbound.casefile;

import blochbound.casefile.Value.Ket;
import blochbound.casefile.Value.Numeric;
import blochbound.casefile.Value.Operator;
import blochbound.interval.Interval;
import blochbound.interval.Rounding;
import blochbound.linalg.ComplexBall;
import blochbound.linalg.Hermitian;
import blochbound.model.StateSpec;

/** Reads states: kets, which are normalised, and density expressions. */
final class StateReader {
  private final Expressions expressions;

  StateReader(Expressions expressions) {
    this.expressions = expressions;
  }

  /** A pure or mixed state. */
  StateSpec state(Passage passage) {
    Value value = expressions.value(passage);
    if (value instanceof Numeric) {
      throw passage.fault(
          "a state is a ket such as |g,e> or a density operator such as |g,e><g,e|, not a number");
    }
    if (value instanceof Ket ket) {
      return new StateSpec.Pure(normalised(ket, passage));
    }
    return new StateSpec.Mixed(density((Operator) value, passage));
  }

  /** A normalised ket. */
  ComplexBall ket(Passage passage) {
    if (expressions.value(passage) instanceof Ket ket) {
      return normalised(ket, passage);
    }
    throw passage.fault("expected a ket such as |g,e>");
  }

  private ComplexBall normalised(Ket ket, Passage passage) {
    expressions.require(Dimension.NONE, ket, passage, "a ket");
    return KetNormaliser.normalised(expressions.constant(ket, passage, "a state"))
        .orElseThrow(() -> passage.fault("the ket is zero, which is no state"));
  }

  private ComplexBall density(Operator operator, Passage passage) {
    expressions.require(Dimension.NONE, operator, passage, "a density operator");
    ComplexBall matrix = expressions.constant(operator, passage, "a state");
    if (!matrix.mayBeHermitian()) {
      throw passage.fault("the density operator is not Hermitian");
    }
    int n = matrix.centre().rows();
    Interval trace = Interval.ZERO;
    for (int k = 0; k < n; k++) {
      trace = trace.plus(Interval.of(matrix.centre().re(k, k)));
    }
    // The trace of the error is at most sqrt(N) times its Frobenius norm.
    double slack = Rounding.timesUp(Rounding.sqrtUp(n), matrix.radius());
    if (trace.lower() - slack > 1 || trace.upper() + slack < 1) {
      throw passage.fault(
          "the density operator has the trace " + shortText(trace.middle()) + "; it must be 1");
    }
    Hermitian hermitian = Hermitian.part(matrix.centre());
    Interval least = hermitian.eigen().smallest();
    // The Hermitian part is rounded once for each entry.
    double rounding = Rounding.UNIT * 4 * matrix.normUp();
    if (least.upper() + matrix.radius() + rounding < 0) {
      throw passage.fault(
          "the density operator has the negative eigenvalue "
              + shortText(least.middle())
              + "; it must be positive semidefinite");
    }
    return matrix;
  }

  private static String shortText(double value) {
    return String.format(java.util.Locale.ROOT, "%.6g", value);
  }
}
