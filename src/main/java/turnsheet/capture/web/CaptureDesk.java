package turnsheet.capture.web;

import java.io.IOException;
import java.io.InputStream;
import java.nio.charset.StandardCharsets;
import java.security.Principal;
import java.util.UUID;
import org.springframework.core.io.InputStreamResource;
import org.springframework.core.io.Resource;
import org.springframework.http.ContentDisposition;
import org.springframework.http.MediaType;
import org.springframework.http.ResponseEntity;
import org.springframework.stereotype.Component;
import turnsheet.capture.Arrival;
import turnsheet.capture.BrokenUploadException;
import turnsheet.capture.Capture;
import turnsheet.capture.CaptureId;
import turnsheet.capture.CaptureStore;
import turnsheet.capture.Captures;
import turnsheet.capture.Intake;
import turnsheet.capture.MissingFile;
import turnsheet.capture.StoreException;
import turnsheet.capture.UploadTrouble;
import turnsheet.job.Job;
import turnsheet.job.JobId;
import turnsheet.job.Jobs;
import turnsheet.web.NotFoundException;
import turnsheet.web.RefusedRequestException;

/** What the pages and the REST resource ask alike. */
@Component
class CaptureDesk {

  private final Intake intake;
  private final Captures captures;
  private final CaptureStore store;
  private final Jobs jobs;

  CaptureDesk(Intake intake, Captures captures, CaptureStore store, Jobs jobs) {
    this.intake = intake;
    this.captures = captures;
    this.store = store;
    this.jobs = jobs;
  }

  Capture capture(UUID id) {
    return captures.find(new CaptureId(id)).orElseThrow(() -> new NotFoundException("capture"));
  }

  /**
   * Takes a file in.
   *
   * @throws RefusedRequestException also where the transfer or the disk failed
   */
  Capture receive(Arrival arrival, String fileName, Principal visitor, InputStream in) {
    try {
      return intake.receive(arrival, fileName, visitor.getName(), in);
    } catch (BrokenUploadException | StoreException e) {
      throw UploadTrouble.refused(e);
    }
  }

  /** Whether the file of a capture lies here; that of an imported one may not. */
  boolean holds(Capture capture) {
    return store.holds(capture.bytes());
  }

  ProgressDocument progress(UUID id) {
    JobId jobId = capture(id).job();
    Job job = jobId == null ? null : jobs.find(jobId).orElse(null);
    // read after its job: one that ends in between must not be told as done and waiting
    return ProgressDocument.of(capture(id), job);
  }

  /** The original bytes, always as a download, never as something that a browser would run. */
  ResponseEntity<Resource> file(UUID id) throws IOException {
    Capture capture = capture(id);
    if (!holds(capture)) {
      throw MissingFile.refused();
    }
    return ResponseEntity.ok()
        .contentType(MediaType.APPLICATION_OCTET_STREAM)
        .contentLength(capture.bytes().length())
        .header(
            "Content-Disposition",
            ContentDisposition.attachment()
                .filename(capture.fileName(), StandardCharsets.UTF_8)
                .build()
                .toString())
        .header("X-Content-Type-Options", "nosniff")
        .body(new InputStreamResource(store.open(capture.bytes()).open()));
  }
}
