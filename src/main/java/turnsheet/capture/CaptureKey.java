package turnsheet.capture;

import org.jspecify.annotations.Nullable;
import turnsheet.shop.InstrumentId;
import turnsheet.shop.MediumId;
import turnsheet.shop.SpeedSettingId;
import turnsheet.shop.VisitId;

/**
 * What a capture was made of, and with what.
 *
 * @param condition {@link #AS_RECEIVED}, {@link #AFTER_REPAIR} or a label of the bench's own
 * @param instrument what recorded it; null where not said
 * @param medium the test tape or record that was played; null where none was or not said
 * @param toneMethod how a tone came onto it; null for whatever is not a tone, and where not said
 */
public record CaptureKey(
    VisitId visit,
    SpeedSettingId setting,
    String condition,
    @Nullable InstrumentId instrument,
    @Nullable MediumId medium,
    @Nullable ToneMethod toneMethod) {

  public static final String AS_RECEIVED = "as received";
  public static final String AFTER_REPAIR = "after repair";
  public static final int CONDITION_LENGTH = 60;

  public CaptureKey {
    condition = label(condition);
    if (condition.isEmpty() || condition.length() > CONDITION_LENGTH) {
      throw new IllegalArgumentException("condition of " + condition.length() + " characters");
    }
  }

  /**
   * A condition as it is kept: the two that every visit has are kept in English, and a page in
   * German names and takes them in German.
   */
  public static String label(String typed) {
    String label = typed.strip();
    return switch (label) {
      case "wie erhalten" -> AS_RECEIVED;
      case "nach der Reparatur" -> AFTER_REPAIR;
      default -> label;
    };
  }

  /** Nothing said about the tone. */
  public CaptureKey(
      VisitId visit,
      SpeedSettingId setting,
      String condition,
      @Nullable InstrumentId instrument,
      @Nullable MediumId medium) {
    this(visit, setting, condition, instrument, medium, null);
  }

  /** The same of another setting and condition. */
  CaptureKey at(SpeedSettingId otherSetting, String otherCondition) {
    return new CaptureKey(visit, otherSetting, otherCondition, instrument, medium, toneMethod);
  }

  /** The same with another method. */
  public CaptureKey by(@Nullable ToneMethod method) {
    return new CaptureKey(visit, setting, condition, instrument, medium, method);
  }
}
