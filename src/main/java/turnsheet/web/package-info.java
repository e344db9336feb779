/**
 * Layout, error pages, formatting of numbers and units, security headers. Knows no feature rule.
 */
@NullMarked
package turnsheet.web;

import org.jspecify.annotations.NullMarked;
