/** Package model. */
@NullMarked
package blochbound.model;

import org.jspecify.annotations.NullMarked;
