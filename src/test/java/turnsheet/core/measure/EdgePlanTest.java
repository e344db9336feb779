package turnsheet.core.measure;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.assertj.core.api.Assertions.within;

import java.io.IOException;
import java.util.Objects;
import java.util.Random;
import org.jspecify.annotations.Nullable;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.ValueSource;
import turnsheet.core.dsp.Weighting;
import turnsheet.core.signal.RejectedException;
import turnsheet.core.signal.Warning;
import turnsheet.core.synth.SignalSynth;
import turnsheet.core.synth.SpeedFunction;

/** Closed-form speeds as edge lists; 400, 800 and 1600 per second are common practice. */
class EdgePlanTest {

  @ParameterizedTest
  @CsvSource({"400, 1.3", "400, 10.1", "800, 33", "1600, 4", "1600, 120", "1600, 0.6", "20000, 60"})
  void readsOneLineOnAnExactList(double rate, double lineHertz) throws Exception {
    double deviation = 0.0037;
    double peak = 0.1;
    SpeedFunction speed = SpeedFunction.constant(deviation).plusLine(lineHertz, peak, 0.7);
    Reading r = measure(speed, rate, 40, 0, null).reading();
    assertThat(value(r.speed().deviationPercent())).isCloseTo(0.37, within(1e-4));
    double relative = peak / (1 + deviation);
    double weighted = relative * Weighting.gain(lineHertz);
    Figure twoSigma = r.flutter().weightedTwoSigmaPercent();
    // sin(0.95 pi / 2): share of a sine's peak not exceeded 95 % of the time
    assertThat(value(twoSigma)).isCloseTo(0.996917 * weighted, within(0.02 * weighted));
    assertThat(value(r.flutter().unweightedRmsPercent()))
        .isCloseTo(relative / Math.sqrt(2), within(0.01 * relative));
    assertThat(r.lines()).isNotEmpty();
    assertThat(value(r.lines().get(0).rateHz())).isCloseTo(lineHertz, within(0.005));
    assertThat(value(r.lines().get(0).peakPercent())).isCloseTo(relative, within(0.01 * relative));
    assertThat(r.lines()).hasSize(1);
    Reading.Edges edges = edges(r);
    assertThat(edges.missing()).isZero();
    assertThat(edges.extra()).isZero();
    // the line enters fourth differences by (2 sin(pi f T))^4 / sqrt 70 of its time error; 1 ps for
    // the rounding of the list
    double time = 1e4 * peak / (2 * Math.PI * lineHertz) / Math.sqrt(2);
    double leak = Math.pow(2 * Math.sin(Math.PI * lineHertz / rate), 4) / Math.sqrt(70) * time;
    assertThat(value(edges.edgeNoiseMicroseconds())).isLessThan(1.05 * leak + 1e-6);
    assertThat(value(edges.meanPeriodMicroseconds()))
        .isCloseTo(1e6 / rate / (1 + deviation), within(1e6 / rate * 2e-5));
  }

  @Test
  void keepsTheMeanOfALargeFluctuation() throws Exception {
    // 5 % peak: the mean over equal angles would be 0.125 % high, the mean of periods as much low
    SpeedFunction speed = SpeedFunction.constant(0).plusLine(3, 5, 0);
    Reading r = measure(speed, 800, 60, 0, null).reading();
    assertThat(value(r.speed().deviationPercent())).isCloseTo(0, within(2e-4));
    assertThat(value(r.lines().get(0).peakPercent())).isCloseTo(5, within(0.02));
  }

  @ParameterizedTest
  @ValueSource(doubles = {0.05, 0.4, 3})
  void recoversTheNoiseOfTheEdges(double microseconds) throws Exception {
    SpeedFunction speed = SpeedFunction.constant(0.001).plusLine(8, 0.05, 0);
    Reading r = measure(speed, 1600, 30, microseconds * 1e-6, null).reading();
    Figure noise = edges(r).edgeNoiseMicroseconds();
    // 48 000 edges: 2.627 / (2 n), root 0.5 %; three of those
    assertThat(value(noise)).isCloseTo(microseconds, within(0.016 * microseconds));
    // independent edges: cycle to cycle sqrt 6 of the noise (second difference)
    double slow = 2 * Math.pow(Math.PI * 8 / 1600, 1) * 625 * 5e-4 / Math.sqrt(2);
    assertThat(value(edges(r).cycleToCycleMicroseconds()))
        .isCloseTo(
            Math.hypot(Math.sqrt(6) * microseconds, slow),
            within(0.03 * Math.sqrt(6) * microseconds));
    // floor of white edge noise: 2 pi sigma sqrt(2 T B^3 / 3), B = 200 Hz
    double floor =
        100 * 2 * Math.PI * microseconds * 1e-6 * Math.sqrt(2 / 1600.0 * Math.pow(200, 3) / 3);
    assertThat(value(r.signal().floorPercent())).isCloseTo(floor, within(0.02 * floor));
  }

