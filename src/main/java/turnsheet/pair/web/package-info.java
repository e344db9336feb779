/** Pages on which two sensors are compared, and the sheet that comes of it. */
@NullMarked
package turnsheet.pair.web;

import org.jspecify.annotations.NullMarked;
