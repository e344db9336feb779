package turnsheet.core.measure;

import static org.assertj.core.api.Assertions.assertThat;
import static turnsheet.core.measure.TraceFiguresTest.value;

import java.util.Arrays;
import java.util.Random;
import org.junit.jupiter.api.Tag;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import turnsheet.core.dsp.EdgeSpeed;
import turnsheet.core.signal.SpeedTrace;
import turnsheet.core.synth.SignalSynth;
import turnsheet.core.synth.SpeedFunction;

/**
 * The whole range of pulse rates, sample rates, deviations and lines, drawn at random, as edge
 * lists and as waveforms: every figure of fluctuation against the speed function itself, within 1 %
 * or 0.0003 percentage points, whichever is larger; the mean within 0.0001 points, of a waveform
 * within 0.0005.
 *
 * <p>Lines reach up to 200 Hz or to 0.4 times the pulse rate, which is all that pulses show.
 * Figures are compared where the noise of the recording alone would read less than a tenth of them:
 * three times as much, in a band of 30 Hz and 30 s, makes them scatter by 0.7 % from one capture to
 * the next (line times noise, averaged over the band and the time).
 */
class EdgeRangeTest {

  private static final double[] SAMPLE_RATES = {
    8000, 11_025, 22_050, 44_100, 48_000, 96_000, 192_000
  };
  private static final double MOST_FLOOR = 0.1;
  private static final String[] NAMES = {
    "two-sigma", "quasi-peak", "weighted rms", "unweighted rms", "mean"
  };

  private enum Kind {
    EXACT,
    QUANTISED,
    WAVEFORM;

    /** Bound of the mean in percentage points. */
    double meanBound() {
      return this == WAVEFORM ? 0.0005 : 0.0001;
    }
  }

  /** A capture and what its recording adds in noise. */
  private record Capture(Outcome.Measured measured, TraceNoise noise) {}

  private final double[] worst = new double[NAMES.length];
  private final String[] where = new String[NAMES.length];
  private int compared;

  @ParameterizedTest
  @CsvSource({"EXACT, 2, 1", "QUANTISED, 2, 5", "WAVEFORM, 2, 5"})
  void everyFigureIsWithinOnePercentInAFewDraws(Kind kind, int cases, int lines) {
    study(kind, cases, lines, 15, new Random(8));
  }

  @ParameterizedTest
  @CsvSource({"EXACT, 1", "EXACT, 5", "QUANTISED, 1", "QUANTISED, 5", "WAVEFORM, 1", "WAVEFORM, 5"})
  @Tag("accuracy")
  void everyFigureIsWithinOnePercent(Kind kind, int lines) {
    study(kind, 60, lines, 60, new Random(13 + lines));
  }

  private void study(Kind kind, int cases, int lines, double longest, Random random) {
    for (int c = 0; c < cases; c++) {
      double pulses = 50 * Math.pow(400, random.nextDouble());
      double sampleRate = SAMPLE_RATES[random.nextInt(SAMPLE_RATES.length)];
      double deviation = 0.2 * random.nextDouble() - 0.1;
      if (kind == Kind.WAVEFORM) {
        // as for tones: what lies above is not safe from the recorder's own filter
        pulses = Math.min(pulses, 0.4 * sampleRate / 1.1);
      }
      double seconds =
          kind == Kind.WAVEFORM && sampleRate > 48_000 ? Math.min(30, longest) : longest;
      double highest = Math.min(200, 0.4 * pulses * (1 + deviation));
      SpeedFunction speed = speed(deviation, lines, 12 / seconds, highest, seconds, random);
      Capture capture =
          kind == Kind.WAVEFORM
              ? waveform(speed, pulses, sampleRate, seconds, c, random)
              : list(speed, pulses, seconds, kind == Kind.QUANTISED, random);
      String what = kind + " " + pulses + "/s, " + sampleRate + " Hz, " + speed;
      compare(capture, speed, highest, kind.meanBound(), what);
    }
    System.out.printf("%s, %d lines, %d of %d compared%n", kind, lines, compared, cases);
    for (int i = 0; i < NAMES.length; i++) {
      System.out.printf("  %-15s %.2f of the bound; %s%n", NAMES[i], worst[i], where[i]);
    }
    assertThat(compared).isGreaterThanOrEqualTo(cases / 2);
    assertThat(Arrays.stream(worst).max().orElseThrow()).isLessThan(1);
  }

  private static SpeedFunction speed(
      double deviation, int lines, double lowest, double highest, double seconds, Random random) {
    SpeedFunction speed = SpeedFunction.constant(deviation);
    while (speed.lines().size() < lines) {
      double hertz = lowest * Math.pow(highest / lowest, random.nextDouble());
      // closer ones beat so slowly that the capture is no sample of the machine
      if (speed.lines().stream().allMatch(l -> Math.abs(l.rateHertz() - hertz) > 4 / seconds)) {
        double peak = 0.02 + 0.1 * random.nextDouble();
        speed = speed.plusLine(hertz, peak, 2 * Math.PI * random.nextDouble());
      }
    }
    return speed;
  }

