/** Pages and REST of the before/after sheet. */
@NullMarked
package turnsheet.report.web;

import org.jspecify.annotations.NullMarked;
