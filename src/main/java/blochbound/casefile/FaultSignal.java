package blochbound.casefile;

import java.util.Optional;

/** Ends the reading of one piece of a case file; the fault log goes on with the next piece. */
final class FaultSignal extends RuntimeException {
  private static final long serialVersionUID = 1L;

  private final transient Optional<Fault> fault;

  private FaultSignal(Optional<Fault> fault) {
    super(fault.map(Fault::toString).orElse("follows from another fault"), null, false, false);
    this.fault = fault;
  }

  /** The piece is wrong. */
  static FaultSignal of(Fault fault) {
    return new FaultSignal(Optional.of(fault));
  }

  /** The piece cannot be read because of a fault that is reported elsewhere. */
  static FaultSignal following() {
    return new FaultSignal(Optional.empty());
  }

  /** The fault, unless it is reported elsewhere. */
  Optional<Fault> fault() {
    return fault;
  }
}
