package turnsheet.access;

import java.util.Collection;
import java.util.List;
import java.util.UUID;
import org.jspecify.annotations.Nullable;
import org.springframework.security.core.GrantedAuthority;
import org.springframework.security.core.authority.SimpleGrantedAuthority;
import org.springframework.security.core.userdetails.UserDetails;
import turnsheet.web.Visitor;

/**
 * The account behind a request, as the security context carries it.
 *
 * @param passwordHash null where a key or a one-time address took the place of the password
 */
public record SignedInUser(
    UUID accountId,
    String signInName,
    String displayName,
    Role role,
    boolean enabled,
    @Nullable String passwordHash)
    implements UserDetails, Visitor {

  static SignedInUser of(Account account, @Nullable String passwordHash) {
    return new SignedInUser(
        account.id(),
        account.signInName(),
        account.displayName(),
        account.role(),
        account.enabled(),
        passwordHash);
  }

  /** The account as a visitor who has already proved who he is. */
  public static SignedInUser of(Account account) {
    return of(account, null);
  }

  @Override
  public Collection<? extends GrantedAuthority> getAuthorities() {
    return List.of(new SimpleGrantedAuthority(role.authority()));
  }

  @Override
  public @Nullable String getPassword() {
    return passwordHash;
  }

  @Override
  public String getUsername() {
    return signInName;
  }

  @Override
  public boolean isEnabled() {
    return enabled;
  }

  @Override
  public String toString() {
    return signInName;
  }
}
