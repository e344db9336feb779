package turnsheet.shop.web;

import java.util.List;
import java.util.Optional;
import java.util.UUID;
import org.springframework.stereotype.Component;
import org.springframework.validation.Errors;
import turnsheet.shop.Customer;
import turnsheet.shop.CustomerId;
import turnsheet.shop.Customers;
import turnsheet.shop.PageOf;
import turnsheet.shop.PageQuery;

/** Finds the customer that a unit's form means, by name; or enters him where the form says so. */
@Component
class OwnerChoice {

  private static final String FIELD = "customerName";

  private final Customers customers;

  OwnerChoice(Customers customers) {
    this.customers = customers;
  }

  /** Names to choose from while typing; people type on where there are more. */
  List<String> names() {
    return customers.page(PageQuery.first(PageOf.LARGEST)).items().stream()
        .map(s -> s.customer().name())
        .distinct()
        .toList();
  }

  Optional<Customer> byId(String id) {
    try {
      return id.isEmpty() ? Optional.empty() : customers.find(new CustomerId(UUID.fromString(id)));
    } catch (IllegalArgumentException e) {
      return Optional.empty();
    }
  }

  /** Says beside the name what is wrong with it, before anything is written. */
  void check(UnitForm form, Errors errors) {
    if (errors.hasFieldErrors(FIELD) || kept(form).isPresent()) {
      return;
    }
    int found = customers.named(form.customerName()).size();
    if (found > 1) {
      errors.rejectValue(FIELD, "shop.unit.customerAmbiguous");
    } else if (found == 0 && form.newCustomer().isEmpty()) {
      errors.rejectValue(FIELD, "shop.unit.customerUnknown");
    }
  }

  /** The customer of a form that {@link #check} found nothing wrong with. */
  Customer owner(UnitForm form) {
    return kept(form)
        .or(() -> customers.named(form.customerName()).stream().findFirst())
        .orElseGet(() -> customers.add(form.customerName(), ""));
  }

  private Optional<Customer> kept(UnitForm form) {
    return byId(form.customer()).filter(c -> c.name().equals(form.customerName()));
  }
}
