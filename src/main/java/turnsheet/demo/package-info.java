/** An invented shop with invented faults, its sample uploads made from closed-form signals. */
@NullMarked
package turnsheet.demo;

import org.jspecify.annotations.NullMarked;
