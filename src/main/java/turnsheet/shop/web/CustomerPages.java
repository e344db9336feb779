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
import turnsheet.shop.Customer;
import turnsheet.shop.CustomerId;
import turnsheet.shop.Customers;
import turnsheet.shop.PageQuery;
import turnsheet.shop.Units;
import turnsheet.web.NotFoundException;

/** The list of customers, and each with his units. */
@Controller
class CustomerPages {

  private static final int ROWS = 50;
  private static final String FORM_PAGE = "shop/customer-form";

  private final Customers customers;
  private final Units units;
  private final UnitRows unitRows;

  CustomerPages(Customers customers, Units units, UnitRows unitRows) {
    this.customers = customers;
    this.units = units;
    this.unitRows = unitRows;
  }

  @GetMapping("/customers")
  String list(
      @RequestParam(defaultValue = "") String q,
      @RequestParam(defaultValue = "1") int page,
      Model model) {
    model.addAttribute("q", q);
    model.addAttribute(
        "page",
        customers
            .page(new PageQuery(q, page, ROWS))
            .map(
                s ->
                    new CustomerRow(
                        s.customer().id().toString(),
                        s.customer().name(),
                        s.customer().contact().lines().findFirst().orElse(""),
                        s.units())));
    return "shop/customers";
  }

  @GetMapping("/customers/new")
  String blank(Model model) {
    model.addAttribute("form", CustomerForm.EMPTY);
    return FORM_PAGE;
  }

  @PostMapping("/customers/new")
  String add(@Valid @ModelAttribute("form") CustomerForm form, BindingResult errors) {
    if (errors.hasErrors()) {
      return FORM_PAGE;
    }
    return "redirect:/customers/" + customers.add(form.name(), form.contact()).id();
  }

  @GetMapping("/customers/{id}")
  String show(@PathVariable UUID id, @RequestParam(defaultValue = "1") int page, Model model) {
    Customer customer = customer(id);
    model.addAttribute("id", id.toString());
    model.addAttribute("customer", CustomerForm.of(customer));
    model.addAttribute(
        "page", units.ofCustomer(customer.id(), new PageQuery("", page, ROWS)).map(unitRows::row));
    return "shop/customer";
  }

  @GetMapping("/customers/{id}/edit")
  String edit(@PathVariable UUID id, Model model) {
    model.addAttribute("form", CustomerForm.of(customer(id)));
    model.addAttribute("id", id.toString());
    return FORM_PAGE;
  }

  @PostMapping("/customers/{id}/edit")
  String change(
      @PathVariable UUID id,
      @Valid @ModelAttribute("form") CustomerForm form,
      BindingResult errors,
      Model model) {
    if (errors.hasErrors()) {
      model.addAttribute("id", customer(id).id().toString());
      return FORM_PAGE;
    }
    return "redirect:/customers/"
        + customers
            .change(new CustomerId(id), form.name(), form.contact())
            .map(Customer::id)
            .orElseThrow(() -> new NotFoundException("customer"));
  }

  private Customer customer(UUID id) {
    return customers.find(new CustomerId(id)).orElseThrow(() -> new NotFoundException("customer"));
  }
}
