/**
 * Sample streams, edge streams, speed traces: what flows between the stages. Knows no file and no
 * other package.
 */
@NullMarked
package turnsheet.core.signal;

import org.jspecify.annotations.NullMarked;