  @Test
  void countsLostAndExtraEdgesExactly() throws Exception {
    SpeedFunction speed = SpeedFunction.constant(0.002).plusLine(5, 0.2, 0);
    for (int seed = 1; seed <= 5; seed++) {
      double[] clean = SignalSynth.risingEdges(speed, 1600, 60, 0.3e-6, seed);
      Faults faults = new Faults(clean, 10_000, 10_000, seed);
      Reading r = plan(1600, null).measure(EdgeLists.rising(faults.times), list()).reading();
      assertThat(edges(r).missing()).isEqualTo(faults.lost);
      assertThat(edges(r).extra()).isEqualTo(faults.added);
      assertThat(edges(r).count()).isEqualTo(faults.times.length);
      assertThat(value(r.speed().deviationPercent())).isCloseTo(0.2, within(0.001));
      double weighted = 0.2 / 1.002 * Weighting.gain(5);
      assertThat(value(r.flutter().weightedTwoSigmaPercent()))
          .isCloseTo(0.996917 * weighted, within(0.02 * weighted));
      assertThat(value(edges(r).edgeNoiseMicroseconds())).isCloseTo(0.3, within(0.01));
      assertThat(r.warnings()).extracting(Warning::code).contains("repairedEdges");
    }
  }

  @Test
  void cutsOutALongGapAndSaysWhere() throws Exception {
    SpeedFunction speed = SpeedFunction.constant(0.002).plusLine(5, 0.2, 0);
    double[] clean = SignalSynth.risingEdges(speed, 800, 60, 0, 1);
    double[] gap = java.util.Arrays.stream(clean).filter(t -> t < 20 || t > 23).toArray();
    Reading r = plan(800, null).measure(EdgeLists.rising(gap), list()).reading();
    // how many are lost in 3 s is known as well as the speed just before: 0.2 % of 2400
    assertThat((double) edges(r).missing()).isCloseTo(clean.length - gap.length, within(5.0));
    assertThat(r.signal().dropouts()).hasSize(1);
    assertThat(r.signal().dropouts().get(0).startSeconds()).isCloseTo(20, within(0.002));
    assertThat(r.signal().dropouts().get(0).durationSeconds()).isCloseTo(3, within(0.003));
    double weighted = 0.2 / 1.002 * Weighting.gain(5);
    assertThat(value(r.flutter().weightedTwoSigmaPercent()))
        .isCloseTo(0.996917 * weighted, within(0.02 * weighted));
    assertThat(value(r.speed().deviationPercent())).isCloseTo(0.2, within(0.002));
  }

  @Test
  void statesTheStepOfAQuantisedList() throws Exception {
    // a timer of 4 us on 625 us periods: 4 / sqrt 12 = 1.155 us per edge beside 2 us of jitter,
    // which makes the rounding errors independent
    SpeedFunction speed = SpeedFunction.constant(0.0012345).plusLine(7, 0.3, 0);
    double[] times = SignalSynth.risingEdges(speed, 1600, 30, 2e-6, 1);
    for (int i = 0; i < times.length; i++) {
      times[i] = Math.rint(times[i] / 4e-6) * 4e-6;
    }
    Reading r = plan(1600, null).measure(EdgeLists.rising(times), list()).reading();
    Warning quantised =
        r.warnings().stream().filter(w -> w.code().equals("quantised")).findFirst().orElseThrow();
    assertThat(quantised.message()).contains("4 \u00b5s");
    // 48 000 edges: 0.5 % of scatter, three of those
    double expected = Math.hypot(2, 4 / Math.sqrt(12));
    assertThat(value(edges(r).edgeNoiseMicroseconds()))
        .isCloseTo(expected, within(0.016 * expected));
    assertThat(value(r.lines().get(0).peakPercent())).isCloseTo(0.2996, within(0.003));
    // two edges bound the 30 s; each lies within its step like a rectangle (JCGM 100, F.2.2.1)
    double mean = value(edges(r).meanPeriodMicroseconds());
    assertThat(edges(r).meanPeriodMicroseconds().budget())
        .filteredOn(c -> c.cause().equals("step of the timer"))
        .singleElement()
        .satisfies(
            c ->
                assertThat(c.standardUncertainty())
                    .isCloseTo(mean * Math.sqrt(2) * 4e-6 / Math.sqrt(12) / 30, within(1e-7)));
  }

