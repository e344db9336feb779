/** Pages and REST documents of bench instruments and the checks of their clocks. */
@NullMarked
package turnsheet.bench.web;

import org.jspecify.annotations.NullMarked;
