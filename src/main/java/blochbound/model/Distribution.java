package blochbound.model;

import blochbound.check.Check;

/** How a parameter scatters inside its tolerance, for sampling only: guarantees do not use it. */
public sealed interface Distribution {
  /** Equally likely everywhere in the tolerance range. */
  record Uniform() implements Distribution {}

  /**
   * Normal about the nominal value.
   *
   * @param sigma standard deviation in the parameter's own unit
   */
  record Normal(double sigma) implements Distribution {
    /** Checks the deviation. */
    public Normal {
      Check.that(sigma > 0, "sigma must be positive");
    }
  }

  /** Triangular over the tolerance range with its peak at the nominal value. */
  record Triangular() implements Distribution {}
}
