package turnsheet.bench;

import java.io.InputStream;
import java.time.Clock;
import java.time.Instant;
import java.time.temporal.ChronoUnit;
import java.util.Locale;
import java.util.Set;
import org.springframework.stereotype.Service;
import org.springframework.transaction.support.TransactionOperations;
import turnsheet.capture.BrokenUploadException;
import turnsheet.capture.CaptureStore;
import turnsheet.capture.FileName;
import turnsheet.capture.StoreException;
import turnsheet.core.measure.ClockError;
import turnsheet.core.measure.Measurement;
import turnsheet.core.measure.Reading;
import turnsheet.core.signal.Warning;
import turnsheet.shop.BenchInstrument;
import turnsheet.shop.InstrumentId;
import turnsheet.shop.Instruments;
import turnsheet.web.NotFoundException;
import turnsheet.web.RefusedRequestException;
import turnsheet.web.Times;

/** Checks the clocks of bench instruments and takes what was found into their records. */
@Service
public class ClockChecking {

  private static final int FORMAT_LENGTH = 400;

  /** What the core tells about the fluctuation of a machine, and there is no machine here. */
  private static final Set<String> OF_MACHINES =
      Set.of("atFloor", "shortCapture", "limitedBand", "lowTone", "quantised");

  private final CaptureStore store;
  private final Instruments instruments;
  private final ClockChecks checks;
  private final TransactionOperations transactions;
  private final Times times;
  private final Clock clock;
  private final ClockMeasuring measuring;

  ClockChecking(
      CaptureStore store,
      Measurement measurement,
      Instruments instruments,
      ClockChecks checks,
      TransactionOperations transactions,
      Times times,
      Clock clock) {
    this.store = store;
    this.instruments = instruments;
    this.checks = checks;
    this.transactions = transactions;
    this.times = times;
    this.clock = clock;
    this.measuring = new ClockMeasuring(store, measurement);
  }

  /**
   * Stores a recording, whatever will be said about it.
   *
   * @param in read to its end; the caller closes it
   * @throws RefusedRequestException if the name is odd; nothing is read then
   * @throws BrokenUploadException if the stream breaks; nothing is stored then
   * @throws StoreException if the disk does not take the bytes; nothing is stored then
   */
  public KeptFile keep(String fileName, InputStream in)
      throws BrokenUploadException, StoreException {
    return new KeptFile(FileName.checked(fileName), store.receive(in));
  }

  /** Whether a recording that was stored before is there. */
  public boolean isKept(KeptFile file) {
    return store.holds(file.bytes());
  }

  /**
   * Measures a stored recording and keeps what was found. The instrument's record stays as it is.
   *
   * @param by name of the account
   * @throws NotFoundException if there is no such instrument
   * @throws RefusedRequestException if the recording tells nothing about the clock; nothing is kept
   *     but the file
   */
  public ClockCheck check(InstrumentId id, ClockQuestion question, KeptFile file, String by) {
    BenchInstrument instrument =
        instruments.find(id).orElseThrow(() -> new NotFoundException("instrument"));
    Reading reading = measuring.reading(question, file);
    ClockError error = ClockError.of(reading, question.reference(), question.keepingPpm());
    ClockMeasuring.requireClock(error, question);
    ClockCheck made =
        new ClockCheck(
            ClockCheckId.next(),
            instrument.id(),
            now(),
            by,
            new ClockCheck.Against(question.source(), question.reference()),
            recording(reading, file),
            new ClockCheck.Found(
                reading.method().version(),
                error.measuredHz(),
                error.recordingPpm(),
                error.ppm(),
                error.expandedUncertaintyPpm(),
                question.keepingPpm(),
                reading.warnings().stream().filter(ClockChecking::concernsAClock).toList()),
            null);
    checks.add(made);
    return made;
  }

  /**
   * Writes what a check found into the record of its instrument: error, uncertainty, day, and a
   * line above the note that says what the clock was held against.
   *
   * @param by name of the account
   * @throws NotFoundException if the instrument has no such check
   * @throws RefusedRequestException if it was taken before
   */
  public ClockCheck take(InstrumentId id, ClockCheckId checkId, String by) {
    return transactions.execute(
        status -> {
          ClockCheck check = check(id, checkId);
          BenchInstrument old = instruments.find(id).orElseThrow();
          var taken = new ClockCheck.Taken(now(), by, ClockCheck.Before.of(old));
          if (!checks.take(checkId, taken)) {
            throw new RefusedRequestException(
                "alreadyTaken", "This check was taken into the record before: nothing is changed.");
          }
          instruments.change(
              new BenchInstrument(
                  id,
                  old.name(),
                  check.found().errorPpm(),
                  check.found().expandedUncertaintyPpm(),
                  times.date(check.madeAt()),
                  note(check, old.note())));
          return check(id, checkId);
        });
  }

  /**
   * One check of an instrument.
   *
   * @throws NotFoundException if the instrument has no such check
   */
  public ClockCheck check(InstrumentId id, ClockCheckId checkId) {
    return checks
        .find(checkId)
        .filter(found -> found.instrument().equals(id))
        .orElseThrow(() -> new NotFoundException("check of a clock"));
  }

  private static boolean concernsAClock(Warning warning) {
    return !OF_MACHINES.contains(warning.code());
  }

  private static ClockCheck.Recording recording(Reading reading, KeptFile file) {
    Reading.Source source = reading.source();
    String format = source.format();
    return new ClockCheck.Recording(
        file,
        format.substring(0, Math.min(format.length(), FORMAT_LENGTH)),
        source.kind(),
        source.channel(),
        source.sampleRateHz(),
        source.durationSeconds());
  }

  /** The new line above what stood there; lines that do not fit any more fall off at the end. */
  private String note(ClockCheck check, String old) {
    ClockError.Reference reference = check.against().reference();
    String line =
        String.format(
            Locale.ROOT,
            "%s: checked against %s (%s Hz, U = %s ppm at k = 2).",
            times.date(check.madeAt()),
            check.against().source(),
            plain(reference.hertz()),
            plain(reference.expandedUncertaintyPpm()));
    String note = old.isBlank() ? line : line + "\n" + old;
    return note.length() <= BenchInstrument.NOTE_LENGTH
        ? note
        : note.substring(0, note.lastIndexOf('\n', BenchInstrument.NOTE_LENGTH));
  }

  private static String plain(double value) {
    return new java.math.BigDecimal(Double.toString(value)).stripTrailingZeros().toPlainString();
  }

  /** Columns keep microseconds. */
  private Instant now() {
    return clock.instant().truncatedTo(ChronoUnit.MICROS);
  }
}
