package turnsheet.core.measure;

import java.util.Arrays;
import java.util.Random;
import java.util.function.DoubleUnaryOperator;
import turnsheet.core.dsp.Fft;
import turnsheet.core.dsp.Weighting;

/**
 * A machine drawn at random: one to three lines and, where asked for, fluctuation like noise, 5 Hz
 * wide, so that its spectrum is known and figures have a truth over a long time.
 */
final class RandomMachine {

  private static final int GRID = 1 << 18;
  private static final double GRID_RATE = 1000;

  final double deviationPercent;
  private final double[] lineHertz;
  private final double[] linePercent;
  private final double noiseFrom;
  private final double noisePercent;

  /**
   * @param withNoise whether there is more than lines
   */
  RandomMachine(Random random, boolean withNoise) {
    deviationPercent = 4 * random.nextDouble() - 2;
    int lines = 1 + random.nextInt(3);
    lineHertz = new double[lines];
    linePercent = new double[lines];
    for (int i = 0; i < lines; i++) {
      lineHertz[i] = 0.5 * Math.pow(100, random.nextDouble());
      linePercent[i] = 0.02 + 0.08 * random.nextDouble();
    }
    noiseFrom = 1 + 14 * random.nextDouble();
    noisePercent = withNoise ? 0.02 + 0.06 * random.nextDouble() : 0;
  }

  double weightedRmsPercent() {
    double sum = noiseWeighted() * noiseWeighted();
    for (int i = 0; i < lineHertz.length; i++) {
      double weighted = linePercent[i] * Weighting.gain(lineHertz[i]);
      sum += weighted * weighted / 2;
    }
    return Math.sqrt(sum) / (1 + deviationPercent / 100);
  }

  private double noiseWeighted() {
    double sum = 0;
    for (int i = 0; i < 500; i++) {
      double gain = Weighting.gain(noiseFrom + 5 * (i + 0.5) / 500);
      sum += gain * gain / 500;
    }
    return noisePercent * Math.sqrt(sum);
  }

  /** From so many draws that their scatter is 0.2 %, a twentieth of the usual interval. */
  double twoSigmaPercent(Random random) {
    double noise = noiseWeighted();
    double[] draws = new double[250_000];
    for (int d = 0; d < draws.length; d++) {
      double sum = noise * random.nextGaussian();
      for (int i = 0; i < lineHertz.length; i++) {
        sum +=
            linePercent[i]
                * Weighting.gain(lineHertz[i])
                * Math.sin(2 * Math.PI * random.nextDouble());
      }
      draws[d] = Math.abs(sum);
    }
    Arrays.sort(draws);
    return draws[(int) (0.95 * draws.length)] / (1 + deviationPercent / 100);
  }

  /** Distance travelled since time zero, in seconds of nominal speed: one stretch of its life. */
  DoubleUnaryOperator way(Random random) {
    double[] noiseWay = noiseWay(random);
    double[] phase = new double[lineHertz.length];
    Arrays.setAll(phase, i -> 2 * Math.PI * random.nextDouble());
    return t -> {
      double way = (1 + deviationPercent / 100) * t + between(noiseWay, t * GRID_RATE);
      for (int i = 0; i < lineHertz.length; i++) {
        double w = 2 * Math.PI * lineHertz[i];
        way += linePercent[i] / 100 * (Math.cos(phase[i]) - Math.cos(w * t + phase[i])) / w;
      }
      return way;
    };
  }

  /**
   * A sine that follows the way, recorded at 0.5 of full scale beside white noise.
   *
   * @param third share of a third harmonic
   * @param clock recorder's seconds per second
   * @param hertz at nominal speed
   */
  static double[] waveform(
      DoubleUnaryOperator way,
      double hertz,
      double third,
      double rateHertz,
      double seconds,
      double clock,
      double snrDb,
      Random random) {
    double[] samples = new double[(int) (seconds * rateHertz)];
    double level = 0.5 / Math.sqrt(2) * Math.pow(10, -snrDb / 20);
    for (int n = 0; n < samples.length; n++) {
      double turns = hertz * way.applyAsDouble(n / (rateHertz * clock));
      double angle = 2 * Math.PI * (turns - Math.rint(turns));
      samples[n] = 0.5 * Math.sin(angle) + level * random.nextGaussian();
      if (third != 0) {
        samples[n] += 0.5 * third * Math.sin(3 * angle);
      }
    }
    return samples;
  }

  /**
   * Times of even places on the way, stamped by a clock with noise and a step.
   *
   * @param clock recorder's seconds per second
   */
  double[] edges(
      DoubleUnaryOperator way,
      double perSecond,
      double seconds,
      double clock,
      double noiseSeconds,
      double stepSeconds,
      Random random) {
    double speed = 1 + deviationPercent / 100;
    double[] times = new double[(int) (0.99 * seconds * perSecond * speed)];
    double t = 0;
    for (int k = 0; k < times.length; k++) {
      double off;
      int turn = 0;
      do {
        // fluctuation is below a percent: each turn leaves less than a hundredth of the distance
        off = k / perSecond - way.applyAsDouble(t);
        t += off / speed;
      } while (Math.abs(off) > 1e-12 && ++turn < 10);
      times[k] = t * clock + noiseSeconds * random.nextGaussian();
      times[k] = stepSeconds * Math.rint(times[k] / stepSeconds);
    }
    return times;
  }

  /** Distance that the noise-like part adds, at {@link #GRID_RATE}: integrated in its spectrum. */
  private double[] noiseWay(Random random) {
    double[] spectrum = new double[GRID];
    if (noisePercent == 0) {
      return spectrum;
    }
    double step = GRID_RATE / GRID;
    int from = (int) Math.ceil(noiseFrom / step);
    int to = (int) Math.floor((noiseFrom + 5) / step);
    // the inverse transform divides by the length and counts each bin twice
    double each = noisePercent / 100 / Math.sqrt(to - from + 1.0) * GRID / 2;
    for (int k = from; k <= to; k++) {
      double w = 2 * Math.PI * k * step;
      spectrum[2 * k] = each * random.nextGaussian() / w;
      spectrum[2 * k + 1] = each * random.nextGaussian() / w;
    }
    new Fft(GRID).realInverse(spectrum);
    return spectrum;
  }

  /** Cubic through four points: the fluctuation ends at 20 Hz, a fiftieth of the grid's rate. */
  private static double between(double[] y, double at) {
    int i = (int) at + 1;
    double x = at + 1 - i;
    double a = y[i - 1];
    double b = y[i];
    double c = y[i + 1];
    double d = y[i + 2];
    return b + 0.5 * x * (c - a + x * (2 * a - 5 * b + 4 * c - d + x * (3 * (b - c) + d - a)));
  }
}
