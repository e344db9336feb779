package turnsheet.shop.web;

import jakarta.validation.Valid;
import java.net.URI;
import java.util.Optional;
import java.util.UUID;
import org.springframework.http.ResponseEntity;
import org.springframework.transaction.support.TransactionOperations;
import org.springframework.web.bind.annotation.GetMapping;
import org.springframework.web.bind.annotation.PathVariable;
import org.springframework.web.bind.annotation.PostMapping;
import org.springframework.web.bind.annotation.PutMapping;
import org.springframework.web.bind.annotation.RequestBody;
import org.springframework.web.bind.annotation.RequestMapping;
import org.springframework.web.bind.annotation.RequestParam;
import org.springframework.web.bind.annotation.RestController;
import turnsheet.shop.PageQuery;
import turnsheet.shop.UnitId;
import turnsheet.shop.Units;
import turnsheet.shop.Visit;
import turnsheet.shop.VisitId;
import turnsheet.shop.Visits;
import turnsheet.web.NotFoundException;

/** Visits for programs. */
@RestController
@RequestMapping(VisitsApi.PATH)
class VisitsApi {

  static final String PATH = "/api/v1/visits";

  private final Visits visits;
  private final Units units;
  private final Refusals refusals;
  private final TransactionOperations transactions;

  VisitsApi(Visits visits, Units units, Refusals refusals, TransactionOperations transactions) {
    this.visits = visits;
    this.units = units;
    this.refusals = refusals;
    this.transactions = transactions;
  }

  /** Newest first; {@code unitId} narrows them to one unit. */
  @GetMapping
  PageDocument<VisitDocument> list(
      @RequestParam(defaultValue = "") String q,
      @RequestParam(required = false) Optional<UUID> unitId,
      @RequestParam(defaultValue = "1") int page,
      @RequestParam(defaultValue = "50") int size) {
    PageQuery query = new PageQuery(q, page, size);
    return PageDocument.of(
        unitId.map(id -> visits.page(new UnitId(id), query)).orElseGet(() -> visits.page(query)),
        s -> VisitDocument.of(s.visit()));
  }

  @GetMapping("/{id}")
  VisitDocument get(@PathVariable UUID id) {
    return VisitDocument.of(visit(id));
  }

  @PostMapping
  ResponseEntity<VisitDocument> open(@Valid @RequestBody VisitDocument sent) {
    UnitId unit = new UnitId(sent.unitId());
    if (units.find(unit).isEmpty()) {
      throw refusals.answer("unitUnknown", unit);
    }
    VisitDocument opened =
        VisitDocument.of(refusals.orAnswer(() -> visits.open(unit, sent.complaint())));
    return ResponseEntity.created(URI.create(PATH + "/" + opened.id())).body(opened);
  }

  @PutMapping("/{id}")
  VisitDocument change(@PathVariable UUID id, @Valid @RequestBody VisitDocument sent) {
    visit(id);
    refusals.orAnswer(() -> transactions.execute(status -> carryOut(new VisitId(id), sent)));
    return get(id);
  }

  private Optional<Visit> carryOut(VisitId id, VisitDocument sent) {
    Boolean open = sent.open();
    Visit now = visit(id.value());
    if (open != null && open && !now.isOpen()) {
      visits.reopen(id);
    }
    Optional<Visit> recorded = visits.record(id, sent.notes(now.notes()));
    return open != null && !open ? visits.close(id) : recorded;
  }

  private Visit visit(UUID id) {
    return visits.find(new VisitId(id)).orElseThrow(() -> new NotFoundException("visit"));
  }
}
