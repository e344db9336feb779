package turnsheet.exchange;

import static turnsheet.exchange.Member.decimal;
import static turnsheet.exchange.Member.text;
import static turnsheet.exchange.Member.whole;

import java.util.List;

/**
 * What the shop has set for itself: one row each, in an export of everything only. What differs
 * stays as it is here unless whoever imports says otherwise.
 */
final class ShopKinds {

  /** No unit and no visit has any. */
  private static final String NEVER = "1 = 0";

  /** Letterhead and preferences. */
  static final Kind PROFILE =
      new Kind(
          "shop",
          "shop_profile",
          "name",
          "",
          NEVER,
          List.of(
              whole("id"),
              text("name"),
              text("address"),
              text("speedUnit"),
              whole("mainsHz"),
              text("paper"),
              text("language")),
          List.of(),
          2);

  static final Kind RULES =
      new Kind(
          "shopRules",
          "shop_rules",
          "decisionRule",
          "",
          NEVER,
          List.of(
              whole("id"),
              text("decisionRule"),
              decimal("leastFlutterChangePercent"),
              decimal("leastSpeedChangePercent")),
          List.of(),
          2);

  static final Kind LOGO =
      new Kind(
          "shopLogo",
          "shop_logo",
          "mediaType",
          "",
          NEVER,
          List.of(whole("id"), text("mediaType"), Member.of("content", MemberType.BYTES)),
          List.of(),
          2);

  private static final List<Kind> ALL = List.of(PROFILE, RULES, LOGO);

  private ShopKinds() {}

  static boolean has(Kind kind) {
    return ALL.contains(kind);
  }
}
