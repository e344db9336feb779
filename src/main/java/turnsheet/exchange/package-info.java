/**
 * The books of the shop as one document that can be taken elsewhere and read back, and as a table
 * of figures. Knows the tables of the features; docs/exchange.md describes the document.
 */
@NullMarked
package turnsheet.exchange;

import org.jspecify.annotations.NullMarked;
