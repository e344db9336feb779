package turnsheet.access.web;

import static org.assertj.core.api.Assertions.assertThat;
import static org.springframework.security.test.web.servlet.request.SecurityMockMvcRequestPostProcessors.csrf;

import org.junit.jupiter.api.AfterEach;
import org.junit.jupiter.api.BeforeEach;
import org.junit.jupiter.api.Test;
import org.springframework.beans.factory.annotation.Autowired;
import org.springframework.security.test.context.support.WithAnonymousUser;
import org.springframework.test.web.servlet.assertj.MockMvcTester;
import turnsheet.access.ShopPreferences;
import turnsheet.access.ShopPreferences.Liked;
import turnsheet.access.ShopProfiles;
import turnsheet.shop.MachineModel;
import turnsheet.shop.MachineModels;
import turnsheet.shop.SpeedSetting;
import turnsheet.shop.SpeedSettingId;
import turnsheet.shop.SpeedUnit;
import turnsheet.testing.AsOwner;
import turnsheet.testing.AsTechnician;
import turnsheet.testing.ServiceTest;

@ServiceTest
@AsOwner
class PreferencesPagesTest {

  @Autowired private MockMvcTester mvc;
  @Autowired private ShopPreferences preferences;
  @Autowired private ShopProfiles profiles;
  @Autowired private MachineModels models;

  @BeforeEach
  void haveALetterhead() {
    if (profiles.get().isEmpty()) {
      profiles.put(new ShopProfiles.ShopProfile("A shop", ""));
    }
  }

  @AfterEach
  void leaveTheUsual() {
    preferences.put(Liked.USUAL);
  }

  @Test
  void theShopChoosesUnitMainsAndPaper() {
    var model =
        models.add(
            MachineModel.named("Deck of inches", null, "")
                .withSetting(
                    new SpeedSetting(
                        SpeedSettingId.next(), "slow", SpeedUnit.CM_PER_S, 9.525, null, null)));
    String page = "/models/" + model.id();
    assertThat(mvc.get().uri(page)).bodyText().contains("9.525\u202fcm/s (3.75\u202fin/s)");
    assertThat(mvc.get().uri("/css/paper.css")).bodyText().isEqualTo("@page { size: A4; }\n");

    assertThat(save("IN_PER_S", "60", "LETTER")).hasStatus(302);

    assertThat(mvc.get().uri(page))
        .bodyText()
        .contains("3.75\u202fin/s (9.525\u202fcm/s)")
        .containsPattern("value=\"IN_PER_S\"[^>]*selected");
    assertThat(mvc.get().uri("/css/paper.css"))
        .hasHeader("Content-Type", "text/css")
        .bodyText()
        .isEqualTo("@page { size: letter; }\n");
    assertThat(mvc.get().uri("/shop/preferences"))
        .bodyText()
        .containsPattern("value=\"60\"\\s+selected")
        .doesNotContain("??");
  }

  @Test
  void nonsenseIsRefused() {
    assertThat(save("FURLONGS", "60", "A4")).hasStatus(422);
    assertThat(save("CM_PER_S", "16", "A4")).hasStatus(422);
    assertThat(preferences.get()).isEqualTo(Liked.USUAL);
  }

  @Test
  @AsTechnician
  void onlyAnOwnerChangesThem() {
    assertThat(mvc.get().uri("/shop/preferences")).hasStatus(403);
    assertThat(save("IN_PER_S", "60", "LETTER")).hasStatus(403);
  }

  @Test
  @WithAnonymousUser
  void aSharedSheetPrintsOnTheShopsPaperToo() {
    assertThat(mvc.get().uri("/css/paper.css")).hasStatusOk();
  }

  private MockMvcTester.MockMvcRequestBuilder save(String speeds, String mains, String paper) {
    return mvc.post()
        .uri("/shop/preferences")
        .with(csrf())
        .param("speeds", speeds)
        .param("mains", mains)
        .param("paper", paper)
        .param("language", "en");
  }
}
