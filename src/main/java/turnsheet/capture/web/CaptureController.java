package turnsheet.capture.web;

import jakarta.servlet.http.HttpServletResponse;
import jakarta.validation.Valid;
import java.io.IOException;
import java.util.UUID;
import org.jspecify.annotations.Nullable;
import org.springframework.core.io.Resource;
import org.springframework.http.ResponseEntity;
import org.springframework.stereotype.Controller;
import org.springframework.ui.Model;
import org.springframework.validation.BindingResult;
import org.springframework.web.bind.annotation.GetMapping;
import org.springframework.web.bind.annotation.ModelAttribute;
import org.springframework.web.bind.annotation.PathVariable;
import org.springframework.web.bind.annotation.PostMapping;
import org.springframework.web.bind.annotation.ResponseBody;
import turnsheet.capture.Capture;
import turnsheet.capture.CaptureId;
import turnsheet.capture.Corrections;
import turnsheet.capture.Intake;
import turnsheet.capture.Looked;
import turnsheet.capture.Previews;
import turnsheet.capture.Proposal;
import turnsheet.capture.Surroundings;
import turnsheet.web.RefusedRequestException;
import turnsheet.web.Times;

/** The page of one capture. */
@Controller
class CaptureController {

  private final Intake intake;
  private final Corrections corrections;
  private final CaptureDesk desk;
  private final Previews previews;
  private final Times times;

  CaptureController(
      Intake intake, Corrections corrections, CaptureDesk desk, Previews previews, Times times) {
    this.intake = intake;
    this.corrections = corrections;
    this.desk = desk;
    this.previews = previews;
    this.times = times;
  }

  @GetMapping("/captures/{id}")
  String page(@PathVariable UUID id, Model model) {
    return show(desk.capture(id), null, model);
  }

  /** Reads the file anew with what the form says, and shows what that gives. */
  @PostMapping("/captures/{id}/look")
  String look(
      @PathVariable UUID id,
      @ModelAttribute("wish") WishForm wish,
      BindingResult binding,
      Model model,
      HttpServletResponse response) {
    return act(
        id,
        wish,
        binding,
        model,
        response,
        () -> intake.lookAgain(new CaptureId(id), wish.options()));
  }

  @PostMapping("/captures/{id}/measure")
  String measure(
      @PathVariable UUID id,
      @ModelAttribute("wish") WishForm wish,
      BindingResult binding,
      Model model,
      HttpServletResponse response) {
    return act(
        id, wish, binding, model, response, () -> intake.confirm(new CaptureId(id), wish.wish()));
  }

  @PostMapping("/captures/{id}/tone-method")
  String nameMethod(@PathVariable UUID id, @Valid @ModelAttribute MethodForm said) {
    corrections.nameMethod(new CaptureId(id), said.method());
    return "redirect:/captures/" + id;
  }

  @GetMapping("/captures/{id}/progress")
  @ResponseBody
  ProgressDocument progress(@PathVariable UUID id) {
    return desk.progress(id);
  }

  @GetMapping("/captures/{id}/file")
  ResponseEntity<Resource> file(@PathVariable UUID id) throws IOException {
    return desk.file(id);
  }

  /** Does it and goes to the page; what cannot be done keeps the form and says why. */
  private String act(
      UUID id,
      WishForm wish,
      BindingResult binding,
      Model model,
      HttpServletResponse response,
      Runnable verb) {
    if (binding.hasErrors()) {
      model.addAttribute("badNumber", true);
    } else {
      try {
        verb.run();
        return "redirect:/captures/" + id;
      } catch (RefusedRequestException e) {
        model.addAttribute("problem", e.getMessage());
      }
    }
    response.setStatus(422);
    return show(desk.capture(id), binding.hasErrors() ? null : wish, model);
  }

  private String show(Capture capture, @Nullable WishForm typed, Model model) {
    Surroundings around = intake.surroundings(capture.key());
    Looked looked = capture.looked();
    Proposal proposal = looked == null ? null : intake.proposal(looked, around);
    PreviewDrawing drawing =
        looked == null || !desk.holds(capture)
            ? null
            : previews.of(capture.bytes(), looked).map(PreviewDrawing::of).orElse(null);
    WishForm form = typed == null ? WishForm.prefilled(capture, proposal) : typed;
    model.addAttribute("page", CapturePage.of(capture, around, proposal, drawing, form, times));
    model.addAttribute("fileMissing", !desk.holds(capture));
    model.addAttribute("progress", desk.progress(capture.id().value()));
    return "capture/capture";
  }
}
