package turnsheet.bench;

import static java.util.Objects.requireNonNull;
import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.assertj.core.api.Assertions.within;

import java.io.ByteArrayInputStream;
import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Path;
import java.time.Clock;
import java.time.Duration;
import java.time.Instant;
import java.time.LocalDate;
import java.time.ZoneOffset;
import java.util.List;
import org.junit.jupiter.api.BeforeEach;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import turnsheet.capture.CaptureStore;
import turnsheet.capture.IncomingFolder;
import turnsheet.capture.StoredBytes;
import turnsheet.core.format.CaptureFormats;
import turnsheet.core.measure.CaptureKind;
import turnsheet.core.measure.ClockError;
import turnsheet.core.measure.Measurement;
import turnsheet.core.signal.Warning;
import turnsheet.shop.BenchInstrument;
import turnsheet.shop.InstrumentId;
import turnsheet.shop.Instruments;
import turnsheet.testing.Database;
import turnsheet.testing.OnEachDatabase;
import turnsheet.web.NotFoundException;
import turnsheet.web.RefusedRequestException;
import turnsheet.web.Times;

@OnEachDatabase
class ClockCheckingTest {

  private static final Instant NOW = Instant.parse("2026-03-02T09:30:00.123456Z");
  private static final ClockError.Reference KILOHERTZ = new ClockError.Reference(1000, 0.2);

  @TempDir Path data;
  private final Database database;
  private final Instruments instruments;
  private final ClockChecks checks;
  private final BenchInstrument card;
  private final Times times = new Times();
  private ClockChecking checking;

  ClockCheckingTest(Database database) throws IOException {
    database.empty();
    this.database = database;
    instruments = new Instruments(database.jdbc());
    checks = new ClockChecks(database.jdbc());
    card =
        instruments.add(
            new BenchInstrument(
                InstrumentId.next(), "Card", 5, 10.0, LocalDate.of(2025, 3, 1), "left input"));
  }

  @BeforeEach
  void start() throws IOException {
    checking = checkingAt(NOW);
  }

  private ClockChecking checkingAt(Instant now) throws IOException {
    Clock clock = Clock.fixed(now, ZoneOffset.UTC);
    return new ClockChecking(
        new CaptureStore(data, new IncomingFolder(data, clock)),
        new Measurement(CaptureFormats.standard()),
        instruments,
        checks,
        database.transactions(),
        times,
        clock);
  }

  private KeptFile keep(String name, byte[] bytes) throws IOException {
    return checking.keep(name, new ByteArrayInputStream(bytes));
  }

  private static ClockQuestion kilohertz() {
    return new ClockQuestion("Oscillator in the loft", KILOHERTZ, 0, null, null);
  }

  private ClockCheck check(double ppm, double seconds) throws IOException {
    return checking.check(card.id(), kilohertz(), keep("a.wav", KnownTone.wav(ppm, seconds)), "mo");
  }

  @Test
  void findsTheErrorAndKeepsItBesideTheRecord() throws IOException {
    ClockCheck check = check(37, 12);
    // reference 0.2 ppm at k = 2; the recording is some thousandths
    assertThat(check.found().errorPpm()).isCloseTo(37, within(0.02));
    assertThat(check.found().expandedUncertaintyPpm()).isBetween(0.2, 0.21);
    assertThat(check.recording().durationSeconds()).isCloseTo(12, within(1e-3));
    assertThat(check.recording().sampleRateHz()).isEqualTo(8000.0);
    assertThat(checks.find(check.id())).contains(check);
    assertThat(checks.ofInstrument(card.id())).containsExactly(check);
    assertThat(instruments.find(card.id())).contains(card);
    assertThat(checking.isKept(check.recording().file())).isTrue();
    assertThat(check.contradicts(ClockCheck.Before.of(card))).isTrue();
    assertThat(check.isWorseThan(ClockCheck.Before.of(card))).isFalse();
    assertThat(check.isShort()).isFalse();
  }

  @Test
  void takesItIntoTheRecordOnce() throws IOException {
    ClockCheck check = check(37, 12);
    ClockCheck taken = checking.take(card.id(), check.id(), "mo");
    BenchInstrument now = instruments.find(card.id()).orElseThrow();
    assertThat(now.clockErrorPpm()).isEqualTo(check.found().errorPpm());
    assertThat(now.clockExpandedUncertaintyPpm()).isEqualTo(check.found().expandedUncertaintyPpm());
    assertThat(now.checkedOn()).isEqualTo(times.date(NOW));
    assertThat(now.note())
        .isEqualTo(
            times.date(NOW)
                + ": checked against Oscillator in the loft (1000 Hz, U = 0.2 ppm at k = 2).\n"
                + "left input");
    assertThat(requireNonNull(taken.taken()).before()).isEqualTo(ClockCheck.Before.of(card));
    assertThat(taken.standsIn(now)).isTrue();
    assertThat(checks.find(check.id())).contains(taken);
    assertRefused("alreadyTaken", () -> checking.take(card.id(), check.id(), "mo"));
    assertThat(instruments.find(card.id())).contains(now);
  }

  @Test
  void takesTheCheckOfAClockNeverChecked() throws IOException {
    BenchInstrument timer =
        instruments.add(new BenchInstrument(InstrumentId.next(), "Timer", 0, null, null, ""));
    KeptFile file = keep("a.wav", KnownTone.wav(-20, 5));
    ClockCheck check = checking.check(timer.id(), kilohertz(), file, "mo");
    assertThat(check.isShort()).isTrue();
    ClockCheck.Taken taken = checking.take(timer.id(), check.id(), "mo").taken();
    assertThat(requireNonNull(taken).before()).isEqualTo(new ClockCheck.Before(0, null, null));
    // half width 100 ppm, rectangular, at k = 2
    assertThat(taken.before().reckonedExpandedPpm()).isCloseTo(200 / Math.sqrt(3), within(1e-12));
    assertThat(checks.find(check.id()).orElseThrow().taken()).isEqualTo(taken);
  }

