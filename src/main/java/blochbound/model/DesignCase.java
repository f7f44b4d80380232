package blochbound.model;

import java.util.List;
import java.util.Optional;

/**
 * A device, its tolerances and its requirements: the content of one case file.
 *
 * @param title title of the case
 * @param timeUnit symbol of the internal unit of time; {@code none} for dimensionless cases
 * @param device the device
 * @param target the target state, when the case names one
 * @param requirements the requirements in order
 * @param sha256 hexadecimal digest of the case file with the files it refers to
 */
public record DesignCase(
    String title,
    String timeUnit,
    Device device,
    Optional<StateSpec> target,
    List<Requirement> requirements,
    String sha256) {
  /** Copies the list. */
  public DesignCase {
    requirements = List.copyOf(requirements);
  }
}
