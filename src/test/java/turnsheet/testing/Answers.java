package turnsheet.testing;

import java.util.Objects;
import org.springframework.mock.web.MockHttpSession;
import org.springframework.test.web.servlet.assertj.MvcTestResult;

/** What an answer left behind for the next request. */
public final class Answers {

  private Answers() {}

  /** The session that the answer began or went on with. */
  public static MockHttpSession session(MvcTestResult answer) {
    return (MockHttpSession) Objects.requireNonNull(answer.getRequest().getSession(false));
  }

  /** A word handed to the page that the answer redirects to. */
  public static String flash(MvcTestResult answer, String name) {
    return (String) Objects.requireNonNull(answer.getMvcResult().getFlashMap().get(name));
  }
}
