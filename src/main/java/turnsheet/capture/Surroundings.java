package turnsheet.capture;

import org.jspecify.annotations.Nullable;
import turnsheet.shop.BenchInstrument;
import turnsheet.shop.MachineModel;
import turnsheet.shop.ReferenceMedium;
import turnsheet.shop.SpeedSetting;
import turnsheet.shop.VisitSummary;
import turnsheet.web.RefusedRequestException;

/** What the shop knows about the things that a {@link CaptureKey} names. */
public record Surroundings(
    VisitSummary visit,
    MachineModel model,
    SpeedSetting setting,
    @Nullable BenchInstrument instrument,
    @Nullable ReferenceMedium medium) {

  /**
   * Captures come and change only while the unit is here.
   *
   * @throws RefusedRequestException if the visit is closed
   */
  void requireOpen() {
    if (!visit.visit().isOpen()) {
      throw new RefusedRequestException(
          "visitClosed",
          "This visit is closed: take it up again before adding or changing captures.");
    }
  }

  /** Nominal tone: of the medium if it carries one, else of the setting. */
  @Nullable Double toneHz() {
    Double ofMedium = medium == null ? null : medium.toneHz();
    return ofMedium == null ? setting.toneHz() : ofMedium;
  }

  @Nullable Double pulsesPerSecond() {
    var pulses = model.pulsesPerSecond(setting);
    return pulses.isPresent() ? pulses.getAsDouble() : null;
  }
}
