package blochbound.model;

import blochbound.linalg.ComplexBall;
import java.util.List;

/** What a requirement measures, as the case file writes it. */
public sealed interface MeasureSpec {
  /**
   * Mean value tr(O rho).
   *
   * @param observable the constant Hermitian operator O on all sites
   */
  record Mean(ComplexBall observable) implements MeasureSpec {}

  /**
   * Probability of some levels of one site.
   *
   * @param site position of the site
   * @param levels positions of the levels
   */
  record Population(int site, List<Integer> levels) implements MeasureSpec {}

  /**
   * Squared Uhlmann fidelity with a state; psi-expectation for a pure one.
   *
   * @param state the reference
   */
  record Fidelity(StateSpec state) implements MeasureSpec {}

  /**
   * Wootters concurrence of two two-level sites.
   *
   * @param first position of a site
   * @param second position of the other site
   */
  record Concurrence(int first, int second) implements MeasureSpec {}

  /**
   * Negativity of some sites against the rest.
   *
   * @param sites positions of the sites on one side of the cut
   */
  record Negativity(List<Integer> sites) implements MeasureSpec {}

  /** Purity tr(rho^2). */
  record Purity() implements MeasureSpec {}

  /**
   * Trace distance |rho - s|_1 / 2.
   *
   * @param state the reference s
   */
  record TraceDistance(StateSpec state) implements MeasureSpec {}

  /** Von Neumann entropy in nats. */
  record Entropy() implements MeasureSpec {}

  /** Slowest decay rate of a deviation. */
  record Gap() implements MeasureSpec {}

  /**
   * Time until the trace distance to the steady state stays below a number.
   *
   * @param distance the number
   */
  record Settling(double distance) implements MeasureSpec {}

  /**
   * Average gate fidelity of a sequence.
   *
   * @param gate the wanted unitary
   * @param subspace kets that span the subspace; empty for the whole space
   */
  record GateFidelity(ComplexBall gate, List<ComplexBall> subspace) implements MeasureSpec {}
}
