package turnsheet.access;

import java.time.Duration;
import org.springframework.boot.context.event.ApplicationReadyEvent;
import org.springframework.context.event.EventListener;
import org.springframework.core.env.Environment;
import org.springframework.stereotype.Service;
import org.springframework.transaction.annotation.Transactional;
import turnsheet.access.OneTimeAddresses.Purpose;
import turnsheet.access.ShopProfiles.ShopProfile;
import turnsheet.web.NotFoundException;

/** The owner's account is set up at a one-time address that only the console shows. */
@Service
public class FirstRun {

  private static final Duration LIFETIME = Duration.ofHours(24);

  private final Accounts accounts;
  private final OneTimeAddresses addresses;
  private final ShopProfiles profiles;
  private final AuditTrail audit;

  FirstRun(Accounts accounts, OneTimeAddresses addresses, ShopProfiles profiles, AuditTrail audit) {
    this.accounts = accounts;
    this.addresses = addresses;
    this.profiles = profiles;
    this.audit = audit;
  }

  @EventListener
  void announce(ApplicationReadyEvent ready) {
    Environment environment = ready.getApplicationContext().getEnvironment();
    String port = environment.getProperty("local.server.port");
    if (port != null && accounts.none()) {
      String path = addresses.issue(Purpose.FIRST_RUN, null, LIFETIME);
      System.out.println("Set up the owner's account: http://localhost:" + port + path);
    }
  }

  public boolean open(String token) {
    return accounts.none()
        && addresses.look(token).filter(o -> o.purpose() == Purpose.FIRST_RUN).isPresent();
  }

  /**
   * Makes the owner and the letterhead, and uses the address up.
   *
   * @throws NotFoundException where the address is not, or no longer, good
   */
  @Transactional
  public Account complete(
      String token, String signInName, String displayName, String password, ShopProfile profile) {
    if (!open(token) || addresses.use(token).isEmpty()) {
      throw new NotFoundException("address");
    }
    profiles.put(profile);
    Account owner = accounts.create(signInName, displayName, Role.OWNER, password);
    audit.record(owner.signInName(), "access.audit.firstRun", profile.name());
    return owner;
  }
}
