package turnsheet.web;

import org.springframework.validation.BindingResult;

/** What became of a form that was sent. */
public final class Bound {

  private Bound() {}

  /**
   * Makes sure that there is a form to be shown again with its errors.
   *
   * @throws RefusedRequestException where a choice held what no page of ours offers, so that the
   *     form could not even be made
   */
  public static void require(BindingResult errors) {
    if (errors.getTarget() == null) {
      throw new RefusedRequestException("invalid", "Some fields are missing or wrong.");
    }
  }
}
