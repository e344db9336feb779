package turnsheet.web;

import java.util.Set;
import org.jspecify.annotations.Nullable;
import org.springframework.http.HttpStatus;
import org.springframework.http.HttpStatusCode;
import org.springframework.web.servlet.ModelAndView;

/** The error page: a title and a text by status, a sentence where there is one, a reference. */
public final class ErrorView {

  /** Request attribute: a form came too late, or not from our page. */
  public static final String STALE_FORM = "turnsheet.staleForm";

  private static final Set<Integer> OWN_TEXT = Set.of(403, 404, 409, 413, 422, 500);

  private ErrorView() {}

  static ModelAndView of(HttpStatusCode status, @Nullable String sentence, @Nullable String ref) {
    return page(status, textFor(status), sentence, ref);
  }

  static ModelAndView staleForm() {
    return page(HttpStatus.FORBIDDEN, "stale", null, null);
  }

  private static ModelAndView page(
      HttpStatusCode status, String text, @Nullable String sentence, @Nullable String reference) {
    ModelAndView view = new ModelAndView("error/page", status);
    view.addObject("titleKey", "web.error." + text + ".title");
    view.addObject("textKey", "web.error." + text + ".text");
    view.addObject("sentence", sentence);
    view.addObject("reference", reference);
    return view;
  }

  private static String textFor(HttpStatusCode status) {
    if (status.is5xxServerError()) {
      return "500";
    }
    return OWN_TEXT.contains(status.value()) ? Integer.toString(status.value()) : "400";
  }
}
