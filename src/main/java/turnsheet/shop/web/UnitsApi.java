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
import turnsheet.shop.MachineModels;
import turnsheet.shop.ModelId;
import turnsheet.shop.PageQuery;
import turnsheet.shop.UnitId;
import turnsheet.shop.Units;
import turnsheet.web.NotFoundException;

/** Units for programs. */
@RestController
@RequestMapping(UnitsApi.PATH)
class UnitsApi {

  static final String PATH = "/api/v1/units";

  private final Units units;
  private final MachineModels models;
  private final Customers customers;
  private final Refusals refusals;

  UnitsApi(Units units, MachineModels models, Customers customers, Refusals refusals) {
    this.units = units;
    this.models = models;
    this.customers = customers;
    this.refusals = refusals;
  }

  @GetMapping
  PageDocument<UnitDocument> list(
      @RequestParam(defaultValue = "") String q,
      @RequestParam(defaultValue = "1") int page,
      @RequestParam(defaultValue = "50") int size) {
    return PageDocument.of(
        units.page(new PageQuery(q, page, size)), s -> UnitDocument.of(s.unit()));
  }

  @GetMapping("/{id}")
  UnitDocument get(@PathVariable UUID id) {
    return units
        .find(new UnitId(id))
        .map(UnitDocument::of)
        .orElseThrow(() -> new NotFoundException("unit"));
  }

  @PostMapping
  ResponseEntity<UnitDocument> add(@Valid @RequestBody UnitDocument sent) {
    UnitDocument added =
        UnitDocument.of(
            refusals.orAnswer(
                () -> units.add(model(sent), customer(sent), sent.serialNumber(), sent.note())));
    return ResponseEntity.created(URI.create(PATH + "/" + added.id())).body(added);
  }

  @PutMapping("/{id}")
  UnitDocument change(@PathVariable UUID id, @Valid @RequestBody UnitDocument sent) {
    return refusals
        .orAnswer(
            () ->
                units.change(
                    new UnitId(id), model(sent), customer(sent), sent.serialNumber(), sent.note()))
        .map(UnitDocument::of)
        .orElseThrow(() -> new NotFoundException("unit"));
  }

  private ModelId model(UnitDocument sent) {
    ModelId id = new ModelId(sent.modelId());
    if (models.find(id).isEmpty()) {
      throw refusals.answer("modelUnknown", id);
    }
    return id;
  }

  private CustomerId customer(UnitDocument sent) {
    CustomerId id = new CustomerId(sent.customerId());
    if (customers.find(id).isEmpty()) {
      throw refusals.answer("customerUnknown", id);
    }
    return id;
  }
}
