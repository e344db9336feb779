package turnsheet.core.measure;

import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import turnsheet.core.dsp.ToneBand;
import turnsheet.core.signal.Warning;

/** What the recording of a tone has to say beyond its figures. */
final class ToneWarnings {

  private static final double FULL_FLUTTER_HERTZ = 200;
  private static final double MAINS_DB = -40;
  private static final double SWING_SHARE = 0.15;

  private ToneWarnings() {}

  static List<Warning> of(ToneBand band, Reading.Signal signal, ToneLevel level) {
    List<Warning> warnings = new ArrayList<>();
    if (band.flutterHertz() < FULL_FLUTTER_HERTZ) {
      warnings.add(
          warning(
              "lowTone",
              "A tone of %.5g Hz at %.6g samples per second shows fluctuation up to %.3g Hz only:"
                  + " figures leave out what lies between that and 200 Hz.",
              band.toneHertz(),
              band.sampleRateHertz(),
              band.flutterHertz()));
    }
    if (signal.clippedSamples() > 0) {
      warnings.add(
          warning(
              "clipped",
              "%d samples lie on clipped tops: speed figures bear this, but record at a lower"
                  + " level.",
              signal.clippedSamples()));
    }
    if (!signal.dropouts().isEmpty()) {
      double seconds =
          signal.dropouts().stream().mapToDouble(Reading.Dropout::durationSeconds).sum();
      warnings.add(
          warning(
              "dropouts",
              "The tone was lost %d times, %.3g s in all, first at %.2f s: these stretches are left"
                  + " out of the figures.",
              signal.dropouts().size(),
              seconds,
              signal.dropouts().get(0).startSeconds()));
    }
    if (!level.clicks().isEmpty()) {
      warnings.add(
          warning(
              "clicks",
              "%d clicks were heard, first at %.2f s: some milliseconds around each are left out of"
                  + " the figures.",
              level.clicks().size(),
              level.clicks().get(0).startSeconds()));
    }
    if (level.swing() > SWING_SHARE) {
      warnings.add(
          warning(
              "unsteadyLevel",
              "The level of the tone swings by \u00b1%.0f %%: speed figures bear this, but look at"
                  + " head contact and at how the tape is guided.",
              100 * level.swing()));
    }
    for (Reading.MainsLine line : signal.mains()) {
      if (line.relativeDb() > MAINS_DB) {
        warnings.add(
            warning(
                "hum",
                "Mains hum at %.0f Hz lies only %.0f dB below the tone: check the earthing of the"
                    + " recording chain.",
                line.rateHz(),
                -line.relativeDb()));
        break;
      }
    }
    return List.copyOf(warnings);
  }

  private static Warning warning(String code, String format, Object... numbers) {
    return new Warning(code, String.format(Locale.ROOT, format, numbers));
  }
}
