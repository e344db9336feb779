package turnsheet.access.web;

import jakarta.validation.Valid;
import jakarta.validation.constraints.NotNull;
import jakarta.validation.constraints.Pattern;
import java.util.Locale;
import org.springframework.http.CacheControl;
import org.springframework.http.MediaType;
import org.springframework.http.ResponseEntity;
import org.springframework.stereotype.Controller;
import org.springframework.ui.Model;
import org.springframework.web.bind.annotation.GetMapping;
import org.springframework.web.bind.annotation.ModelAttribute;
import org.springframework.web.bind.annotation.PostMapping;
import org.springframework.web.servlet.mvc.support.RedirectAttributes;
import turnsheet.access.AuditTrail;
import turnsheet.access.ShopLanguage;
import turnsheet.access.ShopPreferences;
import turnsheet.access.ShopPreferences.Liked;
import turnsheet.access.ShopPreferences.Paper;
import turnsheet.access.ShopPreferences.SpeedLiking;
import turnsheet.web.PageLanguage;

/** How the shop likes to see things, and the paper that print follows. */
@Controller
class PreferencesController {

  static final String PATH = "/shop/preferences";

  /** The choices as sent. */
  record PreferencesForm(
      @NotNull SpeedLiking speeds,
      @NotNull @Pattern(regexp = "50|60") String mains,
      @NotNull Paper paper,
      @NotNull @Pattern(regexp = "en|de") String language) {

    static PreferencesForm of(Liked liked, Locale language) {
      return new PreferencesForm(
          liked.speeds(), Integer.toString(liked.mainsHz()), liked.paper(), language.getLanguage());
    }

    /** As the audit trail keeps it, whatever language it is read in later. */
    String inWords() {
      return String.join(
          ", ",
          speeds == SpeedLiking.CM_PER_S ? "cm/s" : "in/s",
          mains + " Hz",
          paper.css(),
          language);
    }

    Liked liked() {
      return new Liked(speeds, Integer.parseInt(mains), paper);
    }
  }

  private final ShopPreferences preferences;
  private final ShopLanguage language;
  private final AuditTrail audit;

  PreferencesController(ShopPreferences preferences, ShopLanguage language, AuditTrail audit) {
    this.preferences = preferences;
    this.language = language;
    this.audit = audit;
  }

  @GetMapping(PATH)
  String show(Model model, Locale locale) {
    model.addAttribute(
        "form", PreferencesForm.of(preferences.get(), language.get().orElse(locale)));
    model.addAttribute("speedChoices", SpeedLiking.values());
    model.addAttribute("papers", Paper.values());
    return "access/preferences";
  }

  @PostMapping(PATH)
  String change(@Valid @ModelAttribute("form") PreferencesForm form, RedirectAttributes flash) {
    preferences.put(form.liked());
    language.put(PageLanguage.of(form.language()));
    audit.record("access.audit.preferencesChanged", form.inWords());
    flash.addFlashAttribute("done", "access.preferences.saved");
    return "redirect:" + ShopController.PATH;
  }

  /** The content policy forbids style within pages, so the paper comes as a sheet of its own. */
  @GetMapping("/css/paper.css")
  ResponseEntity<String> paper() {
    return ResponseEntity.ok()
        .contentType(new MediaType("text", "css"))
        .cacheControl(CacheControl.noCache())
        .body("@page { size: " + preferences.get().paper().css() + "; }\n");
  }
}
