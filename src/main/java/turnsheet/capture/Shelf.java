package turnsheet.capture;

import java.util.List;
import org.jspecify.annotations.Nullable;
import org.springframework.stereotype.Component;
import turnsheet.shop.BenchInstrument;
import turnsheet.shop.InstrumentId;
import turnsheet.shop.Instruments;
import turnsheet.shop.MachineModel;
import turnsheet.shop.MachineModels;
import turnsheet.shop.Media;
import turnsheet.shop.MediumId;
import turnsheet.shop.ReferenceMedium;
import turnsheet.shop.SpeedSetting;
import turnsheet.shop.VisitId;
import turnsheet.shop.VisitSummary;
import turnsheet.shop.Visits;
import turnsheet.web.NotFoundException;
import turnsheet.web.RefusedRequestException;

/** Fetches from the shop what a capture refers to. */
@Component
class Shelf {

  private final Visits visits;
  private final MachineModels models;
  private final Instruments instruments;
  private final Media media;

  Shelf(Visits visits, MachineModels models, Instruments instruments, Media media) {
    this.visits = visits;
    this.models = models;
    this.instruments = instruments;
    this.media = media;
  }

  /**
   * Everything that the key names.
   *
   * @throws NotFoundException if there is no such visit, instrument or medium
   * @throws RefusedRequestException if the speed setting is not one of the unit's model
   */
  Surroundings of(CaptureKey key) {
    VisitSummary visit = visit(key.visit());
    MachineModel model =
        models.find(visit.modelId()).orElseThrow(() -> new NotFoundException("model"));
    SpeedSetting setting =
        model
            .setting(key.setting())
            .orElseThrow(
                () ->
                    new RefusedRequestException(
                        "foreignSetting",
                        "The unit of this visit has no such speed setting: choose one of its"
                            + " model."));
    return new Surroundings(
        visit, model, setting, instrument(key.instrument()), medium(key.medium()));
  }

  /**
   * The same, and nobody changes the visit or the model of its unit until the transaction at hand
   * commits.
   */
  Surroundings hold(CaptureKey key) {
    visits.lock(key.visit());
    return of(key);
  }

  /**
   * The visit that something comes in for.
   *
   * @throws NotFoundException if there is none
   */
  VisitSummary visit(VisitId id) {
    return visits.summary(id).orElseThrow(() -> new NotFoundException("visit"));
  }

  /**
   * The speed settings that a recording of a visit can have been made at.
   *
   * @throws RefusedRequestException if the unit's model has none
   */
  List<SpeedSetting> settings(VisitSummary visit) {
    List<SpeedSetting> settings =
        models.find(visit.modelId()).orElseThrow(() -> new NotFoundException("model")).settings();
    if (settings.isEmpty()) {
      throw new RefusedRequestException(
          "noSettings",
          "The model of this unit has no speed setting yet: enter one, then upload again.");
    }
    return settings;
  }

  private @Nullable BenchInstrument instrument(@Nullable InstrumentId id) {
    return id == null
        ? null
        : instruments.find(id).orElseThrow(() -> new NotFoundException("instrument"));
  }

  private @Nullable ReferenceMedium medium(@Nullable MediumId id) {
    return id == null ? null : media.find(id).orElseThrow(() -> new NotFoundException("medium"));
  }
}
