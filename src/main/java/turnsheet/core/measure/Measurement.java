package turnsheet.core.measure;

import java.io.IOException;
import turnsheet.core.format.CaptureFormats;
import turnsheet.core.format.api.ByteSource;
import turnsheet.core.format.api.Contents;
import turnsheet.core.format.api.ReadOptions;
import turnsheet.core.format.api.Recognised;
import turnsheet.core.format.api.Recognition;
import turnsheet.core.signal.RejectedException;
import turnsheet.core.signal.Rejection;

/** Measures captures: the way in for the service and the shell command. */
public final class Measurement {

  /** Changes whenever any figure can. */
  public static final String METHOD_VERSION = "3";

  private final CaptureFormats formats;

  public Measurement(CaptureFormats formats) {
    this.formats = formats;
  }

  /**
   * Measures one channel of one capture.
   *
   * @param sha256 of the bytes, to be stated in the reading
   */
  public Outcome measure(
      ByteSource source,
      String sha256,
      ReadOptions options,
      MeasureSettings settings,
      Progress progress)
      throws IOException {
    ByteSource counted = new ProgressSource(source, progress);
    ReadOptions chosen = options.withChannel(settings.channel());
    Recognition recognition = formats.recognise(source, chosen);
    if (!(recognition instanceof Recognition.Accepted accepted)) {
      return new Outcome.Refused(((Recognition.Refused) recognition).rejection());
    }
    Recognised recognised = accepted.recognised();
    boolean waveform = recognised.contents() == Contents.WAVEFORM;
    if (waveform == (settings.kind() == CaptureKind.EDGES)) {
      return new Outcome.Refused(otherContents(waveform));
    }
    EdgePlan edges =
        new EdgePlan(sha256, recognised.format(), recognised.sampleRateHertz(), settings);
    try {
      Outcome outcome =
          switch (settings.kind()) {
            case TONE ->
                new TonePlan(settings)
                    .outcome(() -> formats.openSamples(counted, chosen), sha256, recognised);
            case TACHOMETER ->
                new TachometerPlan(() -> formats.openSamples(counted, chosen), settings)
                    .measure(edges);
            case EDGES ->
                edges.measure(() -> formats.openEdges(counted, chosen), WaveformSignal.ofAList());
          };
      progress.reached(1);
      return outcome;
    } catch (RejectedException e) {
      return new Outcome.Refused(e.rejection());
    }
  }

  private static Rejection otherContents(boolean waveform) {
    return waveform
        ? new Rejection(
            "waveformNotEdges",
            "The file holds a waveform, not a list of edges: measure it as a tone or as a"
                + " tachometer waveform.")
        : new Rejection(
            "edgesNotWaveform",
            "The file holds edges or periods, not a waveform: measure it as an edge list.");
  }

  /** The formats this measures. */
  public CaptureFormats formats() {
    return formats;
  }
}
