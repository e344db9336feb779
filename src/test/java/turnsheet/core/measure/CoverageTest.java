package turnsheet.core.measure;

import static org.assertj.core.api.Assertions.assertThat;
import static turnsheet.core.measure.TraceFiguresTest.value;

import java.util.Arrays;
import java.util.Objects;
import java.util.Random;
import java.util.function.DoubleUnaryOperator;
import org.junit.jupiter.api.Tag;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

/**
 * How often the interval of a figure holds the truth: random machines, recorded with random clocks.
 *
 * <p>Truth is a property of the machine, not of the stretch that was recorded: for the mean the
 * constant part of its speed, for the weighted rms the closed form over its spectrum, for two-sigma
 * the percentile of a large draw from its distribution.
 */
@Tag("accuracy")
class CoverageTest {

  private static final int CAPTURES = 400;
  private static final int RATE = 12_000;
  private static final double TONE = 3150;
  private static final double CLOCK_PPM = 20;
  private static final double MEDIUM_PERCENT = 0.01;
  private static final String[] NAMES = {"mean deviation", "weighted rms", "weighted two-sigma"};

  private final Random random = new Random(20);

  /** The bound for lines alone is open upwards: their intervals are wide for want of blocks. */
  @ParameterizedTest
  @CsvSource({
    "TONE, true, 0.98",
    "TONE, false, 1",
    "EDGES, true, 0.98",
    "TACHOMETER, true, 0.98",
  })
  void theIntervalHoldsTheTruthInNinetyFiveOfAHundred(
      CaptureKind kind, boolean withNoise, double most) throws Exception {
    double[][] errors = new double[NAMES.length][CAPTURES];
    double[] widths = new double[NAMES.length];
    for (int k = 0; k < CAPTURES; k++) {
      RandomMachine machine = new RandomMachine(random, withNoise);
      double[] truth = {
        machine.deviationPercent, machine.weightedRmsPercent(), machine.twoSigmaPercent(random)
      };
      Figure[] figures = measured(kind, machine);
      for (int i = 0; i < figures.length; i++) {
        double half = Objects.requireNonNull(figures[i].expandedUncertainty());
        errors[i][k] = (value(figures[i]) - truth[i]) / half;
        widths[i] += half / CAPTURES;
      }
    }
    System.out.printf("%s, %s%n", kind, withNoise ? "lines and noise" : "lines alone");
    for (int i = 0; i < NAMES.length; i++) {
      System.out.printf(
          "%-20s held in %.1f of 100, error over U: mean %+.2f, rms %.2f; mean U %.5f%n",
          NAMES[i],
          100 * coverage(errors[i]),
          Arrays.stream(errors[i]).average().orElse(0),
          Math.sqrt(Arrays.stream(errors[i]).map(e -> e * e).average().orElse(0)),
          widths[i]);
    }
    for (double[] of : errors) {
      assertThat(coverage(of)).isBetween(0.92, most);
    }
  }

  private static double coverage(double[] errors) {
    return Arrays.stream(errors).filter(e -> Math.abs(e) <= 1).count() / (double) errors.length;
  }

  /** One capture of 20 to 60 s; its mean deviation, weighted rms and two-sigma. */
  private Figure[] measured(CaptureKind kind, RandomMachine machine) throws Exception {
    DoubleUnaryOperator way = machine.way(random);
    double seconds = 20 + 40 * random.nextDouble();
    double snr = 45 + 35 * random.nextDouble();
    double clock = 1 + CLOCK_PPM * 1e-6 * random.nextGaussian();
    double pulses = 100 * Math.pow(16, random.nextDouble());
    if (kind == CaptureKind.TONE) {
      double medium = 1 + MEDIUM_PERCENT / 100 * random.nextGaussian();
      double[] samples =
          RandomMachine.waveform(way, TONE * medium, 0, RATE, seconds, clock, snr, random);
      TraceFigures figures =
          new TonePlan(settings(kind, TONE, MEDIUM_PERCENT))
              .measure(() -> new ArrayReader(samples, RATE, 8192))
              .figures();
      return picked(figures.speed(), figures.flutter());
    }
    MeasureSettings settings = settings(kind, pulses, 0);
    EdgePlan plan = new EdgePlan("00", "any", null, settings);
    Reading reading;
    if (kind == CaptureKind.TACHOMETER) {
      double[] samples =
          RandomMachine.waveform(way, pulses, 0.2, RATE, seconds, clock, snr, random);
      reading =
          new TachometerPlan(() -> EdgeLists.samples(samples, RATE), settings)
              .measure(plan)
              .reading();
    } else {
      // a timer of 0.1 to 4 us; noise of a sensor between 0.1 and 3 us
      double step = 1e-7 * Math.pow(40, random.nextDouble());
      double noise = 1e-7 * Math.pow(30, random.nextDouble());
      double[] times = machine.edges(way, pulses, seconds, clock, noise, step, random);
      reading = plan.measure(EdgeLists.rising(times), WaveformSignal.ofAList()).reading();
    }
    return picked(reading.speed(), reading.flutter());
  }

  private static Figure[] picked(Reading.Speed speed, Reading.Flutter flutter) {
    return new Figure[] {
      speed.deviationPercent(), flutter.weightedRmsPercent(), flutter.weightedTwoSigmaPercent()
    };
  }

  private static MeasureSettings settings(CaptureKind kind, double nominal, double medium) {
    return new MeasureSettings(kind, 1, nominal, 12, null, CLOCK_PPM, 0, medium);
  }
}
