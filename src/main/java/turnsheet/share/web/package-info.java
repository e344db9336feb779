/** Making and withdrawing share links, and the page that a customer sees behind one. */
@NullMarked
package turnsheet.share.web;

import org.jspecify.annotations.NullMarked;
