package turnsheet.evidence.web;

import java.util.Locale;
import java.util.UUID;
import org.jspecify.annotations.Nullable;
import org.springframework.stereotype.Controller;
import org.springframework.ui.Model;
import org.springframework.web.bind.annotation.GetMapping;
import org.springframework.web.bind.annotation.PathVariable;
import org.springframework.web.bind.annotation.PostMapping;
import org.springframework.web.bind.annotation.RequestParam;
import org.springframework.web.bind.annotation.ResponseBody;
import turnsheet.capture.CaptureId;
import turnsheet.capture.Captures;
import turnsheet.evidence.Evidence;
import turnsheet.web.NotFoundException;

/** The page of what a closer look at a capture showed. */
@Controller
class EvidenceController {

  private final Captures captures;
  private final Evidence evidence;
  private final EvidenceView pages;

  EvidenceController(Captures captures, Evidence evidence, EvidenceView pages) {
    this.captures = captures;
    this.evidence = evidence;
    this.pages = pages;
  }

  /**
   * The page.
   *
   * @param said whether the visitor says what the motor is; else the model does
   */
  @GetMapping("/captures/{id}/evidence")
  String page(
      @PathVariable UUID id,
      @RequestParam(required = false) @Nullable Integer channel,
      @RequestParam(defaultValue = "false") boolean said,
      @RequestParam(defaultValue = "false") boolean synchronous,
      Locale locale,
      Model model) {
    model.addAttribute(
        "page",
        captures
            .find(new CaptureId(id))
            .flatMap(capture -> pages.find(capture, channel, said ? synchronous : null, locale))
            .orElseThrow(() -> new NotFoundException("reading")));
    return "evidence/evidence";
  }

  @PostMapping("/captures/{id}/evidence")
  String look(@PathVariable UUID id, @RequestParam(required = false) @Nullable Integer channel) {
    evidence.look(new CaptureId(id));
    return "redirect:/captures/"
        + id
        + "/evidence"
        + (channel == null ? "" : "?channel=" + channel);
  }

  @GetMapping("/captures/{id}/evidence/progress")
  @ResponseBody
  LookDocument progress(@PathVariable UUID id) {
    return LookDocument.of(evidence.job(new CaptureId(id)).orElse(null));
  }
}
