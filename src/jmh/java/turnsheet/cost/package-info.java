/** What a measurement costs; see docs/performance.md. Not part of the service. */
@NullMarked
package turnsheet.cost;

import org.jspecify.annotations.NullMarked;
