package turnsheet.core.diagnose.sensor;

import java.util.Arrays;
import turnsheet.core.dsp.Fft;
import turnsheet.core.dsp.Window;

/**
 * Noise of a waveform over its whole band: the medians of its spectrum in the middle halves of the
 * gaps between the harmonics of the pulses, so that neither they and their side bands nor hum
 * count.
 */
final class WaveNoise {

  private static final double SEGMENT_SECONDS = 0.25;

  /** Bins for each gap, so that window lobes leave its middle free. */
  private static final double BINS_A_GAP = 40;

  private WaveNoise() {}

  /** Root mean square in the unit of the samples; NaN where the recording is too short to tell. */
  static double rms(Wave wave) {
    double rate = wave.rateHertz();
    double pulses = wave.pulsesPerSecond();
    int length = Fft.lengthFor((int) (rate * Math.max(SEGMENT_SECONDS, BINS_A_GAP / pulses)));
    int segments = Math.min(64, wave.samples().length / length);
    if (segments < 1) {
      return Double.NaN;
    }
    double[] power = power(wave.samples(), length, segments);
    double step = rate / length;
    double medianOverMean = Math.pow(1 - 1 / (9.0 * segments), 3);
    double sum = 0;
    int gaps = 0;
    for (int m = 0; (m + 0.75) * pulses < 0.49 * rate; m++) {
      int from = (int) Math.ceil((m + 0.25) * pulses / step);
      int to = (int) Math.floor((m + 0.75) * pulses / step);
      double[] beside = Arrays.copyOfRange(power, from, to + 1);
      Arrays.sort(beside);
      sum += beside[beside.length / 2] / medianOverMean;
      gaps++;
    }
    // a bin's mean power in squared peaks, back to the variance of the samples
    return gaps == 0
        ? Double.NaN
        : Math.sqrt(sum / gaps * length / (4 * Window.BLACKMAN_HARRIS.noiseBandwidthBins()));
  }

  private static double[] power(double[] samples, int length, int segments) {
    Fft fft = new Fft(length);
    double[] window = Window.BLACKMAN_HARRIS.values(length);
    double scale = 2 / (length * Window.BLACKMAN_HARRIS.coherentGain());
    double[] power = new double[length / 2];
    double[] work = new double[length];
    for (int s = 0; s < segments; s++) {
      int from = (int) ((long) (samples.length - length) * s / Math.max(1, segments - 1));
      double mean = 0;
      for (int i = 0; i < length; i++) {
        mean += samples[from + i] / length;
      }
      for (int i = 0; i < length; i++) {
        work[i] = (samples[from + i] - mean) * window[i] * scale;
      }
      fft.real(work);
      for (int k = 1; k < power.length; k++) {
        power[k] += (work[2 * k] * work[2 * k] + work[2 * k + 1] * work[2 * k + 1]) / segments;
      }
    }
    return power;
  }
}
