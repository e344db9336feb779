/** Export and import on pages and for programs. */
@NullMarked
package turnsheet.exchange.web;

import org.jspecify.annotations.NullMarked;
