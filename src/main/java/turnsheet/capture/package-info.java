/** Receives captures, stores their bytes, has them recognised, accepts or refuses them. */
@NullMarked
package turnsheet.capture;

import org.jspecify.annotations.NullMarked;
