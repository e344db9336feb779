package turnsheet.access.web;

import static org.assertj.core.api.Assertions.assertThat;
import static org.springframework.security.test.web.servlet.request.SecurityMockMvcRequestPostProcessors.csrf;
import static org.springframework.test.web.servlet.request.MockMvcRequestBuilders.get;
import static org.springframework.test.web.servlet.request.MockMvcRequestBuilders.post;

import java.time.Duration;
import org.junit.jupiter.api.MethodOrderer.OrderAnnotation;
import org.junit.jupiter.api.Order;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.TestMethodOrder;
import org.springframework.beans.factory.annotation.Autowired;
import org.springframework.boot.test.context.SpringBootTest;
import org.springframework.boot.webmvc.test.autoconfigure.AutoConfigureMockMvc;
import org.springframework.mock.web.MockHttpSession;
import org.springframework.test.context.ContextConfiguration;
import org.springframework.test.web.servlet.assertj.MockMvcTester;
import org.springframework.test.web.servlet.request.MockHttpServletRequestBuilder;
import turnsheet.access.Accounts;
import turnsheet.access.OneTimeAddresses;
import turnsheet.access.OneTimeAddresses.Purpose;
import turnsheet.testing.Answers;
import turnsheet.testing.TemporaryData;

/** The first minutes of a new service, told in order: it starts without any account. */
@SpringBootTest
@AutoConfigureMockMvc
@ContextConfiguration(initializers = TemporaryData.class)
@TestMethodOrder(OrderAnnotation.class)
class FirstRunFlowTest {
  @Autowired MockMvcTester mvc;
  @Autowired Accounts accounts;
  @Autowired OneTimeAddresses addresses;

  @Test
  @Order(1)
  void startsWithoutAnyAccount() {
    assertThat(accounts.none()).isTrue();
    assertThat(accounts.all()).isEmpty();
  }

  @Test
  @Order(2)
  void everyPageSaysThatTheServiceIsNotSetUp() {
    assertThat(mvc.get().uri("/")).hasRedirectedUrl("/not-set-up");
    assertThat(mvc.get().uri("/units/anything")).hasRedirectedUrl("/not-set-up");
    assertThat(mvc.get().uri("/sign-in")).hasRedirectedUrl("/not-set-up");
    assertThat(mvc.get().uri("/not-set-up")).hasStatusOk().bodyText().contains("first-run");
  }

  @Test
  @Order(3)
  void noUsualNameAndPasswordOpensIt() {
    String[][] usual = {
      {"admin", "admin"}, {"admin", ""}, {"owner", "owner"}, {"user", "password"}, {"sa", ""}
    };
    for (String[] pair : usual) {
      assertThat(
              mvc.perform(
                  post("/sign-in").param("name", pair[0]).param("password", pair[1]).with(csrf())))
          .hasRedirectedUrl("/sign-in?wrong");
    }
  }

  @Test
  @Order(4)
  void wrongOrExpiredAddressDoesNotOpen() {
    String expired = addresses.issue(Purpose.FIRST_RUN, null, Duration.ofSeconds(-1));
    assertThat(mvc.get().uri(expired)).hasStatus(404);
    assertThat(mvc.get().uri("/first-run/" + "A".repeat(32))).hasStatus(404);
    assertThat(mvc.perform(setUp(expired, "long enough words", "long enough words")))
        .hasStatus(404);
    assertThat(accounts.all()).isEmpty();
  }

  @Test
  @Order(5)
  void shortOrUnevenPasswordsAreTurnedBackAndTheAddressStaysGood() {
    String address = addresses.issue(Purpose.FIRST_RUN, null, Duration.ofHours(1));
    assertThat(mvc.perform(setUp(address, "short", "short")))
        .hasStatusOk()
        .bodyText()
        .contains("Use 10 characters or more.")
        .doesNotContain("value=\"short\"");
    assertThat(mvc.perform(setUp(address, "long enough words", "other enough words")))
        .hasStatusOk()
        .bodyText()
        .contains("The two passwords differ.");
    assertThat(mvc.get().uri(address)).hasStatusOk();
    assertThat(accounts.all()).isEmpty();
  }

  @Test
  @Order(6)
  void theAddressMakesTheOwnerOnceAndSignsIn() throws Exception {
    String address = addresses.issue(Purpose.FIRST_RUN, null, Duration.ofHours(1));
    var done = mvc.perform(setUp(address, "long enough words", "long enough words"));
    assertThat(done).hasRedirectedUrl("/");
    MockHttpSession session = Answers.session(done);
    assertThat(mvc.perform(get("/shop").session(session)))
        .hasStatusOk()
        .bodyText()
        .contains("Invented Bench", "Ada Bench");
    assertThat(mvc.perform(setUp(address, "long enough words", "long enough words")))
        .hasStatus(404);
    assertThat(accounts.all()).singleElement().extracting("signInName").isEqualTo("ada");
  }

  @Test
  @Order(7)
  void noSecondOwnerByAnotherFirstRunAddress() {
    String address = addresses.issue(Purpose.FIRST_RUN, null, Duration.ofHours(1));
    assertThat(mvc.get().uri(address)).hasStatus(404);
    assertThat(mvc.perform(setUp(address, "long enough words", "long enough words")))
        .hasStatus(404);
    assertThat(mvc.get().uri("/")).hasRedirectedUrl("/sign-in");
  }

  private static MockHttpServletRequestBuilder setUp(String address, String first, String again) {
    return post(address)
        .param("name", "Ada")
        .param("displayName", "Ada Bench")
        .param("password", first)
        .param("again", again)
        .param("shopName", "Invented Bench")
        .param("shopAddress", "1 Example Lane")
        .with(csrf());
  }
}
