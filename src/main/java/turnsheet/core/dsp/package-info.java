/**
 * Windows, transforms, filters, weighting, demodulation, crossings. Does not know what a figure is
 * used for.
 */
@NullMarked
package turnsheet.core.dsp;

import org.jspecify.annotations.NullMarked;
