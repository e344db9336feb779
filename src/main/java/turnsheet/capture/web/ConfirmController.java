package turnsheet.capture.web;

import jakarta.validation.Valid;
import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.UUID;
import org.jspecify.annotations.Nullable;
import org.springframework.context.i18n.LocaleContextHolder;
import org.springframework.stereotype.Controller;
import org.springframework.ui.Model;
import org.springframework.web.bind.annotation.GetMapping;
import org.springframework.web.bind.annotation.ModelAttribute;
import org.springframework.web.bind.annotation.PathVariable;
import org.springframework.web.bind.annotation.PostMapping;
import org.springframework.web.bind.annotation.RequestParam;
import org.springframework.web.servlet.mvc.support.RedirectAttributes;
import turnsheet.capture.Capture;
import turnsheet.capture.CaptureId;
import turnsheet.capture.CaptureKey;
import turnsheet.capture.CaptureState;
import turnsheet.capture.Captures;
import turnsheet.capture.Corrections;
import turnsheet.capture.Intake;
import turnsheet.capture.Looked;
import turnsheet.capture.SettingFit;
import turnsheet.capture.Wish;
import turnsheet.core.format.api.ReadOptions;
import turnsheet.shop.SpeedSettingId;
import turnsheet.shop.VisitId;
import turnsheet.web.CoreWords;
import turnsheet.web.RefusedRequestException;

/** Confirms what was proposed for the recordings of a visit, and puts single ones right. */
@Controller
class ConfirmController {

  private final Captures captures;
  private final Corrections corrections;
  private final Intake intake;
  private final CaptureDesk desk;

  ConfirmController(Captures captures, Corrections corrections, Intake intake, CaptureDesk desk) {
    this.captures = captures;
    this.corrections = corrections;
    this.intake = intake;
    this.desk = desk;
  }

  /**
   * Takes each recording that waits on the visit as its line of the form says, and orders its
   * measurement. What cannot be ordered stays, and a sentence says why.
   *
   * @param only the capture whose own button was pressed; absent for all
   * @param fields {@code setting-ID} and {@code condition-ID} of each line
   */
  @PostMapping("/visits/{visit}/captures/confirm")
  String confirm(
      @PathVariable UUID visit,
      @RequestParam(required = false) @Nullable UUID only,
      @RequestParam Map<String, String> fields,
      RedirectAttributes flash) {
    List<String> troubles = new ArrayList<>();
    for (Capture capture : captures.ofVisit(new VisitId(visit))) {
      String id = capture.id().toString();
      boolean meant =
          only == null ? fields.containsKey("setting-" + id) : id.equals(only.toString());
      if (meant && capture.state() == CaptureState.RECOGNISED) {
        try {
          confirm(
              capture,
              fields.getOrDefault("setting-" + id, ""),
              fields.getOrDefault("condition-" + id, ""));
        } catch (RefusedRequestException e) {
          String sentence = String.valueOf(e.getMessage());
          troubles.add(
              capture.fileName() + ": " + CoreWords.in(LocaleContextHolder.getLocale(), sentence));
        }
      }
    }
    if (!troubles.isEmpty()) {
      flash.addFlashAttribute("troubles", troubles);
    }
    return "redirect:/visits/" + visit;
  }

  /** Corrects one capture from its own page. */
  @PostMapping("/captures/{id}/place")
  String place(@PathVariable UUID id, @Valid @ModelAttribute PlaceForm said) {
    corrections.place(
        new CaptureId(id), new SpeedSettingId(said.speedSettingId()), said.condition());
    return "redirect:/captures/" + desk.capture(id).id();
  }

  @GetMapping("/captures/{id}/remove")
  String askRemoval(@PathVariable UUID id, Model model) {
    Capture capture = desk.capture(id);
    model.addAttribute("id", id);
    model.addAttribute("visit", capture.key().visit().value());
    model.addAttribute("fileName", capture.fileName());
    return "capture/remove";
  }

  @PostMapping("/captures/{id}/remove")
  String remove(@PathVariable UUID id) {
    Capture capture = desk.capture(id);
    corrections.remove(capture.id());
    return "redirect:/visits/" + capture.key().visit();
  }

  private void confirm(Capture capture, String setting, String condition) {
    CaptureKey said =
        new CaptureKey(
            capture.key().visit(),
            setting.isEmpty() ? capture.key().setting() : settingId(setting),
            condition.isBlank() || condition.length() > CaptureKey.CONDITION_LENGTH
                ? capture.key().condition()
                : condition,
            null,
            null);
    SettingFit fit = capture.fit();
    if (setting.isEmpty() && fit != null && !fit.isProposal()) {
      throw new RefusedRequestException(
          "settingUnsaid", "Choose the speed setting that it was recorded at.");
    }
    boolean same =
        said.setting().equals(capture.key().setting())
            && said.condition().equals(capture.key().condition());
    boolean chosen = !setting.isEmpty() && capture.fit() != null;
    if (!same || chosen) {
      corrections.place(capture.id(), said.setting(), said.condition());
    }
    Looked looked = capture.looked();
    ReadOptions read = looked == null ? ReadOptions.none() : looked.options();
    intake.confirm(capture.id(), new Wish(null, null, null, null, read));
  }

  private static SpeedSettingId settingId(String typed) {
    try {
      return new SpeedSettingId(UUID.fromString(typed));
    } catch (IllegalArgumentException e) {
      throw new RefusedRequestException("setting", "Choose a speed setting of the unit's model.");
    }
  }
}
