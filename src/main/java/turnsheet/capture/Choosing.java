package turnsheet.capture;

import org.jspecify.annotations.Nullable;
import turnsheet.core.format.api.Contents;
import turnsheet.core.format.api.ReadOptions;
import turnsheet.core.measure.CaptureKind;
import turnsheet.core.measure.MeasureSettings;
import turnsheet.shop.BenchInstrument;
import turnsheet.shop.ReferenceMedium;
import turnsheet.web.RefusedRequestException;

/** Makes a wish and a proposal into choices, or says why they do not go together. */
final class Choosing {

  private static final double MOST_SEARCH_PERCENT = 50;
  private static final int MOST_TEETH = 100_000;

  private Choosing() {}

  static CaptureChoices choices(Wish wish, Looked looked, Surroundings around) {
    Proposal proposal = Proposal.of(looked, around.model(), around.setting(), around.medium());
    CaptureKind kind = wish.kind() == null ? proposal.kind() : wish.kind();
    boolean waveform = looked.recognised().contents() == Contents.WAVEFORM;
    if (waveform == (kind == CaptureKind.EDGES)) {
      throw new RefusedRequestException(
          "kindDoesNotFit",
          waveform
              ? "The file holds a waveform: it can be a tone or a tachometer, not a list of edges."
              : "The file holds times of edges or periods: it can be measured as edges only.");
    }
    Integer teeth = wish.teeth() == null ? proposal.teeth() : wish.teeth();
    double search = wish.searchPercent() == null ? Proposal.SEARCH_PERCENT : wish.searchPercent();
    if (!(search > 0 && search <= MOST_SEARCH_PERCENT)) {
      throw new RefusedRequestException(
          "searchRange", "State a search range above 0 and up to 50 percent.");
    }
    if (teeth != null && (teeth < 1 || teeth > MOST_TEETH)) {
      throw new RefusedRequestException(
          "teeth", "State the pulses per turn as a whole number from 1 to 100000, or none.");
    }
    BenchInstrument clock = around.instrument();
    ReadOptions options = looked.options();
    int channel = looked.recognised().channel();
    return new CaptureChoices(
        options.withChannel(channel),
        new MeasureSettings(
            kind,
            channel,
            nominal(wish, proposal, kind, looked.recognised().sampleRateHertz()),
            search,
            kind == CaptureKind.TONE ? null : teeth,
            clock == null
                ? MeasureSettings.UNCHECKED_CLOCK_PPM
                : clock.clockStandardUncertaintyPpm(),
            clock == null ? 0 : clock.clockErrorPpm(),
            mediumPercent(kind, around.medium())));
  }

  private static double nominal(
      Wish wish, Proposal proposal, CaptureKind kind, @Nullable Double sampleRateHertz) {
    Double nominal = wish.nominalHz() == null ? proposal.nominalHz(kind) : wish.nominalHz();
    if (nominal == null) {
      throw new RefusedRequestException(
          "nominalMissing",
          kind == CaptureKind.TONE
              ? "State the test tone in Hz: neither the medium nor the speed setting tells it."
              : "State the pulses per second at nominal speed: the model does not tell them at this"
                  + " speed setting.");
    }
    if (!(nominal > 0 && Double.isFinite(nominal))) {
      throw new RefusedRequestException("nominal", "State a nominal rate above 0 Hz.");
    }
    if (sampleRateHertz != null && nominal >= sampleRateHertz / 2) {
      throw new RefusedRequestException(
          "nominalTooHigh",
          "The nominal rate must be below half of the "
              + sampleRateHertz
              + " samples per second: correct it, or record at a higher sample rate.");
    }
    return nominal;
  }

  /** Only a played medium takes part in the speed that is heard. */
  private static double mediumPercent(CaptureKind kind, @Nullable ReferenceMedium medium) {
    return kind != CaptureKind.TONE || medium == null
        ? 0
        : medium.speedStandardUncertaintyPercent();
  }
}
