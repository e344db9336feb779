package turnsheet.reading.web;

import org.jspecify.annotations.Nullable;
import turnsheet.capture.CaptureState;
import turnsheet.capture.ToneMethod;
import turnsheet.core.diagnose.Verdict;
import turnsheet.core.measure.FigureName;
import turnsheet.reading.CaptureResult;
import turnsheet.reading.ReadingId;
import turnsheet.web.Wording;

/**
 * One capture in few words.
 *
 * @param state word of {@link CaptureState}
 * @param href where to go on: the reading, or the capture
 * @param speed deviation with unit; empty until measured
 * @param flutter figure that is limited, else two-sigma, with unit; empty until measured
 * @param flutterName what that figure is; empty with it
 * @param method how a tone came onto what was played; empty where not said
 * @param verdict the worst of all; null where nothing is limited
 * @param percent progress of the measurement
 * @param refusal sentence; empty unless refused or failed
 */
record ResultItem(
    String captureId,
    String state,
    String href,
    String fileName,
    String speed,
    String flutter,
    String flutterName,
    String method,
    @Nullable String verdict,
    long percent,
    String refusal) {

  static ResultItem of(CaptureResult result, Standing standing, Wording words) {
    ReadingId reading = result.readingId();
    Verdict worst = reading == null ? null : standing.worst(result);
    String refusal = result.refusal();
    boolean unusable =
        result.state() == CaptureState.REFUSED || result.state() == CaptureState.FAILED;
    ToneMethod method = result.toneMethod();
    FigureName steady = Sentence.headline(standing.judged(result), result::figure);
    return new ResultItem(
        result.captureId().toString(),
        result.state().word(),
        reading == null ? "/captures/" + result.captureId() : "/readings/" + reading,
        result.fileName(),
        shortText(words, FigureName.DEVIATION, result),
        shortText(words, steady, result),
        reading == null ? "" : words.inText(steady),
        method == null ? "" : words.text("reading.item.tone." + method.word()),
        worst == null ? null : FigureRow.word(worst),
        Math.round(100 * result.progress()),
        unusable && refusal != null ? refusal : "");
  }

  private static String shortText(Wording words, FigureName name, CaptureResult result) {
    return result.figure(name).value() == null
        ? ""
        : words
            .numbers()
            .show(result.figure(name), name.unit(), Wording.signOf(name))
            .valueAndUnit();
  }
}
