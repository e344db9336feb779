package turnsheet.shop.web;

import jakarta.validation.Valid;
import java.util.List;
import java.util.Optional;
import java.util.UUID;
import org.springframework.stereotype.Controller;
import org.springframework.transaction.support.TransactionOperations;
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
import turnsheet.shop.PageOf;
import turnsheet.shop.PageQuery;
import turnsheet.shop.RefusedChangeException;
import turnsheet.shop.Unit;
import turnsheet.shop.UnitId;
import turnsheet.shop.Units;
import turnsheet.web.NotFoundException;

/** Finding, entering and changing units. */
@Controller
class UnitPages {

  private static final int ROWS = 50;
  private static final String FORM_PAGE = "shop/unit-form";

  private final Units units;
  private final MachineModels models;
  private final OwnerChoice owners;
  private final UnitRows rows;
  private final Refusals refusals;
  private final TransactionOperations transactions;

  UnitPages(
      Units units,
      MachineModels models,
      OwnerChoice owners,
      UnitRows rows,
      Refusals refusals,
      TransactionOperations transactions) {
    this.units = units;
    this.models = models;
    this.owners = owners;
    this.rows = rows;
    this.refusals = refusals;
    this.transactions = transactions;
  }

  @GetMapping("/units")
  String list(
      @RequestParam(defaultValue = "") String q,
      @RequestParam(defaultValue = "1") int page,
      Model model) {
    model.addAttribute("q", q);
    model.addAttribute("page", units.page(new PageQuery(q, page, ROWS)).map(rows::row));
    return "shop/units";
  }

  @GetMapping("/units/new")
  String blank(
      @RequestParam(defaultValue = "") String model,
      @RequestParam(defaultValue = "") String customer,
      Model page) {
    UnitForm form = UnitForm.empty(model);
    return form(owners.byId(customer).map(form::ownedBy).orElse(form), page);
  }

  @PostMapping("/units/new")
  String add(@Valid @ModelAttribute("form") UnitForm form, BindingResult errors, Model page) {
    owners.check(form, errors);
    Optional<MachineModel> model = model(form, errors);
    if (!errors.hasErrors() && model.isPresent()) {
      try {
        // a refused unit takes the customer entered for it away again
        Unit added =
            transactions.execute(
                status ->
                    units.add(
                        model.get().id(),
                        owners.owner(form).id(),
                        form.serialNumber(),
                        form.note()));
        return "redirect:/units/" + added.id() + "/visits/new";
      } catch (RefusedChangeException e) {
        refusals.show(e, errors, "serialNumber");
      }
    }
    return form(form, page);
  }

  @GetMapping("/units/{id}/edit")
  String edit(@PathVariable UUID id, Model page) {
    Unit unit = unit(id);
    page.addAttribute("id", id.toString());
    return form(UnitForm.of(unit, owners.byId(unit.customerId().toString()).orElseThrow()), page);
  }

  @PostMapping("/units/{id}/edit")
  String change(
      @PathVariable UUID id,
      @Valid @ModelAttribute("form") UnitForm form,
      BindingResult errors,
      Model page) {
    Unit unit = unit(id);
    owners.check(form, errors);
    Optional<MachineModel> model = model(form, errors);
    if (!errors.hasErrors() && model.isPresent()) {
      try {
        transactions.execute(
            status ->
                units.change(
                    unit.id(),
                    model.get().id(),
                    owners.owner(form).id(),
                    form.serialNumber(),
                    form.note()));
        return "redirect:/units/" + id;
      } catch (RefusedChangeException e) {
        refusals.show(e, errors, e.code().equals("serialTaken") ? "serialNumber" : "model");
      }
    }
    page.addAttribute("id", id.toString());
    return form(form, page);
  }

  private String form(UnitForm form, Model page) {
    List<Choice> choices =
        models.page(PageQuery.first(PageOf.LARGEST)).items().stream()
            .map(m -> new Choice(m.id().toString(), m.name()))
            .toList();
    page.addAttribute("form", form);
    page.addAttribute("models", choices);
    page.addAttribute("names", owners.names());
    return FORM_PAGE;
  }

  private Optional<MachineModel> model(UnitForm form, BindingResult errors) {
    if (errors.hasFieldErrors("model")) {
      return Optional.empty();
    }
    try {
      Optional<MachineModel> found = models.find(new ModelId(UUID.fromString(form.model())));
      if (found.isPresent()) {
        return found;
      }
    } catch (IllegalArgumentException e) {
      // no id at all: the same as one that nothing has
    }
    errors.rejectValue("model", "shop.form.choose");
    return Optional.empty();
  }

  private Unit unit(UUID id) {
    return units.find(new UnitId(id)).orElseThrow(() -> new NotFoundException("unit"));
  }
}