  @Test
  void saysNothingOfQuantisationWhereThereIsNone() throws Exception {
    Reading r = measure(SpeedFunction.constant(0), 1600, 10, 1e-6, null).reading();
    assertThat(r.warnings()).extracting(Warning::code).doesNotContain("quantised");
  }

  @Test
  void findsThePatternOfTheWheel() throws Exception {
    int teeth = 120;
    Random random = new Random(5);
    double[] place = new double[teeth];
    double squares = 0;
    double mean = 0;
    for (int j = 0; j < teeth; j++) {
      place[j] = 0.004 * random.nextGaussian();
      mean += place[j] / teeth;
    }
    for (double p : place) {
      squares += (p - mean) * (p - mean);
    }
    double rmsPercent = 100 * Math.sqrt(squares / teeth);
    SpeedFunction speed = SpeedFunction.constant(0.001).plusLine(2.3, 0.1, 0);
    double[] times = SignalSynth.risingEdges(speed, 1600, 60, 0.2e-6, 9);
    for (int i = 0; i < times.length; i++) {
      times[i] += place[i % teeth] / 1600;
    }
    Reading r = plan(1600, teeth).measure(EdgeLists.rising(times), list()).reading();
    Figure pattern = Objects.requireNonNull(edges(r).wheel()).patternRmsPercentOfPeriod();
    assertThat(value(pattern)).isCloseTo(rmsPercent, within(0.05 * rmsPercent));
    assertThat(r.warnings()).extracting(Warning::code).contains("wheelPattern");
    // with the teeth known the pattern is no noise: 0.2 us of jitter under 2.5 us of pattern
    assertThat(value(edges(r).edgeNoiseMicroseconds())).isCloseTo(0.2, within(0.02));
  }

  @Test
  void correctsAClockThatRunsFast() throws Exception {
    // 500 ppm fast: durations come out long, the unit seems slow by as much
    double[] times = SignalSynth.risingEdges(SpeedFunction.constant(0), 800, 20, 0, 1);
    for (int i = 0; i < times.length; i++) {
      times[i] *= 1 + 500e-6;
    }
    MeasureSettings known = new MeasureSettings(CaptureKind.EDGES, 1, 800, 12, null, 1, 500, 0);
    Reading r =
        new EdgePlan("00", "list", null, known).measure(EdgeLists.rising(times), list()).reading();
    assertThat(value(r.speed().deviationPercent())).isCloseTo(0, within(1e-5));
    Reading blind = plan(800, null).measure(EdgeLists.rising(times), list()).reading();
    assertThat(value(blind.speed().deviationPercent())).isCloseTo(-0.049975, within(1e-5));
    // 100 ppm half width, rectangular: 2 x 57.7 ppm
    assertThat(blind.speed().deviationPercent().expandedUncertainty())
        .isCloseTo(0.01154, within(0.0002));
  }

  @Test
  void readsTheDutyFromFallingEdges() throws Exception {
    double[] rises = SignalSynth.risingEdges(SpeedFunction.constant(0.01), 400, 10, 0, 1);
    double[] times = new double[2 * rises.length];
    boolean[] rising = new boolean[times.length];
    for (int i = 0; i < rises.length; i++) {
      times[2 * i] = rises[i];
      rising[2 * i] = true;
      times[2 * i + 1] = rises[i] + 0.3 / 404;
    }
    Reading r = plan(400, null).measure(EdgeLists.of(times, rising, 0), list()).reading();
    assertThat(value(Objects.requireNonNull(edges(r).dutyPercent()))).isCloseTo(30, within(1e-6));
    assertThat(edges(r).count()).isEqualTo(rises.length);
  }