  @Test
  void listsTheNewestFirstAndOnlyThoseOfTheInstrument() throws IOException {
    ClockCheck first = check(37, 5);
    checking = checkingAt(NOW.plus(Duration.ofDays(1)));
    ClockCheck second = check(38, 5);
    assertThat(checks.ofInstrument(card.id())).containsExactly(second, first);
    InstrumentId other = InstrumentId.next();
    assertThat(checks.ofInstrument(other)).isEmpty();
    assertThatThrownBy(() -> checking.take(other, first.id(), "mo"))
        .isInstanceOf(NotFoundException.class);
    assertThatThrownBy(() -> checking.check(other, kilohertz(), first.recording().file(), "mo"))
        .isInstanceOf(NotFoundException.class);
  }

  @Test
  void refusesWhatTellsNothingAndKeepsTheFile() throws IOException {
    KeptFile tone = keep("a.wav", KnownTone.wav(0, 5));
    ClockQuestion other = new ClockQuestion("x", new ClockError.Reference(1020, 1), 0, null, null);
    assertRefused("otherTone", () -> checking.check(card.id(), other, tone, "mo"));
    assertThatThrownBy(() -> checking.check(card.id(), other, tone, "mo"))
        .hasMessageContaining("holds 1000.00 Hz where 1020.00 Hz were said")
        .hasMessageEndingWith("correct the frequency, or record again.");
    ClockQuestion third = new ClockQuestion("x", KILOHERTZ, 0, null, 3);
    assertRefused("noSuchChannel", () -> checking.check(card.id(), third, tone, "mo"));
    KeptFile brief = keep("b.wav", KnownTone.wav(0, 1));
    assertRefused("tooShort", () -> checking.check(card.id(), kilohertz(), brief, "mo"));
    KeptFile text = keep("c.txt", "no recording".getBytes(StandardCharsets.UTF_8));
    assertThatThrownBy(() -> checking.check(card.id(), kilohertz(), text, "mo"))
        .isInstanceOf(RefusedRequestException.class);
    assertThat(checking.isKept(tone)).isTrue();
    assertThat(checking.isKept(new KeptFile("d", new StoredBytes("0".repeat(64), 3)))).isFalse();
    assertThat(checks.ofInstrument(card.id())).isEmpty();
    assertThat(instruments.find(card.id())).contains(card);
  }

  /** A head that announces 31 minutes, with no need to write them. */
  @Test
  void refusesARecordingOfMoreThanHalfAnHour() throws IOException {
    byte[] bytes = KnownTone.wav(0, 5);
    // bytes 24 to 27 hold the sample rate: 20 per second make 40000 frames last 2000 s
    bytes[24] = 20;
    bytes[25] = 0;
    KeptFile file = keep("long.wav", bytes);
    assertRefused("tooLong", () -> checking.check(card.id(), kilohertz(), file, "mo"));
  }

  @Test
  void readsPulsesAndListsOfEdges() throws IOException {
    StringBuilder list = new StringBuilder("time_us\n");
    for (int k = 0; k <= 12_000; k++) {
      list.append(Math.round(k * 1000.0 * (1 - 20e-6) * 100) / 100.0).append('\n');
    }
    KeptFile file = keep("e.csv", list.toString().getBytes(StandardCharsets.UTF_8));
    ClockCheck check = checking.check(card.id(), kilohertz(), file, "mo");
    assertThat(check.recording().kind()).isEqualTo(CaptureKind.EDGES);
    assertThat(check.found().errorPpm())
        .isCloseTo(-20, within(check.found().expandedUncertaintyPpm()));
    ClockQuestion pulses = new ClockQuestion("x", KILOHERTZ, 1, CaptureKind.TACHOMETER, null);
    KeptFile tone = keep("a.wav", KnownTone.wav(12, 12));
    ClockCheck second = checking.check(card.id(), pulses, tone, "mo");
    assertThat(second.recording().kind()).isEqualTo(CaptureKind.TACHOMETER);
    assertThat(second.found().errorPpm())
        .isCloseTo(12, within(second.found().expandedUncertaintyPpm()));
    assertThat(checks.find(second.id())).contains(second);
  }

  @Test
  void keepsAsManyWarningsAsThereIsRoomFor() throws IOException {
    ClockCheck made = check(1, 5);
    List<Warning> many =
        java.util.Collections.nCopies(300, new Warning("clipped", "w".repeat(100)));
    ClockCheck.Found found = made.found();
    ClockCheck full =
        new ClockCheck(
            ClockCheckId.next(),
            made.instrument(),
            made.madeAt(),
            made.madeBy(),
            made.against(),
            made.recording(),
            new ClockCheck.Found(
                found.methodVersion(),
                found.measuredHz(),
                found.recordingPpm(),
                found.errorPpm(),
                found.expandedUncertaintyPpm(),
                found.keepingPpm(),
                many),
            null);
    checks.add(full);
    assertThat(checks.find(full.id()).orElseThrow().found().warnings())
        .hasSizeGreaterThan(100)
        .hasSizeLessThan(300);
  }

  private static void assertRefused(
      String code, org.assertj.core.api.ThrowableAssert.ThrowingCallable verb) {
    assertThatThrownBy(verb)
        .isInstanceOfSatisfying(
            RefusedRequestException.class, e -> assertThat(e.code()).isEqualTo(code));
  }
}
