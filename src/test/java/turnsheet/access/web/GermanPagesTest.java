package turnsheet.access.web;

import static org.assertj.core.api.Assertions.assertThat;
import static org.springframework.security.test.web.servlet.request.SecurityMockMvcRequestPostProcessors.anonymous;
import static org.springframework.security.test.web.servlet.request.SecurityMockMvcRequestPostProcessors.csrf;

import org.junit.jupiter.api.AfterEach;
import org.junit.jupiter.api.BeforeEach;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;
import org.springframework.beans.factory.annotation.Autowired;
import org.springframework.test.web.servlet.assertj.MockMvcTester;
import turnsheet.access.ShopLanguage;
import turnsheet.access.ShopProfiles;
import turnsheet.testing.AsOwner;
import turnsheet.testing.ServiceTest;
import turnsheet.web.EnglishLeft;
import turnsheet.web.PageLanguage;

/** The shop reads German; what programs read stays English. */
@ServiceTest
@AsOwner
class GermanPagesTest {

  @Autowired private MockMvcTester mvc;
  @Autowired private ShopLanguage language;
  @Autowired private ShopProfiles profiles;

  @BeforeEach
  void speakGerman() {
    if (profiles.get().isEmpty()) {
      profiles.put(new ShopProfiles.ShopProfile("A shop", ""));
    }
    language.put(PageLanguage.GERMAN);
  }

  @AfterEach
  void speakEnglish() {
    language.put(PageLanguage.ENGLISH);
  }

  @ParameterizedTest
  @ValueSource(
      strings = {
        "/",
        "/units",
        "/units/new",
        "/units/labels",
        "/models",
        "/models/new",
        "/customers",
        "/customers/new",
        "/instruments",
        "/instruments/new",
        "/media/new",
        "/reports",
        "/check",
        "/check?code=none",
        "/shop",
        "/shop/preferences",
        "/shop/profile",
        "/shop/rules",
        "/shop/people/new",
        "/help/recording",
        "/help/words",
        "/sign-in",
        "/sign-in?wrong"
      })
  void noEnglishIsLeft(String address) {
    assertThat(mvc.get().uri(address))
        .hasStatusOk()
        .bodyText()
        .satisfies(page -> assertThat(EnglishLeft.in(page)).isEmpty());
  }

  @Test
  void theCheckForEnglishFindsIt() {
    language.put(PageLanguage.ENGLISH);
    assertThat(mvc.get().uri("/units"))
        .bodyText()
        .contains("lang=\"en\"")
        .satisfies(page -> assertThat(EnglishLeft.in(page)).hasSizeGreaterThan(2));
  }

  @Test
  void whatIsTypedWrongIsToldInGerman() {
    assertThat(mvc.post().uri("/customers/new").with(csrf()).param("name", "").param("contact", ""))
        .bodyText()
        .contains("Das darf nicht leer sein.")
        .satisfies(page -> assertThat(EnglishLeft.in(page)).isEmpty());
  }

  @Test
  void errorPagesAreGermanAndTheirSentenceToo() {
    assertThat(mvc.get().uri("/units/00000000-0000-0000-0000-000000000000"))
        .hasStatus(404)
        .bodyText()
        .contains("Dieses Gerät gibt es nicht.")
        .satisfies(page -> assertThat(EnglishLeft.in(page)).isEmpty());
  }

  @Test
  void programsReadEnglish() {
    assertThat(mvc.get().uri("/api/v1/units/00000000-0000-0000-0000-000000000000"))
        .hasStatus(404)
        .bodyText()
        .contains("There is no such unit.");
  }

  @Test
  void theOwnerChoosesTheLanguage() {
    assertThat(
            mvc.post()
                .uri("/shop/preferences")
                .with(csrf())
                .param("speeds", "CM_PER_S")
                .param("mains", "50")
                .param("paper", "A4")
                .param("language", "en"))
        .hasStatus(302);
    assertThat(mvc.get().uri("/units")).bodyText().contains("<html lang=\"en\"");
  }

  @Test
  void strangersAreAnsweredAsTheirBrowserAsksOrInTheLanguageOfTheShop() {
    language.put(PageLanguage.ENGLISH);
    for (String address : new String[] {"/check", "/s/none"}) {
      assertThat(mvc.get().uri(address).with(anonymous()).header("Accept-Language", "de-AT, en"))
          .bodyText()
          .contains("lang=\"de\"");
      assertThat(mvc.get().uri(address).with(anonymous()).header("Accept-Language", "fr, de"))
          .bodyText()
          .contains("lang=\"en\"");
    }
    language.put(PageLanguage.GERMAN);
    assertThat(mvc.get().uri("/check").with(anonymous()).header("Accept-Language", "fr"))
        .bodyText()
        .contains("lang=\"de\"");
  }
}
