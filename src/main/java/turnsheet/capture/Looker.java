package turnsheet.capture;

import java.io.IOException;
import java.util.Arrays;
import java.util.UUID;
import org.jspecify.annotations.Nullable;
import org.slf4j.Logger;
import org.slf4j.LoggerFactory;
import org.springframework.stereotype.Component;
import turnsheet.core.format.CaptureFormats;
import turnsheet.core.format.api.ByteSource;
import turnsheet.core.format.api.Contents;
import turnsheet.core.format.api.ReadOptions;
import turnsheet.core.format.api.Recognised;
import turnsheet.core.format.api.Recognition;
import turnsheet.core.measure.KindGuess;
import turnsheet.core.signal.RejectedException;
import turnsheet.core.signal.Rejection;
import turnsheet.core.signal.SampleReader;

/** Looks at the head and the first seconds of stored bytes. */
@Component
class Looker {

  private static final Logger log = LoggerFactory.getLogger(Looker.class);

  /** Long enough for a slow wheel, short enough to be read while a page waits. */
  private static final double SECONDS = 2;

  private static final int MOST_SAMPLES = 1 << 18;

  private final CaptureStore store;
  private final CaptureFormats formats;

  Looker(CaptureStore store, CaptureFormats formats) {
    this.store = store;
    this.formats = formats;
  }

  /** What a look led to. */
  sealed interface Result {}

  record Seen(Looked looked) implements Result {}

  record Unusable(Rejection why) implements Result {}

  /** Whether the bytes lie here; those of an imported capture may not. */
  boolean holds(StoredBytes bytes) {
    return store.holds(bytes);
  }

  /** Looks, with the rates that the surroundings name. */
  Result look(StoredBytes bytes, ReadOptions options, Surroundings around) {
    return look(bytes, options, around.toneHz(), around.pulsesPerSecond());
  }

  /**
   * Looks. A fault of a reader must not lose the upload: it is noted as a refusal with a reference.
   *
   * @param toneHz nominal tone, where known
   * @param pulsesPerSecond nominal tachometer rate, where known
   */
  Result look(
      StoredBytes bytes,
      ReadOptions options,
      @Nullable Double toneHz,
      @Nullable Double pulsesPerSecond) {
    if (!holds(bytes)) {
      throw MissingFile.refused();
    }
    try {
      return lookInto(bytes, options, toneHz, pulsesPerSecond);
    } catch (IOException | RuntimeException e) {
      String reference = UUID.randomUUID().toString().substring(0, 8);
      log.error("Reference {}: cannot look at {}", reference, bytes.sha256(), e);
      return new Unusable(
          new Rejection(
              "readerFailed",
              "The service failed while reading this file: this is a fault of the service, not of"
                  + " the recording. Quote the reference "
                  + reference
                  + "."));
    }
  }

  private Result lookInto(
      StoredBytes bytes,
      ReadOptions options,
      @Nullable Double toneHz,
      @Nullable Double pulsesPerSecond)
      throws IOException {
    ByteSource source = store.open(bytes);
    Recognition recognition = formats.recognise(source, options);
    if (recognition instanceof Recognition.Refused refused) {
      return new Unusable(refused.rejection());
    }
    Recognised recognised = ((Recognition.Accepted) recognition).recognised();
    if (recognised.contents() != Contents.WAVEFORM) {
      return new Seen(new Looked(options, recognised, null));
    }
    try (SampleReader in = formats.openSamples(source, options.withChannel(recognised.channel()))) {
      double[] samples = first(in, SECONDS);
      return new Seen(
          new Looked(
              options,
              recognised,
              KindGuess.of(samples, in.sampleRateHertz(), toneHz, pulsesPerSecond)));
    } catch (RejectedException e) {
      return new Unusable(e.rejection());
    }
  }

  /** The first seconds of a waveform, fewer where it ends earlier or is sampled very fast. */
  static double[] first(SampleReader in, double seconds) throws IOException, RejectedException {
    int wanted = (int) Math.min(MOST_SAMPLES, Math.ceil(seconds * in.sampleRateHertz()));
    double[] samples = new double[wanted];
    double[] block = new double[4096];
    int have = 0;
    for (int n = in.read(block); n > 0 && have < wanted; n = in.read(block)) {
      int taken = Math.min(n, wanted - have);
      System.arraycopy(block, 0, samples, have, taken);
      have += taken;
    }
    return Arrays.copyOf(samples, have);
  }
}
