package turnsheet.capture;

import java.io.IOException;

/** The disk did not take the bytes: full, read-only or broken. */
public final class StoreException extends IOException {

  StoreException(IOException cause) {
    super("the capture could not be stored", cause);
  }
}
