package blochbound.casefile;

import java.util.List;
import java.util.stream.Collectors;

/** A case file cannot be read; all faults that were found are listed together. */
public final class CaseFaultException extends Exception {
  private static final long serialVersionUID = 1L;

  private final transient List<Fault> faults;

  /** Makes the exception of at least one fault; the message has one line for each. */
  public CaseFaultException(List<Fault> faults) {
    super(faults.stream().map(Fault::toString).collect(Collectors.joining("\n")));
    this.faults = List.copyOf(faults);
  }

  /** The faults in the order of their places. */
  public List<Fault> faults() {
    return faults;
  }
}
