package turnsheet.shop;

import java.time.Instant;
import org.jspecify.annotations.Nullable;

/**
 * A unit as lists and headings show it.
 *
 * @param visits how many there have been
 * @param lastOpenedAt when it last came; null where it never has
 * @param onBench whether a visit is open
 */
public record UnitSummary(
    Unit unit,
    String modelName,
    String customerName,
    int visits,
    @Nullable Instant lastOpenedAt,
    boolean onBench) {}
