/** Package measure. */
@NullMarked
package blochbound.measure;

import org.jspecify.annotations.NullMarked;
