package turnsheet.core.measure;

import java.io.IOException;
import turnsheet.core.format.CaptureFormats;
import turnsheet.core.format.api.ByteSource;
import turnsheet.core.format.api.ReadOptions;
import turnsheet.core.signal.Rejection;

/** Measures captures: the way in for the service and the shell command. */
public final class Measurement {

  /** Changes whenever any figure can. */
  public static final String METHOD_VERSION = "1";

  private final CaptureFormats formats;

  public Measurement(CaptureFormats formats) {
    this.formats = formats;
  }

  /**
   * Measures one channel of one capture.
   *
   * @param sha256 of the bytes, to be stated in the reading
   */
  public Outcome measure(
      ByteSource source,
      String sha256,
      ReadOptions options,
      MeasureSettings settings,
      Progress progress)
      throws IOException {
    return new Outcome.Refused(new Rejection("notYet", "No plan stands for " + settings.kind()));
  }

  /** The formats this measures. */
  public CaptureFormats formats() {
    return formats;
  }
}
