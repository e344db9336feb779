/** Pages and REST resources of captures. */
@NullMarked
package turnsheet.capture.web;

import org.jspecify.annotations.NullMarked;
