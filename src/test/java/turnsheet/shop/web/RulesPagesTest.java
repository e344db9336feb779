package turnsheet.shop.web;

import static org.assertj.core.api.Assertions.assertThat;

import org.junit.jupiter.api.AfterEach;
import org.junit.jupiter.api.Test;
import org.springframework.beans.factory.annotation.Autowired;
import org.springframework.test.web.servlet.assertj.MockMvcTester;
import turnsheet.core.diagnose.DecisionRule;
import turnsheet.shop.ShopRules;
import turnsheet.testing.AsOwner;
import turnsheet.testing.AsTechnician;
import turnsheet.testing.ServiceTest;

@ServiceTest
@AsOwner
class RulesPagesTest {

  private final Browser browser;
  private final ShopRules rules;
  private final ShopRules.Rules before;

  @Autowired
  RulesPagesTest(MockMvcTester mvc, ShopRules rules) {
    this.browser = new Browser(mvc);
    this.rules = rules;
    this.before = rules.get();
  }

  @AfterEach
  void asItWas() {
    rules.put(before);
  }

  @Test
  void theOwnerChoosesTheRuleAndWhatMatters() throws Exception {
    assertThat(before).isEqualTo(new ShopRules.Rules(DecisionRule.GUARDED, 10, 0.02));
    assertThat(browser.read("/shop")).contains("/shop/rules");

    browser.sendOn("/shop/rules", "rule", "SIMPLE", "leastFlutter", "5", "leastSpeed", "0.1");

    assertThat(rules.get()).isEqualTo(new ShopRules.Rules(DecisionRule.SIMPLE, 5, 0.1));
    assertThat(browser.read("/shop/rules"))
        .containsPattern("value=\"SIMPLE\"[^>]*checked")
        .contains("value=\"0.1\"");
  }

  @Test
  void eachRuleIsToldWithoutSayingAgainThatItIsOne() throws Exception {
    assertThat(browser.read("/shop/rules"))
        .containsOnlyOnce("Decision rule")
        .contains("The value alone decides", "on both sides of the limit");
    assertThat(browser.read("/help/words"))
        .contains("<b>Simple acceptance</b>", "<b>Guard band</b>");
  }

  @Test
  void whatIsNoThresholdComesBack() throws Exception {
    browser.sendBack(
        "/shop/rules",
        "At most 100.",
        "101",
        "rule",
        "SIMPLE",
        "leastFlutter",
        "101",
        "leastSpeed",
        "0");
    browser.sendBack(
        "/shop/rules",
        "must not be below zero",
        "-1",
        "rule",
        "SIMPLE",
        "leastFlutter",
        "-1",
        "leastSpeed",
        "0");
    assertThat(rules.get()).isEqualTo(before);
  }

  @Test
  void aRuleThatNoPageOffersIsRefusedWithASentence() {
    assertThat(browser.send("/shop/rules", "rule", "NONE", "leastFlutter", "1", "leastSpeed", "1"))
        .hasStatus(422)
        .bodyText()
        .contains("Some fields are missing or wrong.");
    assertThat(rules.get()).isEqualTo(before);
  }

  @Test
  @AsTechnician
  void aTechnicianDoesNotChangeThem() {
    assertThat(
            browser.send("/shop/rules", "rule", "SIMPLE", "leastFlutter", "1", "leastSpeed", "1"))
        .hasStatus(403);
  }
}
