package blochbound.certificate;

import blochbound.linalg.Hermitian;
import blochbound.model.Region;
import java.util.Optional;

/**
 * What proves a bound on one region: enough to rebuild the trial observable.
 *
 * @param region the box in coordinates of the ball
 * @param order order K of the trial observable in the parameters
 * @param witness the witness on the measure's own space; empty where the range of the measure
 *     itself is the bound
 * @param certifiedLower lower bound of the measure (times -1 for an upper limit) on the region
 */
public record RegionCertificate(
    Region region, int order, Optional<Hermitian> witness, double certifiedLower) {}
