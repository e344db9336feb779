package turnsheet.core.diagnose.filter;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.assertj.core.api.Assertions.within;

import java.io.ByteArrayInputStream;
import java.io.ByteArrayOutputStream;
import java.io.InputStream;
import java.util.List;
import java.util.Objects;
import java.util.concurrent.Executor;
import java.util.concurrent.ForkJoinPool;
import org.junit.jupiter.api.Test;
import turnsheet.core.format.CaptureFormats;
import turnsheet.core.format.api.ByteSource;
import turnsheet.core.format.api.ReadOptions;
import turnsheet.core.measure.MeasureSettings;
import turnsheet.core.measure.Measurement;
import turnsheet.core.measure.Outcome;
import turnsheet.core.measure.Progress;
import turnsheet.core.signal.RejectedException;
import turnsheet.core.synth.WavWriter;

class TrialTest {

  private static final FilterFamily BUTTERWORTH = FilterFamily.BUTTERWORTH;
  private static final FilterFamily BESSEL = FilterFamily.BESSEL;
  private static final Executor THREADS = ForkJoinPool.commonPool();

  /** 12 % of the peak of the pulses. */
  private static final double HUM = 0.048;

  private static TrialPlan plan(double hysteresisPercent, FilterDesign... designs) {
    return new TrialPlan(800, 400, 1600, true, hysteresisPercent, 0, 0.05, List.of(designs));
  }

  private static TrialResult run(double[] samples, TrialPlan plan) throws Exception {
    return new Trial(THREADS, 2).run(Recordings.source(samples), plan, Progress.NONE);
  }

  /**
   * The prediction of the trial against the edge noise that the filtered waveform shows when it is
   * written to a file and measured as any capture. Asked for within 10 %; 4800 edges give the
   * measured one within 1.7 % (1 sigma), the prediction's spectrum 1 %.
   */
  @Test
  void predictedEdgeNoiseIsThatOfTheFilteredWaveform() throws Exception {
    double[] samples = Recordings.tachometer(6, HUM, 0.002, 5);
    FilterDesign[] designs = {
      FilterDesign.highPass(BUTTERWORTH, 4, 300),
      FilterDesign.lowPass(BESSEL, 6, 2000),
      FilterDesign.bandPass(BUTTERWORTH, 2, 250, 2500)
    };
    TrialResult result = run(samples, plan(10, designs));
    for (TrialResult.Row row : result.rows()) {
      double[] filtered = samples.clone();
      FilterDesign design = row.design();
      if (design != null) {
        DiscreteFilter filter = design.at(Recordings.RATE);
        filter.settleAt(0.1);
        filter.process(filtered, filtered.length);
      }
      double measured = edgeNoiseMicroseconds(filtered);
      assertThat(row.bare().predictedMicroseconds()).isCloseTo(measured, within(0.06 * measured));
      assertThat(row.bare().noiseMicroseconds()).isCloseTo(measured, within(0.04 * measured));
      // 10 % of hysteresis lie where a rounded pulse is hardly flatter: the same slope within 8 %
      assertThat(row.compared().predictedMicroseconds())
          .isCloseTo(row.compared().noiseMicroseconds(), within(0.06 * measured));
    }
  }

  private static double edgeNoiseMicroseconds(double[] samples) throws Exception {
    ByteArrayOutputStream bytes = new ByteArrayOutputStream();
    WavWriter.write(bytes, (int) Recordings.RATE, 24, samples);
    ByteSource source =
        new ByteSource() {
          @Override
          public InputStream open() {
            return new ByteArrayInputStream(bytes.toByteArray());
          }

          @Override
          public long length() {
            return bytes.size();
          }
        };
    Outcome outcome =
        new Measurement(CaptureFormats.standard())
            .measure(
                source,
                "0",
                ReadOptions.none(),
                MeasureSettings.tachometer(800, null),
                Progress.NONE);
    var edges = Objects.requireNonNull(((Outcome.Measured) outcome).reading().edges());
    return Objects.requireNonNull(edges.edgeNoiseMicroseconds().value());
  }

