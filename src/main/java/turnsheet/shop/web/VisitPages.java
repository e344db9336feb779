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
import turnsheet.shop.RefusedChangeException;
import turnsheet.shop.UnitId;
import turnsheet.shop.UnitSummary;
import turnsheet.shop.Units;
import turnsheet.shop.Visit;
import turnsheet.shop.VisitId;
import turnsheet.shop.VisitSummary;
import turnsheet.shop.Visits;
import turnsheet.web.NotFoundException;
import turnsheet.web.Times;

/** Opening a visit, keeping its notes, handing the unit back. */
@Controller
class VisitPages {

  private static final String OPEN_PAGE = "shop/visit-open";
  private static final String EDIT_PAGE = "shop/visit-edit";

  private final Visits visits;
  private final Units units;
  private final Refusals refusals;
  private final Times times;

  VisitPages(Visits visits, Units units, Refusals refusals, Times times) {
    this.visits = visits;
    this.units = units;
    this.refusals = refusals;
    this.times = times;
  }

  @GetMapping("/units/{id}/visits/new")
  String blank(@PathVariable UUID id, Model model) {
    model.addAttribute("form", VisitForm.EMPTY);
    return openPage(unit(id), model);
  }

  @PostMapping("/units/{id}/visits/new")
  String open(
      @PathVariable UUID id,
      @Valid @ModelAttribute("form") VisitForm form,
      BindingResult errors,
      Model model) {
    UnitSummary unit = unit(id);
    if (!errors.hasErrors()) {
      try {
        return "redirect:/visits/" + visits.open(unit.unit().id(), form.complaint()).id();
      } catch (RefusedChangeException e) {
        refusals.show(e, errors, null);
      }
    }
    return openPage(unit, model);
  }

  @GetMapping("/visits/{id}/edit")
  String edit(@PathVariable UUID id, Model model) {
    VisitSummary visit = visit(id);
    model.addAttribute("form", VisitForm.of(visit.visit()));
    return editPage(visit, model);
  }

  /**
   * @param verb what the pressed button says: {@code save}, {@code close}, {@code reopen}, or
   *     {@code reopenAndSave} for what was typed while somebody else closed the visit
   */
  @PostMapping("/visits/{id}/edit")
  String change(
      @PathVariable UUID id,
      @RequestParam(defaultValue = "save") String verb,
      @Valid @ModelAttribute("form") VisitForm form,
      BindingResult errors,
      Model model) {
    VisitSummary visit = visit(id);
    form.check(errors);
    if (!errors.hasErrors()) {
      try {
        change(visit.visit().id(), verb, form);
        return verb.equals("reopen")
            ? "redirect:/visits/" + id + "/edit"
            : "redirect:/visits/" + id;
      } catch (RefusedChangeException e) {
        refusals.show(e, errors, null);
        if (e.code().equals("notesChanged")) {
          model.addAttribute("kept", VisitForm.of(visit(id).visit()));
        }
      }
    }
    model.addAttribute("typed", true);
    String page = editPage(visit(id), model);
    if (!model.containsAttribute("kept")) {
      // what came meanwhile has not been shown yet
      model.addAttribute("seen", form.seen());
    }
    return page;
  }

  /** Hands the unit back, or takes the visit up again, from the page of the visit itself. */
  @PostMapping("/visits/{id}/standing")
  String stand(@PathVariable UUID id, @RequestParam boolean open) {
    VisitId visit = visit(id).visit().id();
    refusals.orAnswer(() -> open ? visits.reopen(visit) : visits.close(visit));
    return "redirect:/visits/" + id;
  }

  @GetMapping("/visits/{id}/remove")
  String askRemoval(@PathVariable UUID id, Model model) {
    VisitSummary visit = visit(id);
    model.addAttribute("captures", visits.captures(visit.visit().id()));
    editPage(visit, model);
    return "shop/visit-remove";
  }

  @PostMapping("/visits/{id}/remove")
  String remove(@PathVariable UUID id) {
    Visit visit = visit(id).visit();
    refusals.orAnswer(() -> visits.remove(visit.id()));
    return "redirect:/units/" + visit.unitId();
  }

  private void change(VisitId id, String verb, VisitForm form) {
    switch (verb) {
      case "reopen" -> visits.reopen(id);
      case "reopenAndSave" -> {
        visits.reopen(id);
        visits.record(id, form.notes());
      }
      case "close" -> {
        visits.record(id, form.notes(), form::saw);
        visits.close(id);
      }
      default -> visits.record(id, form.notes(), form::saw);
    }
  }

  private String openPage(UnitSummary unit, Model model) {
    model.addAttribute("unitId", unit.unit().id().toString());
    model.addAttribute("name", unit.modelName() + " " + unit.unit().serialNumber());
    model.addAttribute("customer", unit.customerName());
    model.addAttribute(
        "openVisit",
        visits.ofUnit(unit.unit().id()).stream()
            .filter(Visit::isOpen)
            .map(v -> v.id().toString())
            .findFirst()
            .orElse(null));
    return OPEN_PAGE;
  }

  private String editPage(VisitSummary visit, Model model) {
    model.addAttribute("id", visit.visit().id().toString());
    model.addAttribute("unitId", visit.visit().unitId().toString());
    model.addAttribute("name", visit.modelName() + " " + visit.serialNumber());
    model.addAttribute("customer", visit.customerName());
    model.addAttribute("opened", times.day(visit.visit().openedAt()));
    model.addAttribute("closed", closed(visit.visit()));
    model.addAttribute("open", visit.visit().isOpen());
    model.addAttribute("seen", VisitForm.of(visit.visit()).seen());
    return EDIT_PAGE;
  }

  private String closed(Visit visit) {
    java.time.Instant at = visit.closedAt();
    return at == null ? "" : times.day(at);
  }

  private UnitSummary unit(UUID id) {
    return units.summary(new UnitId(id)).orElseThrow(() -> new NotFoundException("unit"));
  }

  private VisitSummary visit(UUID id) {
    return visits.summary(new VisitId(id)).orElseThrow(() -> new NotFoundException("visit"));
  }
}
