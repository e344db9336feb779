package turnsheet.core.measure;

import java.io.IOException;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import turnsheet.core.dsp.NoiseProbe;
import turnsheet.core.dsp.ToneBand;
import turnsheet.core.dsp.ToneDemodulator;
import turnsheet.core.format.api.Recognised;
import turnsheet.core.signal.RejectedException;
import turnsheet.core.signal.SampleReader;
import turnsheet.core.signal.SpeedTrace;
import turnsheet.core.signal.Warning;

/**
 * Measures the recording of a test tone: finds the tone, follows its phase, and works the figures
 * out from the speed. Reads the recording twice, the first time its beginning only.
 */
final class TonePlan {

  private static final double SHORTEST_SECONDS = 2;
  private static final double PROBE_SECONDS = 20;

  /** Bad speed reaches this far beyond a drop-out through the filters. */
  private static final double GUARD_SECONDS = 0.012;

  private final MeasureSettings settings;

  TonePlan(MeasureSettings settings) {
    this.settings = settings;
  }

  /** A recording that can be opened as often as needed. */
  @FunctionalInterface
  interface Recording {
    SampleReader open() throws IOException, RejectedException;
  }

  /** Figures and what the recording itself told. */
  record Result(
      TraceFigures figures,
      SpeedTrace trace,
      double sampleRateHertz,
      double durationSeconds,
      Reading.Signal signal,
      List<Warning> warnings) {}

  /** Measures and states the result. */
  Outcome outcome(Recording recording, String sha256, Recognised recognised)
      throws IOException, RejectedException {
    Result result = measure(recording);
    TraceFigures figures = result.figures;
    Reading.Source source =
        new Reading.Source(
            sha256,
            recognised.format(),
            CaptureKind.TONE,
            recognised.channel(),
            result.sampleRateHertz,
            result.durationSeconds);
    Reading reading =
        new Reading(
            source,
            new Reading.Method(Measurement.METHOD_VERSION, settings),
            figures.speed(),
            figures.flutter(),
            figures.lines(),
            null,
            result.signal,
            result.warnings);
    return new Outcome.Measured(
        reading,
        new Series(result.trace, figures.spectrum(), null, figures.blocks(), figures::fluctuation));
  }

  Result measure(Recording recording) throws IOException, RejectedException {
    ToneProbe.Found tone = probe(recording);
    try (SampleReader reader = recording.open()) {
      return follow(reader, tone);
    }
  }

  private ToneProbe.Found probe(Recording recording) throws IOException, RejectedException {
    try (SampleReader reader = recording.open()) {
      double rate = realRate(reader);
      if (settings.nominalHz() >= 0.48 * rate) {
        throw new RejectedException(
            "rateTooLow",
            String.format(
                Locale.ROOT,
                "The recording has %.6g samples per second, too few for a tone of %.6g Hz: record at"
                    + " %.0f or more.",
                rate,
                settings.nominalHz(),
                3 * settings.nominalHz()));
      }
      ToneProbe probe = new ToneProbe(rate, settings);
      double[] block = new double[ToneDemodulator.blockSamples()];
      double wanted = PROBE_SECONDS * rate;
      double seen = 0;
      int n;
      while (seen < wanted && (n = reader.read(block)) > 0) {
        probe.add(block, n);
        seen += n;
      }
      if (seen < SHORTEST_SECONDS * rate) {
        throw tooShort(seen / rate);
      }
      return probe.found();
    }
  }

  /** The recording's rate in real time: a clock that runs fast takes more samples than it says. */
  private double realRate(SampleReader reader) {
    return reader.sampleRateHertz() * (1 + settings.clockErrorPpm() * 1e-6);
  }

  private Result follow(SampleReader reader, ToneProbe.Found tone)
      throws IOException, RejectedException {
    double rate = realRate(reader);
    ToneBand band = ToneBand.of(tone.hertz(), rate);
    ToneTrack track = new ToneTrack(band, tone, settings.nominalHz());
    ClipCounter clips = ClipCounter.ofSine(rate / tone.hertz());
    double[] block = new double[ToneDemodulator.blockSamples()];
    long samples = 0;
    int n;
    while ((n = reader.read(block)) > 0) {
      samples += n;
      clips.add(block, n);
      track.add(block, n);
    }
    SpeedTrace speed = track.finish();
    if (speed.length() < TraceFigures.SHORTEST_SECONDS * band.traceRateHertz()) {
      throw tooShort(samples / rate);
    }
    return result(reader, tone, band, speed, samples / rate, track, clips.clipped());
  }

  private Result result(
      SampleReader reader,
      ToneProbe.Found tone,
      ToneBand band,
      SpeedTrace speed,
      double seconds,
      ToneTrack track,
      long clipped)
      throws RejectedException {
    ToneLevel level = track.level();
    NoiseProbe noise = track.noise();
    List<Stretch> ends = RunUp.of(speed, level.dropouts());
    List<Stretch> excluded = new ArrayList<>(ends);
    List<Reading.Dropout> dropouts = new ArrayList<>();
    for (Stretch s : level.dropouts()) {
      dropouts.add(new Reading.Dropout(s.startSeconds(), s.durationSeconds()));
      excluded.add(s.widened(GUARD_SECONDS));
    }
    level.clicks().forEach(s -> excluded.add(s.widened(GUARD_SECONDS)));
    if (TraceFigures.longestUsableSeconds(speed, excluded) < TraceFigures.SHORTEST_SECONDS) {
      throw new RejectedException(
          "noTone",
          String.format(
              Locale.ROOT,
              "The tone at %.5g Hz never holds for a second between its %d drop-outs: clean the heads"
                  + " or record again.",
              tone.hertz(),
              dropouts.size()));
    }
    double amplitude = level.amplitude();
    double density = noise.ready() ? noise.density() / (amplitude * amplitude) : 0;
    TraceNoise floor = TraceNoise.ofPhase(density, tone.hertz());
    TraceFigures figures = TraceFigures.of(speed, excluded, floor, band.flutterHertz(), settings);
    // the noise beside the tone counted over the whole band, against the tone
    double snrDb = 10 * Math.log10(2 / (density * band.sampleRateHertz()));
    Reading.Signal signal =
        new Reading.Signal(
            density > 0
                ? Figure.withoutUncertainty(snrDb, "the noise is taken as even over the whole band")
                : Figure.absent("no noise was found beside the tone"),
            tone.mains(),
            clipped,
            dropouts,
            density > 0
                ? Figure.withoutUncertainty(
                    figures.floorPercent(), "follows from the noise beside the tone")
                : Figure.absent("no noise was found beside the tone"));
    List<Warning> warnings = new ArrayList<>(reader.warnings());
    warnings.addAll(RunUp.warnings(ends, speed.startSeconds()));
    warnings.addAll(figures.warnings());
    warnings.addAll(ToneWarnings.of(band, signal, level));
    return new Result(
        figures, speed, reader.sampleRateHertz(), seconds, signal, List.copyOf(warnings));
  }

  private static RejectedException tooShort(double seconds) {
    return new RejectedException(
        "tooShort",
        String.format(
            Locale.ROOT,
            "The recording lasts %.2f s and at least %.0f s are needed: record 30 s or more.",
            seconds,
            SHORTEST_SECONDS));
  }
}
