package turnsheet.shop.web;

import jakarta.validation.constraints.NotBlank;
import jakarta.validation.constraints.Size;
import java.time.Instant;
import java.util.UUID;
import org.jspecify.annotations.Nullable;
import turnsheet.shop.Customer;

/**
 * A customer in JSON.
 *
 * @param id given by the service
 * @param createdAt given by the service
 */
record CustomerDocument(
    @Nullable UUID id,
    @NotBlank @Size(max = Customer.NAME_LENGTH) String name,
    @Size(max = Customer.CONTACT_LENGTH) String contact,
    @Nullable Instant createdAt) {

  CustomerDocument {
    name = Typed.text(name);
    contact = Typed.text(contact);
  }

  static CustomerDocument of(Customer customer) {
    return new CustomerDocument(
        customer.id().value(), customer.name(), customer.contact(), customer.createdAt());
  }
}
