package turnsheet.core.dsp;

/**
 * How a tone's neighbourhood is cut out of a recording and turned into speed: three filters, each
 * followed by a reduction of the rate by a whole factor.
 *
 * @param toneHertz middle of the band
 * @param sampleRateHertz of the recording
 * @param passHertz half width around the tone that passes unchanged
 * @param stopHertz distance from the tone beyond which nothing passes
 * @param firstFactor from the recording to the first complex rate
 * @param secondFactor from there to the rate at which the phase is taken
 * @param thirdFactor from there to the rate of the speed trace
 * @param flutterHertz highest rate of fluctuation that is shown in full
 */
public record ToneBand(
    double toneHertz,
    double sampleRateHertz,
    double passHertz,
    double stopHertz,
    int firstFactor,
    int secondFactor,
    int thirdFactor,
    double flutterHertz) {

  static final double ATTENUATION_DB = 90;

  private static final double FULL_FLUTTER_HERTZ = 210;

  /** Room for the tone to stray and for the side bands of deep fluctuation, as a share of it. */
  private static final double STRAY_SHARE = 0.127;

  private static final double SLOWEST_TRACE_HERTZ = 1000;
  private static final int MOST = 64;

  public ToneBand {
    if (!(toneHertz > 0 && toneHertz < sampleRateHertz / 2 && passHertz < stopHertz)) {
      throw new IllegalArgumentException(
          toneHertz + " Hz at " + sampleRateHertz + " Hz, " + passHertz + " to " + stopHertz);
    }
  }

  /**
   * The band for a tone. It is as wide as 200 Hz of flutter need, and narrower where zero frequency
   * or half the sample rate come near the tone.
   */
  public static ToneBand of(double toneHertz, double sampleRateHertz) {
    double room = Math.min(toneHertz, sampleRateHertz - 2 * toneHertz);
    double pass = Math.min(FULL_FLUTTER_HERTZ + STRAY_SHARE * toneHertz, 0.5 * room);
    double stop = Math.min(1.5 * pass + 100, 0.85 * room);
    double flutter = Math.min(FULL_FLUTTER_HERTZ, pass - 0.04 * toneHertz);
    double least = Math.min(SLOWEST_TRACE_HERTZ, sampleRateHertz);
    ToneBand best = new ToneBand(toneHertz, sampleRateHertz, pass, stop, 1, 1, 1, flutter);
    for (int third = 1; third <= MOST; third++) {
      for (int second = 1; second <= MOST && third * second * least <= sampleRateHertz; second++) {
        int first = (int) (sampleRateHertz / (least * third * second));
        for (int f = first; f >= Math.max(1, first / 2); f--) {
          var band =
              new ToneBand(toneHertz, sampleRateHertz, pass, stop, f, second, third, flutter);
          if (band.feasible() && band.cost() < best.cost()) {
            best = band;
          }
        }
      }
    }
    return best;
  }

  /** Rate behind the first filter. */
  double firstRateHertz() {
    return sampleRateHertz / firstFactor;
  }

  /** Rate at which the phase is taken. */
  public double phaseRateHertz() {
    return firstRateHertz() / secondFactor;
  }

  /** Rate of the speed trace. */
  public double traceRateHertz() {
    return phaseRateHertz() / thirdFactor;
  }

  /** What folds back into the band must have been stopped before. */
  private boolean feasible() {
    return phaseRateHertz() >= pass2() && traceRateHertz() <= 2 * SLOWEST_TRACE_HERTZ;
  }

  private double pass2() {
    return passHertz + stopHertz;
  }

  /** End of the stop band of the first filter: only what folds onto the second one matters. */
  double firstStopHertz() {
    return firstFactor == 1 ? Double.NaN : firstRateHertz() - stopHertz;
  }

  /** Multiplications per second of recording. */
  private double cost() {
    if (!feasible()) {
      return Double.MAX_VALUE;
    }
    double first =
        firstFactor == 1
            ? 3
            : firstStopHertz() > passHertz
                ? KaiserFir.taps(passHertz, firstStopHertz(), ATTENUATION_DB, sampleRateHertz)
                : Double.MAX_VALUE;
    double second = KaiserFir.taps(passHertz, stopHertz, ATTENUATION_DB, firstRateHertz());
    // moving the samples into the first filter costs as much as some multiplications
    return 4 * sampleRateHertz + 2 * first * firstRateHertz() + 2 * second * phaseRateHertz();
  }
}
