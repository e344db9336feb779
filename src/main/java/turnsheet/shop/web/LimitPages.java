package turnsheet.shop.web;

import jakarta.validation.Valid;
import java.util.UUID;
import org.springframework.context.MessageSource;
import org.springframework.context.i18n.LocaleContextHolder;
import org.springframework.stereotype.Controller;
import org.springframework.ui.Model;
import org.springframework.validation.BindingResult;
import org.springframework.web.bind.annotation.GetMapping;
import org.springframework.web.bind.annotation.ModelAttribute;
import org.springframework.web.bind.annotation.PathVariable;
import org.springframework.web.bind.annotation.PostMapping;
import turnsheet.core.measure.FigureName;
import turnsheet.shop.MachineModel;
import turnsheet.shop.ServiceLimit;
import turnsheet.shop.SpeedSettingId;
import turnsheet.web.NotFoundException;

/** The service limits of a machine model: adding, changing, taking away. */
@Controller
class LimitPages {

  private static final String FORM_PAGE = "shop/limit-form";

  private final ModelScreen screen;
  private final ModelChange change;
  private final MessageSource messages;

  LimitPages(ModelScreen screen, ModelChange change, MessageSource messages) {
    this.screen = screen;
    this.change = change;
    this.messages = messages;
  }

  @PostMapping("/models/{id}/limits")
  String add(
      @PathVariable UUID id,
      @Valid @ModelAttribute("limitForm") LimitForm form,
      BindingResult errors,
      Model model) {
    boolean done =
        form.limit(screen.model(id), errors)
            .map(l -> change.done(id, m -> m.withLimit(l), errors, "figure"))
            .orElse(false);
    return done ? back(id) : screen.show(id, model, "limits");
  }

  @GetMapping("/models/{id}/limits/{settingId}/{figure}")
  String edit(
      @PathVariable UUID id,
      @PathVariable UUID settingId,
      @PathVariable FigureName figure,
      Model model) {
    MachineModel of = screen.model(id);
    model.addAttribute("limitForm", LimitForm.of(limit(of, settingId, figure)));
    return form(of, settingId, figure, model);
  }

  @PostMapping("/models/{id}/limits/{settingId}/{figure}")
  String change(
      @PathVariable UUID id,
      @PathVariable UUID settingId,
      @PathVariable("figure") FigureName bounded,
      @Valid @ModelAttribute("limitForm") LimitForm form,
      BindingResult errors,
      Model model) {
    MachineModel of = screen.model(id);
    ServiceLimit old = limit(of, settingId, bounded);
    boolean done =
        form.limit(of, errors)
            .map(l -> change.done(id, m -> m.changeLimit(old, l), errors, "figure"))
            .orElse(false);
    return done ? back(id) : form(of, settingId, bounded, model);
  }

  @GetMapping("/models/{id}/limits/{settingId}/{figure}/remove")
  String askRemoval(
      @PathVariable UUID id,
      @PathVariable UUID settingId,
      @PathVariable FigureName figure,
      Model model) {
    MachineModel of = screen.model(id);
    ServiceLimit limit = limit(of, settingId, figure);
    model.addAttribute("what", "limit");
    model.addAttribute(
        "name",
        messages.getMessage("figure." + figure.path(), null, LocaleContextHolder.getLocale())
            + ", "
            + of.setting(limit.settingId()).orElseThrow().label());
    model.addAttribute("model", of.name());
    model.addAttribute("back", "/models/" + id);
    model.addAttribute("address", address(id, settingId, figure) + "/remove");
    return "shop/remove";
  }

  @PostMapping("/models/{id}/limits/{settingId}/{figure}/remove")
  String remove(
      @PathVariable UUID id, @PathVariable UUID settingId, @PathVariable FigureName figure) {
    change.orAnswer(id, m -> m.withoutLimit(limit(m, settingId, figure)));
    return back(id);
  }

  private String form(MachineModel of, UUID settingId, FigureName figure, Model model) {
    screen.addChoices(of, model);
    model.addAttribute("address", address(of.id().value(), settingId, figure));
    return FORM_PAGE;
  }

  private static ServiceLimit limit(MachineModel model, UUID settingId, FigureName figure) {
    return model.limitsAt(new SpeedSettingId(settingId)).stream()
        .filter(l -> l.figure() == figure)
        .findFirst()
        .orElseThrow(() -> new NotFoundException("service limit"));
  }

  private static String address(UUID id, UUID settingId, FigureName figure) {
    return "/models/" + id + "/limits/" + settingId + "/" + figure.name();
  }

  private static String back(UUID id) {
    return "redirect:/models/" + id;
  }
}
