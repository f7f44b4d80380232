/**
 * Argument checks that return the checked value, and the exception of a broken guarantee.
 *
 * <p>Imports nothing of this project; every other package may import it. Read {@link
 * blochbound.check.Check}, then {@link blochbound.check.BrokenGuaranteeException}. Invariant: a
 * check either returns its argument unchanged or throws with a message that says what is wrong and
 * what is allowed.
 */
@NullMarked
package blochbound.check;

import org.jspecify.annotations.NullMarked;
