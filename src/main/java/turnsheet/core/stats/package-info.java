/**
 * Moments, quantiles, stability, regression, uncertainty budgets. Does not know where samples came
 * from.
 */
@NullMarked
package turnsheet.core.stats;

import org.jspecify.annotations.NullMarked;