  /**
   * White noise behind no filter on a sine: sigma over slope, sigma / (2 pi f A), closed form. The
   * pulses here have tanh of a sine: their slope at zero is A 2 pi f / tanh 1.
   */
  @Test
  void noiseOverSlopeIsTheClosedForm() throws Exception {
    TrialResult result = run(Recordings.tachometer(5, 0, 0.002, 8), plan(0));
    double expected = 1e6 * 0.002 / (0.4 / Math.tanh(1) * 2 * Math.PI * 801.04);
    TrialResult.Edges bare = result.rows().get(0).bare();
    // 4000 edges: 1.8 % (1 sigma); averaged spectra of 5 s: 1 %
    assertThat(bare.predictedMicroseconds()).isCloseTo(expected, within(0.04 * expected));
    assertThat(bare.noiseMicroseconds()).isCloseTo(expected, within(0.06 * expected));
    assertThat(result.hum()).isEmpty();
    assertThat(result.toothHz()).isCloseTo(801.04, within(0.001));
    // the fundamental of tanh(sin x) / tanh 1 is 1.06576, integrated by another program
    double noiseDb = 20 * Math.log10(0.002 * Math.sqrt(2) / (0.4 * 1.06576));
    assertThat(result.noiseDb()).isCloseTo(noiseDb, within(0.1));
  }

  /** What is left is the response at each line; what comes in is what was put in. */
  @Test
  void signalAndHumAreLeftAsTheResponseSays() throws Exception {
    FilterDesign design = FilterDesign.highPass(BUTTERWORTH, 2, 200);
    TrialResult result = run(Recordings.tachometer(5, HUM, 0.0005, 3), plan(10, design));
    double in = 20 * Math.log10(HUM / (0.4 * 1.06576));
    assertThat(result.hum()).extracting(TrialResult.Hum::rateHz).containsExactly(50.0, 150.0);
    // the line's power is read within 1 % over the noise beside it
    assertThat(result.hum().get(0).relativeDb()).isCloseTo(in, within(0.1));
    assertThat(result.hum().get(1).relativeDb()).isCloseTo(in - 12.04, within(0.1));
    TrialResult.Row row = result.rows().get(1);
    double gain = design.gainDb(801.04);
    assertThat(row.signalDb()).isCloseTo(gain, within(0.01));
    assertThat(row.hum().get(0).relativeDb()).isCloseTo(in + design.gainDb(50) - gain, within(0.1));
    // a line of peak a moves an edge by a / slope, its root mean square is that over sqrt 2
    double unfiltered =
        1e6 * HUM * Math.sqrt(17 / 16.0 / 2) / (0.4 / Math.tanh(1) * 2 * Math.PI * 801.04);
    assertThat(result.rows().get(0).bare().humMicroseconds())
        .isCloseTo(unfiltered, within(0.02 * unfiltered));
  }

  /** A low-pass of two poles: the delay by its closed form at the pulse rate. */
  @Test
  void delayIsTheGroupDelayAtThePulseRate() throws Exception {
    TrialResult result =
        run(
            Recordings.tachometer(3, 0, 0.001, 4),
            plan(10, FilterDesign.lowPass(BUTTERWORTH, 2, 3000)));
    double x = 801.04 / 3000;
    double w0 = 2 * Math.PI * 3000;
    double expected = 1e6 * Math.sqrt(2) / w0 * (1 + x * x) / (1 + Math.pow(x, 4));
    // 3 kHz at 48 kHz are warped by 1.3 %, and the frequency axis about the pulses with them
    assertThat(result.rows().get(1).delayMicroseconds())
        .isCloseTo(expected, within(0.013 * expected));
  }

  /** Hum larger than the pulses: without a high-pass edges are lost, behind one none is. */
  @Test
  void humThatSwallowsPulsesIsSeenAndFiltered() throws Exception {
    double[] samples = Recordings.tachometer(4, 0.6, 0.002, 6);
    TrialResult result =
        run(
            samples,
            plan(
                10,
                FilterDesign.lowPass(BUTTERWORTH, 4, 3000),
                FilterDesign.highPass(BUTTERWORTH, 8, 280)));
    assertThat(result.rows().get(0).compared().lost()).isGreaterThan(500);
    assertThat(result.rows().get(1).compared().lost()).isGreaterThan(500);
    TrialResult.Row behind = result.rows().get(2);
    assertThat(behind.compared().lost()).isZero();
    assertThat(behind.compared().extra()).isZero();
    assertThat(behind.bare().lost()).isZero();
    TrialResult.Choice choice = Objects.requireNonNull(result.choice());
    assertThat(choice.row()).isEqualTo(2);
    assertThat(choice.kept()).isEqualTo(1);
  }

  /**
   * Noise that crosses the middle again and again makes false edges; hysteresis takes them away.
   */
  @Test
  void hysteresisTakesFalseEdgesAway() throws Exception {
    double[] samples = Recordings.tachometer(3, 0, 0.03, 7);
    TrialResult.Edges none = run(samples, plan(0)).rows().get(0).compared();
    assertThat(none.extra()).isGreaterThan(100);
    TrialResult.Edges some = run(samples, plan(40)).rows().get(0).compared();
    assertThat(some.extra()).isZero();
    assertThat(some.lost()).isZero();
  }

