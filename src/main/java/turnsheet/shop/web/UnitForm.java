package turnsheet.shop.web;

import jakarta.validation.constraints.NotBlank;
import jakarta.validation.constraints.Size;
import turnsheet.shop.Customer;
import turnsheet.shop.Unit;

/**
 * A unit as typed.
 *
 * @param model id of its model
 * @param customer id of the customer whose name the form came with; may be empty
 * @param customerName decides who the customer is, unless it is still the name of that one
 * @param newCustomer not empty where an unknown name is to become a customer
 */
record UnitForm(
    @NotBlank(message = "{shop.form.choose}") String model,
    String customer,
    @NotBlank(message = "{shop.form.required}")
        @Size(max = Customer.NAME_LENGTH, message = "{shop.form.tooLong}")
        String customerName,
    String newCustomer,
    @NotBlank(message = "{shop.form.required}")
        @Size(max = Unit.SERIAL_LENGTH, message = "{shop.form.tooLong}")
        String serialNumber,
    @Size(max = Unit.NOTE_LENGTH, message = "{shop.form.tooLong}") String note) {

  UnitForm {
    model = Typed.text(model);
    customer = Typed.text(customer);
    customerName = Typed.text(customerName);
    newCustomer = Typed.text(newCustomer);
    serialNumber = Typed.text(serialNumber);
    note = Typed.text(note);
  }

  static UnitForm empty(String model) {
    return new UnitForm(model, "", "", "", "", "");
  }

  UnitForm ownedBy(Customer owner) {
    return new UnitForm(model, owner.id().toString(), owner.name(), "", serialNumber, note);
  }

  static UnitForm of(Unit unit, Customer owner) {
    return new UnitForm(unit.modelId().toString(), "", "", "", unit.serialNumber(), unit.note())
        .ownedBy(owner);
  }
}
