package turnsheet.core.measure;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.assertj.core.api.Assertions.within;
import static org.junit.jupiter.api.Assumptions.assumeTrue;

import java.io.IOException;
import java.io.InputStream;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.Objects;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import turnsheet.core.format.CaptureFormats;
import turnsheet.core.format.api.ByteSource;
import turnsheet.core.format.api.ReadOptions;
import turnsheet.core.signal.RejectedException;
import turnsheet.core.signal.Warning;
import turnsheet.core.stats.Moments;
import turnsheet.core.stats.PeriodStatistics;

/** Public captures; the expected numbers were counted independently and stand with them. */
class PeriodCorpusTest {

  /** Periods of all rising edges without any repair. Tolerance: the digits stated. */
  @ParameterizedTest
  @CsvSource({
    "real-logic-captures/dcf77-b-periods.txt, 113, 0.88535179646, 0.325834, 1e-5",
    "real-logic-captures/clock-1mhz-a-periods.txt, 30000, 1.00015277778e-06, 7.88969e-09, 1e-5",
    "real-logic-captures/stepper-c-periods.txt, 56902, 0.000298985677129, 0.00820119, 1e-5",
    "real-heart-periods/nsr001_rr_secs.txt, 106460, 0.762646402, 0.710551538, 1e-8"
  })
  void rawPeriodsHaveTheCountedStatistics(
      String name, long count, double mean, double deviation, double digits) throws IOException {
    Moments periods = new Moments();
    for (String line : lines(name)) {
      periods.add(Double.parseDouble(line));
    }
    assertThat(periods.count()).isEqualTo(count);
    assertThat(periods.mean()).isCloseTo(mean, within(Math.abs(mean) * 1e-8));
    assertThat(periods.sampleStdDev()).isCloseTo(deviation, within(deviation * digits));
  }

  /** Root mean square of successive differences, min and max of the day of heart beats. */
  @Test
  void successivePeriodsDifferAsCounted() throws IOException {
    PeriodStatistics statistics = new PeriodStatistics(0.7109375, 0.12);
    double time = 0;
    statistics.edge(time, true);
    for (String line : lines("real-heart-periods/nsr001_rr_secs.txt").stream().skip(1).toList()) {
      time += Double.parseDouble(line);
      statistics.edge(time, true);
    }
    assertThat(statistics.cycleToCycleSeconds()).isCloseTo(0.0524638027, within(1e-9));
    assertThat(statistics.periods().min()).isCloseTo(0.3046875, within(1e-9));
    assertThat(statistics.periods().max()).isCloseTo(7.4765625, within(1e-9));
    assertThat(statistics.meanSeconds()).isCloseTo(0.760532591, within(1e-9));
  }

  /**
   * 12 MHz analyser on a clock of 1 MHz for 30 ms: too short for a speed, but 30 000 periods with
   * the mean and deviation counted, and what scatters them is the analyser's step of 83.3 ns.
   */
  @Test
  void namesTheStepOfTheAnalyser() throws Exception {
    Reading clock = measured(plan(1e6, periods("real-logic-captures/clock-1mhz-a-periods.txt")));
    Reading.Edges edges = Objects.requireNonNull(clock.edges());
    assertThat(edges.count()).isEqualTo(30_001);
    assertThat(value(edges.meanPeriodMicroseconds())).isCloseTo(1.00015277778, within(1e-9));
    assertThat(value(edges.periodStdDevMicroseconds())).isCloseTo(0.00788969, within(1e-8));
    assertThat(value(clock.speed().deviationPercent())).isCloseTo(-0.0152754, within(1e-6));
    assertThat(clock.flutter().weightedTwoSigmaPercent().value()).isNull();
    assertThat(clock.warnings())
        .filteredOn(w -> w.code().equals("quantised"))
        .singleElement()
        .extracting(Warning::message)
        .asString()
        .contains("a grid of 0.08333 \u00b5s");
    assertThat(clock.warnings()).extracting(Warning::code).contains("periodsOnly");
  }

  /**
   * One pulse a second by an atomic clock, none in second 59, radio glitches between: least-squares
   * periods 1.000510096 s and 1.000440449 s of the analyser's time from 172 and 99 pulses of 50 ms
   * or longer.
   */
  @Test
  void repairsTheTimeSignal() throws Exception {
    Reading a = measured(measure("real-logic-captures/dcf77-a.vcd", 1));
    Reading.Edges edges = Objects.requireNonNull(a.edges());
    assertThat(edges.count()).isEqualTo(183);
    assertThat(edges.count() - edges.extra()).isEqualTo(172);
    assertThat(edges.missing()).isEqualTo(3);
    // two end points of 8.4 ms scatter over 174 s: 68 us; two of those
    assertThat(value(edges.meanPeriodMicroseconds())).isCloseTo(1000510.1, within(136.0));

    Reading b = measured(plan(1, periods("real-logic-captures/dcf77-b-periods.txt")));
    assertThat(Objects.requireNonNull(b.edges()).count()).isEqualTo(114);
    assertThat(b.edges().count() - b.edges().extra()).isEqualTo(99);
    // 10 ms over 100 s
    assertThat(value(b.edges().meanPeriodMicroseconds())).isCloseTo(1000440.4, within(285.0));
  }

