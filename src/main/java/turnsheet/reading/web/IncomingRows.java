package turnsheet.reading.web;

import java.util.List;
import java.util.Locale;
import org.springframework.stereotype.Component;
import turnsheet.capture.Capture;
import turnsheet.capture.CaptureState;
import turnsheet.capture.Captures;
import turnsheet.capture.Looked;
import turnsheet.capture.SettingFit;
import turnsheet.core.measure.KindGuess;
import turnsheet.core.signal.Rejection;
import turnsheet.shop.VisitId;
import turnsheet.web.Numbers;
import turnsheet.web.Wording;

/** The recordings of a visit that nobody has confirmed yet. */
@Component
class IncomingRows {

  private final Captures captures;

  IncomingRows(Captures captures) {
    this.captures = captures;
  }

  List<VisitPage.Incoming> of(VisitId visit, Wording words) {
    return captures.ofVisit(visit).stream()
        .filter(IncomingRows::isIncoming)
        .map(capture -> row(capture, words))
        .toList();
  }

  private static boolean isIncoming(Capture capture) {
    return capture.state() == CaptureState.RECOGNISED
        || (capture.state() == CaptureState.REFUSED && capture.fit() != null);
  }

  private static VisitPage.Incoming row(Capture capture, Wording words) {
    SettingFit fit = capture.fit();
    Rejection refusal = capture.refusal();
    return new VisitPage.Incoming(
        capture.id().toString(),
        capture.fileName(),
        what(capture.looked(), words),
        fit == null ? "" : fit.word(),
        fit == null || fit.isProposal() ? capture.key().setting().toString() : "",
        capture.key().condition(),
        refusal == null ? "" : refusal.message());
  }

  private static String what(@org.jspecify.annotations.Nullable Looked looked, Wording words) {
    if (looked == null) {
      return "";
    }
    KindGuess guess = looked.guess();
    Double rate = guess == null ? null : guess.rateHertz();
    if (guess == null || rate == null) {
      return words.said(looked.recognised().format());
    }
    return words.text(
        "reading.visit.swings",
        words.said(looked.recognised().format()),
        words.text("reading.kind." + guess.kind().name().toLowerCase(Locale.ROOT)),
        words.numbers().show(rate, null, "Hz", Numbers.Sign.PLAIN).valueAndUnit());
  }
}
