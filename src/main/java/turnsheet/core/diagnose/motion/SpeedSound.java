package turnsheet.core.diagnose.motion;

import turnsheet.core.dsp.Fft;
import turnsheet.core.signal.Fluctuation;

/**
 * The fluctuation as sound: played faster by a whole factor, so that what the machine does once a
 * second becomes a tone. Ears that have heard a thousand machines name a part by its sound.
 *
 * <p>The speed is the sound's waveform: a line of 4 Hz played 50 times faster is a tone of 200 Hz.
 * Nothing below {@value #LOWEST_HERTZ} Hz is kept; one line's band may be cut out. The largest
 * sample reaches half of full scale, and both ends fade for a hundredth of a second.
 */
public final class SpeedSound {

  private static final double LOWEST_HERTZ = 0.2;

  /**
   * Beyond that much sound nobody listens, and the transform would take the memory of a capture.
   */
  private static final int MOST_SAMPLES = 1 << 20;

  private static final double LOUDEST = 0.5;
  private static final double FADE_SECONDS = 0.01;
  private static final double BAND_SHARE = 0.1;
  private static final double NARROWEST_HERTZ = 0.3;

  private final int rateHertz;
  private final float[] samples;
  private final double fullScalePercent;

  private SpeedSound(int rateHertz, float[] samples, double fullScalePercent) {
    this.rateHertz = rateHertz;
    this.samples = samples;
    this.fullScalePercent = fullScalePercent;
  }

  /** Everything that the fluctuation holds. */
  public static SpeedSound whole(Fluctuation fluctuation, int faster) {
    return band(fluctuation, faster, LOWEST_HERTZ, fluctuation.rateHertz() / 2);
  }

  /** A tenth of its rate to either side of a line, 0.3 Hz at least. */
  public static SpeedSound line(Fluctuation fluctuation, int faster, double lineHertz) {
    double half = Math.max(NARROWEST_HERTZ, BAND_SHARE * lineHertz);
    return band(
        fluctuation, faster, Math.max(LOWEST_HERTZ / 2, lineHertz - half), lineHertz + half);
  }

  private static SpeedSound band(
      Fluctuation fluctuation, int faster, double fromHertz, double toHertz) {
    int rate = (int) Math.round(fluctuation.rateHertz() * faster);
    if (faster < 1 || rate > 192_000) {
      throw new IllegalArgumentException(faster + " times faster");
    }
    int count = Math.min(MOST_SAMPLES, fluctuation.length());
    double[] work =
        java.util.Arrays.copyOf(fluctuation.percent(0, count), Fft.lengthFor(2 * count));
    keep(work, fluctuation.rateHertz(), fromHertz, toHertz);
    double largest = 0;
    for (int i = 0; i < count; i++) {
      largest = Math.max(largest, Math.abs(work[i]));
    }
    double fullScale = largest > 0 ? largest / LOUDEST : 1;
    float[] samples = new float[count];
    double fade = FADE_SECONDS * rate;
    for (int i = 0; i < count; i++) {
      double gain = Math.min(1, Math.min(i, count - 1 - i) / fade);
      samples[i] = (float) (gain * work[i] / fullScale);
    }
    return new SpeedSound(rate, samples, fullScale);
  }

  /** Leaves a band, with borders that fade over a fifth of its width so that nothing rings long. */
  private static void keep(double[] work, double rateHertz, double fromHertz, double toHertz) {
    Fft fft = new Fft(work.length);
    fft.real(work);
    double step = rateHertz / work.length;
    double border = (toHertz - fromHertz) / 5;
    work[0] = 0;
    work[1] = 0;
    for (int k = 1; k < work.length / 2; k++) {
      double f = k * step;
      double up = Math.min(1, Math.max(0, (f - fromHertz) / Math.min(border, fromHertz) + 1));
      double down = Math.min(1, Math.max(0, (toHertz - f) / border + 1));
      double gain = Math.min(up, down);
      double smooth = gain * gain * (3 - 2 * gain);
      work[2 * k] *= smooth;
      work[2 * k + 1] *= smooth;
    }
    fft.realInverse(work);
  }

  /** Samples per second of sound. */
  public int rateHertz() {
    return rateHertz;
  }

  public int length() {
    return samples.length;
  }

  /** A sample, -1 to 1. */
  public double sample(int index) {
    return samples[index];
  }

  public double seconds() {
    return (double) samples.length / rateHertz;
  }

  /** Fluctuation that would reach full scale. */
  public double fullScalePercent() {
    return fullScalePercent;
  }
}
