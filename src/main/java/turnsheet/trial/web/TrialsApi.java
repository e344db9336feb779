package turnsheet.trial.web;

import java.util.List;
import java.util.UUID;
import org.jspecify.annotations.Nullable;
import org.springframework.http.HttpStatus;
import org.springframework.http.MediaType;
import org.springframework.web.bind.annotation.DeleteMapping;
import org.springframework.web.bind.annotation.GetMapping;
import org.springframework.web.bind.annotation.PathVariable;
import org.springframework.web.bind.annotation.PostMapping;
import org.springframework.web.bind.annotation.RequestBody;
import org.springframework.web.bind.annotation.RequestMapping;
import org.springframework.web.bind.annotation.RequestParam;
import org.springframework.web.bind.annotation.ResponseStatus;
import org.springframework.web.bind.annotation.RestController;
import turnsheet.capture.Capture;
import turnsheet.capture.CaptureId;
import turnsheet.document.CoreJson;
import turnsheet.trial.KeptTrial;
import turnsheet.trial.TrialDesk;
import turnsheet.trial.TrialId;
import turnsheet.trial.TrialOrder;
import turnsheet.web.RefusedRequestException;

/** Trials by REST. */
@RestController
@RequestMapping("/api/v1")
class TrialsApi {

  private final TrialDesk desk;

  TrialsApi(TrialDesk desk) {
    this.desk = desk;
  }

  /** The trials of a capture, the newest first, with what came of them. */
  @GetMapping(path = "/captures/{id}/trials", produces = MediaType.APPLICATION_JSON_VALUE)
  String ofCapture(@PathVariable UUID id) {
    Capture capture = desk.capture(new CaptureId(id));
    List<TrialDocument> documents =
        desk.ofCapture(capture.id()).stream().map(this::document).toList();
    return CoreJson.toJson(documents);
  }

  /** What a trial of a capture would begin with, to be changed and ordered. */
  @GetMapping(path = "/captures/{id}/trials/proposal", produces = MediaType.APPLICATION_JSON_VALUE)
  String proposal(@PathVariable UUID id) {
    return CoreJson.toJson(desk.proposal(desk.capture(new CaptureId(id))));
  }

  /** Orders a trial: the body is an order as the proposal gives one; without a body, that one. */
  @PostMapping(path = "/captures/{id}/trials", produces = MediaType.APPLICATION_JSON_VALUE)
  @ResponseStatus(HttpStatus.ACCEPTED)
  String order(@PathVariable UUID id, @RequestBody(required = false) @Nullable String body) {
    Capture capture = desk.capture(new CaptureId(id));
    TrialOrder order = body == null || body.isBlank() ? desk.proposal(capture) : ordered(body);
    return CoreJson.toJson(document(desk.find(desk.order(capture.id(), order))));
  }

  @GetMapping(path = "/trials/{id}", produces = MediaType.APPLICATION_JSON_VALUE)
  String trial(@PathVariable UUID id) {
    return CoreJson.toJson(document(desk.find(new TrialId(id))));
  }

  /** The circuit for a row of the result; row 0 is the signal without a filter and has none. */
  @GetMapping(path = "/trials/{id}/circuit", produces = MediaType.APPLICATION_JSON_VALUE)
  String circuit(@PathVariable UUID id, @RequestParam int row) {
    return CoreJson.toJson(desk.circuit(desk.find(new TrialId(id)), row));
  }

  /** Calls a trial off; one that is over stays as it is. */
  @PostMapping(path = "/trials/{id}/cancel", produces = MediaType.APPLICATION_JSON_VALUE)
  String cancel(@PathVariable UUID id) {
    desk.cancel(new TrialId(id));
    return trial(id);
  }

  /** Removes a trial for good. */
  @DeleteMapping("/trials/{id}")
  @ResponseStatus(HttpStatus.NO_CONTENT)
  void remove(@PathVariable UUID id) {
    desk.remove(new TrialId(id));
  }

  private TrialDocument document(KeptTrial trial) {
    return TrialDocument.of(trial, desk.job(trial));
  }

  private static TrialOrder ordered(String body) {
    try {
      TrialOrder order = CoreJson.fromJson(body, TrialOrder.class);
      order.designs();
      return order;
    } catch (IllegalArgumentException e) {
      throw new RefusedRequestException(
          "trialOrder",
          "The body is no order of a trial: begin with what GET .../trials/proposal answers.");
    }
  }
}
