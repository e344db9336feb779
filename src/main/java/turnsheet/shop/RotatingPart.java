package turnsheet.shop;

import org.jspecify.annotations.Nullable;

/**
 * A shaft, roller, idler, reel, belt, platter or motor.
 *
 * @param name no other part of the model has it
 * @param amount diameter in mm, turns per turn, or turns per minute, as the basis says
 * @param referencePart name of the part whose turns are counted; null for the machine's nominal
 *     rotation, and for the other bases
 */
public record RotatingPart(
    String name, PartBasis basis, double amount, @Nullable String referencePart) {

  public static final int NAME_LENGTH = 120;

  public RotatingPart {
    Require.text("name", name, NAME_LENGTH);
    Require.positive("amount", amount);
    if (referencePart != null && basis != PartBasis.TURNS_PER_TURN) {
      throw new IllegalArgumentException(basis + " does not refer to " + referencePart);
    }
  }
}
