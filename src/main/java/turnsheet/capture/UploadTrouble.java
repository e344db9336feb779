package turnsheet.capture;

import java.io.IOException;
import org.slf4j.Logger;
import org.slf4j.LoggerFactory;
import turnsheet.web.RefusedRequestException;

/** An upload that did not arrive, as a sentence for whoever sent it. */
public final class UploadTrouble {

  private static final Logger log = LoggerFactory.getLogger(UploadTrouble.class);

  private UploadTrouble() {}

  /** The answer to a transfer that broke off, or to a disk that did not take the bytes. */
  public static RefusedRequestException refused(IOException trouble) {
    if (trouble instanceof BrokenUploadException) {
      return new RefusedRequestException(
          "uploadBroken", "The transfer broke off and nothing was stored: upload it again.");
    }
    log.error("cannot store a recording", trouble);
    return new RefusedRequestException(
        "notStored",
        "The disk of the service did not take the recording, and nothing of it was stored: make"
            + " room in the data folder, then upload it again.");
  }
}
