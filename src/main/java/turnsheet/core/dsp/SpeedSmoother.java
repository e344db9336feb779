package turnsheet.core.dsp;

/**
 * Turns phase steps into an evenly sampled frequency, flat up to the band's highest rate of flutter
 * and empty well above it.
 *
 * <p>A phase step over the time T is the mean frequency over T, which shows a fluctuation at f
 * smaller by sin(pi f T)/(pi f T). Five taps make up for that: with s = 2 - 2 cos(2 pi f T) the
 * inverse is 1 + s/24 + 3 s^2/640 up to terms of the sixth order, below 2e-5 at f T = 0.1.
 */
public final class SpeedSmoother {

  private static final double STOP_DB = 80;

  private final FirDecimator filter;
  private final double delaySeconds;

  public SpeedSmoother(ToneBand band) {
    double rate = band.phaseRateHertz();
    double pass = band.flutterHertz();
    double stop = Math.min(1.4 * pass + 20, 0.98 * rate / 2);
    double[] low = KaiserFir.lowPass(Math.min(pass, 0.9 * stop), stop, STOP_DB, rate);
    double b = 3.0 / 640;
    double a = 1.0 / 24;
    double[] mend = {b, -a - 4 * b, 1 + 2 * a + 6 * b, -a - 4 * b, b};
    double[] taps = new double[low.length + mend.length - 1];
    for (int i = 0; i < low.length; i++) {
      for (int k = 0; k < mend.length; k++) {
        taps[i + k] += low[i] * mend[k] * rate / (2 * Math.PI);
      }
    }
    filter = new FirDecimator(taps, band.thirdFactor());
    // a step lies half a sample before the value that ends it
    delaySeconds = (filter.delaySamples() + 0.5) / rate;
  }

  /** Time of the first frequency after the first of the two values that made the first step. */
  public double delaySeconds() {
    return delaySeconds;
  }

  /** How many frequencies come out at most. */
  public int roomFor(int count) {
    return filter.roomFor(count);
  }

  /**
   * Takes phase steps.
   *
   * @param steps radians, read from index 0
   * @param hertz receives the distance from the band's middle
   * @return how many were written
   */
  public int process(double[] steps, int count, double[] hertz) {
    return filter.process(steps, count, hertz);
  }
}
