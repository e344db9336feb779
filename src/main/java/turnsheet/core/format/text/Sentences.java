package turnsheet.core.format.text;

/** Sentences that more than one reader needs. */
final class Sentences {

  private Sentences() {}

  static String backwards(long line, double before, double now) {
    return "Line "
        + line
        + ": the time "
        + now
        + " follows "
        + before
        + ": time must not run backwards; sort or split the table.";
  }
}
