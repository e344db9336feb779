package turnsheet.core.measure;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.assertj.core.api.Assertions.within;

import java.util.Objects;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import turnsheet.core.dsp.Weighting;
import turnsheet.core.signal.RejectedException;
import turnsheet.core.signal.Warning;
import turnsheet.core.synth.SignalSynth;
import turnsheet.core.synth.SpeedFunction;

/** Closed-form speeds as tachometer waveforms: sines, and pulses as a sound card records them. */
class TachometerPlanTest {

  @ParameterizedTest
  @CsvSource({
    "400, 44100, 1",
    "800, 48000, 1",
    "1600, 48000, 1",
    "1600, 96000, 1",
    "1600, 192000, 4"
  })
  void readsSinesAndSoftPulses(double pulses, double rate, double steepness) throws Exception {
    SpeedFunction speed = SpeedFunction.constant(-0.0021).plusLine(6.3, 0.15, 0.3);
    double[] samples = SignalSynth.tone(speed, pulses, rate, 20, 0.5, Double.POSITIVE_INFINITY, 1);
    if (steepness > 1) {
      for (int i = 0; i < samples.length; i++) {
        samples[i] = 0.5 * Math.tanh(steepness * 2 * samples[i]);
      }
    }
    Reading r = measure(samples, rate, pulses);
    assertThat(value(r.speed().deviationPercent())).isCloseTo(-0.21, within(1e-3));
    double relative = 0.15 / (1 - 0.0021);
    double weighted = relative * Weighting.gain(6.3);
    assertThat(value(r.flutter().weightedTwoSigmaPercent()))
        .isCloseTo(0.996917 * weighted, within(0.02 * weighted));
    assertThat(value(r.lines().get(0).rateHz())).isCloseTo(6.3, within(0.02));
    assertThat(value(r.lines().get(0).peakPercent())).isCloseTo(relative, within(0.03 * relative));
    Reading.Edges edges = Objects.requireNonNull(r.edges());
    assertThat(edges.missing()).isZero();
    assertThat(edges.extra()).isZero();
    assertThat(value(Objects.requireNonNull(edges.dutyPercent()))).isCloseTo(50, within(0.05));
    // interpolation of the crossings alone: below a hundredth of a sample
    assertThat(value(edges.edgeNoiseMicroseconds())).isLessThan(0.01e6 / rate);
  }

  /** White noise over slope: sigma_t = sigma_n / (2 pi f A) (textbook). */
  @Test
  void turnsNoiseOfASineIntoNoiseOfItsEdges() throws Exception {
    double[] samples = SignalSynth.tone(SpeedFunction.constant(0), 800, 48000, 30, 0.5, 40, 7);
    Reading r = measure(samples, 48000, 800);
    double noise = 0.5 / Math.sqrt(2) * 0.01;
    double expected = noise / (2 * Math.PI * 800 * 0.5) * 1e6;
    // interpolation between two noisy samples averages: factor between 0.71 (middle) and 1 (at a
    // sample) for a straight line, the cubic keeps a little more: mean square 0.7 to 1
    assertThat(value(Objects.requireNonNull(r.edges()).edgeNoiseMicroseconds()))
        .isBetween(0.75 * expected, 1.02 * expected);
    assertThat(Objects.requireNonNull(r.edges()).extra()).isZero();
  }

  @Test
  void takesFullScaleSquaresWithoutComplaint() throws Exception {
    SpeedFunction speed = SpeedFunction.constant(0.004);
    double[] samples = new double[48000 * 20];
    for (int i = 0; i < samples.length; i++) {
      double turns = 400 * speed.travelled(i / 48000.0);
      samples[i] = turns - Math.floor(turns) < 0.5 ? 1 : -1;
    }
    Reading r = measure(samples, 48000, 400);
    assertThat(value(r.speed().deviationPercent())).isCloseTo(0.4, within(1e-3));
    assertThat(r.warnings()).extracting(Warning::code).doesNotContain("clipped");
    assertThat(r.signal().clippedSamples()).isEqualTo(samples.length);
    // 119.5 samples a period: rounding goes to and fro from edge to edge, which fourth differences
    // take for more noise than the 20.83 / sqrt 12 = 6 us of independent rounding
    assertThat(value(Objects.requireNonNull(r.edges()).edgeNoiseMicroseconds()))
        .isBetween(5.0, 12.0);
    // steps this sharp have no place between samples: the sampling is a clock of 20.83 us
    assertThat(r.warnings())
        .filteredOn(w -> w.code().equals("quantised"))
        .first()
        .satisfies(w -> assertThat(w.message()).contains("20.83"));
  }

  /** Hum of 12 % of a sine: 20 log 0.12 = -18.4 dB; what it does to edges is in the lines. */
  @Test
  void namesMainsHumOnTheSignal() throws Exception {
    double[] samples =
        SignalSynth.tone(
            SpeedFunction.constant(0), 800, 48000, 20, 0.5, Double.POSITIVE_INFINITY, 1);
    for (int i = 0; i < samples.length; i++) {
      samples[i] += 0.06 * Math.sin(2 * Math.PI * 50 * i / 48000);
    }
    Reading r = measure(samples, 48000, 800);
    assertThat(r.signal().mains()).hasSize(1);
    assertThat(r.signal().mains().get(0).rateHz()).isEqualTo(50);
    // 50 Hz lies between bins of the probe's spectrum: up to 0.8 dB of scallop
    assertThat(r.signal().mains().get(0).relativeDb()).isCloseTo(-18.4, within(0.9));
    assertThat(value(r.lines().get(0).rateHz())).isCloseTo(50, within(0.01));
  }

  @Test
  void findsShortPulsesOnAnOffset() throws Exception {
    double[] samples = new double[20 * 20000];
    for (int i = 0; i < samples.length; i++) {
      double turns = 100 * i / 20000.0;
      double x = (turns - Math.floor(turns) - 0.5) / 0.01;
      samples[i] = 2.5 + 1.5 * Math.exp(-x * x / 2);
    }
    Reading r = measure(samples, 20000, 100);
    assertThat(value(r.speed().deviationPercent())).isCloseTo(0, within(1e-3));
    assertThat(Objects.requireNonNull(r.edges()).count()).isEqualTo(2000);
  }

  @Test
  void refusesWhatHoldsNoPulses() {
    refused(new double[48000 * 2], "silent");
    double[] one = new double[48000 * 2];
    java.util.Arrays.fill(one, 48000, 96000, 1);
    refused(one, "noPulses");
    java.util.Random random = new java.util.Random(1);
    double[] noise = new double[48000 * 5];
    for (int i = 0; i < noise.length; i++) {
      noise[i] = 0.1 * random.nextGaussian();
    }
    refused(noise, "notSteady");
  }

  private static void refused(double[] samples, String code) {
    assertThatThrownBy(() -> measure(samples, 48000, 800))
        .isInstanceOfSatisfying(
            RejectedException.class, e -> assertThat(e.rejection().code()).isEqualTo(code));
  }

  private static Reading measure(double[] samples, double rate, double pulses) throws Exception {
    MeasureSettings settings = MeasureSettings.tachometer(pulses, null);
    return new TachometerPlan(() -> EdgeLists.samples(samples, rate), settings)
        .measure(new EdgePlan("00", "waveform", rate, settings))
        .reading();
  }

  private static double value(Figure figure) {
    return Objects.requireNonNull(figure.value(), String.valueOf(figure.why()));
  }
}
