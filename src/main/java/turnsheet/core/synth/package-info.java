/**
 * Captures with a closed-form truth: speed functions rendered to tones, waveforms and edge times.
 */
@NullMarked
package turnsheet.core.synth;

import org.jspecify.annotations.NullMarked;
