package blochbound.study;

import blochbound.model.Requirement;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;

/**
 * Everything found out about one requirement.
 *
 * @param requirement the requirement
 * @param nominal value of the nominal device in the requirement's unit; empty with a remark when it
 *     has no value
 * @param worstFound worst device found by search and samples
 * @param guaranteed the certified bound
 * @param sampled the samples
 * @param verdict outcome
 * @param remarks sentences for the user: why a value is missing, why it stayed undecided
 */
public record RequirementResult(
    Requirement requirement,
    OptionalDouble nominal,
    Optional<FoundPoint> worstFound,
    Optional<Guarantee> guaranteed,
    Optional<SampledTruth> sampled,
    Verdict verdict,
    List<String> remarks) {
  /** Copies the list. */
  public RequirementResult {
    remarks = List.copyOf(remarks);
  }
}
