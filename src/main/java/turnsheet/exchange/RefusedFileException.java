package turnsheet.exchange;

/** A file that cannot be taken in; nothing of it was. */
public final class RefusedFileException extends RuntimeException {

  private final String code;

  /**
   * @param code stable word in lower camel case, for programs
   * @param sentence what is wrong, where, and what to do, for people
   */
  RefusedFileException(String code, String sentence) {
    super(sentence + " Nothing of the file was taken in.");
    this.code = code;
  }

  /** Something is wrong at a place of the file. */
  static RefusedFileException at(Place place, String sentence) {
    return new RefusedFileException(
        "brokenExport", "Line %d, column %d: %s".formatted(place.line(), place.column(), sentence));
  }

  public String code() {
    return code;
  }

  /** Where in a file, counted from 1. */
  record Place(int line, int column) {}
}
