package turnsheet.exchange;

import turnsheet.access.ShopPreferences;
import turnsheet.core.diagnose.DecisionRule;
import turnsheet.shop.ShopRules;
import turnsheet.web.PageLanguage;

/** Holds what a file says of the shop against what the shop's own pages would have taken. */
final class ShopChecks {

  private ShopChecks() {}

  /**
   * Looks at an entry of {@link ShopKinds}.
   *
   * @throws RuntimeException if it breaks a rule
   */
  static void check(Entry entry) {
    if (entry.is(ShopKinds.LOGO)) {
      Pictures.checkLogo(entry);
    } else if (entry.is(ShopKinds.RULES)) {
      rules(entry);
    } else {
      profile(entry);
    }
  }

  private static ShopRules.Rules rules(Entry entry) {
    return new ShopRules.Rules(
        DecisionRule.valueOf(entry.text("decisionRule")),
        entry.decimal("leastFlutterChangePercent"),
        entry.decimal("leastSpeedChangePercent"));
  }

  private static ShopPreferences.Liked profile(Entry entry) {
    String language = entry.text("language");
    if (entry.text("name").isBlank() || !PageLanguage.of(language).getLanguage().equals(language)) {
      throw new IllegalArgumentException("it lacks a name, or its language is none of the pages'");
    }
    return new ShopPreferences.Liked(
        ShopPreferences.SpeedLiking.valueOf(entry.text("speedUnit")),
        Math.toIntExact(entry.whole("mainsHz")),
        ShopPreferences.Paper.valueOf(entry.text("paper")));
  }
}
