/** What a reading means: suspects behind lines, verdicts against limits, before against after. */
@NullMarked
package turnsheet.core.diagnose;

import org.jspecify.annotations.NullMarked;
