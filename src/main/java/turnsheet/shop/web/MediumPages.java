package turnsheet.shop.web;

import jakarta.validation.Valid;
import java.util.Optional;
import java.util.UUID;
import java.util.function.UnaryOperator;
import org.springframework.stereotype.Controller;
import org.springframework.ui.Model;
import org.springframework.validation.BindingResult;
import org.springframework.web.bind.annotation.GetMapping;
import org.springframework.web.bind.annotation.ModelAttribute;
import org.springframework.web.bind.annotation.PathVariable;
import org.springframework.web.bind.annotation.PostMapping;
import turnsheet.shop.Media;
import turnsheet.shop.MediumId;
import turnsheet.shop.ReferenceMedium;
import turnsheet.shop.RefusedChangeException;
import turnsheet.web.NotFoundException;

/** Entering reference media; they are listed with the instruments. */
@Controller
class MediumPages {

  private static final String LIST = "redirect:/instruments";
  private static final String FORM_PAGE = "shop/medium-form";

  private final Media media;
  private final Refusals refusals;

  MediumPages(Media media, Refusals refusals) {
    this.media = media;
    this.refusals = refusals;
  }

  @GetMapping("/media/new")
  String blank(Model model) {
    model.addAttribute("form", MediumForm.EMPTY);
    return FORM_PAGE;
  }

  @PostMapping("/media/new")
  String add(@Valid @ModelAttribute("form") MediumForm form, BindingResult errors) {
    return write(form, MediumId.next(), errors, media::add) ? LIST : FORM_PAGE;
  }

  @GetMapping("/media/{id}/edit")
  String edit(@PathVariable UUID id, Model model) {
    model.addAttribute("form", MediumForm.of(medium(id)));
    model.addAttribute("id", id.toString());
    return FORM_PAGE;
  }

  @PostMapping("/media/{id}/edit")
  String change(
      @PathVariable UUID id,
      @Valid @ModelAttribute("form") MediumForm form,
      BindingResult errors,
      Model model) {
    model.addAttribute("id", medium(id).id().toString());
    UnaryOperator<ReferenceMedium> change = m -> media.change(m).orElseThrow();
    return write(form, new MediumId(id), errors, change) ? LIST : FORM_PAGE;
  }

  private boolean write(
      MediumForm form, MediumId id, BindingResult errors, UnaryOperator<ReferenceMedium> writing) {
    Optional<ReferenceMedium> meant = form.medium(id, errors);
    try {
      return meant.map(writing).isPresent();
    } catch (RefusedChangeException e) {
      refusals.show(e, errors, "name");
      return false;
    }
  }

  private ReferenceMedium medium(UUID id) {
    return media.find(new MediumId(id)).orElseThrow(() -> new NotFoundException("medium"));
  }
}
