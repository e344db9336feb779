package turnsheet.core.diagnose.sensor;

import static java.util.Objects.requireNonNull;
import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.io.ByteArrayInputStream;
import java.io.ByteArrayOutputStream;
import java.io.InputStream;
import java.util.function.DoubleUnaryOperator;
import org.junit.jupiter.api.Test;
import turnsheet.core.diagnose.Waves;
import turnsheet.core.format.CaptureFormats;
import turnsheet.core.format.api.ByteSource;
import turnsheet.core.format.api.ReadOptions;
import turnsheet.core.measure.Figure;
import turnsheet.core.measure.MeasureSettings;
import turnsheet.core.measure.Measurement;
import turnsheet.core.measure.Progress;
import turnsheet.core.synth.WavWriter;

/** Against closed forms of sines, trapezoids and pulses, in files of 16 bits. */
class HealthMeterTest {

  private static final int RATE = 16_000;
  private static final double PULSES = 800;
  private static final double PEAK = 0.5;

  /** Slope of a sine at its crossing. */
  private static final double SLOPE = 2 * Math.PI * PULSES * PEAK;

  private static double[] sine(double seconds, double noise) {
    double[] x = new double[(int) (seconds * RATE)];
    Waves.add(x, RATE, PULSES, PEAK, 0.3);
    Waves.addNoise(x, noise, 4);
    return x;
  }

  /**
   * Hum of 12 % of the signal on a shaft that runs evenly. By hand: an edge comes early by hum over
   * slope, and the speed line is 2 pi 50 Hz times that: 100 * 0.12 * 50 / 800 = 0.75 %. The bar is
   * 5 %; the sine's curvature adds 0.2 % (arc sine of 0.12), reading lines 1 %.
   */
  @Test
  void humReadsAsItsPredictedFalseLineByEdgesAndAsNothingInTheBand() throws Exception {
    double[] x = sine(30, 0.0003);
    Waves.add(x, RATE, 50, 0.12 * PEAK, 1);
    SensorHealth health = judge(x, RATE, PULSES);

    assertThat(health.riding()).hasSize(1);
    RidingLine hum = health.riding().get(0);
    assertThat(hum.cause()).isEqualTo(RidingLine.Cause.MAINS);
    assertThat(hum.rateHz()).isCloseTo(50, within(0.001));
    assertThat(hum.relativeDb()).isCloseTo(20 * Math.log10(0.12), within(0.05));
    assertThat(hum.falsePeakPercent()).isCloseTo(0.75, within(0.0075));

    TwoReadings both = requireNonNull(health.readings());
    TwoReadings.Line line =
        both.lines().stream()
            .filter(l -> Math.abs(l.rateHz() - 50) < 0.1)
            .findFirst()
            .orElseThrow();
    assertThat(line.edgesPeakPercent()).isCloseTo(0.75, within(0.05 * 0.75));
    assertThat(line.who()).isEqualTo(TwoReadings.Who.SIGNAL);
    // 90 dB of the filters are 0.00002 %, noise of 65 dB lies below 0.0005 %
    assertThat(line.bandPeakPercent()).isLessThan(0.0005);
    assertThat(both.falsePercent()).isCloseTo(0.75 / Math.sqrt(2), within(0.01));
    assertThat(value(both.edgesPercent())).isCloseTo(0.75 / Math.sqrt(2), within(0.02));
    assertThat(value(both.smallestByEdgesPercent())).isGreaterThan(0.75);
    assertThat(value(both.smallestByBandPercent())).isLessThan(0.02);
    assertThat(value(both.bandPercent())).isLessThan(value(both.smallestByBandPercent()));
  }

