package turnsheet.core.measure;

import java.io.IOException;
import java.util.Arrays;
import java.util.List;
import turnsheet.core.dsp.CrossingReader;
import turnsheet.core.signal.RejectedException;
import turnsheet.core.signal.SampleReader;
import turnsheet.core.stats.Quantiles;

/**
 * The waveform of a tachometer: its two levels are found, crossings of the level between them
 * become edges, and edges become a reading.
 */
final class TachometerPlan {

  private static final double PROBE_SECONDS = 60;
  private static final int PROBE_SAMPLES = 400_000;

  /** Levels: pulses may be as short as one part in a hundred of their period. */
  private static final double LEVEL_SHARE = 0.005;

  /** Less than half a step of 16 bits to either side is no signal. */
  private static final double SMALLEST_SWING = 3.1e-5;

  /** The waveform must go this share of its swing beyond the middle before an edge counts. */
  private static final double BAND_SHARE = 0.11;

  /** Mains lines close to the pulse rate or above it cannot be told from the pulses. */
  private static final double MAINS_BELOW_SHARE = 0.7;

  private final SampleOpener opener;
  private final MeasureSettings settings;
  private List<Reading.MainsLine> mains = List.of();
  private ClipCounter clips = ClipCounter.atFullScale();

  TachometerPlan(SampleOpener opener, MeasureSettings settings) {
    this.opener = opener;
    this.settings = settings;
  }

  Outcome.Measured measure(EdgePlan plan) throws IOException, RejectedException {
    EdgeOpener edges = edges();
    return plan.measure(
        edges,
        new WaveformSignal(
            Figure.absent(
                "pulses have no single level to compare with noise: see the noise of the edges"),
            mains,
            () -> clips.clipped()));
  }

  /** Finds the levels; what it gives reads the edges, as often as they are asked for. */
  EdgeOpener edges() throws IOException, RejectedException {
    Quantiles levels = new Quantiles(beginning());
    double low = levels.at(LEVEL_SHARE);
    double high = levels.at(1 - LEVEL_SHARE);
    double swing = high - low;
    if (!(swing > SMALLEST_SWING)) {
      throw new RejectedException(
          "silent",
          "The channel holds no signal: check the probe, the channel and the level, and record"
              + " again.");
    }
    double middle = (low + high) / 2;
    return () -> {
      clips = ClipCounter.atFullScale();
      return new CrossingReader(
          new ClipCountingReader(opener.open(), clips), middle, BAND_SHARE * swing);
    };
  }

  /** Samples of the first minute, thinned evenly. */
  private double[] beginning() throws IOException, RejectedException {
    try (SampleReader reader = opener.open()) {
      double rate = reader.sampleRateHertz();
      ToneProbe tone = new ToneProbe(rate, settings);
      long span = (long) (PROBE_SECONDS * rate);
      int every = (int) Math.max(1, span / PROBE_SAMPLES);
      double[] kept = new double[(int) (span / every) + 1];
      double[] block = new double[8192];
      int used = 0;
      long index = 0;
      int count;
      while (index < span && (count = reader.read(block)) > 0) {
        tone.add(block, count);
        for (int i = 0; i < count && used < kept.length; i++, index++) {
          if (index % every == 0) {
            kept[used++] = block[i];
          }
        }
      }
      mains = mains(tone);
      if (used == 0) {
        throw new RejectedException(
            "empty", "The channel holds no samples: record or export it again.");
      }
      return Arrays.copyOf(kept, used);
    }
  }

  /** Mains lines below the fundamental of the pulses; none where that cannot be told. */
  private List<Reading.MainsLine> mains(ToneProbe tone) {
    try {
      return tone.found().mains().stream()
          .filter(line -> line.rateHz() < MAINS_BELOW_SHARE * settings.nominalHz())
          .toList();
    } catch (RejectedException e) {
      return List.of();
    }
  }
}
