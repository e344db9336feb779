package turnsheet.web;

import static org.assertj.core.api.Assertions.assertThat;

import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;
import org.springframework.beans.factory.annotation.Autowired;
import org.springframework.test.web.servlet.assertj.MockMvcTester;
import turnsheet.testing.AsOwner;
import turnsheet.testing.AsTechnician;
import turnsheet.testing.ServiceTest;

@ServiceTest
class PagesTest {
  @Autowired MockMvcTester mvc;

  @Test
  @AsOwner
  void unknownAddressGetsTheErrorPageInTheLayout() {
    assertThat(mvc.get().uri("/no-such-page"))
        .hasStatus(404)
        .bodyText()
        .contains("Nothing here", "aria-label=\"Main\"", "Sign out")
        .doesNotContain("Exception", "??");
  }

  @ParameterizedTest
  @ValueSource(strings = {"/help/recording", "/help/words"})
  @AsTechnician
  void helpPagesMarkTheirPlaceInTheMenu(String address) {
    assertThat(mvc.get().uri(address))
        .hasStatusOk()
        .bodyText()
        .contains("<a href=\"" + address + "\" aria-current=\"page\">")
        .doesNotContain("th:", "??");
  }

  @Test
  @AsTechnician
  void whoeverReadsHowToConnectReadsTheCautionsFirst() {
    assertThat(mvc.get().uri("/help/recording"))
        .bodyText()
        .containsSubsequence(
            "Mains voltage can kill", "Capacitors", "capstans, idlers, belts", "A test tone</h2>");
  }

  @Test
  void strangersSeeNoMenu() {
    assertThat(mvc.get().uri("/sign-in"))
        .hasStatusOk()
        .bodyText()
        .contains("name=\"_csrf\"")
        .doesNotContain("aria-label=\"Main\"", "Sign out");
  }

  @Test
  @AsOwner
  void pagesNeedNoScriptAndNoStyleInLine() {
    for (String address : new String[] {"/shop", "/help/words", "/no-such-page"}) {
      assertThat(mvc.get().uri(address))
          .bodyText()
          .doesNotContain("style=\"", "<style", "onclick=")
          .doesNotContainPattern("<script(?![^>]*src=)");
    }
  }
}
