package turnsheet.evidence.web;

import java.util.List;
import java.util.UUID;
import org.springframework.http.HttpStatus;
import org.springframework.http.MediaType;
import org.springframework.web.bind.annotation.GetMapping;
import org.springframework.web.bind.annotation.PathVariable;
import org.springframework.web.bind.annotation.PostMapping;
import org.springframework.web.bind.annotation.RequestMapping;
import org.springframework.web.bind.annotation.ResponseStatus;
import org.springframework.web.bind.annotation.RestController;
import turnsheet.capture.CaptureId;
import turnsheet.capture.Captures;
import turnsheet.document.CoreJson;
import turnsheet.evidence.Evidence;
import turnsheet.evidence.EvidenceDocument;
import turnsheet.evidence.StoredEvidence;
import turnsheet.web.NotFoundException;

/** What a closer look at captures showed, for programs. */
@RestController
@RequestMapping("/api/v1")
class EvidenceApi {

  private final Evidence evidence;
  private final Captures captures;

  EvidenceApi(Evidence evidence, Captures captures) {
    this.evidence = evidence;
    this.captures = captures;
  }

  /** The evidence of each measured channel, in their order; empty before a closer look. */
  @GetMapping(path = "/captures/{id}/evidence", produces = MediaType.APPLICATION_JSON_VALUE)
  String ofCapture(@PathVariable UUID id) {
    List<EvidenceDocument> documents =
        evidence.of(existing(id)).stream().map(StoredEvidence::document).toList();
    return CoreJson.toJson(documents);
  }

  /** Orders a closer look at all measured channels. */
  @PostMapping("/captures/{id}/evidence")
  @ResponseStatus(HttpStatus.ACCEPTED)
  LookDocument look(@PathVariable UUID id) {
    CaptureId capture = existing(id);
    evidence.look(capture);
    return LookDocument.of(evidence.job(capture).orElse(null));
  }

  /** How the latest closer look stands. */
  @GetMapping("/captures/{id}/evidence/job")
  LookDocument job(@PathVariable UUID id) {
    return LookDocument.of(evidence.job(existing(id)).orElse(null));
  }

  private CaptureId existing(UUID id) {
    CaptureId capture = new CaptureId(id);
    if (captures.find(capture).isEmpty()) {
      throw new NotFoundException("capture");
    }
    return capture;
  }
}
