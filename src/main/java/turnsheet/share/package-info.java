/** Share links: tokens, expiry, which sheet they open. */
@NullMarked
package turnsheet.share;

import org.jspecify.annotations.NullMarked;
