package turnsheet.shop.web;

import jakarta.validation.Valid;
import java.net.URI;
import java.util.UUID;
import org.springframework.http.ResponseEntity;
import org.springframework.web.bind.annotation.GetMapping;
import org.springframework.web.bind.annotation.PathVariable;
import org.springframework.web.bind.annotation.PostMapping;
import org.springframework.web.bind.annotation.PutMapping;
import org.springframework.web.bind.annotation.RequestBody;
import org.springframework.web.bind.annotation.RequestMapping;
import org.springframework.web.bind.annotation.RequestParam;
import org.springframework.web.bind.annotation.RestController;
import turnsheet.shop.CustomerId;
import turnsheet.shop.Customers;
import turnsheet.shop.PageQuery;
import turnsheet.web.NotFoundException;

/** Customers for programs. */
@RestController
@RequestMapping(CustomersApi.PATH)
class CustomersApi {

  static final String PATH = "/api/v1/customers";

  private final Customers customers;

  CustomersApi(Customers customers) {
    this.customers = customers;
  }

  @GetMapping
  PageDocument<CustomerDocument> list(
      @RequestParam(defaultValue = "") String q,
      @RequestParam(defaultValue = "1") int page,
      @RequestParam(defaultValue = "50") int size) {
    return PageDocument.of(
        customers.page(new PageQuery(q, page, size)), s -> CustomerDocument.of(s.customer()));
  }

  @GetMapping("/{id}")
  CustomerDocument get(@PathVariable UUID id) {
    return customers
        .find(new CustomerId(id))
        .map(CustomerDocument::of)
        .orElseThrow(() -> new NotFoundException("customer"));
  }

  @PostMapping
  ResponseEntity<CustomerDocument> add(@Valid @RequestBody CustomerDocument sent) {
    CustomerDocument added = CustomerDocument.of(customers.add(sent.name(), sent.contact()));
    return ResponseEntity.created(URI.create(PATH + "/" + added.id())).body(added);
  }

  @PutMapping("/{id}")
  CustomerDocument change(@PathVariable UUID id, @Valid @RequestBody CustomerDocument sent) {
    return customers
        .change(new CustomerId(id), sent.name(), sent.contact())
        .map(CustomerDocument::of)
        .orElseThrow(() -> new NotFoundException("customer"));
  }
}
