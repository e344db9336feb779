package turnsheet.capture;

import java.io.IOException;

/** The sender went away before the last byte. */
public final class BrokenUploadException extends IOException {

  BrokenUploadException(IOException cause) {
    super("the upload broke off", cause);
  }
}
