package turnsheet.core.diagnose.filter;

import turnsheet.core.synth.SignalSynth;
import turnsheet.core.synth.SpeedFunction;

/** Waveforms of a tachometer as a bench would record them. */
final class Recordings {

  static final double RATE = 48_000;

  private Recordings() {}

  /** Pulses of 0.4 at 800 per second on a mean of 0.1, with hum and white noise. */
  static double[] tachometer(double seconds, double hum, double noiseRms, long seed) {
    double[] samples =
        SignalSynth.pulses(
            SpeedFunction.constant(0.0013), 800, RATE, seconds, 0.4, 1, noiseRms, seed);
    for (int i = 0; i < samples.length; i++) {
      double t = i / RATE;
      samples[i] +=
          0.1
              + hum * Math.sin(2 * Math.PI * 50 * t + 0.3)
              + hum / 4 * Math.sin(2 * Math.PI * 150 * t + 1.3);
    }
    return samples;
  }

  static SampleSource source(double[] samples) {
    return new ArraySamples(samples, RATE);
  }
}
