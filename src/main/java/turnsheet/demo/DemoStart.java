package turnsheet.demo;

import java.time.Duration;
import org.springframework.boot.context.event.ApplicationReadyEvent;
import org.springframework.boot.context.event.ApplicationStartedEvent;
import org.springframework.context.event.EventListener;
import org.springframework.core.env.Environment;
import org.springframework.jdbc.core.simple.JdbcClient;
import org.springframework.stereotype.Component;
import turnsheet.access.Account;
import turnsheet.access.Accounts;
import turnsheet.access.OneTimeAddresses;
import turnsheet.access.Role;
import turnsheet.access.ShopProfiles;

/**
 * Loads the demo at its first start, tells how far its measurements are, and lets one visitor in.
 */
@Component
class DemoStart {

  private static final String SIGN_IN_NAME = "demo";
  private static final Duration ADDRESS_LIFETIME = Duration.ofHours(12);
  private static final long LOOK_EVERY_MS = 500;

  private final Accounts accounts;
  private final OneTimeAddresses addresses;
  private final ShopProfiles profiles;
  private final DemoShop shop;
  private final DemoReports reports;
  private final JdbcClient jdbc;
  private final Environment environment;

  DemoStart(
      Accounts accounts,
      OneTimeAddresses addresses,
      ShopProfiles profiles,
      DemoShop shop,
      DemoReports reports,
      JdbcClient jdbc,
      Environment environment) {
    this.accounts = accounts;
    this.addresses = addresses;
    this.profiles = profiles;
    this.shop = shop;
    this.reports = reports;
    this.jdbc = jdbc;
    this.environment = environment;
  }

  /** Before the service says that it is ready, and so before it asks for an owner. */
  @EventListener(ApplicationStartedEvent.class)
  void load() {
    if (!accounts.none()) {
      return;
    }
    System.out.println("Loading the invented shop ...");
    profiles.put(
        new ShopProfiles.ShopProfile("Steady Turn Repair Bench", "1 Invented Lane\nSamplestead"));
    accounts.create(SIGN_IN_NAME, "Demo owner", Role.OWNER, null);
    shop.load();
  }

  @EventListener(ApplicationReadyEvent.class)
  void follow() {
    Thread follower = new Thread(this::tell, "demo-progress");
    follower.setDaemon(true);
    follower.start();
  }

  private void tell() {
    long total = captures("state <> 'refused'");
    long told = -1;
    while (true) {
      long done = total - captures("state = 'queued'");
      if (done != told) {
        System.out.println("Measured " + done + " of " + total + " recordings");
        told = done;
      }
      if (done >= total) {
        break;
      }
      try {
        Thread.sleep(LOOK_EVERY_MS);
      } catch (InterruptedException e) {
        Thread.currentThread().interrupt();
        return;
      }
    }
    reports.issue();
    Account account = accounts.bySignInName(SIGN_IN_NAME).orElseThrow();
    String path = addresses.issue(OneTimeAddresses.Purpose.ENTER, account.id(), ADDRESS_LIFETIME);
    System.out.println(
        "Open the demo: http://localhost:" + environment.getProperty("local.server.port") + path);
  }

  private long captures(String which) {
    return jdbc.sql("select count(*) from capture where " + which).query(Long.class).single();
  }
}
