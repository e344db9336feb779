/** The page of what a closer look at a capture showed, and its REST resource. */
@NullMarked
package turnsheet.evidence.web;

import org.jspecify.annotations.NullMarked;
