/** The plan for each kind of capture, from stream to reading. */
@NullMarked
package turnsheet.core.measure;

import org.jspecify.annotations.NullMarked;
