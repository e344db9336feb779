/**
 * Checks of the clocks of bench instruments: runs the core on known frequencies, keeps what it
 * found.
 */
@NullMarked
package turnsheet.bench;

import org.jspecify.annotations.NullMarked;
