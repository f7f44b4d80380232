package blochbound.study;

import blochbound.certificate.RegionCertificate;
import java.util.List;

/**
 * A bound that no device inside the tolerances can cross.
 *
 * @param value certified value in the requirement's unit, rounded to the safe side
 * @param method name of the method
 * @param regions number of regions bounded
 * @param seconds time spent
 * @param certificates the regions that together cover the ball
 */
public record Guarantee(
    double value,
    String method,
    long regions,
    double seconds,
    List<RegionCertificate> certificates) {
  /** Copies the list. */
  public Guarantee {
    certificates = List.copyOf(certificates);
  }
}
