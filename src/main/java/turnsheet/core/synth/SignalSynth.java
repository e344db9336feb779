package turnsheet.core.synth;

import java.util.Random;

/** Renders a {@link SpeedFunction} as the recording that a bench would make of it. */
public final class SignalSynth {

  private SignalSynth() {}

  /**
   * A sine whose phase follows the distance travelled.
   *
   * @param nominalHertz tone at nominal speed
   * @param amplitude peak, 1 is full scale
   * @param snrDb sine power over the power of added white Gaussian noise, over the whole band;
   *     infinite for none
   */
  public static double[] tone(
      SpeedFunction speed,
      double nominalHertz,
      double sampleRateHertz,
      double durationSeconds,
      double amplitude,
      double snrDb,
      long seed) {
    double[] samples = new double[(int) Math.round(durationSeconds * sampleRateHertz)];
    double noise =
        Double.isInfinite(snrDb) ? 0 : amplitude / Math.sqrt(2) * Math.pow(10, -snrDb / 20);
    Random random = new Random(seed);
    for (int i = 0; i < samples.length; i++) {
      double turns = nominalHertz * speed.travelled(i / sampleRateHertz);
      // the whole turns are dropped before the sine so that an hour keeps its digits
      samples[i] = amplitude * Math.sin(2 * Math.PI * (turns - Math.rint(turns)));
      if (noise > 0) {
        samples[i] += noise * random.nextGaussian();
      }
    }
    return samples;
  }

  /**
   * A tachometer's rounded pulses: they rise through zero where {@link #risingEdges} of the same
   * speed has its edges, and fall half a pulse later.
   *
   * @param pulsesPerSecond at nominal speed
   * @param steepness 1 for nearly a sine, 8 for steep flanks
   * @param noiseRms standard deviation of added white Gaussian noise, 1 is full scale
   */
  public static double[] pulses(
      SpeedFunction speed,
      double pulsesPerSecond,
      double sampleRateHertz,
      double durationSeconds,
      double amplitude,
      double steepness,
      double noiseRms,
      long seed) {
    double[] samples =
        tone(
            speed,
            pulsesPerSecond,
            sampleRateHertz,
            durationSeconds,
            1,
            Double.POSITIVE_INFINITY,
            seed);
    double scale = amplitude / Math.tanh(steepness);
    Random random = new Random(seed);
    for (int i = 0; i < samples.length; i++) {
      samples[i] = scale * Math.tanh(steepness * samples[i]) + noiseRms * random.nextGaussian();
    }
    return samples;
  }

  /**
   * Times of the rising edges of a wheel of pulses.
   *
   * @param pulsesPerSecond at nominal speed
   * @param jitterSeconds standard deviation of Gaussian noise on each edge
   */
  public static double[] risingEdges(
      SpeedFunction speed,
      double pulsesPerSecond,
      double durationSeconds,
      double jitterSeconds,
      long seed) {
    int count = (int) Math.floor(speed.travelled(durationSeconds) * pulsesPerSecond) + 1;
    double[] times = new double[count];
    Random random = new Random(seed);
    for (int k = 0; k < count; k++) {
      times[k] = speed.timeOf(k / pulsesPerSecond);
      if (jitterSeconds > 0) {
        times[k] += jitterSeconds * random.nextGaussian();
      }
    }
    return times;
  }
}
