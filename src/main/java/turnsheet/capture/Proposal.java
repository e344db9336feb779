package turnsheet.capture;

import java.util.OptionalDouble;
import org.jspecify.annotations.Nullable;
import turnsheet.core.format.api.Contents;
import turnsheet.core.measure.CaptureKind;
import turnsheet.core.measure.KindGuess;
import turnsheet.shop.MachineModel;
import turnsheet.shop.ReferenceMedium;
import turnsheet.shop.SpeedSetting;

/**
 * What is taken unless the bench says otherwise.
 *
 * @param kind what the capture is a recording of
 * @param kindWhy why, for people; null where the contents leave no other
 * @param toneHz nominal rate if it is a tone; null where unknown
 * @param toneFrom who says so
 * @param pulsesPerSecond nominal rate if it is a tachometer's; null where unknown
 * @param teeth pulses per turn of the model's sensor wheel; null where unknown
 */
public record Proposal(
    CaptureKind kind,
    @Nullable String kindWhy,
    @Nullable Double toneHz,
    ToneFrom toneFrom,
    @Nullable Double pulsesPerSecond,
    @Nullable Integer teeth) {

  /** As far from nominal as a tone or pulse rate is looked for when nobody says otherwise. */
  public static final double SEARCH_PERCENT = 12;

  /** Where the nominal tone comes from. */
  public enum ToneFrom {
    MEDIUM,
    SETTING,
    /** a common test tone that the recording comes near to */
    GUESS,
    NOBODY
  }

  /** IEC 60386:1972 names 3150 Hz; older tapes and records carry 3000 Hz (common practice). */
  private static final double[] COMMON_TONES_HZ = {3150, 3000};

  /** Two tones 5 % apart can be told from each other by half of that at best. */
  private static final double TONE_REACH = 0.06;

  static Proposal of(
      Looked looked, MachineModel model, SpeedSetting setting, @Nullable ReferenceMedium medium) {
    KindGuess guess = looked.guess();
    CaptureKind kind =
        looked.recognised().contents() != Contents.WAVEFORM
            ? CaptureKind.EDGES
            : guess == null ? CaptureKind.TONE : guess.kind();
    Double tone = medium == null ? null : medium.toneHz();
    ToneFrom from = ToneFrom.MEDIUM;
    if (tone == null) {
      tone = setting.toneHz();
      from = ToneFrom.SETTING;
    }
    if (tone == null) {
      tone = guess == null ? null : commonTone(guess.rateHertz());
      from = tone == null ? ToneFrom.NOBODY : ToneFrom.GUESS;
    }
    OptionalDouble pulses = model.pulsesPerSecond(setting);
    return new Proposal(
        kind,
        kind == CaptureKind.EDGES || guess == null ? null : guess.why(),
        tone,
        from,
        pulses.isPresent() ? pulses.getAsDouble() : null,
        model.pulsesPerTurn());
  }

  /** The proposed nominal rate of a kind; null where unknown. */
  public @Nullable Double nominalHz(CaptureKind chosen) {
    return chosen == CaptureKind.TONE ? toneHz : pulsesPerSecond;
  }

  private static @Nullable Double commonTone(@Nullable Double rateHertz) {
    if (rateHertz == null) {
      return null;
    }
    Double nearest = null;
    double least = TONE_REACH;
    for (double tone : COMMON_TONES_HZ) {
      double off = Math.abs(rateHertz / tone - 1);
      if (off < least) {
        least = off;
        nearest = tone;
      }
    }
    return nearest;
  }
}
