package turnsheet.core.dsp;

/**
 * The weighting of speed fluctuation that follows how disturbing it sounds, highest at 4 Hz.
 *
 * <p>Source: table 1 of AES6-2008 (technically IEC 60386), nominal values as quoted by two
 * secondary texts. Between the tabulated frequencies a monotone cubic over the logarithm of the
 * frequency; outside, 18 dB per octave below 0.1 Hz and -6 dB per octave above 200 Hz.
 */
public final class Weighting {

  private static final double LOG2 = StrictMath.log(2);
  private static final double NEPER_PER_DECIBEL = StrictMath.log(10) / 20;
  private static final double RESPONSE_SECONDS = 8;

  private static final double[] HERTZ = {
    0.1, 0.2, 0.315, 0.4, 0.63, 0.8, 1, 1.6, 2, 4, 6.3, 10, 20, 40, 63, 100, 200
  };
  private static final double[] DECIBELS = {
    -48, -30.6, -19.7, -15, -8.4, -6, -4.2, -1.8, -0.9, 0, -0.9, -2.1, -5.9, -10.4, -14.2, -17.3,
    -23
  };
  private static final double LOW_OCTAVE = octave(HERTZ[0]);
  private static final double HIGH_OCTAVE = octave(HERTZ[HERTZ.length - 1]);
  private static final MonotoneCubic CURVE = curve();

  private Weighting() {}

  /** The weighting at a frequency above zero. */
  public static double decibels(double hertz) {
    double octave = octave(hertz);
    if (octave < LOW_OCTAVE) {
      return DECIBELS[0] + 18 * (octave - LOW_OCTAVE);
    }
    if (octave > HIGH_OCTAVE) {
      return DECIBELS[DECIBELS.length - 1] - 6 * (octave - HIGH_OCTAVE);
    }
    return CURVE.at(octave);
  }

  /** The weighting at a frequency above zero as a factor. */
  public static double gain(double hertz) {
    return StrictMath.exp(decibels(hertz) * NEPER_PER_DECIBEL);
  }

  /**
   * The weighting as a causal filter of least delay, as a meter has it.
   *
   * <p>Error: within 0.0225 dB of {@link #decibels} from 0.2 Hz, 0.07 dB at 0.1 Hz, at every rate
   * from 50 Hz to 2 kHz up to 0.45 times the rate.
   *
   * @return taps at the given rate, 8 s long
   */
  public static double[] response(double rateHertz) {
    int taps = (int) Math.ceil(RESPONSE_SECONDS * rateHertz);
    return MinimumPhase.design(f -> decibels(f) * NEPER_PER_DECIBEL, rateHertz, taps);
  }

  private static double octave(double hertz) {
    return StrictMath.log(hertz) / LOG2;
  }

  private static MonotoneCubic curve() {
    double[] octaves = new double[HERTZ.length];
    for (int i = 0; i < octaves.length; i++) {
      octaves[i] = octave(HERTZ[i]);
    }
    return new MonotoneCubic(octaves, DECIBELS);
  }
}
