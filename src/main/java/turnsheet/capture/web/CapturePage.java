package turnsheet.capture.web;

import java.math.BigDecimal;
import java.math.MathContext;
import java.util.List;
import java.util.Locale;
import java.util.UUID;
import org.jspecify.annotations.Nullable;
import turnsheet.capture.Capture;
import turnsheet.capture.CaptureState;
import turnsheet.capture.Looked;
import turnsheet.capture.Proposal;
import turnsheet.capture.Surroundings;
import turnsheet.core.format.api.Contents;
import turnsheet.core.format.api.Recognised;
import turnsheet.core.measure.CaptureKind;
import turnsheet.core.signal.Rejection;
import turnsheet.shop.SpeedSetting;
import turnsheet.web.Numbers;
import turnsheet.web.Times;

/**
 * Everything the capture page says, ready to be shown.
 *
 * @param proposed whether the speed setting was found by the service and is not confirmed
 * @param toneMethod word of {@link turnsheet.capture.ToneMethod}; null where not said
 * @param tone whether it is the recording of a played tone, as far as is known
 */
record CapturePage(
    UUID id,
    UUID visitId,
    UUID unitId,
    String fileName,
    String unitName,
    String settingLabel,
    String condition,
    List<SpeedSetting> settings,
    boolean proposed,
    @Nullable String instrument,
    @Nullable String medium,
    @Nullable String toneMethod,
    boolean tone,
    boolean visitOpen,
    String size,
    String received,
    String receivedBy,
    String sha256,
    String state,
    @Nullable Rejection refusal,
    @Nullable Seen seen,
    WishForm form) {

  /** What was recognised and is proposed. */
  record Seen(
      Recognised recognised,
      @Nullable String sampleRate,
      @Nullable String duration,
      boolean waveform,
      Proposal proposal,
      @Nullable PreviewDrawing drawing) {

    /** What was assumed about one choice; null where nothing was. */
    public @Nullable String guessed(String subject) {
      return recognised.guesses().stream()
          .filter(g -> g.subject().equals(subject))
          .map(Recognised.Guess::taken)
          .findFirst()
          .orElse(null);
    }

    /** Whether the reading of a text file may have to be corrected. */
    public boolean textChoices() {
      return !waveform
          || guessed("contents") != null
          || guessed("timeUnitSeconds") != null
          || guessed("sampleStepSeconds") != null;
    }

    public List<CaptureKind> kinds() {
      return waveform
          ? List.of(CaptureKind.TONE, CaptureKind.TACHOMETER)
          : List.of(CaptureKind.EDGES);
    }
  }

  static CapturePage of(
      Capture capture,
      Surroundings around,
      @Nullable Proposal proposal,
      @Nullable PreviewDrawing drawing,
      WishForm form,
      Times times) {
    Looked looked = capture.looked();
    return new CapturePage(
        capture.id().value(),
        capture.key().visit().value(),
        around.visit().visit().unitId().value(),
        capture.fileName(),
        around.model().name() + " " + around.visit().serialNumber(),
        around.setting().label(),
        capture.key().condition(),
        around.model().settings(),
        capture.fit() != null,
        around.instrument() == null ? null : around.instrument().name(),
        around.medium() == null ? null : around.medium().name(),
        capture.key().toneMethod() == null ? null : capture.key().toneMethod().word(),
        capture.mayBeTone(),
        around.visit().visit().isOpen(),
        size(capture.bytes().length()),
        times.minute(capture.receivedAt()),
        capture.receivedBy(),
        capture.bytes().sha256(),
        capture.state().word(),
        capture.refusal(),
        looked == null || proposal == null ? null : seen(looked, proposal, drawing),
        form);
  }

  /** Whether setting and condition can still be corrected. */
  public boolean placeable() {
    return visitOpen && open() && !state.equals(CaptureState.MEASURED.word());
  }

  /** Whether another choice than the one made could still help. */
  public boolean open() {
    return !state.equals(CaptureState.QUEUED.word());
  }

  /** A plain number for an input field; empty for none. */
  public String field(@Nullable Double value) {
    return value == null ? "" : BigDecimal.valueOf(value).stripTrailingZeros().toPlainString();
  }

  private static Seen seen(Looked looked, Proposal proposal, @Nullable PreviewDrawing drawing) {
    Recognised found = looked.recognised();
    Double rate = found.sampleRateHertz();
    Long frames = found.frames();
    return new Seen(
        found,
        rate == null ? null : short6(rate),
        rate == null || frames == null ? null : short6(frames / rate),
        found.contents() == Contents.WAVEFORM,
        proposal,
        drawing);
  }

  private static String size(long bytes) {
    if (bytes < 1000) {
      return bytes + " B";
    }
    String[] units = {"kB", "MB", "GB", "TB"};
    double value = bytes / 1000.0;
    int unit = 0;
    while (value >= 1000 && unit < units.length - 1) {
      value /= 1000;
      unit++;
    }
    return Numbers.onPage(String.format(Locale.ROOT, "%.1f %s", value, units[unit]));
  }

  private static String short6(double value) {
    return Numbers.onPage(
        new BigDecimal(value).round(new MathContext(6)).stripTrailingZeros().toPlainString());
  }
}
