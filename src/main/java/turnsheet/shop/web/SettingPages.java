package turnsheet.shop.web;

import jakarta.validation.Valid;
import java.util.Optional;
import java.util.UUID;
import org.springframework.stereotype.Controller;
import org.springframework.ui.Model;
import org.springframework.validation.BindingResult;
import org.springframework.web.bind.annotation.GetMapping;
import org.springframework.web.bind.annotation.ModelAttribute;
import org.springframework.web.bind.annotation.PathVariable;
import org.springframework.web.bind.annotation.PostMapping;
import turnsheet.access.ShopPreferences;
import turnsheet.shop.MachineModel;
import turnsheet.shop.SpeedSetting;
import turnsheet.shop.SpeedSettingId;
import turnsheet.web.NotFoundException;

/** The speed settings of a machine model: adding, changing, taking away. */
@Controller
class SettingPages {

  private static final String FORM_PAGE = "shop/setting-form";

  private final ModelScreen screen;
  private final ModelChange change;
  private final ShopPreferences preferences;

  SettingPages(ModelScreen screen, ModelChange change, ShopPreferences preferences) {
    this.preferences = preferences;
    this.screen = screen;
    this.change = change;
  }

  @PostMapping("/models/{id}/settings")
  String add(
      @PathVariable UUID id,
      @Valid @ModelAttribute("settingForm") SettingForm form,
      BindingResult errors,
      Model model) {
    return written(id, form.setting(SpeedSettingId.next(), errors), errors)
        ? back(id)
        : screen.show(id, model, "settings");
  }

  @GetMapping("/models/{id}/settings/{settingId}")
  String edit(@PathVariable UUID id, @PathVariable UUID settingId, Model model) {
    MachineModel of = screen.model(id);
    model.addAttribute(
        "settingForm", SettingForm.of(setting(of, settingId), preferences.get().speeds()));
    return form(of, settingId, model);
  }

  @PostMapping("/models/{id}/settings/{settingId}")
  String change(
      @PathVariable UUID id,
      @PathVariable UUID settingId,
      @Valid @ModelAttribute("settingForm") SettingForm form,
      BindingResult errors,
      Model model) {
    MachineModel of = screen.model(id);
    SpeedSetting old = setting(of, settingId);
    return written(id, form.setting(old, errors), errors) ? back(id) : form(of, settingId, model);
  }

  @GetMapping("/models/{id}/settings/{settingId}/remove")
  String askRemoval(@PathVariable UUID id, @PathVariable UUID settingId, Model model) {
    MachineModel of = screen.model(id);
    SpeedSetting setting = setting(of, settingId);
    model.addAttribute("what", "setting");
    model.addAttribute("name", setting.label());
    model.addAttribute("limits", of.limitsAt(setting.id()).size());
    model.addAttribute("model", of.name());
    model.addAttribute("back", "/models/" + id);
    model.addAttribute("address", "/models/" + id + "/settings/" + settingId + "/remove");
    return "shop/remove";
  }

  @PostMapping("/models/{id}/settings/{settingId}/remove")
  String remove(@PathVariable UUID id, @PathVariable UUID settingId) {
    change.orAnswer(id, m -> m.withoutSetting(new SpeedSettingId(settingId)));
    return back(id);
  }

  private boolean written(UUID id, Optional<SpeedSetting> typed, BindingResult errors) {
    return typed.map(s -> change.done(id, m -> m.withSetting(s), errors, "label")).orElse(false);
  }

  private String form(MachineModel of, UUID settingId, Model model) {
    screen.addChoices(of, model);
    model.addAttribute("settingId", settingId.toString());
    return FORM_PAGE;
  }

  private static SpeedSetting setting(MachineModel model, UUID settingId) {
    return model
        .setting(new SpeedSettingId(settingId))
        .orElseThrow(() -> new NotFoundException("speed setting"));
  }

  private static String back(UUID id) {
    return "redirect:/models/" + id;
  }
}
