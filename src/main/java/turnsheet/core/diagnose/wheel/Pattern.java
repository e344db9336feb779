package turnsheet.core.diagnose.wheel;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import turnsheet.core.stats.Quantiles;

/** The wheel's own pattern: the average over the turns, less what is told to be true motion. */
final class Pattern {

  /** With fewer harmonics there is no telling what is usual. */
  private static final int FEWEST_HARMONICS = 8;

  /** A harmonic is there where noise alone would be so strong with a chance of exp(-9). */
  private static final double THERE = 9;

  /** What stands this far above the usual, by chance once in exp(4) wheels, stands out. */
  private static final double STANDS_OUT = 4;

  private static final int MOST_TRIALS = 12;
  private static final int ALWAYS_SHOWN = 3;

  private final TurnAverage average;
  private final int places;
  private final double[] re;
  private final double[] im;
  private final double[] noise;
  private final double[] motion;
  private final Standing[] standing;
  private final double turnRateHertz;

  Pattern(
      EdgeTrain train,
      Deviations deviations,
      Numbering numbering,
      TurnAverage average,
      double turnRateHertz) {
    this.average = average;
    this.turnRateHertz = turnRateHertz;
    places = average.places();
    int half = places / 2;
    re = new double[half + 1];
    im = new double[half + 1];
    noise = new double[half + 1];
    motion = new double[half + 1];
    standing = new Standing[half + 1];
    double usual = usual(half);
    int tried = 0;
    for (int m = 1; m <= half; m++) {
      re[m] = average.re(m);
      im[m] = average.im(m);
      noise[m] = average.noise(m);
      standing[m] = Standing.SPACING;
      if (average.power(m) > Math.max(usual, THERE * noise[m])) {
        standing[m] = Standing.OPEN;
        if (tried++ < MOST_TRIALS) {
          HarmonicTrial trial =
              new HarmonicTrial(train, deviations, numbering, m, re[m], im[m], noise[m]);
          standing[m] = trial.standing();
          re[m] = trial.wheelRe();
          im[m] = trial.wheelIm();
          noise[m] = trial.wheelNoise();
          motion[m] = trial.motion();
        }
      }
    }
  }

  /** Of uneven teeth the powers are exponentially distributed: the median is ln 2 of the mean. */
  private double usual(int half) {
    if (half < FEWEST_HARMONICS) {
      return 0;
    }
    double[] powers = new double[half];
    for (int m = 1; m <= half; m++) {
      powers[m - 1] = average.power(m);
    }
    return new Quantiles(powers).median() / Math.log(2) * (Math.log(half) + STANDS_OUT);
  }

  /** Round the wheel, in periods; with all of it, or with what is the wheel's for certain. */
  double[] values(boolean withOpen) {
    double[] a = re.clone();
    double[] b = im.clone();
    for (int m = 1; m < a.length; m++) {
      if (!withOpen && standing[m] == Standing.OPEN) {
        a[m] = 0;
        b[m] = 0;
      }
    }
    return Harmonics.values(places, a, b);
  }

  boolean open() {
    return Arrays.asList(standing).contains(Standing.OPEN);
  }

  /** Mean square of the noise of one value of the pattern. */
  double noiseMeanSquare() {
    double sum = 0;
    for (int m = 1; m < noise.length; m++) {
      sum += twice(m) * noise[m];
    }
    return sum;
  }

  /** Root mean square over the teeth, in periods, cleared of noise. */
  double rms(double[] values) {
    double sum = 0;
    int teeth = 0;
    for (int j = 0; j < places; j++) {
      if (average.tooth(j)) {
        sum += values[j] * values[j];
        teeth++;
      }
    }
    return Math.sqrt(Math.max(0, sum / Math.max(1, teeth) - noiseMeanSquare()));
  }

  /**
   * Standard uncertainty of that. Noise of mean square n on a coefficient c scatters its square
   * with the variance 2 c^2 n + n^2, and of a root the error is half that over the root.
   */
  double rmsUncertainty(double rms) {
    double variance = 0;
    for (int m = 1; m < noise.length; m++) {
      double power = re[m] * re[m] + im[m] * im[m];
      double weight = twice(m);
      // the coefficient at half the places is real: all its noise lies along it
      double own = (2 * power * noise[m] + noise[m] * noise[m]) * (weight == 1 ? 2 : 1);
      variance += weight * weight * own;
    }
    double small = Math.sqrt(Math.sqrt(variance));
    return rms > 0 ? Math.min(small, Math.sqrt(variance) / (2 * rms)) : small;
  }

  private int twice(int m) {
    return 2 * m == places ? 1 : 2;
  }

  /** Those that stand out, and the lowest. */
  List<WheelHarmonic> harmonics() {
    List<WheelHarmonic> list = new ArrayList<>();
    for (int m = 1; m < re.length; m++) {
      if (m <= ALWAYS_SHOWN || standing[m] != Standing.SPACING) {
        double peak = twice(m) * Math.hypot(re[m], im[m]);
        // half of the noise lies along the coefficient
        double u = twice(m) * Math.sqrt(noise[m] / twice(m));
        list.add(
            new WheelHarmonic(
                m,
                m * turnRateHertz,
                100 * peak,
                2 * 100 * u,
                asSpeedPercent(m, peak),
                asSpeedPercent(m, twice(m) * motion[m]),
                standing[m]));
      }
    }
    return List.copyOf(list);
  }

  /** A late edge by the share of a period is an angle; its change per turn is a speed. */
  private double asSpeedPercent(int m, double peakPeriods) {
    return 100 * 2 * Math.PI * m * peakPeriods / places;
  }
}