  /** Sinusoidal modulation: ADEV = peak sin^2(pi f tau) / (pi f tau), SP 1065 and textbook. */
  @Test
  void listsTheStabilityAtOctaves() throws Exception {
    SpeedFunction speed = SpeedFunction.constant(0).plusLine(4, 0.1, 0);
    Reading r = measure(speed, 400, 60, 0, null).reading();
    int checked = 0;
    for (Reading.Stability s : edges(r).stability()) {
      double a = Math.PI * 4 * s.tauSeconds();
      double expected = 1e-3 * Math.sin(a) * Math.sin(a) / a;
      if (s.tauSeconds() < 0.2) {
        // angle steps against time steps: second order in 0.1 %; ends of the record
        assertThat(value(s.allanDeviation())).isCloseTo(expected, within(0.01 * expected));
        checked++;
      }
    }
    assertThat(checked).isGreaterThanOrEqualTo(6);
  }

  @Test
  void countsEveryPeriodInTheHistogram() throws Exception {
    Outcome.Measured m = measure(SpeedFunction.constant(0), 800, 20, 1e-6, null);
    Series.Histogram h = Objects.requireNonNull(m.series().histogram());
    long total = 0;
    double mean = 0;
    for (int i = 0; i < h.size(); i++) {
      total += h.count(i);
      mean += h.count(i) * (h.fromMicroseconds() + (i + 0.5) * h.widthMicroseconds());
    }
    assertThat(total).isEqualTo(edges(m.reading()).count() - 1);
    assertThat(mean / total).isCloseTo(1250, within(0.1));
    assertThat(h.size()).isBetween(20, 100);
  }

  @Test
  void refusesARateFarFromNominalAndNamesIt() {
    double[] times = SignalSynth.risingEdges(SpeedFunction.constant(0), 800, 10, 0, 1);
    refused(1600, times, "otherRate", "800");
  }

  @Test
  void refusesWhatIsTooShort() {
    double[] times = SignalSynth.risingEdges(SpeedFunction.constant(0), 1600, 0.5, 0, 1);
    refused(1600, times, "tooShort", "record");
    refused(1, new double[] {0, 1, 2, 3, 4}, "tooShort", "Only 5 edges");
    refused(1, new double[] {0, 1}, "noPulses", "Only 2");
    refused(1, new double[0], "noPulses", "Only 0");
    refused(1, new double[100], "noPulses", "same time");
  }

  @Test
  void refusesPulsesThatAreNoRotation() {
    Random random = new Random(3);
    double[] times = new double[5000];
    for (int i = 1; i < times.length; i++) {
      times[i] = times[i - 1] + 0.01 * (0.5 + random.nextDouble());
    }
    refused(100, times, "notSteady", "no steady rotation");
  }

  @Test
  void acceptsASlowSweepAsUnevenSpeed() throws Exception {
    // 600 to 3000 rev/min in 10 s, one pulse a turn: k turns after (-10 + sqrt(100 + 8 k)) / 4 s
    double[] times = new double[300];
    for (int k = 0; k < times.length; k++) {
      times[k] = (-10 + Math.sqrt(100 + 8.0 * k)) / 4;
    }
    Reading r = plan(30, null).measure(EdgeLists.rising(times), list()).reading();
    assertThat(r.warnings()).extracting(Warning::code).contains("unevenSpeed", "limitedBand");
    assertThat(edges(r).missing()).isZero();
    assertThat(edges(r).extra()).isZero();
  }

  private static void refused(double nominal, double[] times, String code, String part) {
    assertThatThrownBy(() -> plan(nominal, null).measure(EdgeLists.rising(times), list()))
        .isInstanceOfSatisfying(
            RejectedException.class,
            e -> {
              assertThat(e.rejection().code()).isEqualTo(code);
              assertThat(e.rejection().message()).contains(part);
            });
  }

  private static Outcome.Measured measure(
      SpeedFunction speed, double rate, double seconds, double jitter, @Nullable Integer teeth)
      throws IOException, RejectedException {
    double[] times = SignalSynth.risingEdges(speed, rate, seconds, jitter, 1);
    return plan(rate, teeth).measure(EdgeLists.rising(times), list());
  }

  private static EdgePlan plan(double rate, @Nullable Integer teeth) {
    return new EdgePlan("00", "edge list", null, MeasureSettings.edges(rate, teeth));
  }

  private static WaveformSignal list() {
    return WaveformSignal.ofAList();
  }

  private static Reading.Edges edges(Reading r) {
    return Objects.requireNonNull(r.edges());
  }

  private static double value(Figure figure) {
    return Objects.requireNonNull(figure.value(), String.valueOf(figure.why()));
  }
}
