package blochbound.study;

import java.math.BigDecimal;
import java.util.List;
import java.util.Optional;

/**
 * Whether every device inside the tolerances has exactly one steady state.
 *
 * @param kind outcome
 * @param point for {@link Kind#NOT_UNIQUE} a device with several stationary states, as decimals of
 *     the parameters' own units
 * @param reason one sentence for the user; empty for {@link Kind#UNIQUE}
 */
public record SteadyStateStatus(Kind kind, Optional<List<BigDecimal>> point, String reason) {
  /** Outcome. */
  public enum Kind {
    /** Proved unique on the whole ball. */
    UNIQUE("unique"),
    /** Not proved, and no counterexample found. */
    UNPROVED("unproved"),
    /** A device with several stationary states was found. */
    NOT_UNIQUE("notUnique");

    private final String key;

    Kind(String key) {
      this.key = key;
    }

    /** The word of machine results. */
    public String key() {
      return key;
    }
  }
}
