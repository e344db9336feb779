/**
 * How healthy the waveform of a tachometer is, and what its edges see that the shaft does not do.
 */
@NullMarked
package turnsheet.core.diagnose.sensor;

import org.jspecify.annotations.NullMarked;
