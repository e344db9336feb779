/** Pages and REST of the shop's own records. */
@NullMarked
package turnsheet.shop.web;

import org.jspecify.annotations.NullMarked;
