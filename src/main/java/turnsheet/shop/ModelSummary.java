package turnsheet.shop;

import org.jspecify.annotations.Nullable;

/** A model as a list shows it. */
public record ModelSummary(
    ModelId id,
    String name,
    @Nullable Integer pulsesPerTurn,
    int settings,
    int parts,
    int limits,
    int units) {}
