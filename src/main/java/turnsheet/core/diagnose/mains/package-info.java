/**
 * The mains frequency from the hum in a recording, and what of a speed error the supply explains.
 */
@NullMarked
package turnsheet.core.diagnose.mains;

import org.jspecify.annotations.NullMarked;
