package turnsheet.capture.web;

import jakarta.servlet.http.HttpServletRequest;
import jakarta.validation.Valid;
import java.io.IOException;
import java.net.URI;
import java.security.Principal;
import java.util.List;
import java.util.UUID;
import org.jspecify.annotations.Nullable;
import org.springframework.core.io.Resource;
import org.springframework.http.MediaType;
import org.springframework.http.ResponseEntity;
import org.springframework.web.bind.annotation.GetMapping;
import org.springframework.web.bind.annotation.ModelAttribute;
import org.springframework.web.bind.annotation.PathVariable;
import org.springframework.web.bind.annotation.PostMapping;
import org.springframework.web.bind.annotation.PutMapping;
import org.springframework.web.bind.annotation.RequestBody;
import org.springframework.web.bind.annotation.RequestMapping;
import org.springframework.web.bind.annotation.RequestParam;
import org.springframework.web.bind.annotation.RestController;
import turnsheet.capture.Capture;
import turnsheet.capture.CaptureId;
import turnsheet.capture.Captures;
import turnsheet.capture.Corrections;
import turnsheet.capture.Intake;
import turnsheet.shop.SpeedSettingId;
import turnsheet.shop.VisitId;

/** Captures by REST. */
@RestController
@RequestMapping("/api/v1")
class CaptureResource {

  private final Intake intake;
  private final Corrections corrections;
  private final Captures captures;
  private final CaptureDesk desk;

  CaptureResource(Intake intake, Corrections corrections, Captures captures, CaptureDesk desk) {
    this.intake = intake;
    this.corrections = corrections;
    this.captures = captures;
    this.desk = desk;
  }

  /** Takes the body as the file; a file that cannot be used answers 201 with state refused. */
  @PostMapping(
      path = "/visits/{visit}/captures",
      consumes = MediaType.APPLICATION_OCTET_STREAM_VALUE)
  ResponseEntity<CaptureDocument> upload(
      @PathVariable UUID visit,
      @Valid @ModelAttribute CaptureRequest request,
      @RequestParam String fileName,
      Principal visitor,
      HttpServletRequest body)
      throws IOException {
    Capture capture =
        desk.receive(request.arrival(visit), fileName, visitor, body.getInputStream());
    return ResponseEntity.created(
            URI.create(body.getContextPath() + "/api/v1/captures/" + capture.id()))
        .body(CaptureDocument.of(capture));
  }

  @GetMapping("/visits/{visit}/captures")
  List<CaptureDocument> ofVisit(@PathVariable UUID visit) {
    return captures.ofVisit(new VisitId(visit)).stream().map(CaptureDocument::of).toList();
  }

  @GetMapping("/captures/{id}")
  CaptureDocument capture(@PathVariable UUID id) {
    return CaptureDocument.of(desk.capture(id));
  }

  /** Orders the measurement; answers 202, or 200 where the wish made the file unusable. */
  @PostMapping("/captures/{id}/measure")
  ResponseEntity<CaptureDocument> measure(
      @PathVariable UUID id, @RequestBody(required = false) @Nullable WishForm wish) {
    WishForm said = wish == null ? WishForm.none() : wish;
    Capture capture = intake.confirm(new CaptureId(id), said.wish());
    boolean ordered = capture.refusal() == null;
    return ResponseEntity.status(ordered ? 202 : 200).body(CaptureDocument.of(capture));
  }

  /** Corrects how the tone came onto what was played; no figure changes. */
  @PutMapping("/captures/{id}/tone-method")
  CaptureDocument nameMethod(@PathVariable UUID id, @Valid @RequestBody MethodForm said) {
    return CaptureDocument.of(corrections.nameMethod(new CaptureId(id), said.method()));
  }

  /** Says at which setting and under which condition the recording was made. */
  @PutMapping("/captures/{id}/place")
  CaptureDocument place(@PathVariable UUID id, @Valid @RequestBody PlaceForm said) {
    return CaptureDocument.of(
        corrections.place(
            new CaptureId(id), new SpeedSettingId(said.speedSettingId()), said.condition()));
  }

  @GetMapping("/captures/{id}/job")
  ProgressDocument job(@PathVariable UUID id) {
    return desk.progress(id);
  }

  @GetMapping("/captures/{id}/file")
  ResponseEntity<Resource> file(@PathVariable UUID id) throws IOException {
    return desk.file(id);
  }
}
