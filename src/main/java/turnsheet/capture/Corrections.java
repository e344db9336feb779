package turnsheet.capture;

import org.jspecify.annotations.Nullable;
import org.springframework.stereotype.Service;
import turnsheet.shop.SpeedSettingId;
import turnsheet.web.NotFoundException;
import turnsheet.web.RefusedRequestException;

/** What the bench may put right about a capture that has come in. */
@Service
public class Corrections {

  private final Captures captures;
  private final Looker looker;
  private final Shelf shelf;

  Corrections(Captures captures, Looker looker, Shelf shelf) {
    this.captures = captures;
    this.looker = looker;
    this.shelf = shelf;
  }

  /**
   * Says at which setting and under which condition a recording was made, and looks at it again.
   *
   * @throws RefusedRequestException if the visit is closed, the setting foreign, or the capture is
   *     being measured or has been
   */
  public Capture place(CaptureId id, SpeedSettingId setting, String condition) {
    Capture capture = captures.find(id).orElseThrow(() -> new NotFoundException("capture"));
    CaptureKey key = capture.key().at(setting, condition);
    Surroundings around = shelf.of(key);
    around.requireOpen();
    if (!captures.place(id, setting, key.condition())) {
      throw Intake.busy();
    }
    Looked looked = capture.looked();
    if (looked != null
        && capture.state() == CaptureState.RECOGNISED
        && looker.holds(capture.bytes())) {
      captures.noted(id, looker.look(capture.bytes(), looked.options(), around));
    }
    return captures.find(id).orElseThrow();
  }

  /**
   * Corrects how the tone came onto what was played.
   *
   * @param method null where it is not known
   * @throws RefusedRequestException if the visit is closed, or the capture is not of a tone
   */
  public Capture nameMethod(CaptureId id, @Nullable ToneMethod method) {
    Capture capture = captures.find(id).orElseThrow(() -> new NotFoundException("capture"));
    shelf.of(capture.key()).requireOpen();
    if (method != null && !capture.mayBeTone()) {
      throw new RefusedRequestException(
          "notATone", "Only a played tone was recorded here or elsewhere: this is none.");
    }
    captures.name(id, method);
    return captures.find(id).orElseThrow();
  }

  /**
   * Takes a capture away that was brought by mistake. Its bytes stay in the store, where another
   * capture may share them.
   *
   * @throws RefusedRequestException if the visit is closed, or the capture is being measured or has
   *     been: what a reading was made of stays
   */
  public void remove(CaptureId id) {
    Capture capture = captures.find(id).orElseThrow(() -> new NotFoundException("capture"));
    shelf.of(capture.key()).requireOpen();
    if (!captures.remove(id)) {
      throw new RefusedRequestException(
          "measured", "This capture is being measured or has been: what was measured stays.");
    }
  }
}
