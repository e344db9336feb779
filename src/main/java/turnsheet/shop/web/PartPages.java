package turnsheet.shop.web;

import jakarta.validation.Valid;
import java.util.UUID;
import org.springframework.stereotype.Controller;
import org.springframework.ui.Model;
import org.springframework.validation.BindingResult;
import org.springframework.web.bind.annotation.GetMapping;
import org.springframework.web.bind.annotation.ModelAttribute;
import org.springframework.web.bind.annotation.PathVariable;
import org.springframework.web.bind.annotation.PostMapping;
import org.springframework.web.bind.annotation.RequestParam;
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

  @PostMapping("/models/{id}/parts")
  String add(
      @PathVariable UUID id,
      @Valid @ModelAttribute("partForm") PartForm form,
      BindingResult errors,
      Model model) {
    boolean done =
        form.part(errors)
            .map(p -> change.done(id, m -> m.withPart(p), errors, "part"))
            .orElse(false);
    return done ? back(id) : screen.show(id, model, "parts");
  }

  @GetMapping("/models/{id}/parts/edit")
  String edit(@PathVariable UUID id, @RequestParam String name, Model model) {
    MachineModel of = screen.model(id);
    model.addAttribute("partForm", PartForm.of(part(of, name)));
    return form(of, name, model);
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
    return done ? back(id) : form(of, name, model);
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

  private String form(MachineModel of, String name, Model model) {
    screen.addChoices(of, model);
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
