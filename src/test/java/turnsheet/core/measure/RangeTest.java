package turnsheet.core.measure;

import static org.assertj.core.api.Assertions.assertThat;
import static turnsheet.core.measure.TraceFiguresTest.value;

import java.util.Arrays;
import java.util.Random;
import org.junit.jupiter.api.Tag;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;
import turnsheet.core.dsp.QuasiPeakDetector;
import turnsheet.core.dsp.ToneBand;
import turnsheet.core.dsp.Weighting;
import turnsheet.core.synth.SignalSynth;
import turnsheet.core.synth.SpeedFunction;

/**
 * The whole range of tones, sample rates, deviations and lines, drawn at random: every figure of
 * fluctuation against the speed function itself, within 1 % or 0.0003 percentage points, whichever
 * is larger, and the mean within 0.0005 percentage points.
 *
 * <p>Truth of the weighted figures: the lines of the speed function, each turned and shrunk as the
 * weighting's taps do at its rate, read over the stretch that the product reads.
 */
@Tag("accuracy")
class RangeTest {

  private static final double[] RATES = {8000, 11_025, 16_000, 44_100, 48_000, 96_000, 192_000};
  private static final double[] TONES = {300, 1000, 3000, 3150, 6300, 10_000};
  private static final int CASES = 60;
  private static final double GRID = 4000;
  private static final double RESPONSE_RATE = 1000;

  private final Random random = new Random(12);

  @ParameterizedTest
  @ValueSource(ints = {1, 5})
  void everyFigureIsWithinOnePercent(int lines) {
    double[] response = Weighting.response(RESPONSE_RATE);
    double[] worst = new double[5];
    String[] where = new String[5];
    for (int c = 0; c < CASES; c++) {
      double rate = RATES[random.nextInt(RATES.length)];
      double tone = TONES[random.nextInt(TONES.length)];
      if (tone > 0.4 * rate) {
        continue;
      }
      double seconds = rate > 48_000 ? 30 : 60;
      double deviation = 0.2 * random.nextDouble() - 0.1;
      double highest = Math.min(200, ToneBand.of(tone * (1 + deviation), rate).flutterHertz());
      double lowest = 60 / seconds * 0.2;
      SpeedFunction speed = SpeedFunction.constant(deviation);
      while (speed.lines().size() < lines) {
        double hertz = lowest * Math.pow(highest / lowest, random.nextDouble());
        // closer ones beat so slowly that the capture is no sample of the machine
        if (speed.lines().stream().allMatch(l -> Math.abs(l.rateHertz() - hertz) > 4 / seconds)) {
          speed =
              speed.plusLine(
                  hertz, 0.02 + 0.1 * random.nextDouble(), 2 * Math.PI * random.nextDouble());
        }
      }
      double[] samples = SignalSynth.tone(speed, tone, rate, seconds, 0.5, 75, c);
      TonePlan.Result result = Tones.measured(samples, rate, MeasureSettings.tone(tone));
      double floor = value(result.signal().floorPercent());
      double[] truth = truth(speed, seconds, response, floor);
      Reading.Flutter flutter = result.figures().flutter();
      double[] found = {
        value(flutter.weightedTwoSigmaPercent()),
        value(flutter.weightedQuasiPeakPercent()),
        value(flutter.weightedRmsPercent()),
        value(flutter.unweightedRmsPercent()),
      };
      for (int i = 0; i < found.length; i++) {
        double off = Math.abs(found[i] - truth[i]) / Math.max(0.01 * truth[i], 0.0003);
        if (off > worst[i]) {
          worst[i] = off;
          where[i] = tone + " Hz at " + rate + ", " + speed + ": " + found[i] + " for " + truth[i];
        }
      }
      double mean = value(result.figures().speed().deviationPercent());
      double off = Math.abs(mean - 100 * deviation) / 0.0005;
      if (off > worst[4]) {
        worst[4] = off;
        where[4] = tone + " Hz at " + rate + ", " + speed + ": " + mean;
      }
    }
    String[] names = {"two-sigma", "quasi-peak", "weighted rms", "unweighted rms", "mean"};
    for (int i = 0; i < names.length; i++) {
      System.out.printf(
          "%d lines, %-15s %.2f of the bound; %s%n", lines, names[i], worst[i], where[i]);
    }
    assertThat(Arrays.stream(worst).max().orElseThrow()).isLessThan(1);
  }

  private static double[] truth(
      SpeedFunction speed, double seconds, double[] response, double floorPercent) {
    double mean = 1 + speed.deviation();
    int count = (int) (seconds * GRID);
    double[] weighted = new double[count];
    double plain = floorPercent * floorPercent;
    double squares = 0;
    for (SpeedFunction.Line line : speed.lines()) {
      double peak = 100 * line.peak() / mean;
      plain += peak * peak / 2;
      double re = 0;
      double im = 0;
      for (int n = 0; n < response.length; n++) {
        double angle = 2 * Math.PI * line.rateHertz() * n / RESPONSE_RATE;
        re += response[n] * Math.cos(angle);
        im -= response[n] * Math.sin(angle);
      }
      double w = peak * Weighting.gain(line.rateHertz());
      squares += w * w / 2;
      double turn = Math.atan2(im, re);
      for (int i = 0; i < count; i++) {
        weighted[i] +=
            w * Math.sin(2 * Math.PI * line.rateHertz() * i / GRID + line.phaseRadians() + turn);
      }
    }
    QuasiPeakDetector detector = new QuasiPeakDetector(GRID);
    double[] indicated = new double[count];
    for (int i = 0; i < count; i++) {
      indicated[i] = detector.next(weighted[i]);
    }
    int settled = (int) (2 * GRID);
    return new double[] {
      percentile(Arrays.copyOfRange(weighted, settled, count)),
      percentile(Arrays.copyOfRange(indicated, settled, count)),
      Math.sqrt(squares),
      Math.sqrt(plain)
    };
  }

  private static double percentile(double[] values) {
    double[] magnitudes = Arrays.stream(values).map(Math::abs).sorted().toArray();
    return magnitudes[(int) (0.95 * magnitudes.length)];
  }
}
