package turnsheet.capture.web;

import java.util.UUID;
import org.jspecify.annotations.Nullable;
import org.springframework.stereotype.Controller;
import org.springframework.web.bind.annotation.PathVariable;
import org.springframework.web.bind.annotation.PostMapping;
import org.springframework.web.bind.annotation.RequestParam;
import turnsheet.access.AuditTrail;
import turnsheet.access.CurrentUser;
import turnsheet.capture.Capture;
import turnsheet.capture.CaptureId;
import turnsheet.capture.LeftOut;
import turnsheet.web.PlainText;
import turnsheet.web.RefusedRequestException;

/** Leaving a capture out of sheets and reports; the capture's page asks {@code @leavingOut}. */
@Controller("leavingOut")
class LeftOutController {

  private final CaptureDesk desk;
  private final LeftOut leftOut;
  private final CurrentUser user;
  private final AuditTrail audit;

  LeftOutController(CaptureDesk desk, LeftOut leftOut, CurrentUser user, AuditTrail audit) {
    this.desk = desk;
    this.leftOut = leftOut;
    this.user = user;
    this.audit = audit;
  }

  /** Why the capture is left out; null where it is not. */
  public @Nullable String reason(String id) {
    return leftOut.reason(new CaptureId(UUID.fromString(id))).orElse(null);
  }

  @PostMapping("/captures/{id}/leave-out")
  String leave(@PathVariable UUID id, @RequestParam String reason) {
    Capture capture = desk.capture(id);
    String why = PlainText.typed(reason);
    if (why.isEmpty() || why.length() > LeftOut.REASON_LENGTH) {
      throw new RefusedRequestException(
          "leaveOutReason",
          "Say in at most 300 characters why the recording is left out: the sheet names it.");
    }
    leftOut.leave(capture.id(), why, user.signInName());
    audit.record("capture.audit.leftOut", capture.fileName() + ": " + why);
    return "redirect:/captures/" + id;
  }

  @PostMapping("/captures/{id}/take-in")
  String takeIn(@PathVariable UUID id) {
    Capture capture = desk.capture(id);
    leftOut.takeIn(capture.id());
    audit.record("capture.audit.takenIn", capture.fileName());
    return "redirect:/captures/" + id;
  }
}
