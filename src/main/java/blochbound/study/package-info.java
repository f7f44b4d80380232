/**
 * One question each, request record in, result record out; the only place where proofs, searches
 * and samples meet.
 *
 * <p>Imports everything up to bound, search and sample. Read {@link blochbound.study.Certification}
 * first. Invariant: guaranteed, found and sampled values are ordered or the study stops with {@link
 * blochbound.check.BrokenGuaranteeException}.
 */
@NullMarked
package blochbound.study;

import org.jspecify.annotations.NullMarked;
