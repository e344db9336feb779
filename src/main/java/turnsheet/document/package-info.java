/** The result contract as JSON. Knows readings; knows no feature. */
@NullMarked
package turnsheet.document;

import org.jspecify.annotations.NullMarked;
