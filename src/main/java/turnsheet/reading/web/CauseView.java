package turnsheet.reading.web;

import java.util.List;
import java.util.Locale;
import java.util.Optional;
import org.springframework.context.MessageSource;
import org.springframework.stereotype.Component;
import turnsheet.access.ShopPreferences;
import turnsheet.core.diagnose.parts.LineFinding;
import turnsheet.reading.CapturePlaces;
import turnsheet.reading.MachineInCapture;
import turnsheet.reading.ReadingId;
import turnsheet.reading.Readings;
import turnsheet.reading.StoredReading;
import turnsheet.shop.MachineModel;
import turnsheet.shop.MachineModels;
import turnsheet.web.Wording;

/**
 * Asks the parts of the model, as they are entered now, who can stand behind the lines of a
 * reading: a diameter put right shows at once.
 */
@Component
class CauseView {

  private final Readings readings;
  private final CapturePlaces places;
  private final MachineModels models;
  private final ShopPreferences preferences;
  private final MessageSource messages;

  CauseView(
      Readings readings,
      CapturePlaces places,
      MachineModels models,
      ShopPreferences preferences,
      MessageSource messages) {
    this.readings = readings;
    this.places = places;
    this.models = models;
    this.preferences = preferences;
    this.messages = messages;
  }

  /** What was found, and whose parts were asked. */
  record Found(MachineModel model, List<LineFinding> findings) {}

  /** Empty where the reading is unknown or the model has lost the speed setting. */
  Optional<Found> found(ReadingId id) {
    return readings.find(id).flatMap(this::found);
  }

  private Optional<Found> found(StoredReading stored) {
    return places
        .find(stored.captureId())
        .flatMap(
            place ->
                models
                    .find(place.modelId())
                    .flatMap(
                        model ->
                            MachineInCapture.of(
                                    model,
                                    place.settingId(),
                                    stored.reading(),
                                    preferences.get().mainsHz())
                                .map(m -> new Found(model, m.findings(stored.reading())))));
  }

  /** The section of a page; without lines where nothing can be said. */
  CausePage page(ReadingId id, Locale locale) {
    CauseWords causes = new CauseWords(new Wording(messages, locale));
    return found(id)
        .map(
            found ->
                new CausePage(
                    found.model().id().toString(),
                    !found.model().parts().isEmpty(),
                    found.findings().stream().map(causes::line).toList()))
        .orElse(new CausePage("", false, List.of()));
  }
}
