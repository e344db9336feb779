package turnsheet.report;

import org.jspecify.annotations.Nullable;
import turnsheet.core.diagnose.Difference;
import turnsheet.core.measure.Figure;
import turnsheet.core.measure.FigureName;
import turnsheet.reading.Judged;

/**
 * One figure before and after a repair.
 *
 * @param judgedBefore against its limit; null where there is none
 * @param judgedAfter against its limit; null where there is none
 */
public record Comparison(
    FigureName name,
    Figure before,
    Figure after,
    @Nullable Judged judgedBefore,
    @Nullable Judged judgedAfter,
    Difference difference) {}
