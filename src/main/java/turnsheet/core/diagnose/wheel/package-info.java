/** The sensor wheel: what repeats with each of its turns, its marks and its damage. */
@NullMarked
package turnsheet.core.diagnose.wheel;

import org.jspecify.annotations.NullMarked;
