/**
 * Customers, machine models, units, visits, instruments, media, limits. Knows no bytes and no
 * numerics.
 */
@NullMarked
package turnsheet.shop;

import org.jspecify.annotations.NullMarked;
