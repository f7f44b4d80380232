/** Package interval. */
@NullMarked
package blochbound.interval;

import org.jspecify.annotations.NullMarked;
