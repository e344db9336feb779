package turnsheet.core.diagnose.pair;

import java.util.ArrayList;
import java.util.List;
import java.util.Random;
import turnsheet.core.dsp.Weighting;
import turnsheet.core.synth.SpeedFunction;

/** An invented shaft whose flutter is known in closed form: lines, and many lines like noise. */
final class Shaft {

  final SpeedFunction speed;

  private static final double STEP = 1e-3;

  private final double[] travelled;
  private final double[] at;

  private Shaft(SpeedFunction speed, double seconds) {
    this.speed = speed;
    this.travelled = new double[(int) (seconds / STEP) + 3];
    this.at = new double[travelled.length];
    for (int i = 0; i < at.length; i++) {
      travelled[i] = speed.travelled(i * STEP);
      at[i] = speed.at(i * STEP);
    }
  }

  /**
   * Times of the rising edges of a wheel, each with Gaussian noise: the closed form at every
   * millisecond and a cubic between, right to 1e-16 s at these rates.
   */
  double[] edges(double pulsesPerSecond, double durationSeconds, double jitterSeconds, long seed) {
    int count = (int) Math.floor(speed.travelled(durationSeconds) * pulsesPerSecond) + 1;
    double[] times = new double[count];
    Random random = new Random(seed);
    int i = 0;
    for (int k = 0; k < count; k++) {
      double x = k / pulsesPerSecond;
      while (travelled[i + 1] <= x) {
        i++;
      }
      double t = (x - travelled[i]) / at[i] / STEP;
      for (int pass = 0; pass < 3; pass++) {
        double d = travelled[i + 1] - travelled[i];
        double m0 = at[i] * STEP;
        double m1 = at[i + 1] * STEP;
        double c = 3 * d - 2 * m0 - m1;
        double e = m0 + m1 - 2 * d;
        t -= (travelled[i] - x + t * (m0 + t * (c + t * e))) / (m0 + t * (2 * c + 3 * t * e));
      }
      times[k] = (i + t) * STEP + jitterSeconds * random.nextGaussian();
    }
    return times;
  }

  /** A few lines and a wander of 60 lines from 0.4 to 40 Hz, in percent rms. */
  static Shaft wandering(double lineRmsPercent, double wanderRmsPercent, long seed) {
    Random random = new Random(seed);
    List<SpeedFunction.Line> lines = new ArrayList<>();
    for (double rate : new double[] {0.83, 4.17, 9.7}) {
      double peak = lineRmsPercent / 100 * Math.sqrt(2.0 / 3);
      lines.add(new SpeedFunction.Line(rate, peak, 2 * Math.PI * random.nextDouble()));
    }
    int count = 60;
    for (int i = 0; i < count && wanderRmsPercent > 0; i++) {
      double rate = 0.4 * Math.pow(100, (i + random.nextDouble()) / count);
      double peak = wanderRmsPercent / 100 * Math.sqrt(2.0 / count);
      lines.add(new SpeedFunction.Line(rate, peak, 2 * Math.PI * random.nextDouble()));
    }
    return new Shaft(new SpeedFunction(0, 0, lines), 62);
  }

  /**
   * Rms over a stretch of time, of the sum of its lines behind the weighting or not, in percent.
   */
  double rmsPercent(double fromSeconds, double toSeconds, boolean weighted) {
    double[] peaks =
        speed.lines().stream()
            .mapToDouble(l -> l.peak() * (weighted ? Weighting.gain(l.rateHertz()) : 1))
            .toArray();
    double sum = 0;
    double squares = 0;
    int count = (int) ((toSeconds - fromSeconds) * 100);
    for (int i = 0; i < count; i++) {
      double t = fromSeconds + (toSeconds - fromSeconds) * i / count;
      double v = 0;
      for (int k = 0; k < peaks.length; k++) {
        SpeedFunction.Line line = speed.lines().get(k);
        v += peaks[k] * Math.sin(2 * Math.PI * line.rateHertz() * t + line.phaseRadians());
      }
      sum += v;
      squares += v * v;
    }
    return 100 * Math.sqrt(squares / count - sum * sum / count / count);
  }
}
