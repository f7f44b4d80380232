/** Tests of the project as a whole: its architecture, and the program run as users run it. */
@NullMarked
package blochbound;

import org.jspecify.annotations.NullMarked;