  private void compare(
      Capture capture, SpeedFunction speed, double topHertz, double meanBound, String what) {
    Reading reading = capture.measured.reading();
    note(4, value(reading.speed().deviationPercent()), 100 * speed.deviation(), meanBound, what);
    if (tooNoisy(speed, capture.noise, topHertz)) {
      return;
    }
    compared++;
    SpeedTrace trace = capture.measured.series().trace();
    double from = trace.startSeconds();
    SpeedTruth.Figures truth =
        SpeedTruth.of(
            speed,
            from,
            from + trace.durationSeconds(),
            capture.noise,
            topHertz,
            traceHertz(reading));
    Reading.Flutter found = reading.flutter();
    note(0, value(found.weightedTwoSigmaPercent()), truth.twoSigma(), 0.0003, what);
    note(1, value(found.weightedQuasiPeakPercent()), truth.quasiPeak(), 0.0003, what);
    note(2, value(found.weightedRmsPercent()), truth.weightedRms(), 0.0003, what);
    note(3, value(found.unweightedRmsPercent()), truth.unweightedRms(), 0.0003, what);
  }

  /**
   * Middle of the transition band: half the pulse rate over the decimation, 0.45 where there is
   * none.
   */
  private static double traceHertz(Reading reading) {
    double rate = value(reading.speed().meanHz());
    int decimation = EdgeSpeed.decimationFor(rate);
    return (decimation == 1 ? 0.45 : 0.5) * rate / decimation;
  }

  private void note(int figure, double found, double truth, double least, String what) {
    double bound = figure == 4 ? least : Math.max(0.01 * truth, least);
    double share = Math.abs(found - truth) / bound;
    if (share > worst[figure]) {
      worst[figure] = share;
      where[figure] = what + ": " + found + " for " + truth;
    }
  }

  private static boolean tooNoisy(SpeedFunction speed, TraceNoise noise, double topHertz) {
    SpeedTruth.Figures quiet = SpeedTruth.rms(speed);
    return noise.floorPercent(0.1, topHertz) > MOST_FLOOR * quiet.unweightedRms()
        || noise.weightedFloorPercent(0.1, topHertz) > MOST_FLOOR * quiet.weightedRms();
  }

  /** A timer's step beside noise of half a step or more, which makes its rounding noise. */
  private static Capture list(
      SpeedFunction speed, double pulses, double seconds, boolean quantised, Random random) {
    double highest = Math.min(200, 0.4 * pulses * (1 + speed.deviation()));
    double step = quantised ? 2e-8 * Math.pow(500, random.nextDouble()) : 0;
    double jitter = 0.5 + 0.5 * random.nextDouble();
    TraceNoise noise;
    do {
      step /= 2;
      noise = TraceNoise.ofEdges(step * Math.hypot(jitter, 1 / Math.sqrt(12)), pulses);
    } while (tooNoisy(speed, noise, highest));
    double[] times =
        SignalSynth.risingEdges(speed, pulses, seconds, jitter * step, random.nextLong());
    for (int i = 0; i < times.length && step > 0; i++) {
      times[i] = step * Math.rint(times[i] / step);
    }
    EdgePlan plan = new EdgePlan("00", "list", null, MeasureSettings.edges(pulses, null));
    try {
      return new Capture(
          plan.measure(EdgeLists.rising(times), WaveformSignal.ofAList()),
          TraceNoise.ofEdges(
              step * Math.hypot(jitter, 1 / Math.sqrt(12)), pulses * (1 + speed.deviation())));
    } catch (Exception e) {
      throw new AssertionError(e);
    }
  }

  /**
   * Every second one a sine, the others square-like: odd harmonics up to the fifteenth as far as a
   * recorder's own filter lets them through. Every second one at 40 dB.
   */
  private static Capture waveform(
      SpeedFunction speed,
      double pulses,
      double sampleRate,
      double seconds,
      int number,
      Random random) {
    double rate = pulses * (1 + speed.deviation());
    int harmonics = number % 2 == 0 ? 1 : (int) Math.min(15, 0.44 * sampleRate / rate);
    double amplitude = 0.5;
    double slope = 0;
    for (int h = 1; h <= harmonics; h += 2) {
      slope += 2 * Math.PI * rate * amplitude;
    }
    double highest = Math.min(200, 0.4 * rate);
    boolean loud = number % 4 < 2;
    double snrDb = loud ? 40 : 40 + 40 * random.nextDouble();
    double level;
    TraceNoise noise;
    do {
      level = amplitude / Math.sqrt(2) * Math.pow(10, -snrDb / 20);
      noise = TraceNoise.ofEdges(level / slope, rate);
      snrDb += 3;
    } while (!loud && tooNoisy(speed, noise, highest));
    double[] samples = new double[(int) (seconds * sampleRate)];
    int bits = new int[] {16, 24, 32}[random.nextInt(3)];
    double full = Math.pow(2, bits - 1.0);
    for (int i = 0; i < samples.length; i++) {
      double turns = pulses * speed.travelled(i / sampleRate);
      double angle = 2 * Math.PI * (turns - Math.rint(turns));
      double before = -Math.sin(angle);
      double now = -before;
      double twice = 2 * Math.cos(2 * angle);
      double sum = 0;
      for (int h = 1; h <= harmonics; h += 2) {
        sum += now / h;
        double after = twice * now - before;
        before = now;
        now = after;
      }
      double x = amplitude * sum + level * random.nextGaussian();
      samples[i] = bits == 32 ? (float) x : Math.rint(x * full) / full;
    }
    MeasureSettings settings = MeasureSettings.tachometer(pulses, null);
    try {
      return new Capture(
          new TachometerPlan(() -> EdgeLists.samples(samples, sampleRate), settings)
              .measure(new EdgePlan("00", "waveform", sampleRate, settings)),
          noise);
    } catch (Exception e) {
      throw new AssertionError(pulses + "/s at " + sampleRate, e);
    }
  }
}
