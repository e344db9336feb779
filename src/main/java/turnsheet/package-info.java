/** Turnsheet: speed and flutter measurement for repair benches. */
@NullMarked
package turnsheet;

import org.jspecify.annotations.NullMarked;
