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
import turnsheet.shop.InstrumentId;
import turnsheet.shop.Instruments;
import turnsheet.shop.PageQuery;
import turnsheet.web.NotFoundException;

/** Bench instruments for programs. */
@RestController
@RequestMapping(InstrumentsApi.PATH)
class InstrumentsApi {

  static final String PATH = "/api/v1/instruments";

  private final Instruments instruments;
  private final Refusals refusals;

  InstrumentsApi(Instruments instruments, Refusals refusals) {
    this.instruments = instruments;
    this.refusals = refusals;
  }

  @GetMapping
  PageDocument<InstrumentDocument> list(
      @RequestParam(defaultValue = "") String q,
      @RequestParam(defaultValue = "1") int page,
      @RequestParam(defaultValue = "50") int size) {
    return PageDocument.of(instruments.page(new PageQuery(q, page, size)), InstrumentDocument::of);
  }

  @GetMapping("/{id}")
  InstrumentDocument get(@PathVariable UUID id) {
    return instruments
        .find(new InstrumentId(id))
        .map(InstrumentDocument::of)
        .orElseThrow(() -> new NotFoundException("instrument"));
  }

  @PostMapping
  ResponseEntity<InstrumentDocument> add(@Valid @RequestBody InstrumentDocument sent) {
    InstrumentDocument added =
        InstrumentDocument.of(
            refusals.orAnswer(() -> instruments.add(sent.instrument(InstrumentId.next()))));
    return ResponseEntity.created(URI.create(PATH + "/" + added.id())).body(added);
  }

  @PutMapping("/{id}")
  InstrumentDocument change(@PathVariable UUID id, @Valid @RequestBody InstrumentDocument sent) {
    return refusals
        .orAnswer(() -> instruments.change(sent.instrument(new InstrumentId(id))))
        .map(InstrumentDocument::of)
        .orElseThrow(() -> new NotFoundException("instrument"));
  }
}