  /** facts: sigma_t = sigma_n / |slope|; SNR = A^2 / (2 sigma_n^2). */
  @Test
  void noiseOverSlopeIsTheNoiseOfTheEdges() throws Exception {
    double noise = 0.005;
    SensorHealth health = judge(sine(20, noise), RATE, PULSES);

    // medians of 64 segments and 20 gaps: 1 %
    assertThat(requireNonNull(health.noiseRms())).isCloseTo(noise, within(0.02 * noise));
    assertThat(value(health.snrDb()))
        .isCloseTo(20 * Math.log10(PEAK / Math.sqrt(2) / noise), within(0.2));
    assertThat(value(health.riseSlopePerSecond())).isCloseTo(SLOPE, within(0.005 * SLOPE));
    assertThat(value(health.fallSlopePerSecond())).isCloseTo(-SLOPE, within(0.005 * SLOPE));
    double predicted = 1e6 * noise / SLOPE;
    assertThat(value(health.predictedEdgeNoiseMicroseconds()))
        .isCloseTo(predicted, within(0.02 * predicted));
    // 16000 edges give the measured one within 2 %
    assertThat(value(health.edgeNoiseMicroseconds()))
        .isCloseTo(predicted, within(0.06 * predicted));
    assertThat(requireNonNull(health.hysteresis().neededPercent()))
        .isCloseTo(100 * 8 * noise / (2 * PEAK), within(0.2));
    assertThat(health.riding()).isEmpty();
    assertThat(health.distortionPercent()).isLessThan(0.1);
  }

  /** From -0.8 to 0.8 of the peak: 2 asin 0.8 / (2 pi f). */
  @Test
  void aSineRisesAsItsArcSineSays() throws Exception {
    double expected = 1e6 * 2 * Math.asin(0.8) / (2 * Math.PI * PULSES);
    // the mean pulse has 128 points, whose largest may miss the peak by 0.03 %: 1 us
    assertThat(value(judge(sine(10, 0.0005), RATE, PULSES).riseMicroseconds()))
        .isCloseTo(expected, within(0.01 * expected));
  }

  /**
   * A symmetrical trapezoid whose flanks take 0.2 of the period: 0.8 of that from 10 to 90 %, odd
   * harmonics sin(pi h r) / (pi h r) / h.
   */
  @Test
  void aTrapezoidShowsItsFlanksAndHarmonics() throws Exception {
    double flank = 0.2;
    double[] x =
        wave(
            48_000,
            12,
            100.3,
            u -> PEAK * clip(2 * (0.25 - Math.abs((u + 0.25) % 1 - 0.5)) / flank));
    SensorHealth health = judge(x, 48_000, 100.3);

    double expected = 1e6 * 0.8 * flank / 100.3;
    assertThat(value(health.riseMicroseconds())).isCloseTo(expected, within(0.01 * expected));
    double squares = 0;
    for (int h = 3; h <= 9; h += 2) {
      double peak = harmonic(h, flank) / harmonic(1, flank);
      squares += peak * peak;
      if (Math.abs(peak) > 0.001) {
        assertThat(health.harmonicsDb().get(h - 2))
            .isCloseTo(20 * Math.log10(Math.abs(peak)), within(0.1));
      }
    }
    assertThat(health.distortionPercent()).isCloseTo(100 * Math.sqrt(squares), within(0.1));
    assertThat(value(health.dutyPercent())).isCloseTo(50, within(0.1));
    // the full swing but for the lowest and highest half percent of the samples
    assertThat(health.hysteresis().widestPercent()).isCloseTo(100, within(0.5));
  }

  /** Flanks of a hundredth of the period at 480 samples a period: 4.8 samples, 80 us of them. */
  @Test
  void narrowPulsesHaveTheirDutyAndTheirRise() throws Exception {
    double[] x = wave(48_000, 12, 100, u -> PEAK * clip(1 - (Math.abs(u - 0.5) - 0.045) / 0.005));
    SensorHealth health = judge(x, 48_000, 100);
    assertThat(value(health.dutyPercent())).isCloseTo(10, within(0.1));
    // corners are not band-limited and ring between samples
    assertThat(value(health.riseMicroseconds())).isCloseTo(80, within(8.0));
  }

  @Test
  void aFlankWithinTwoSamplesIsSaidToBeTheRecorders() throws Exception {
    double[] x = wave(16_000, 10, 101.7, u -> PEAK * Math.tanh(60 * Math.sin(2 * Math.PI * u)));
    Figure rise = judge(x, 16_000, 101.7).riseMicroseconds();
    assertThat(rise.value()).isNull();
    assertThat(rise.why()).startsWith("the waveform rises within ");
  }

