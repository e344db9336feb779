package turnsheet.bench.web;

import jakarta.servlet.http.HttpServletResponse;
import jakarta.validation.Valid;
import java.io.IOException;
import java.io.InputStream;
import java.util.List;
import java.util.Locale;
import java.util.Optional;
import java.util.UUID;
import org.jspecify.annotations.Nullable;
import org.springframework.context.MessageSource;
import org.springframework.http.MediaType;
import org.springframework.stereotype.Controller;
import org.springframework.ui.Model;
import org.springframework.validation.BindingResult;
import org.springframework.web.bind.annotation.GetMapping;
import org.springframework.web.bind.annotation.ModelAttribute;
import org.springframework.web.bind.annotation.PathVariable;
import org.springframework.web.bind.annotation.PostMapping;
import org.springframework.web.bind.annotation.RequestParam;
import org.springframework.web.multipart.MultipartFile;
import org.springframework.web.servlet.mvc.support.RedirectAttributes;
import turnsheet.bench.ClockCheck;
import turnsheet.bench.ClockQuestion;
import turnsheet.bench.KeptFile;
import turnsheet.core.measure.CaptureKind;
import turnsheet.reading.Floors;
import turnsheet.shop.BenchInstrument;
import turnsheet.web.RefusedRequestException;
import turnsheet.web.Times;
import turnsheet.web.Wording;

/** The page of a bench instrument, and checking its clock. */
@Controller
class ClockPages {

  private static final String FORM_PAGE = "bench/clock-form";

  /** A list of edges tells of itself that it is one. */
  private static final List<String> KINDS =
      List.of(CaptureKind.TONE.name(), CaptureKind.TACHOMETER.name());

  private final ClockDesk desk;
  private final Floors floors;
  private final MessageSource messages;
  private final Times times;

  ClockPages(ClockDesk desk, Floors floors, MessageSource messages, Times times) {
    this.desk = desk;
    this.floors = floors;
    this.messages = messages;
    this.times = times;
  }

  @GetMapping("/instruments/{id}")
  String instrument(@PathVariable UUID id, Locale locale, Model model) {
    BenchInstrument instrument = desk.instrument(id);
    Wording words = new Wording(messages, locale);
    model.addAttribute(
        "page",
        InstrumentPage.of(
            instrument,
            desk.checks(instrument),
            FloorMonth.of(floors.ofInstrument(instrument.id()), times),
            words,
            times));
    return "bench/instrument";
  }

  @GetMapping("/instruments/{id}/clock-checks/new")
  String blank(@PathVariable UUID id, Model model) {
    model.addAttribute("form", ClockForm.EMPTY);
    return form(desk.instrument(id), model);
  }

  /** Stores the file first: whatever else is wrong with the form, it need not be sent again. */
  @PostMapping(
      path = "/instruments/{id}/clock-checks/new",
      consumes = MediaType.MULTIPART_FORM_DATA_VALUE)
  String check(
      @PathVariable UUID id,
      @Valid @ModelAttribute("form") ClockForm form,
      BindingResult errors,
      @RequestParam(name = "file", required = false) @Nullable MultipartFile file,
      Model model,
      HttpServletResponse response)
      throws IOException {
    BenchInstrument instrument = desk.instrument(id);
    try {
      KeptFile kept = kept(form, file);
      if (kept == null) {
        errors.rejectValue("heldName", "bench.form.fileMissing");
      } else {
        model.addAttribute("held", kept);
      }
      Optional<ClockQuestion> question = form.question(errors);
      if (kept != null && question.isPresent()) {
        ClockCheck made = desk.check(instrument, question.get(), kept);
        return "redirect:/instruments/" + id + "/clock-checks/" + made.id();
      }
    } catch (RefusedRequestException e) {
      model.addAttribute("problem", e.getMessage());
      response.setStatus(422);
    }
    return form(instrument, model);
  }

  @GetMapping("/instruments/{id}/clock-checks/{check}")
  String found(@PathVariable UUID id, @PathVariable UUID check, Locale locale, Model model) {
    BenchInstrument instrument = desk.instrument(id);
    Wording words = new Wording(messages, locale);
    model.addAttribute("page", ClockPage.of(instrument, desk.check(id, check), words, times));
    return "bench/clock-check";
  }

  @PostMapping("/instruments/{id}/clock-checks/{check}/take")
  String take(@PathVariable UUID id, @PathVariable UUID check, RedirectAttributes flash) {
    desk.take(id, check);
    flash.addFlashAttribute("done", "bench.instrument.taken");
    return "redirect:/instruments/" + id;
  }

  private String form(BenchInstrument instrument, Model model) {
    model.addAttribute("id", instrument.id().toString());
    model.addAttribute("name", instrument.name());
    model.addAttribute("kinds", KINDS);
    return FORM_PAGE;
  }

  private @Nullable KeptFile kept(ClockForm form, @Nullable MultipartFile file) throws IOException {
    String name = file == null ? null : file.getOriginalFilename();
    if (file == null || name == null || name.isEmpty()) {
      KeptFile held = form.held();
      return held != null && desk.isKept(held) ? held : null;
    }
    try (InputStream in = file.getInputStream()) {
      return desk.keep(name, in);
    }
  }
}
