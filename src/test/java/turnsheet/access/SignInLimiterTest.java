package turnsheet.access;

import static org.assertj.core.api.Assertions.assertThat;

import java.time.Clock;
import java.time.Duration;
import java.time.Instant;
import java.time.InstantSource;
import java.time.ZoneOffset;
import org.junit.jupiter.api.Test;

class SignInLimiterTest {
  private Instant now = Instant.parse("2026-12-01T08:00:00Z");
  private final InstantSource source = () -> now;
  private final Clock clock = source.withZone(ZoneOffset.UTC);
  private final SignInLimiter limiter = new SignInLimiter(clock);

  @Test
  void fourSlipsCostNothingAndEachFurtherOneDoublesTheWait() {
    fail(4, "ada", "10.0.0.1");
    assertThat(limiter.wait("ada", "10.0.0.1")).isZero();
    fail(1, "ada", "10.0.0.1");
    assertThat(limiter.wait("ada", "10.0.0.1")).isEqualTo(Duration.ofSeconds(10));
    fail(1, "ADA ", "10.0.0.1");
    assertThat(limiter.wait("ada", "10.0.0.1")).isEqualTo(Duration.ofSeconds(20));
    now = now.plusSeconds(20);
    assertThat(limiter.wait("ada", "10.0.0.1")).isZero();
  }

  @Test
  void waitsAtMostAQuarterOfAnHour() {
    fail(25, "ada", "10.0.0.1");
    assertThat(limiter.wait("ada", "10.0.0.1")).isEqualTo(Duration.ofMinutes(15));
  }

  @Test
  void theHolderIsNotShutOutByAStrangerElsewhere() {
    fail(25, "ada", "10.0.0.1");
    assertThat(limiter.wait("ada", "10.0.0.2")).isZero();
    assertThat(limiter.wait("bob", "10.0.0.1")).isZero();
  }

  @Test
  void manyNamesFromOneAddressSlowTheAddress() {
    for (int i = 0; i < 30; i++) {
      fail(1, "name" + i, "10.0.0.1");
    }
    assertThat(limiter.wait("another", "10.0.0.1")).isPositive();
  }

  @Test
  void oneNameFromManyAddressesSlowsTheName() {
    for (int i = 0; i < 60; i++) {
      fail(1, "ada", "10.0.1." + i);
    }
    assertThat(limiter.wait("ada", "10.0.2.1")).isPositive();
  }

  @Test
  void successAndAnHourForgetTheSlips() {
    fail(4, "ada", "10.0.0.1");
    limiter.succeeded("ada", "10.0.0.1");
    fail(4, "ada", "10.0.0.1");
    assertThat(limiter.wait("ada", "10.0.0.1")).isZero();
    now = now.plus(Duration.ofHours(1)).plusSeconds(1);
    fail(4, "ada", "10.0.0.1");
    assertThat(limiter.wait("ada", "10.0.0.1")).isZero();
  }

  @Test
  void memoryIsBounded() {
    for (int i = 0; i < SignInLimiter.REMEMBERED; i++) {
      fail(1, "name" + i, "address" + i);
    }
    assertThat(limiter.remembered()).isEqualTo(SignInLimiter.REMEMBERED);
  }

  private void fail(int times, String name, String address) {
    for (int i = 0; i < times; i++) {
      limiter.failed(name, address);
    }
  }
}
