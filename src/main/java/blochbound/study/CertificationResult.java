package blochbound.study;

import blochbound.model.DesignCase;
import java.util.List;
import java.util.Optional;

/**
 * Result of {@link Certification} for a whole case.
 *
 * @param designCase the case
 * @param seed seed of the random draws
 * @param status uniqueness of the steady state; empty when no requirement asks for one
 * @param requirements results in the order of the case
 * @param verdict refuted when one is, else undecided when one is, else certified
 * @param interrupted whether the run was stopped from outside before its end
 */
public record CertificationResult(
    DesignCase designCase,
    long seed,
    Optional<SteadyStateStatus> status,
    List<RequirementResult> requirements,
    Verdict verdict,
    boolean interrupted) {
  /** Copies the list. */
  public CertificationResult {
    requirements = List.copyOf(requirements);
  }
}
