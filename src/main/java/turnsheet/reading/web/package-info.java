/** Pages and REST documents of readings, visits, units and the bench. */
@NullMarked
package turnsheet.reading.web;

import org.jspecify.annotations.NullMarked;
