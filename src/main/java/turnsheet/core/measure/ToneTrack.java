package turnsheet.core.measure;

import turnsheet.core.dsp.Angle;
import turnsheet.core.dsp.NoiseProbe;
import turnsheet.core.dsp.SpeedSmoother;
import turnsheet.core.dsp.ToneBand;
import turnsheet.core.dsp.ToneDemodulator;
import turnsheet.core.signal.SpeedTrace;

/**
 * From the samples of a tone to its speed, block by block. One use.
 *
 * <p>Cost: every stage is a short loop in a method of its own, so that the just-in-time compiler
 * meets each once and early; in one long loop it translated the same code several times.
 */
final class ToneTrack {

  private final ToneDemodulator demodulator;
  private final SpeedSmoother smoother;
  private final NoiseProbe noise;
  private final ToneLevel level;
  private final SpeedTrace.Builder trace = new SpeedTrace.Builder();
  private final double traceRateHertz;
  private final double toneHertz;
  private final double nominalHertz;
  private final double[] steps;
  private final double[] amplitudes;
  private final boolean[] gone;
  private final double[] hertz;
  private double lastRe;
  private double lastIm;

  /** Values that must pass before the first mended step: it takes two, and mending comes late. */
  private int early;

  ToneTrack(ToneBand band, ToneProbe.Found tone, double nominalHertz) {
    demodulator = new ToneDemodulator(band);
    smoother = new SpeedSmoother(band);
    noise = new NoiseProbe(band);
    level = new ToneLevel(band.phaseRateHertz(), demodulator.delaySeconds(), tone.amplitude());
    traceRateHertz = band.traceRateHertz();
    toneHertz = tone.hertz();
    this.nominalHertz = nominalHertz;
    steps = new double[ToneDemodulator.blockSamples()];
    amplitudes = new double[steps.length];
    gone = new boolean[steps.length];
    hertz = new double[smoother.roomFor(steps.length)];
    early = 1 + level.delay();
  }

  /** Takes samples, from index 0. */
  void add(double[] samples, int n) {
    int count = demodulator.process(samples, n);
    double[] re = demodulator.re();
    double[] im = demodulator.im();
    follow(re, im, count);
    watch(count);
    noise.add(re, im, gone, count);
    int skipped = Math.min(early, count);
    early -= skipped;
    if (skipped > 0) {
      System.arraycopy(steps, skipped, steps, 0, count - skipped);
    }
    int made = smoother.process(steps, count - skipped, hertz);
    for (int i = 0; i < made; i++) {
      trace.add(100 * ((toneHertz + hertz[i]) / nominalHertz - 1));
    }
  }

  /** Phase steps and amplitudes. */
  private void follow(double[] re, double[] im, int count) {
    double beforeRe = lastRe;
    double beforeIm = lastIm;
    for (int i = 0; i < count; i++) {
      double x = re[i];
      double y = im[i];
      steps[i] = Angle.of(y * beforeRe - x * beforeIm, x * beforeRe + y * beforeIm);
      amplitudes[i] = Math.sqrt(x * x + y * y);
      beforeRe = x;
      beforeIm = y;
    }
    lastRe = beforeRe;
    lastIm = beforeIm;
  }

  /** Mends the steps. */
  private void watch(int count) {
    for (int i = 0; i < count; i++) {
      steps[i] = level.next(steps[i], amplitudes[i]);
      gone[i] = level.gone();
    }
  }

  /** The speed in percent of nominal; nothing can be added afterwards. */
  SpeedTrace finish() {
    level.finish();
    double start = demodulator.delaySeconds() + smoother.delaySeconds();
    return trace.build(start, traceRateHertz);
  }

  ToneLevel level() {
    return level;
  }

  NoiseProbe noise() {
    return noise;
  }
}
