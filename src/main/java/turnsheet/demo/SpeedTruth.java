package turnsheet.demo;

import java.util.Arrays;
import turnsheet.core.dsp.Weighting;
import turnsheet.core.synth.SpeedFunction;

/**
 * What a measurement ought to find, computed on the speed function itself.
 *
 * @param deviationPercent mean speed over the capture relative to nominal
 * @param weightedTwoSigmaPercent magnitude of the weighted fluctuation that is exceeded for 5 % of
 *     the time, relative to the mean speed
 * @param unweightedRmsPercent root mean square of the fluctuation relative to the mean speed
 */
record SpeedTruth(
    double deviationPercent, double weightedTwoSigmaPercent, double unweightedRmsPercent) {

  /** No line of any sample is in step with this rate, so its phases are passed through evenly. */
  private static final double RATE_HERTZ = 1000 * Math.PI;

  /**
   * Lines of unrelated rates take every relative phase in this time, so the start does not count.
   */
  private static final double LONG_SECONDS = 500;

  static SpeedTruth of(SpeedFunction speed, double durationSeconds) {
    double mean = speed.travelled(durationSeconds) / durationSeconds;
    double[] weighted = new double[(int) (LONG_SECONDS * RATE_HERTZ)];
    double power = 0;
    for (SpeedFunction.Line line : speed.lines()) {
      double peak = 100 * line.peak() / mean;
      power += peak * peak / 2;
      double weightedPeak = peak * Weighting.gain(line.rateHertz());
      for (int i = 0; i < weighted.length; i++) {
        weighted[i] +=
            weightedPeak
                * Math.sin(2 * Math.PI * line.rateHertz() * i / RATE_HERTZ + line.phaseRadians());
      }
    }
    for (int i = 0; i < weighted.length; i++) {
      weighted[i] = Math.abs(weighted[i]);
    }
    Arrays.sort(weighted);
    return new SpeedTruth(
        100 * (mean - 1), weighted[(int) (0.95 * weighted.length)], Math.sqrt(power));
  }
}
