/**
 * Curves of a reading, cut to a window, and their drawing as SVG. Knows no database and no page.
 */
@NullMarked
package turnsheet.reading.chart;

import org.jspecify.annotations.NullMarked;
