/**
 * Filters that could be built in front of a tachometer's input: their sections and circuits, and
 * what each would make of a recorded waveform. Knows nothing of files or pages.
 */
@NullMarked
package turnsheet.core.diagnose.filter;

import org.jspecify.annotations.NullMarked;
