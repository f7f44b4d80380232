/** Package check. */
@NullMarked
package blochbound.check;

import org.jspecify.annotations.NullMarked;
