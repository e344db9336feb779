package turnsheet.reading;

import java.time.Instant;
import java.util.Map;
import org.jspecify.annotations.Nullable;
import turnsheet.capture.CaptureId;
import turnsheet.capture.CaptureState;
import turnsheet.capture.SettingFit;
import turnsheet.capture.ToneMethod;
import turnsheet.core.measure.Figure;
import turnsheet.core.measure.FigureName;
import turnsheet.shop.SpeedSettingId;
import turnsheet.shop.VisitId;

/**
 * How a capture stands, with the figures of the reading that stands for it.
 *
 * @param fit how the speed setting was proposed; null once the bench has said or confirmed it
 * @param toneMethod how a tone came onto what was played; null for others and where not said
 * @param refusal sentence of a capture that is refused or failed; null otherwise
 * @param progress 0 to 1, of the job that measures it; 0 where none runs
 * @param readingId null until it is measured
 * @param measuredAt when that reading was made; null until then
 * @param figures those with a value; empty until it is measured
 */
public record CaptureResult(
    CaptureId captureId,
    VisitId visitId,
    SpeedSettingId settingId,
    String settingLabel,
    String condition,
    String fileName,
    Instant receivedAt,
    CaptureState state,
    @Nullable SettingFit fit,
    @Nullable ToneMethod toneMethod,
    @Nullable String refusal,
    double progress,
    @Nullable ReadingId readingId,
    @Nullable Instant measuredAt,
    Map<FigureName, Figure> figures) {

  public CaptureResult {
    figures = Map.copyOf(figures);
  }

  /** A figure of the reading that stands for it; absent where there is none. */
  public Figure figure(FigureName name) {
    return figures.getOrDefault(name, Figure.absent("not measured"));
  }

  CaptureResult withFigures(Map<FigureName, Figure> found) {
    return new CaptureResult(
        captureId,
        visitId,
        settingId,
        settingLabel,
        condition,
        fileName,
        receivedAt,
        state,
        fit,
        toneMethod,
        refusal,
        progress,
        readingId,
        measuredAt,
        found);
  }
}