  /**
   * A coil's level halves with the speed: thresholds at 60 % of the recorded peak are not reached
   * at the lower setting, by one of constant level they are.
   */
  @Test
  void aLevelThatFallsWithTheSpeedMayNotSurvive() throws Exception {
    double[] samples = Recordings.tachometer(3, 0, 0.001, 9);
    FilterDesign high = FilterDesign.highPass(BUTTERWORTH, 8, 700);
    TrialResult coil = run(samples, plan(60, high));
    assertThat(coil.rows().get(0).compared().lowest().survives()).isFalse();
    assertThat(coil.rows().get(0).compared().lowest().signalDb()).isCloseTo(-6.03, within(0.1));
    assertThat(coil.rows().get(0).compared().highest().survives()).isTrue();
    assertThat(coil.choice()).isNull();
    TrialResult even =
        run(samples, new TrialPlan(800, 400, 1600, false, 60, 0, 0.05, List.of(high)));
    assertThat(even.rows().get(0).compared().lowest().survives()).isTrue();
    // the filter takes 39 dB at 400 per second: nothing passes the thresholds
    assertThat(even.rows().get(1).compared().lowest().survives()).isFalse();
    assertThat(even.rows().get(1).compared().lost()).isZero();
    TrialResult.Choice choice = Objects.requireNonNull(even.choice());
    assertThat(choice.reason()).isEqualTo(TrialResult.Reason.NO_FILTER);
  }

  /** A comparator that switches above the signal's top sees nothing. */
  @Test
  void anOffsetBeyondTheSignalLosesEverything() throws Exception {
    TrialPlan plan = new TrialPlan(800, 400, 1600, true, 10, 49, 0.05, List.of());
    TrialResult.Edges edges =
        run(Recordings.tachometer(3, 0, 0.001, 9), plan).rows().get(0).compared();
    assertThat(edges.counted()).isZero();
    assertThat(edges.lost()).isGreaterThan(2000);
    assertThat(edges.noiseMicroseconds()).isNull();
    assertThat(edges.predictedMicroseconds()).isNull();
  }

  @Test
  void threadsChangeNothing() throws Exception {
    double[] samples = Recordings.tachometer(2.5, HUM, 0.002, 5);
    TrialPlan plan =
        plan(
            10,
            FilterDesign.highPass(BESSEL, 2, 100),
            FilterDesign.highPass(BESSEL, 4, 100),
            FilterDesign.bandPass(BESSEL, 2, 100, 3000));
    TrialResult alone =
        new Trial(Runnable::run, 1).run(Recordings.source(samples), plan, Progress.NONE);
    assertThat(run(samples, plan)).isEqualTo(alone);
  }

  @Test
  void stopsWhenProgressThrows() {
    double[] samples = Recordings.tachometer(3, 0, 0.001, 9);
    FilterDesign[] many = new FilterDesign[40];
    for (int i = 0; i < many.length; i++) {
      many[i] = FilterDesign.highPass(BUTTERWORTH, 8, 100 + i);
    }
    assertThatThrownBy(
            () ->
                new Trial(THREADS, 2)
                    .run(
                        Recordings.source(samples),
                        plan(10, many),
                        part -> {
                          if (part > 0.05) {
                            throw new IllegalStateException("enough");
                          }
                        }))
        .isInstanceOf(IllegalStateException.class)
        .hasMessage("enough");
  }

  @Test
  void refusesWhatCannotBeTried() {
    double[] samples = Recordings.tachometer(3, 0, 0.001, 9);
    TrialPlan tooHigh = plan(10, FilterDesign.lowPass(BESSEL, 2, 22_000));
    assertThatThrownBy(() -> run(samples, tooHigh))
        .isInstanceOf(RejectedException.class)
        .hasMessageContaining("cutoffTooHigh");
    TrialPlan other = new TrialPlan(700, 400, 1600, true, 10, 0, 0.05, List.of());
    assertThatThrownBy(() -> run(samples, other))
        .isInstanceOf(RejectedException.class)
        .hasMessageContaining("otherRate");
    assertThatThrownBy(() -> run(new double[250_000], plan(10)))
        .isInstanceOf(RejectedException.class)
        .hasMessageContaining("silent");
    assertThatThrownBy(() -> run(new double[50], plan(10)))
        .isInstanceOf(RejectedException.class)
        .hasMessageContaining("tooShort");
  }
}
