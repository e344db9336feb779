package turnsheet.evidence.web;

import java.util.UUID;
import org.jspecify.annotations.Nullable;
import org.springframework.stereotype.Controller;
import org.springframework.web.bind.annotation.PathVariable;
import org.springframework.web.bind.annotation.PostMapping;
import org.springframework.web.bind.annotation.RequestParam;
import turnsheet.capture.Capture;
import turnsheet.capture.CaptureChoices;
import turnsheet.capture.CaptureId;
import turnsheet.capture.Captures;
import turnsheet.capture.Intake;
import turnsheet.capture.Wish;
import turnsheet.core.measure.MeasureSettings;
import turnsheet.web.NotFoundException;
import turnsheet.web.RefusedRequestException;

/** Takes the pulses per turn that the model does not know. */
@Controller
class WheelController {

  private final Captures captures;
  private final Intake intake;

  WheelController(Captures captures, Intake intake) {
    this.captures = captures;
    this.intake = intake;
  }

  /** Measures again with that number, all else as before; the capture's page shows how it goes. */
  @PostMapping("/captures/{id}/evidence/teeth")
  String teeth(@PathVariable UUID id, @RequestParam(required = false) @Nullable Integer teeth) {
    CaptureId captureId = new CaptureId(id);
    Capture capture = captures.find(captureId).orElseThrow(() -> new NotFoundException("capture"));
    CaptureChoices before = capture.choices();
    if (before == null || teeth == null) {
      throw new RefusedRequestException(
          "teeth", "State the pulses per turn as a whole number from 1 to 100000, or none.");
    }
    MeasureSettings settings = before.settings();
    intake.confirm(
        captureId,
        new Wish(
            settings.kind(),
            settings.nominalHz(),
            settings.searchPercent(),
            teeth,
            before.options()));
    return "redirect:/captures/" + id;
  }
}
