/** Sign-in, first run, the shop page; who may open what. */
@NullMarked
package turnsheet.access.web;

import org.jspecify.annotations.NullMarked;
