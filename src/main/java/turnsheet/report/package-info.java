/** Before against after: pairs readings, states verdicts, prints the sheet. */
@NullMarked
package turnsheet.report;

import org.jspecify.annotations.NullMarked;
