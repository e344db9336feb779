package turnsheet.capture;

import java.util.Locale;

/** Where a capture stands; {@link Captures} holds the steps between. */
public enum CaptureState {
  /** its contents are known; the bench has not yet confirmed what was recognised and guessed */
  RECOGNISED,
  /** confirmed; its job waits or runs */
  QUEUED,
  /** has at least one reading */
  MEASURED,
  /** cannot be used, as its {@link Capture#refusal()} says; the bytes are kept */
  REFUSED,
  /** the service failed on it, as its {@link Capture#refusal()} says */
  FAILED;

  /** As the database and the REST API say it. */
  public String word() {
    return name().toLowerCase(Locale.ROOT);
  }

  static CaptureState ofWord(String word) {
    return valueOf(word.toUpperCase(Locale.ROOT));
  }
}
