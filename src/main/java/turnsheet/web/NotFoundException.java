package turnsheet.web;

/** A page or document that does not exist, or not for this visitor; becomes 404. */
public final class NotFoundException extends RuntimeException {

  /**
   * @param what the kind of thing, for people: {@code unit}
   */
  public NotFoundException(String what) {
    super("There is no such " + what + ".");
  }
}
