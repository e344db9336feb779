/** Numbers as text: waveform tables, edge lists, period lists, value change dumps. */
@NullMarked
package turnsheet.core.format.text;

import org.jspecify.annotations.NullMarked;
