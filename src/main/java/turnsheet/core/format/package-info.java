/**
 * Turns the bytes of a capture into a signal stream: recognises the format by content and opens it.
 */
@NullMarked
package turnsheet.core.format;

import org.jspecify.annotations.NullMarked;