  /** Irregular repetition with drop-outs, and bursts with pauses: not a steady rotation. */
  @Test
  void doesNotCallIrregularPulsesSteady() throws Exception {
    Reading pwm = measured(measure("real-logic-captures/pwm-dropout.vcd", 1 / 0.0110965));
    assertThat(pwm.warnings())
        .extracting(Warning::code)
        .contains("unevenSpeed", "repairedEdges", "limitedBand");
    assertThat(pwm.signal().dropouts()).isNotEmpty();
    assertThat(Objects.requireNonNull(pwm.edges()).count()).isEqualTo(1802);

    for (String name : List.of("stepper-c-periods.txt", "stepper-d-periods.txt")) {
      EdgeOpener edges = periods("real-logic-captures/" + name);
      double mean = EdgeProbe.of(edges, 1).medianSeconds();
      assertThatThrownBy(() -> plan(1 / mean, edges)).isInstanceOf(RejectedException.class);
    }
  }

  /** Shaft speed 10 + 4 t Hz over 10 s sampled at 1 kHz: mean (30.0 +- 0.1) Hz, steps of 1 ms. */
  @Test
  void followsTheSweepOfTheShaft() throws Exception {
    double[] samples =
        lines("ref-tacho-sweep/test_input.csv").stream()
            .mapToDouble(line -> Double.parseDouble(line.substring(line.indexOf(',') + 1)))
            .toArray();
    MeasureSettings settings = MeasureSettings.tachometer(30, null);
    Reading reading =
        new TachometerPlan(() -> EdgeLists.samples(samples, 1000), settings)
            .measure(new EdgePlan("00", "table", 1000.0, settings))
            .reading();
    Reading.Edges edges = Objects.requireNonNull(reading.edges());
    assertThat(edges.count()).isEqualTo(300);
    assertThat(edges.missing()).isZero();
    assertThat(edges.extra()).isZero();
    assertThat(1e6 / value(edges.meanPeriodMicroseconds())).isCloseTo(30, within(0.1));
    assertThat(reading.warnings())
        .extracting(Warning::code)
        .contains("unevenSpeed", "quantised", "limitedBand");
  }

  /** A day of heart beats: the first line is an offset, the rest an uneven train. */
  @Test
  void leavesOutTheOffsetOfAPeriodList() throws Exception {
    Reading reading = measured(plan(1.315, periods("real-heart-periods/nsr001_rr_secs.txt")));
    assertThat(reading.warnings())
        .extracting(Warning::code)
        .contains("leadingGap", "unevenSpeed", "quantised");
    // 0.16865 s for the periods of 0.3 to 2 s, of which 50 here count as beside a missing one
    assertThat(value(Objects.requireNonNull(reading.edges()).periodStdDevMicroseconds()))
        .isCloseTo(0.16865e6, within(0.0005e6));
  }

  private static Outcome measure(String name, double pulses) throws IOException {
    Path file = file(name);
    ByteSource source =
        new ByteSource() {
          @Override
          public InputStream open() throws IOException {
            return Files.newInputStream(file);
          }

          @Override
          public long length() {
            return file.toFile().length();
          }
        };
    return new Measurement(CaptureFormats.standard())
        .measure(
            source, "00", ReadOptions.none(), MeasureSettings.edges(pulses, null), Progress.NONE);
  }

  private static Outcome plan(double pulses, EdgeOpener edges)
      throws IOException, RejectedException {
    return new EdgePlan("00", "periods", null, MeasureSettings.edges(pulses, null))
        .measure(edges, WaveformSignal.ofAList());
  }

  private static Reading measured(Outcome outcome) {
    assertThat(outcome).isInstanceOf(Outcome.Measured.class);
    return ((Outcome.Measured) outcome).reading();
  }

  private static double value(Figure figure) {
    return Objects.requireNonNull(figure.value(), String.valueOf(figure.why()));
  }

  private static EdgeOpener periods(String name) throws IOException {
    List<String> lines = lines(name);
    double[] times = new double[lines.size() + 1];
    for (int i = 0; i < lines.size(); i++) {
      times[i + 1] = times[i] + Double.parseDouble(lines.get(i));
    }
    return EdgeLists.rising(times);
  }

  /** The lines that begin with a number. */
  private static List<String> lines(String name) throws IOException {
    return Files.readAllLines(file(name)).stream()
        .map(String::strip)
        .filter(line -> !line.isEmpty() && Character.isDigit(line.charAt(0)))
        .toList();
  }

  private static Path file(String name) {
    Path file = Path.of(System.getProperty("turnsheet.corpus", "absent")).resolve(name);
    if (!Files.exists(file)) {
      System.out.println("skipped: no reference file " + name);
    }
    assumeTrue(Files.exists(file));
    return file;
  }
}
