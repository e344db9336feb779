package turnsheet.capture;

import java.util.UUID;

/** Names one capture. */
public record CaptureId(UUID value) {

  /** A name that nothing has yet. */
  public static CaptureId next() {
    return new CaptureId(UUID.randomUUID());
  }

  @Override
  public String toString() {
    return value.toString();
  }
}
