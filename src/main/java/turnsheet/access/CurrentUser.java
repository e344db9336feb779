package turnsheet.access;

import org.springframework.security.core.Authentication;
import org.springframework.security.core.context.SecurityContextHolder;
import org.springframework.stereotype.Component;

/** Who is behind the request at hand. */
@Component
public class CurrentUser {

  /** Stands in the books where the service itself acts: jobs, the demo. */
  public static final String SERVICE = "service";

  private final Accounts accounts;

  CurrentUser(Accounts accounts) {
    this.accounts = accounts;
  }

  /** The sign-in name, or {@link #SERVICE} outside a signed-in request. */
  public String signInName() {
    Authentication authentication = SecurityContextHolder.getContext().getAuthentication();
    return authentication == null || authentication.getPrincipal() instanceof String
        ? SERVICE // nobody, or the anonymous visitor
        : authentication.getName();
  }

  /** Whether the service itself acts, outside any request; an anonymous visitor is one. */
  public boolean isService() {
    return SecurityContextHolder.getContext().getAuthentication() == null;
  }

  public boolean isOwner() {
    Authentication authentication = SecurityContextHolder.getContext().getAuthentication();
    return authentication != null
        && authentication.getAuthorities().stream()
            .anyMatch(a -> Role.OWNER.authority().equals(a.getAuthority()));
  }

  /**
   * The account of the signed-in person.
   *
   * @throws IllegalStateException outside a signed-in request
   */
  public Account account() {
    return accounts
        .bySignInName(signInName())
        .orElseThrow(() -> new IllegalStateException("nobody is signed in"));
  }
}
