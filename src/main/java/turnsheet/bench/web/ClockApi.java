package turnsheet.bench.web;

import jakarta.servlet.http.HttpServletRequest;
import jakarta.validation.Valid;
import java.io.IOException;
import java.net.URI;
import java.util.List;
import java.util.UUID;
import org.springframework.http.MediaType;
import org.springframework.http.ResponseEntity;
import org.springframework.web.bind.annotation.GetMapping;
import org.springframework.web.bind.annotation.ModelAttribute;
import org.springframework.web.bind.annotation.PathVariable;
import org.springframework.web.bind.annotation.PostMapping;
import org.springframework.web.bind.annotation.RequestMapping;
import org.springframework.web.bind.annotation.RequestParam;
import org.springframework.web.bind.annotation.RestController;
import turnsheet.bench.ClockCheck;
import turnsheet.shop.BenchInstrument;

/** Checks of clocks for programs. */
@RestController
@RequestMapping("/api/v1/instruments/{id}/clock-checks")
class ClockApi {

  private final ClockDesk desk;

  ClockApi(ClockDesk desk) {
    this.desk = desk;
  }

  /** Takes the body as the file; one that tells nothing about the clock answers 422. */
  @PostMapping(consumes = MediaType.APPLICATION_OCTET_STREAM_VALUE)
  ResponseEntity<ClockDocument> check(
      @PathVariable UUID id,
      @Valid @ModelAttribute ClockRequest request,
      @RequestParam String fileName,
      HttpServletRequest body)
      throws IOException {
    BenchInstrument instrument = desk.instrument(id);
    ClockCheck made =
        desk.check(instrument, request.question(), desk.keep(fileName, body.getInputStream()));
    return ResponseEntity.created(
            URI.create(
                body.getContextPath() + "/api/v1/instruments/" + id + "/clock-checks/" + made.id()))
        .body(ClockDocument.of(made));
  }

  /** The newest first. */
  @GetMapping
  List<ClockDocument> list(@PathVariable UUID id) {
    return desk.checks(desk.instrument(id)).stream().map(ClockDocument::of).toList();
  }

  @GetMapping("/{check}")
  ClockDocument get(@PathVariable UUID id, @PathVariable UUID check) {
    return ClockDocument.of(desk.check(id, check));
  }

  /** Writes what was found into the record of the instrument. */
  @PostMapping("/{check}/take")
  ClockDocument take(@PathVariable UUID id, @PathVariable UUID check) {
    return ClockDocument.of(desk.take(id, check));
  }
}
