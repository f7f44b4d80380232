package blochbound.check;

/**
 * A verified value lies beyond a certified bound: a defect of the program, never of the case.
 *
 * <p>The command line reports it as an internal error and asks for a report of the defect.
 */
public final class BrokenGuaranteeException extends IllegalStateException {
  private static final long serialVersionUID = 1L;

  /** States which certified and which verified values contradict each other. */
  public BrokenGuaranteeException(String message) {
    super(message);
  }
}
