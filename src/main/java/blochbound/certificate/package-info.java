/**
 * Records of what was proved, read by the prover, by proof files and by reports.
 *
 * <p>Imports model, linalg and packages before them. Nothing here computes.
 */
@NullMarked
package blochbound.certificate;

import org.jspecify.annotations.NullMarked;
