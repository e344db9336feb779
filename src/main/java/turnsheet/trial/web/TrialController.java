package turnsheet.trial.web;

import jakarta.servlet.http.HttpServletResponse;
import java.util.List;
import java.util.Locale;
import java.util.Optional;
import java.util.UUID;
import org.jspecify.annotations.Nullable;
import org.springframework.stereotype.Controller;
import org.springframework.ui.Model;
import org.springframework.validation.BindingResult;
import org.springframework.web.bind.annotation.GetMapping;
import org.springframework.web.bind.annotation.ModelAttribute;
import org.springframework.web.bind.annotation.PathVariable;
import org.springframework.web.bind.annotation.PostMapping;
import org.springframework.web.bind.annotation.RequestParam;
import org.springframework.web.bind.annotation.ResponseBody;
import turnsheet.capture.Capture;
import turnsheet.capture.CaptureId;
import turnsheet.core.diagnose.filter.ESeries;
import turnsheet.core.diagnose.filter.FilterFamily;
import turnsheet.core.diagnose.filter.FilterKind;
import turnsheet.trial.KeptTrial;
import turnsheet.trial.TrialDesk;
import turnsheet.trial.TrialId;
import turnsheet.trial.TrialOrder;
import turnsheet.web.RefusedRequestException;

/** The pages of trials. */
@Controller
class TrialController {

  private final TrialDesk desk;
  private final TrialView pages;

  TrialController(TrialDesk desk, TrialView pages) {
    this.desk = desk;
    this.pages = pages;
  }

  @GetMapping("/captures/{id}/trials")
  String overview(@PathVariable UUID id, Locale locale, Model model) {
    Capture capture = desk.capture(new CaptureId(id));
    model.addAttribute("form", TrialForm.of(desk.proposal(capture)));
    return overview(capture, locale, model);
  }

  @PostMapping("/captures/{id}/trials")
  String order(
      @PathVariable UUID id,
      @ModelAttribute("form") TrialForm form,
      BindingResult errors,
      Locale locale,
      Model model,
      HttpServletResponse response) {
    Capture capture = desk.capture(new CaptureId(id));
    Optional<TrialOrder> order = form.order(errors);
    if (order.isPresent()) {
      try {
        return "redirect:/trials/" + desk.order(capture.id(), order.get());
      } catch (RefusedRequestException e) {
        model.addAttribute("problem", e.getMessage());
      }
    }
    response.setStatus(422);
    return overview(capture, locale, model);
  }

  private String overview(Capture capture, Locale locale, Model model) {
    model.addAttribute("page", pages.overview(capture, locale));
    model.addAttribute("kinds", List.of(FilterKind.values()));
    model.addAttribute("families", List.of(FilterFamily.values()));
    model.addAttribute("poles", TrialForm.POLES);
    model.addAttribute("series", List.of(ESeries.values()));
    model.addAttribute("capacitors", TrialForm.CAPACITORS);
    return "trial/trials";
  }

  @GetMapping("/trials/{id}")
  String trial(
      @PathVariable UUID id,
      @RequestParam(required = false) @Nullable Integer candidate,
      Locale locale,
      Model model) {
    model.addAttribute("page", pages.page(find(id), candidate, locale));
    return "trial/trial";
  }

  @GetMapping("/trials/{id}/progress")
  @ResponseBody
  TrialDocument.Standing progress(@PathVariable UUID id) {
    return TrialDocument.Standing.of(desk.job(find(id)));
  }

  @PostMapping("/trials/{id}/cancel")
  String cancel(@PathVariable UUID id) {
    desk.cancel(new TrialId(id));
    return "redirect:/trials/" + id;
  }

  @GetMapping("/trials/{id}/remove")
  String askToRemove(@PathVariable UUID id, Locale locale, Model model) {
    model.addAttribute("page", pages.page(find(id), null, locale));
    return "trial/remove";
  }

  @PostMapping("/trials/{id}/remove")
  String remove(@PathVariable UUID id) {
    KeptTrial trial = find(id);
    desk.remove(trial.id());
    return "redirect:/captures/" + trial.capture() + "/trials";
  }

  private KeptTrial find(UUID id) {
    return desk.find(new TrialId(id));
  }
}
