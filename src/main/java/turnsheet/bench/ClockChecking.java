package turnsheet.bench;

import java.io.IOException;
import java.io.InputStream;
import java.time.Clock;
import java.time.Instant;
import java.time.temporal.ChronoUnit;
import java.util.Locale;
import java.util.Set;
import java.util.UUID;
import java.util.concurrent.Semaphore;
import org.slf4j.Logger;
import org.slf4j.LoggerFactory;
import org.springframework.stereotype.Service;
import org.springframework.transaction.support.TransactionOperations;
import turnsheet.capture.BrokenUploadException;
import turnsheet.capture.CaptureStore;
import turnsheet.capture.FileName;
import turnsheet.capture.StoreException;
import turnsheet.core.format.api.ByteSource;
import turnsheet.core.format.api.Contents;
import turnsheet.core.format.api.ReadOptions;
import turnsheet.core.format.api.Recognised;
import turnsheet.core.format.api.Recognition;
import turnsheet.core.measure.CaptureKind;
import turnsheet.core.measure.ClockError;
import turnsheet.core.measure.Measurement;
import turnsheet.core.measure.Outcome;
import turnsheet.core.measure.Progress;
import turnsheet.core.measure.Reading;
import turnsheet.core.signal.Rejection;
import turnsheet.core.signal.Warning;
import turnsheet.shop.BenchInstrument;
import turnsheet.shop.InstrumentId;
import turnsheet.shop.Instruments;
import turnsheet.web.NotFoundException;
import turnsheet.web.RefusedRequestException;
import turnsheet.web.Times;

/**
 * Checks the clocks of bench instruments and takes what was found into their records.
 *
 * <p>A check is measured while its request waits, not by a job: a minute of sound takes about a
 * second, a table of jobs with its states, progress and pages would be larger than everything else
 * here, and a process killed in between loses one press of a button, since the file is stored
 * before. For that to hold, the length is bounded ({@value #LONGEST_SECONDS} s of a waveform whose
 * head tells its length, {@value #MOST_BYTES} bytes of anything else), and one check is measured at
 * a time; others wait for it.
 */
@Service
public class ClockChecking {

  /** Half an hour: beyond that no clock is known better for it, as its wandering takes over. */
  static final int LONGEST_SECONDS = 1800;

  static final long MOST_BYTES = 256L << 20;

  private static final Logger log = LoggerFactory.getLogger(ClockChecking.class);

  private static final int FORMAT_LENGTH = 400;

  /** What the core tells about the fluctuation of a machine, and there is no machine here. */
  private static final Set<String> OF_MACHINES =
      Set.of("atFloor", "shortCapture", "limitedBand", "lowTone", "quantised");

  private final CaptureStore store;
  private final Measurement measurement;
  private final Instruments instruments;
  private final ClockChecks checks;
  private final TransactionOperations transactions;
  private final Times times;
  private final Clock clock;
  private final Semaphore turn = new Semaphore(1, true);

  ClockChecking(
      CaptureStore store,
      Measurement measurement,
      Instruments instruments,
      ClockChecks checks,
      TransactionOperations transactions,
      Times times,
      Clock clock) {
    this.store = store;
    this.measurement = measurement;
    this.instruments = instruments;
    this.checks = checks;
    this.transactions = transactions;
    this.times = times;
    this.clock = clock;
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
    Reading reading = reading(question, file);
    ClockError error = ClockError.of(reading, question.reference(), question.keepingPpm());
    requireClock(error, question);
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

  private Reading reading(ClockQuestion question, KeptFile file) {
    turn.acquireUninterruptibly();
    try {
      return measure(question, file);
    } catch (IOException e) {
      throw faulty(file, e);
    } catch (RefusedRequestException e) {
      throw e;
    } catch (RuntimeException e) {
      throw faulty(file, e);
    } finally {
      turn.release();
    }
  }

  private Reading measure(ClockQuestion question, KeptFile file) throws IOException {
    ByteSource source = store.open(file.bytes());
    ReadOptions options = new ReadOptions(question.channel(), null, null, null);
    Recognition recognition = measurement.formats().recognise(source, options);
    if (!(recognition instanceof Recognition.Accepted accepted)) {
      throw refused(((Recognition.Refused) recognition).rejection());
    }
    Recognised recognised = accepted.recognised();
    requireReasonableLength(recognised, file);
    requireSureRate(recognised);
    boolean waveform = recognised.contents() == Contents.WAVEFORM;
    CaptureKind said = question.kind() == null ? CaptureKind.TONE : question.kind();
    Outcome outcome =
        measurement.measure(
            source,
            file.bytes().sha256(),
            options,
            ClockError.settings(
                waveform ? said : CaptureKind.EDGES,
                recognised.channel(),
                question.reference().hertz()),
            Progress.NONE);
    if (outcome instanceof Outcome.Measured measured) {
      return measured.reading();
    }
    throw refused(((Outcome.Refused) outcome).rejection());
  }

  private static void requireReasonableLength(Recognised recognised, KeptFile file) {
    Double rate = recognised.sampleRateHertz();
    Long frames = recognised.frames();
    double seconds = rate == null || frames == null ? Double.NaN : frames / rate;
    if (seconds > LONGEST_SECONDS) {
      throw new RefusedRequestException(
          "tooLong",
          String.format(
              Locale.ROOT,
              "The recording lasts %.0f minutes and a check takes %d at most: cut it to a few"
                  + " minutes.",
              seconds / 60,
              LONGEST_SECONDS / 60));
    }
    if (Double.isNaN(seconds) && file.bytes().length() > MOST_BYTES) {
      throw new RefusedRequestException(
          "tooLong",
          String.format(
              Locale.ROOT,
              "The file has %d MiB and a check takes %d at most of a file that does not tell its"
                  + " length: cut it to a few minutes.",
              file.bytes().length() >> 20,
              MOST_BYTES >> 20));
    }
  }

  /** What the reader could not tell of the sampling rate would be taken for the clock's error. */
  private static void requireSureRate(Recognised recognised) {
    for (Warning warning : recognised.warnings()) {
      if (warning.code().equals("coarseTimes")) {
        throw new RefusedRequestException(warning.code(), warning.message());
      }
    }
  }

  private static void requireClock(ClockError error, ClockQuestion question) {
    if (Math.abs(error.ppm()) > 1e4 * ClockError.LARGEST_PERCENT) {
      throw new RefusedRequestException(
          "otherTone",
          String.format(
              Locale.ROOT,
              "The recording holds %.6g Hz where %.6g Hz were said, and no clock is that wrong:"
                  + " correct the frequency, or record again.",
              error.measuredHz(),
              question.reference().hertz()));
    }
  }

  /**
   * The core's sentence. Of a wrong frequency it advises about test tapes and speed settings, which
   * do not exist here.
   */
  private static RefusedRequestException refused(Rejection why) {
    String sentence = why.message();
    int advice = sentence.indexOf(": ");
    boolean otherFrequency = why.code().equals("otherTone") || why.code().equals("otherRate");
    return new RefusedRequestException(
        why.code(),
        otherFrequency && advice > 0
            ? sentence.substring(0, advice) + ": correct the frequency, or record again."
            : sentence);
  }

  private static RefusedRequestException faulty(KeptFile file, Exception e) {
    String reference = UUID.randomUUID().toString().substring(0, 8);
    log.error("Reference {}: cannot check a clock by {}", reference, file.bytes().sha256(), e);
    return new RefusedRequestException(
        "readerFailed",
        "The service failed while reading this file: this is a fault of the service, not of the"
            + " recording. Quote the reference "
            + reference
            + ".");
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
