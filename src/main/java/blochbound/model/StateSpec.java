package blochbound.model;

import blochbound.linalg.ComplexBall;

/** A state of the whole device that the case file writes down. */
public sealed interface StateSpec {
  /**
   * A pure state.
   *
   * @param ket normalised column of N amplitudes, with error bound
   */
  record Pure(ComplexBall ket) implements StateSpec {}

  /**
   * A mixed state.
   *
   * @param density N by N density matrix, with error bound
   */
  record Mixed(ComplexBall density) implements StateSpec {}
}