  /** A level that swings between 0.25 and 0.75: the weakest pulse leaves a band of 0.5. */
  @Test
  void theWeakestPulseSetsTheHysteresis() throws Exception {
    double[] x = new double[10 * RATE];
    for (int i = 0; i < x.length; i++) {
      double t = (double) i / RATE;
      x[i] = (0.5 + 0.25 * Math.sin(6 * Math.PI * t)) * Math.sin(2 * Math.PI * 397.3 * t);
    }
    SensorHealth health = judge(x, RATE, 397.3);
    double expected = 100 * 0.5 / (health.high() - health.low());
    // 40 samples a period miss the crest by up to 0.3 %
    assertThat(health.hysteresis().widestPercent()).isCloseTo(expected, within(0.02 * expected));
  }

  /** Hum above half the pulse rate folds: 150.2 Hz at 100 pulses shows at 49.8 Hz. */
  @Test
  void humAboveHalfThePulseRateFolds() throws Exception {
    double[] x = new double[30 * RATE];
    Waves.add(x, RATE, 100, PEAK, 0);
    Waves.add(x, RATE, 150.2, 0.01 * PEAK, 0.4);
    Waves.addNoise(x, 0.0001, 3);
    SensorHealth health = judge(x, RATE, 100);
    // half of 100 Hz less 4 % for straying
    assertThat(requireNonNull(health.readings()).bandTopHz()).isCloseTo(46, within(0.1));
    assertThat(requireNonNull(health.readings()).lines())
        .filteredOn(l -> l.rateHz() > 49)
        .singleElement()
        .satisfies(l -> assertThat(l.bandPeakPercent()).isNull());
    RidingLine line = health.riding().get(0);
    assertThat(line.falseRateHz()).isCloseTo(49.8, within(0.01));
    // 100 * 0.01 * 49.8 / 100
    assertThat(line.falsePeakPercent()).isCloseTo(0.498, within(0.005));
  }

  /** A true line of 0.05 % at 4 Hz and hum of 2 %: each is told whose it is. */
  @Test
  void trueAndFalseLinesAreToldApart() throws Exception {
    double[] x = new double[30 * RATE];
    for (int i = 0; i < x.length; i++) {
      double t = (double) i / RATE;
      double phase = 2 * Math.PI * PULSES * t - PULSES * 0.0005 / 4 * Math.cos(2 * Math.PI * 4 * t);
      x[i] = PEAK * Math.sin(phase);
    }
    Waves.add(x, RATE, 150.06, 0.02 * PEAK, 0);
    Waves.addNoise(x, 0.0003, 8);
    TwoReadings both = requireNonNull(judge(x, RATE, PULSES).readings());
    assertThat(both.lines()).hasSize(2);
    assertThat(both.lines().get(0).who()).isEqualTo(TwoReadings.Who.SHAFT);
    assertThat(both.lines().get(0).bandPeakPercent()).isCloseTo(0.05, within(0.001));
    assertThat(both.lines().get(1).who()).isEqualTo(TwoReadings.Who.SIGNAL);
    // 100 * 0.02 * 150.06 / 800
    assertThat(both.lines().get(1).edgesPeakPercent()).isCloseTo(0.375, within(0.019));
  }

  private static double clip(double v) {
    return Math.max(-1, Math.min(1, v));
  }

  private static double harmonic(int h, double flank) {
    double a = Math.PI * h * flank;
    return Math.sin(a) / a / h;
  }

  private static double[] wave(
      int rate, double seconds, double pulses, DoubleUnaryOperator ofTurn) {
    double[] x = new double[(int) (rate * seconds)];
    for (int i = 0; i < x.length; i++) {
      double turns = pulses * i / rate + 0.1;
      x[i] = ofTurn.applyAsDouble(turns - Math.floor(turns));
    }
    return x;
  }

  private static double value(Figure figure) {
    Double value = figure.value();
    return value == null ? Double.NaN : value;
  }

  private static SensorHealth judge(double[] x, int rate, double pulses) throws Exception {
    var out = new ByteArrayOutputStream();
    WavWriter.write(out, rate, 16, x);
    byte[] wav = out.toByteArray();
    ByteSource bytes =
        new ByteSource() {
          @Override
          public InputStream open() {
            return new ByteArrayInputStream(wav);
          }

          @Override
          public long length() {
            return wav.length;
          }
        };
    MeasureSettings settings = MeasureSettings.tachometer(pulses, null);
    return new HealthMeter(
            new Measurement(CaptureFormats.standard()),
            bytes,
            "ab",
            ReadOptions.none().withChannel(1),
            settings)
        .judge(Progress.NONE);
  }
}
