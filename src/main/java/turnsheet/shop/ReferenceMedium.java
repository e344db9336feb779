package turnsheet.shop;

import org.jspecify.annotations.Nullable;

/**
 * A test tape or test record.
 *
 * @param toneHz the tone it carries; null where it carries several
 * @param speedTolerancePercent its tone's frequency is within this much of the stated one
 * @param ownFlutterPercent flutter that was recorded with it; null where not stated
 * @param note may be empty
 */
public record ReferenceMedium(
    MediumId id,
    String name,
    @Nullable Double toneHz,
    double speedTolerancePercent,
    @Nullable Double ownFlutterPercent,
    String note) {

  public static final int NAME_LENGTH = 200;
  public static final int NOTE_LENGTH = 4000;

  public ReferenceMedium {
    Require.text("name", name, NAME_LENGTH);
    Require.atMost("note", note, NOTE_LENGTH);
    Require.positive("tone", toneHz);
    Require.notNegative("tolerance", speedTolerancePercent);
    Require.notNegative("own flutter", ownFlutterPercent);
  }

  /**
   * Standard uncertainty of the speed: the tolerance taken as the half width of a rectangular
   * distribution (JCGM 100:2008, 4.3.7), in percent.
   */
  public double speedStandardUncertaintyPercent() {
    return speedTolerancePercent / Math.sqrt(3);
  }
}
