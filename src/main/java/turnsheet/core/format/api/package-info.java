/**
 * What every capture format agrees on: bytes in, a recognition or a rejection out, then a stream.
 */
@NullMarked
package turnsheet.core.format.api;

import org.jspecify.annotations.NullMarked;
