package turnsheet.report;

import java.time.Instant;
import java.util.List;
import java.util.UUID;
import org.jspecify.annotations.Nullable;
import turnsheet.capture.ToneMethod;
import turnsheet.core.measure.MeasureSettings;

/**
 * The captures of one condition.
 *
 * @param condition {@code as received}, {@code after repair} or a free label
 * @param runs oldest first, at least one
 * @param spectrum of the newest; empty where it has none
 */
public record SheetSide(String condition, List<Run> runs, List<CurvePart> spectrum) {

  public SheetSide {
    runs = List.copyOf(runs);
    spectrum = List.copyOf(spectrum);
  }

  /** The newest capture. */
  public Run newest() {
    return runs.get(runs.size() - 1);
  }

  /**
   * One capture with what made its figures.
   *
   * @param instrument that recorded it; null where nobody said
   * @param medium that was played; null where nobody said
   * @param method how a tone came onto the medium; null for what was not played, or where nobody
   *     said
   */
  public record Run(
      UUID readingId,
      Instant receivedAt,
      String fileName,
      String sha256,
      String format,
      int channel,
      double durationSeconds,
      String methodVersion,
      MeasureSettings settings,
      @Nullable String instrument,
      @Nullable String medium,
      @Nullable ToneMethod method) {}

  /**
   * Points of a curve at even steps.
   *
   * @param high highest value of what each point stands for
   */
  public record CurvePart(double start, double step, List<Float> high) {

    public CurvePart {
      high = List.copyOf(high);
    }
  }
}
