/** Recorded audio: RIFF/WAVE with its 64-bit relatives, AIFF and AIFF-C, FLAC. */
@NullMarked
package turnsheet.core.format.audio;

import org.jspecify.annotations.NullMarked;
