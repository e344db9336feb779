package turnsheet.pair.web;

import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import org.springframework.context.MessageSource;
import org.springframework.stereotype.Component;
import turnsheet.capture.Capture;
import turnsheet.capture.CaptureChoices;
import turnsheet.capture.Looked;
import turnsheet.core.format.api.Recognised;
import turnsheet.pair.Pairs;
import turnsheet.reading.CapturePlace;
import turnsheet.reading.CapturePlaces;
import turnsheet.web.Crumb;
import turnsheet.web.Times;
import turnsheet.web.Wording;

/** Gathers what the form shows that orders a comparison. */
@Component
class PairOrderView {

  private final Pairs pairs;
  private final CapturePlaces places;
  private final MessageSource messages;
  private final Times times;

  PairOrderView(Pairs pairs, CapturePlaces places, MessageSource messages, Times times) {
    this.pairs = pairs;
    this.places = places;
    this.messages = messages;
    this.times = times;
  }

  PairOrderPage page(Capture capture, Locale locale) {
    Wording words = new Wording(messages, locale);
    CapturePlace place = places.find(capture.id()).orElseThrow();
    List<PairOrderPage.Choice> own = channels(capture, words);
    List<PairOrderPage.Choice> choices = new ArrayList<>(own);
    for (Capture other : pairs.beside(capture)) {
      if (!other.id().equals(capture.id())) {
        choices.addAll(channels(other, words));
      }
    }
    CaptureChoices confirmed = capture.choices();
    Integer teeth = confirmed == null ? null : confirmed.settings().teeth();
    return new PairOrderPage(
        capture.id().toString(),
        List.of(
            new Crumb(place.modelName() + " " + place.serialNumber(), "/units/" + place.unitId()),
            new Crumb(place.fileName(), "/captures/" + place.captureId())),
        choices,
        choices.get(0).value(),
        choices.get(Math.min(1, choices.size() - 1)).value(),
        teeth == null ? "" : teeth.toString(),
        choices.size() < 2,
        pairs.ofCapture(capture.id()).stream()
            .map(
                p ->
                    new PairOrderPage.Earlier(
                        p.id().toString(), times.minute(p.madeAt()), p.madeBy()))
            .toList());
  }

  private static List<PairOrderPage.Choice> channels(Capture capture, Wording words) {
    List<PairOrderPage.Choice> choices = new ArrayList<>();
    Looked looked = capture.looked();
    List<Recognised.Channel> channels = looked == null ? List.of() : looked.recognised().channels();
    for (int i = 1; i <= Math.max(1, channels.size()); i++) {
      choices.add(
          new PairOrderPage.Choice(
              capture.id() + ":" + i,
              words.text(
                  "sensors.order.choice",
                  capture.fileName(),
                  Integer.toString(i),
                  words.said(capture.key().condition()))));
    }
    return choices;
  }
}
