package turnsheet.shop.web;

import jakarta.validation.Valid;
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
import turnsheet.shop.MachineModel;
import turnsheet.shop.MachineModels;
import turnsheet.shop.ModelId;
import turnsheet.shop.PageQuery;
import turnsheet.shop.RefusedChangeException;

/** The list of machine models, and the head of each. */
@Controller
class ModelPages {

  private static final int ROWS = 50;
  private static final String FORM_PAGE = "shop/model-form";

  private final MachineModels models;
  private final ModelScreen screen;
  private final Refusals refusals;

  ModelPages(MachineModels models, ModelScreen screen, Refusals refusals) {
    this.models = models;
    this.screen = screen;
    this.refusals = refusals;
  }

  @GetMapping("/models")
  String list(
      @RequestParam(defaultValue = "") String q,
      @RequestParam(defaultValue = "1") int page,
      Model model) {
    model.addAttribute("q", q);
    model.addAttribute("page", models.page(new PageQuery(q, page, ROWS)));
    return "shop/models";
  }

  @GetMapping("/models/new")
  String blank(Model model) {
    model.addAttribute("form", ModelForm.EMPTY);
    return FORM_PAGE;
  }

  @PostMapping("/models/new")
  String add(@Valid @ModelAttribute("form") ModelForm form, BindingResult errors) {
    Integer pulses = Typed.countOrNone(errors, "pulsesPerTurn", form.pulsesPerTurn());
    if (!errors.hasErrors()) {
      try {
        MachineModel added = MachineModel.named(form.name(), pulses, form.note());
        return "redirect:/models/" + models.add(added).id();
      } catch (RefusedChangeException e) {
        refusals.show(e, errors, "name");
      }
    }
    return FORM_PAGE;
  }

  @GetMapping("/models/{id}")
  String show(@PathVariable UUID id, Model model) {
    return screen.show(id, model, "");
  }

  @GetMapping("/models/{id}/edit")
  String edit(@PathVariable UUID id, Model model) {
    model.addAttribute("form", ModelForm.of(screen.model(id)));
    model.addAttribute("id", id.toString());
    return FORM_PAGE;
  }

  @PostMapping("/models/{id}/edit")
  String change(
      @PathVariable UUID id,
      @Valid @ModelAttribute("form") ModelForm form,
      BindingResult errors,
      Model model) {
    model.addAttribute("id", screen.model(id).id().toString());
    Integer pulses = Typed.countOrNone(errors, "pulsesPerTurn", form.pulsesPerTurn());
    return !errors.hasErrors() && describe(id, form, pulses, errors)
        ? "redirect:/models/" + id
        : FORM_PAGE;
  }

  private boolean describe(
      UUID id, ModelForm form, @Nullable Integer pulses, BindingResult errors) {
    try {
      models.change(new ModelId(id), m -> m.describe(form.name(), pulses, form.note()));
      return true;
    } catch (RefusedChangeException e) {
      refusals.show(e, errors, "name");
      return false;
    }
  }
}
