package turnsheet.testing;

import org.springframework.boot.ApplicationRunner;
import org.springframework.boot.test.context.TestConfiguration;
import org.springframework.context.annotation.Bean;
import turnsheet.access.Accounts;
import turnsheet.access.Role;

/** The two accounts behind {@link AsOwner} and {@link AsTechnician}. */
@TestConfiguration(proxyBeanMethods = false)
public class TestPeople {

  public static final String PASSWORD = "a password for tests";

  @Bean
  ApplicationRunner testPeople(Accounts accounts) {
    return arguments -> {
      accounts.create("owner", "Test Owner", Role.OWNER, PASSWORD);
      accounts.create("technician", "Test Technician", Role.TECHNICIAN, PASSWORD);
    };
  }
}
