/** Runs the core on captures, keeps the readings, shows them and their history. */
@NullMarked
package turnsheet.reading;

import org.jspecify.annotations.NullMarked;
