/** Package linalg. */
@NullMarked
package blochbound.linalg;

import org.jspecify.annotations.NullMarked;
