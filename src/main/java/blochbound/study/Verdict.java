package blochbound.study;

/** Outcome for a requirement or a whole case. */
public enum Verdict {
  /** No device inside the tolerances violates it: proved. */
  CERTIFIED("certified"),
  /** A verified device inside the tolerances violates it. */
  REFUTED("refuted"),
  /** Neither was shown. */
  UNDECIDED("undecided");

  private final String key;

  Verdict(String key) {
    this.key = key;
  }

  /** The word of reports and machine results. */
  public String key() {
    return key;
  }
}
