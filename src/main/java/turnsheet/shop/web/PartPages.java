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
import turnsheet.core.diagnose.parts.PartKind;
import turnsheet.shop.MachineModel;
import turnsheet.shop.RotatingPart;
import turnsheet.web.NotFoundException;

/**
 * The rotating parts of a machine model: adding, changing, taking away. A part is known by its
 * name, which may hold any sign and therefore travels as a parameter.
 */
@Controller
class PartPages {

  private static final String FORM_PAGE = "shop/part-form";

  private final ModelScreen screen;
  private final ModelChange change;

  PartPages(ModelScreen screen, ModelChange change) {
    this.screen = screen;
    this.change = change;
  }

  /** The fields of the kind chosen; a kind that nobody has is that of other parts. */
  @GetMapping("/models/{id}/parts/new")
  String start(@PathVariable UUID id, @RequestParam(defaultValue = "") String kind, Model model) {
    MachineModel of = screen.model(id);
    PartKind chosen = PartForm.kind(kind).orElse(PartKind.OTHER);
    model.addAttribute("partForm", PartForm.empty(chosen));
    return form(of, null, chosen, model);
  }

  @PostMapping("/models/{id}/parts")
  String add(
      @PathVariable UUID id,
      @Valid @ModelAttribute("partForm") PartForm form,
      BindingResult errors,
      Model model) {
    MachineModel of = screen.model(id);
    boolean done =
        form.part(errors)
            .map(p -> change.done(id, m -> m.withPart(p), errors, "part"))
            .orElse(false);
    return done ? back(id) : form(of, null, form.kindChosen(), model);
  }

  @GetMapping("/models/{id}/parts/edit")
  String edit(
      @PathVariable UUID id,
      @RequestParam String name,
      @RequestParam(defaultValue = "") String kind,
      Model model) {
    MachineModel of = screen.model(id);
    PartForm as = PartForm.of(part(of, name));
    PartForm shown = PartForm.kind(kind).filter(k -> k != as.kindChosen()).map(as::as).orElse(as);
    model.addAttribute("partForm", shown);
    return form(of, name, shown.kindChosen(), model);
  }

  @PostMapping("/models/{id}/parts/edit")
  String change(
      @PathVariable UUID id,
      @RequestParam String name,
      @Valid @ModelAttribute("partForm") PartForm form,
      BindingResult errors,
      Model model) {
    MachineModel of = screen.model(id);
    String old = part(of, name).name();
    boolean done =
        form.part(errors)
            .map(p -> change.done(id, m -> m.changePart(old, p), errors, "part"))
            .orElse(false);
    return done ? back(id) : form(of, name, form.kindChosen(), model);
  }

  @GetMapping("/models/{id}/parts/remove")
  String askRemoval(@PathVariable UUID id, @RequestParam String name, Model model) {
    MachineModel of = screen.model(id);
    model.addAttribute("what", "part");
    model.addAttribute("name", part(of, name).name());
    model.addAttribute("part", name);
    model.addAttribute("model", of.name());
    model.addAttribute("back", "/models/" + id);
    model.addAttribute("address", "/models/" + id + "/parts/remove");
    return "shop/remove";
  }

  @PostMapping("/models/{id}/parts/remove")
  String remove(@PathVariable UUID id, @RequestParam String name) {
    change.orAnswer(id, m -> m.withoutPart(name));
    return back(id);
  }

  private String form(MachineModel of, @Nullable String name, PartKind kind, Model model) {
    screen.addChoices(of, model);
    screen.addPartFields(kind, model);
    model.addAttribute("name", name);
    return FORM_PAGE;
  }

  private static RotatingPart part(MachineModel model, String name) {
    return model.part(name).orElseThrow(() -> new NotFoundException("rotating part"));
  }

  private static String back(UUID id) {
    return "redirect:/models/" + id;
  }
}
