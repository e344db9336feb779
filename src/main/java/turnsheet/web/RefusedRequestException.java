package turnsheet.web;

/** A request that is understood and cannot be carried out; becomes 422 with its sentence. */
public final class RefusedRequestException extends RuntimeException {

  private final String code;

  /**
   * @param code stable word in lower camel case, for programs
   * @param sentence what is wrong and what to do, for people
   */
  public RefusedRequestException(String code, String sentence) {
    super(sentence);
    this.code = code;
  }

  public String code() {
    return code;
  }
}
