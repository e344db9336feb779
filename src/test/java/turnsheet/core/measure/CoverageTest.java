package turnsheet.core.measure;

import static org.assertj.core.api.Assertions.assertThat;
import static turnsheet.core.measure.TraceFiguresTest.value;

import java.util.Arrays;
import java.util.Objects;
import java.util.Random;
import org.junit.jupiter.api.Tag;
import org.junit.jupiter.api.Test;
import turnsheet.core.dsp.Fft;
import turnsheet.core.dsp.Weighting;

/**
 * How often the interval of a figure holds the truth: random machines, recorded with random clocks.
 *
 * <p>Each machine has one to three lines and fluctuation like noise, 5 Hz wide. Truth is a property
 * of the machine, not of the stretch that was recorded: for the mean the constant part of its
 * speed, for the weighted rms the closed form over its spectrum, for two-sigma the percentile of a
 * large draw from its distribution.
 */
@Tag("accuracy")
class CoverageTest {

  private static final int CAPTURES = 400;
  private static final int RATE = 12_000;
  private static final double TONE = 3150;
  private static final int GRID = 1 << 18;
  private static final double GRID_RATE = 1000;
  private static final double CLOCK_PPM = 20;
  private static final double MEDIUM_PERCENT = 0.01;

  private final Random random = new Random(20);

  @Test
  void theIntervalHoldsTheTruthInNinetyFiveOfAHundred() throws Exception {
    double[][] errors = new double[3][CAPTURES];
    for (int k = 0; k < CAPTURES; k++) {
      Machine machine = new Machine(random);
      double seconds = 20 + 40 * random.nextDouble();
      double snr = 45 + 35 * random.nextDouble();
      double clock = CLOCK_PPM * random.nextGaussian();
      double medium = MEDIUM_PERCENT * random.nextGaussian();
      double[] samples = machine.recorded(seconds, snr, 1 + clock * 1e-6, medium / 100, random);
      MeasureSettings settings =
          new MeasureSettings(CaptureKind.TONE, 1, TONE, 12, null, CLOCK_PPM, 0, MEDIUM_PERCENT);
      TraceFigures figures =
          new TonePlan(settings).measure(() -> new ArrayReader(samples, RATE, 8192)).figures();
      Reading.Flutter flutter = figures.flutter();
      errors[0][k] = inUnits(figures.speed().deviationPercent(), machine.deviationPercent);
      errors[1][k] = inUnits(flutter.weightedRmsPercent(), machine.weightedRmsPercent());
      errors[2][k] = inUnits(flutter.weightedTwoSigmaPercent(), machine.twoSigmaPercent(random));
    }
    String[] names = {"mean deviation", "weighted rms", "weighted two-sigma"};
    for (int i = 0; i < names.length; i++) {
      System.out.printf(
          "%-20s held in %.1f of 100, error over U: mean %+.2f, rms %.2f%n",
          names[i],
          100 * coverage(errors[i]),
          Arrays.stream(errors[i]).average().orElse(0),
          Math.sqrt(Arrays.stream(errors[i]).map(e -> e * e).average().orElse(0)));
    }
    for (double[] of : errors) {
      assertThat(coverage(of)).isBetween(0.92, 0.98);
    }
  }

  private static double inUnits(Figure figure, double truth) {
    return (value(figure) - truth) / Objects.requireNonNull(figure.expandedUncertainty());
  }

  private static double coverage(double[] errors) {
    return Arrays.stream(errors).filter(e -> Math.abs(e) <= 1).count() / (double) errors.length;
  }

  /** A speed with a known spectrum. */
  private static final class Machine {
    final double deviationPercent;
    private final double[] lineHertz;
    private final double[] linePercent;
    private final double noiseFrom;
    private final double noisePercent;

    Machine(Random random) {
      deviationPercent = 4 * random.nextDouble() - 2;
      int lines = 1 + random.nextInt(3);
      lineHertz = new double[lines];
      linePercent = new double[lines];
      for (int i = 0; i < lines; i++) {
        lineHertz[i] = 0.5 * Math.pow(100, random.nextDouble());
        linePercent[i] = 0.02 + 0.08 * random.nextDouble();
      }
      noiseFrom = 1 + 14 * random.nextDouble();
      noisePercent = 0.02 + 0.06 * random.nextDouble();
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

    /** From a million draws: its own scatter is a tenth of a percent. */
    double twoSigmaPercent(Random random) {
      double noise = noiseWeighted();
      double[] draws = new double[1_000_000];
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

    /**
     * The recording, by a clock and from a medium that are off.
     *
     * @param clock recorder's seconds per second
     */
    double[] recorded(double seconds, double snrDb, double clock, double medium, Random random) {
      double[] noiseWay = noiseWay(random);
      double[] phase = new double[lineHertz.length];
      Arrays.setAll(phase, i -> 2 * Math.PI * random.nextDouble());
      double[] samples = new double[(int) (seconds * RATE)];
      double level = 0.5 / Math.sqrt(2) * Math.pow(10, -snrDb / 20);
      for (int n = 0; n < samples.length; n++) {
        double t = n / (RATE * clock);
        double way = (1 + deviationPercent / 100) * t + between(noiseWay, t * GRID_RATE);
        for (int i = 0; i < lineHertz.length; i++) {
          double w = 2 * Math.PI * lineHertz[i];
          way += linePercent[i] / 100 * (Math.cos(phase[i]) - Math.cos(w * t + phase[i])) / w;
        }
        double turns = TONE * (1 + medium) * way;
        samples[n] =
            0.5 * Math.sin(2 * Math.PI * (turns - Math.rint(turns)))
                + level * random.nextGaussian();
      }
      return samples;
    }

    /**
     * Distance that the noise-like part adds, at {@link #GRID_RATE}: integrated in its spectrum.
     */
    private double[] noiseWay(Random random) {
      double[] spectrum = new double[GRID];
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
}
