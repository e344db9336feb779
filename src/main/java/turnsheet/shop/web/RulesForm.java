package turnsheet.shop.web;

import java.util.Optional;
import org.jspecify.annotations.Nullable;
import org.springframework.validation.Errors;
import turnsheet.core.diagnose.DecisionRule;
import turnsheet.shop.ShopRules;

/** How the shop judges, as typed. */
record RulesForm(DecisionRule rule, String leastFlutter, String leastSpeed) {

  RulesForm {
    leastFlutter = Typed.text(leastFlutter);
    leastSpeed = Typed.text(leastSpeed);
  }

  static RulesForm of(ShopRules.Rules rules) {
    return new RulesForm(
        rules.rule(),
        Typed.number(rules.leastFlutterChangePercent()),
        Typed.number(rules.leastSpeedChangePercent()));
  }

  /** The rules meant; nothing where the errors say why. */
  Optional<ShopRules.Rules> rules(Errors errors) {
    Double flutter = percent(errors, "leastFlutter", leastFlutter);
    Double speed = percent(errors, "leastSpeed", leastSpeed);
    return rule == null || flutter == null || speed == null
        ? Optional.empty()
        : Optional.of(new ShopRules.Rules(rule, flutter, speed));
  }

  private static @Nullable Double percent(Errors errors, String field, String typed) {
    if (typed.isEmpty()) {
      errors.rejectValue(field, "shop.form.numberMissing");
      return null;
    }
    Double value = Typed.notNegativeOrNone(errors, field, typed);
    if (value != null && value > ShopRules.LARGEST_PERCENT) {
      errors.rejectValue(field, "shop.rules.tooLarge");
      return null;
    }
    return value;
  }
}
