package turnsheet.web;

/** Somebody else came first, and what was asked no longer fits; becomes 409 with its sentence. */
public final class OvertakenException extends RuntimeException {

  private final String code;

  /**
   * @param code stable word in lower camel case, for programs
   * @param sentence what happened and what to do, for people
   */
  public OvertakenException(String code, String sentence) {
    super(sentence);
    this.code = code;
  }

  public String code() {
    return code;
  }
}
