/** Tests of the guaranteed bounds. */
@NullMarked
package blochbound.bound;

import org.jspecify.annotations.NullMarked;
