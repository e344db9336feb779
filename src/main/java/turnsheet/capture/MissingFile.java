package turnsheet.capture;

import turnsheet.web.RefusedRequestException;

/** What is said where the bytes of a capture do not lie here. */
public final class MissingFile {

  private MissingFile() {}

  /** Becomes an answer with its sentence. */
  public static RefusedRequestException refused() {
    return new RefusedRequestException(
        "fileMissing",
        "The file of this capture is not here: it came with an import, which carries no"
            + " recordings. Upload the same file to any visit; this capture then has it again.");
  }
}
