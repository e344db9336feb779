package turnsheet.shop.web;

import jakarta.validation.constraints.NotBlank;
import jakarta.validation.constraints.Size;
import turnsheet.shop.Customer;

/** A customer as typed. */
record CustomerForm(
    @NotBlank(message = "{shop.form.required}")
        @Size(max = Customer.NAME_LENGTH, message = "{shop.form.tooLong}")
        String name,
    @Size(max = Customer.CONTACT_LENGTH, message = "{shop.form.tooLong}") String contact) {

  static final CustomerForm EMPTY = new CustomerForm("", "");

  CustomerForm {
    name = Typed.text(name);
    contact = Typed.text(contact);
  }

  static CustomerForm of(Customer customer) {
    return new CustomerForm(customer.name(), customer.contact());
  }
}
