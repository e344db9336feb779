package turnsheet.core.format.api;

import turnsheet.core.signal.Rejection;

/** What became of looking at a file. */
public sealed interface Recognition {

  /** The file can be opened. */
  record Accepted(Recognised recognised) implements Recognition {}

  /** The file cannot be used. */
  record Refused(Rejection rejection) implements Recognition {}
}
