package turnsheet.capture;

import turnsheet.web.RefusedRequestException;

/** What a file may be called. */
public final class FileName {

  private FileName() {}

  /**
   * The name itself without blanks around it; anything that could mean a place is refused.
   *
   * @throws RefusedRequestException if it is odd, empty or too long
   */
  public static String checked(String given) {
    String name = given.strip();
    boolean odd =
        name.chars().anyMatch(c -> c == '/' || c == '\\' || Character.isISOControl(c))
            || name.equals(".")
            || name.equals("..");
    if (name.isEmpty() || odd) {
      throw new RefusedRequestException(
          "fileName",
          "The file needs a plain name without folders, slashes and control characters: rename it"
              + " and upload it again.");
    }
    if (name.length() > Capture.FILE_NAME_LENGTH) {
      throw new RefusedRequestException(
          "fileName",
          "The file's name has "
              + name.length()
              + " characters, of which "
              + Capture.FILE_NAME_LENGTH
              + " can be kept: rename it and upload it again.");
    }
    return name;
  }
}
