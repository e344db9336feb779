/** Filters tried on the waveform of a capture before they are built: orders, a job, results. */
@NullMarked
package turnsheet.trial;

import org.jspecify.annotations.NullMarked;
