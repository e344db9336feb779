package turnsheet.browser;

import java.time.Duration;
import java.util.regex.Pattern;
import turnsheet.jar.RunningService;

/** The owner's first steps in a new service. */
final class FirstRun {

  private static final String PASSWORD = "a long road home 47";

  private FirstRun() {}

  static void of(RunningService service, Visitor visitor, String shop) throws InterruptedException {
    visitor.open(
        service.printed(
            Pattern.compile("Set up the owner's account: (\\S+)"), Duration.ofMinutes(3)));
    visitor.fill("name", "bench");
    visitor.fill("displayName", "Bench Owner");
    visitor.fill("password", PASSWORD);
    visitor.fill("again", PASSWORD);
    visitor.fill("shopName", shop);
    visitor.pressButton("Set up and sign in");
  }
}
