/** What a measurement costs; see docs/performance.md. Not part of the service. */
@NullMarked
package turnsheet.bench;

import org.jspecify.annotations.NullMarked;
