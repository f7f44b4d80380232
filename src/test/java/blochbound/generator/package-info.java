/** Tests of the Bloch generator, its expansions and its steady states. */
@NullMarked
package blochbound.generator;

import org.jspecify.annotations.NullMarked;
