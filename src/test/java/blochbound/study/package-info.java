/** Tests of the studies, and of the guarantee as a whole. */
@NullMarked
package blochbound.study;

import org.jspecify.annotations.NullMarked;
