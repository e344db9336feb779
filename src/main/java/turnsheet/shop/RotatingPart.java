package turnsheet.shop;

import org.jspecify.annotations.Nullable;
import turnsheet.core.diagnose.parts.PartKind;

/**
 * A shaft, roller, idler, reel, belt, platter, gear, bearing or motor. One whose numbers do not fit
 * together is met with a {@link RefusedChangeException}.
 *
 * @param name no other part of the model has it
 * @param amount diameter or length in mm, turns per turn, turns per minute, or pole pairs, as the
 *     basis says; of a reel the diameter of the full pack
 * @param referencePart name of the part whose turns are counted, or on which a belt lies; null for
 *     the machine's nominal rotation, for a belt at tape speed, and for the other bases
 */
public record RotatingPart(
    String name,
    PartKind kind,
    PartBasis basis,
    double amount,
    @Nullable String referencePart,
    PartDetails details) {

  public static final int NAME_LENGTH = 120;

  public RotatingPart {
    Require.text("name", name, NAME_LENGTH);
    Require.positive("amount", amount);
    if (referencePart != null
        && basis != PartBasis.TURNS_PER_TURN
        && basis != PartBasis.LENGTH_MM) {
      throw new IllegalArgumentException(basis + " does not refer to " + referencePart);
    }
    PartRules.check(name, kind, basis, amount, referencePart, details);
  }

  /** A part of a kind that nobody has said. */
  public RotatingPart(String name, PartBasis basis, double amount, @Nullable String referencePart) {
    this(name, PartKind.OTHER, basis, amount, referencePart, PartDetails.NONE);
  }

  /** A part without numbers beside its amount. */
  public RotatingPart(
      String name, PartKind kind, PartBasis basis, double amount, @Nullable String referencePart) {
    this(name, kind, basis, amount, referencePart, PartDetails.NONE);
  }

  RotatingPart following(String newReference) {
    return new RotatingPart(name, kind, basis, amount, newReference, details);
  }
}
