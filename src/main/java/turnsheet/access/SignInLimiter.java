package turnsheet.access;

import java.time.Clock;
import java.time.Duration;
import java.time.Instant;
import java.util.LinkedHashMap;
import java.util.Locale;
import java.util.Map;
import org.springframework.stereotype.Component;

/**
 * Slows guessing down. Failures are counted for a name at an address, for an address, and for a
 * name; past the free ones each further failure doubles the wait. A stranger can therefore slow the
 * holder of an account only from many addresses at once.
 */
@Component
public class SignInLimiter {

  private static final int FREE_FOR_NAME_AT_ADDRESS = 5;
  private static final int FREE_FOR_ADDRESS = 30;
  private static final int FREE_FOR_NAME = 60;
  private static final Duration FIRST_WAIT = Duration.ofSeconds(10);
  private static final Duration LONGEST_WAIT = Duration.ofMinutes(15);
  private static final Duration FORGET_AFTER = Duration.ofHours(1);

  /** Bounds the memory; beyond it the longest untouched are forgotten. */
  static final int REMEMBERED = 10_000;

  private record Failures(int count, Instant last, Instant until) {}

  private final Clock clock;
  private final Map<String, Failures> failures =
      new LinkedHashMap<>(16, 0.75f, true) {
        @Override
        protected boolean removeEldestEntry(Map.Entry<String, Failures> eldest) {
          return size() > REMEMBERED;
        }
      };

  SignInLimiter(Clock clock) {
    this.clock = clock;
  }

  /** How long this attempt has to wait; zero where it may go on. */
  public synchronized Duration wait(String name, String address) {
    Instant now = clock.instant();
    Duration longest = Duration.ZERO;
    for (String key : new String[] {both(name, address), address(address), name(name)}) {
      Failures found = failures.get(key);
      if (found != null && found.until.isAfter(now)) {
        Duration left = Duration.between(now, found.until);
        longest = left.compareTo(longest) > 0 ? left : longest;
      }
    }
    return longest;
  }

  public synchronized void failed(String name, String address) {
    add(both(name, address), FREE_FOR_NAME_AT_ADDRESS);
    add(address(address), FREE_FOR_ADDRESS);
    add(name(name), FREE_FOR_NAME);
  }

  /** Someone proved who he is: his own slips are forgotten, those of the address are not. */
  public synchronized void succeeded(String name, String address) {
    failures.remove(both(name, address));
  }

  synchronized int remembered() {
    return failures.size();
  }

  private void add(String key, int free) {
    Instant now = clock.instant();
    Failures before = failures.get(key);
    int count =
        before == null || before.last.plus(FORGET_AFTER).isBefore(now) ? 1 : before.count + 1;
    failures.put(key, new Failures(count, now, now.plus(waitAfter(count - free))));
  }

  private static Duration waitAfter(int beyond) {
    if (beyond < 0) {
      return Duration.ZERO;
    }
    Duration wait = FIRST_WAIT.multipliedBy(1L << Math.min(beyond, 20));
    return wait.compareTo(LONGEST_WAIT) < 0 ? wait : LONGEST_WAIT;
  }

  private static String both(String name, String address) {
    return "both " + lower(name) + " " + address;
  }

  private static String address(String address) {
    return "address " + address;
  }

  private static String name(String name) {
    return "name " + lower(name);
  }

  /** Cut, so that a made-up name of a megabyte is not kept. */
  private static String lower(String name) {
    return name.substring(0, Math.min(name.length(), 80)).strip().toLowerCase(Locale.ROOT);
  }
}
