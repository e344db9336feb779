package turnsheet.bench;

import java.io.IOException;
import java.util.Locale;
import java.util.UUID;
import java.util.concurrent.Semaphore;
import org.slf4j.Logger;
import org.slf4j.LoggerFactory;
import turnsheet.capture.CaptureStore;
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
import turnsheet.web.RefusedRequestException;

/**
 * Runs the core on the recording of a known frequency.
 *
 * <p>A check is measured while its request waits, not by a job: a minute of sound takes about a
 * second, a table of jobs with its states, progress and pages would be larger than everything else
 * here, and a process killed in between loses one press of a button, since the file is stored
 * before. For that to hold, the length is bounded ({@value #LONGEST_SECONDS} s of a waveform whose
 * head tells its length, {@value #MOST_BYTES} bytes of anything else), and one check is measured at
 * a time; others wait for it.
 */
final class ClockMeasuring {

  /** Half an hour: beyond that no clock is known better for it, as its wandering takes over. */
  static final int LONGEST_SECONDS = 1800;

  static final long MOST_BYTES = 256L << 20;

  private static final Logger log = LoggerFactory.getLogger(ClockMeasuring.class);

  private final CaptureStore store;
  private final Measurement measurement;
  private final Semaphore turn = new Semaphore(1, true);

  ClockMeasuring(CaptureStore store, Measurement measurement) {
    this.store = store;
    this.measurement = measurement;
  }

  /**
   * Measures a stored recording; others wait until it is done.
   *
   * @throws RefusedRequestException if the recording tells nothing about a clock
   */
  Reading reading(ClockQuestion question, KeptFile file) {
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

  /**
   * Holds what was found against what clocks can be.
   *
   * @throws RefusedRequestException where no clock is that wrong
   */
  static void requireClock(ClockError error, ClockQuestion question) {
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
}
