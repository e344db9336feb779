package turnsheet.access.web;

import java.time.Instant;
import java.util.List;
import java.util.Locale;
import org.jspecify.annotations.Nullable;
import org.springframework.context.MessageSource;
import org.springframework.stereotype.Component;
import turnsheet.access.Account;
import turnsheet.access.Accounts;
import turnsheet.access.ApiKeys;
import turnsheet.access.ApiKeys.ApiKey;
import turnsheet.access.AuditTrail;
import turnsheet.access.CurrentUser;
import turnsheet.access.Role;
import turnsheet.access.ShopProfiles;
import turnsheet.access.ShopProfiles.ShopProfile;
import turnsheet.web.Times;

/** Puts the shop page together for whoever looks at it. */
@Component
class ShopPages {

  private static final int ENTRIES = 100;

  private final ShopProfiles profiles;
  private final Accounts accounts;
  private final ApiKeys keys;
  private final AuditTrail audit;
  private final CurrentUser user;
  private final Times times;
  private final MessageSource messages;

  ShopPages(
      ShopProfiles profiles,
      Accounts accounts,
      ApiKeys keys,
      AuditTrail audit,
      CurrentUser user,
      Times times,
      MessageSource messages) {
    this.profiles = profiles;
    this.accounts = accounts;
    this.keys = keys;
    this.audit = audit;
    this.user = user;
    this.times = times;
    this.messages = messages;
  }

  ShopPage page(Locale locale) {
    ShopProfile profile = profiles.get().orElse(new ShopProfile("", ""));
    boolean owner = user.isOwner();
    return new ShopPage(
        owner,
        profile.name(),
        profile.address().lines().toList(),
        owner ? accounts.all().stream().map(this::person).toList() : List.of(),
        keys.all().stream()
            .filter(k -> owner || k.signInName().equals(user.signInName()))
            .map(this::key)
            .toList(),
        owner ? audit.latest(ENTRIES).stream().map(e -> entry(e, locale)).toList() : List.of());
  }

  private ShopPage.Person person(Account account) {
    return new ShopPage.Person(
        account.id(),
        account.displayName(),
        account.signInName(),
        account.role() == Role.OWNER ? "access.role.owner" : "access.role.technician",
        times.day(account.createdAt()),
        account.enabled());
  }

  private ShopPage.Key key(ApiKey key) {
    return new ShopPage.Key(
        key.id(),
        key.label(),
        key.signInName(),
        times.day(key.createdAt()),
        orEmpty(key.lastUsedAt()),
        orEmpty(key.withdrawnAt()));
  }

  private ShopPage.Entry entry(AuditTrail.Entry entry, Locale locale) {
    String action = messages.getMessage(entry.action(), null, entry.action(), locale);
    return new ShopPage.Entry(
        times.minute(entry.at()),
        entry.signInName(),
        action == null ? entry.action() : action,
        entry.subject());
  }

  private String orEmpty(@Nullable Instant at) {
    return at == null ? "" : times.minute(at);
  }
}
