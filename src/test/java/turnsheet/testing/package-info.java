/** What the tests of several features share. */
@NullMarked
package turnsheet.testing;

import org.jspecify.annotations.NullMarked;
