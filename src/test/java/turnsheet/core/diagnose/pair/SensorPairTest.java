package turnsheet.core.diagnose.pair;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.io.ByteArrayInputStream;
import java.io.ByteArrayOutputStream;
import java.io.InputStream;
import java.util.List;
import java.util.Random;
import java.util.function.DoubleUnaryOperator;
import org.assertj.core.api.Assertions;
import org.junit.jupiter.api.Tag;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import turnsheet.core.dsp.EdgeSpeed;
import turnsheet.core.format.CaptureFormats;
import turnsheet.core.format.api.ByteSource;
import turnsheet.core.format.api.ReadOptions;
import turnsheet.core.measure.Figure;
import turnsheet.core.measure.MeasureSettings;
import turnsheet.core.measure.Measurement;
import turnsheet.core.measure.Outcome;
import turnsheet.core.signal.RejectedException;
import turnsheet.core.signal.SpeedTrace;
import turnsheet.core.signal.Warning;
import turnsheet.core.synth.SignalSynth;
import turnsheet.core.synth.SpeedFunction;
import turnsheet.core.synth.WavWriter;

/**
 * Two sensors on an invented shaft: the noise that was put on the edges and the flutter of its
 * closed form must come out.
 */
class SensorPairTest {

  private static final double TURNS = 13.3;
  private static final Shaft SHAFT = Shaft.wandering(0.08, 0.05, 101);

  /** The bars: 10 % of the noise, 3 % of the common flutter, from 60 s. */
  @ParameterizedTest
  @CsvSource({
    "60, 60, 1, 1",
    "60, 60, 1, 10",
    "60, 100, 1, 1",
    "60, 100, 0.5, 5",
    "12, 120, 1, 1",
    "12, 120, 0.5, 5"
  })
  void theNoiseOfEachAndTheCommonFlutterAreFound(int teeth, int others, double noise, double worse)
      throws Exception {
    PairFindings found = of(side(teeth, noise, 1), side(others, worse, 2));

    assertThat(off(found.original().edgeNoiseMicroseconds(), noise)).isLessThan(0.10);
    assertThat(off(found.replacement().edgeNoiseMicroseconds(), worse)).isLessThan(0.10);
    assertThat(off(found.commonWeightedRmsPercent(), SHAFT.rmsPercent(0, 60, true)))
        .isLessThan(0.03);
    // at 10 us the noise alone shows five times the flutter up to 200 Hz
    assertThat(off(found.commonUnweightedRmsPercent(), SHAFT.rmsPercent(0, 60, false)))
        .isLessThan(worse > 5 ? 0.08 : 0.03);
    // twice the stated uncertainty, k = 2 each: one in ten thousand is beyond
    assertThat(found.noiseRatio().value())
        .isCloseTo(noise / worse, within(2 * uncertainty(found.noiseRatio())));
    assertThat(found.warnings()).isEmpty();
    assertThat(found.ownLines()).isEmpty();
  }

  /** Error over stated standard uncertainty: its root mean square over 24 draws is 1 +- 0.14. */
  @Tag("accuracy")
  @ParameterizedTest
  @CsvSource({"60, 60, 1, 10", "60, 100, 1, 1", "12, 120, 1, 10"})
  void theStatedErrorsAreThoseThatAreMade(int teeth, int others, double noise, double worse)
      throws Exception {
    double[] squares = new double[3];
    int draws = 24;
    for (int d = 0; d < draws; d++) {
      PairFindings found = of(side(teeth, noise, 100 + d), side(others, worse, 500 + d));
      squares[0] += score(found.original().edgeNoiseMicroseconds(), noise) / draws;
      squares[1] += score(found.replacement().edgeNoiseMicroseconds(), worse) / draws;
      squares[2] += score(found.noiseRatio(), noise / worse) / draws;
    }
    for (double s : squares) {
      assertThat(Math.sqrt(s)).isBetween(0.6, 1.4);
    }
  }

  private static double score(Figure figure, double truth) {
    Double value = figure.value();
    return value == null ? Double.NaN : Math.pow((value - truth) / uncertainty(figure) * 2, 2);
  }

  /** S_y = (2 pi f)^2 2 s^2 / R, summed over the band: the root of its integral. */
  @Test
  void theNoiseIsAlsoToldAsTheFlutterThatItShows() throws Exception {
    PairFindings.Sensor sensor = of(side(60, 2, 3), side(60, 2, 4)).original();

    Double told = sensor.edgeNoiseMicroseconds().value();
    double microseconds = told == null ? Double.NaN : told;
    double density = 2 * Math.pow(microseconds * 1e-6, 2) / (60 * TURNS);
    double percent = 100 * 2 * Math.PI * Math.sqrt(density * Math.pow(200, 3) / 3);
    // the band ends at a bin of 0.12 Hz below 200 Hz
    assertThat(sensor.noiseUnweightedPercent().value()).isCloseTo(percent, within(0.002 * percent));
  }

  /** Every tooth of one wheel off its place by up to 5 us. */
  @Test
  void thePatternOfAWheelIsNeitherNoiseNorCommon() throws Exception {
    double[] places = new Random(5).doubles(60, -5e-6, 5e-6).toArray();
    int[] tooth = {0};
    PairSide uneven = side(SHAFT, 60, 1, 6, t -> t + places[tooth[0]++ % 60]);

    PairFindings found = of(uneven, side(60, 1, 7));

    assertThat(off(found.original().edgeNoiseMicroseconds(), 1)).isLessThan(0.10);
    assertThat(off(found.replacement().edgeNoiseMicroseconds(), 1)).isLessThan(0.10);
    assertThat(off(found.commonWeightedRmsPercent(), SHAFT.rmsPercent(0, 60, true)))
        .isLessThan(0.03);
    assertThat(found.ownLines())
        .isNotEmpty()
        .allSatisfy(
            line -> {
              assertThat(line.turnMultiple()).isNotNull();
              assertThat(line.originalPercent()).isGreaterThan(line.replacementPercent());
            });
    assertThat(codes(found)).contains("pairPattern");
  }

  /** 50 Hz that moves the edges of both by 3 us looks like a machine that does so. */
  @Test
  void humInBothIsSaidToLookLikeTheMachine() throws Exception {
    DoubleUnaryOperator hum = t -> t + 3e-6 * Math.sin(2 * Math.PI * 50 * t);

    PairFindings found = of(side(SHAFT, 60, 1, 8, hum), side(SHAFT, 100, 1, 9, hum));

    // 2 pi 50 Hz x 3 us over the root of two
    assertThat(found.mainsPercent()).isCloseTo(0.0666, within(0.002));
    assertThat(codes(found)).contains("pairMains");
    assertThat(of(side(60, 1, 8), side(100, 1, 9)).mainsPercent()).isNull();
  }

  @Test
  void humInOneIsALineOfItsOwn() throws Exception {
    DoubleUnaryOperator hum = t -> t + 3e-6 * Math.sin(2 * Math.PI * 50 * t);

    PairFindings found = of(side(SHAFT, 60, 1, 8, hum), side(100, 1, 9));

    assertThat(found.ownLines()).hasSize(1);
    assertThat(found.ownLines().get(0).mains()).isTrue();
    assertThat(found.ownLines().get(0).originalPercent()).isCloseTo(0.0666, within(0.003));
    assertThat(found.mainsPercent()).isNull();
    assertThat(off(found.original().edgeNoiseMicroseconds(), 1)).isLessThan(0.10);
  }

  /** Rounding to a step adds a twelfth of its square (JCGM 100 F.2.2.1). */
  @Test
  void theStepOfATimerIsNoiseOfEach() throws Exception {
    double step = 4e-6;
    DoubleUnaryOperator stamp = t -> step * Math.rint(t / step);

    PairFindings found = of(side(SHAFT, 60, 0.5, 10, stamp), side(SHAFT, 100, 1, 11, stamp));

    double square = 16.0 / 12;
    assertThat(off(found.original().edgeNoiseMicroseconds(), Math.sqrt(0.25 + square)))
        .isLessThan(0.10);
    assertThat(off(found.replacement().edgeNoiseMicroseconds(), Math.sqrt(1 + square)))
        .isLessThan(0.10);
  }

  @Test
  void whereNothingIsSharedNoFlutterIsClaimed() throws Exception {
    Shaft even = Shaft.wandering(1e-9, 0, 12);

    PairFindings found = of(side(even, 60, 5, 12, t -> t), side(even, 60, 5, 13, t -> t));

    assertThat(found.commonUnweightedRmsPercent().value()).isNull();
    assertThat(found.commonUnweightedRmsPercent().why()).startsWith("nothing that both share");
    assertThat(off(found.original().edgeNoiseMicroseconds(), 5)).isLessThan(0.10);
    // with 5 in 100 above the level by chance, 40 of 240 would be eight standard deviations away
    assertThat(found.spectrum().stream().filter(p -> p.coherence() > p.chance()).count())
        .isLessThan(40);
  }

  @Test
  void noiseThatBothShareIsSaid() throws Exception {
    // both channels hold the signal of one sensor
    PairSide one = side(60, 3, 14);
    PairSide alike =
        new PairSide(one.trace(), one.edgesPerSecond(), 60, List.of(), Figure.of(3, 0.1));

    assertThat(codes(of(alike, alike))).contains("pairSharedNoise");
  }

  @Test
  void sensorsOfDifferentShaftsAreRefused() {
    Assertions.assertThatThrownBy(() -> of(side(60, 1, 1), side(60, 1, 2).withTeeth(100)))
        .isInstanceOf(RejectedException.class)
        .hasMessageContaining("check the pulses per turn");
  }

  /** Stereo at 48 kHz: noise over slope is the noise of an edge. */
  @Test
  void twoChannelsOfAWaveformTellTheNoiseOfEach() throws Exception {
    SpeedFunction speed = SpeedFunction.constant(0).plusLine(0.83, 0.08, 1).plusLine(4.17, 0.07, 2);
    double[] one = SignalSynth.pulses(speed, 798, 48_000, 60, 0.5, 1, 0.01, 21);
    double[] other = SignalSynth.pulses(speed, 1330, 48_000, 60, 0.5, 1, 0.01, 22);
    ByteArrayOutputStream file = new ByteArrayOutputStream();
    WavWriter.write(file, 48_000, 16, one, other);

    PairFindings found =
        SensorPair.together(measured(file, 1, 798, 60), measured(file, 2, 1330, 100));

    // slope at the crossing 2 pi f A s / tanh s with s = 1
    double slope = 2 * Math.PI * 0.5 / Math.tanh(1);
    double noise = 0.01;
    assertThat(off(found.original().edgeNoiseMicroseconds(), 1e6 * noise / slope / 798))
        .isLessThan(0.10);
    assertThat(off(found.replacement().edgeNoiseMicroseconds(), 1e6 * noise / slope / 1330))
        .isLessThan(0.10);
    assertThat(off(found.commonUnweightedRmsPercent(), Math.hypot(0.08, 0.07) / Math.sqrt(2)))
        .isLessThan(0.03);
  }

  private static PairSide measured(ByteArrayOutputStream file, int channel, double rate, int teeth)
      throws Exception {
    byte[] bytes = file.toByteArray();
    ByteSource source =
        new ByteSource() {
          @Override
          public InputStream open() {
            return new ByteArrayInputStream(bytes);
          }

          @Override
          public long length() {
            return bytes.length;
          }
        };
    Outcome outcome =
        new Measurement(CaptureFormats.standard())
            .measure(
                source,
                "",
                ReadOptions.none(),
                MeasureSettings.tachometer(rate, teeth).onChannel(channel),
                share -> {});
    return PairSide.of((Outcome.Measured) outcome, teeth);
  }

  private static PairFindings of(PairSide original, PairSide replacement) throws Exception {
    return SensorPair.together(original, replacement);
  }

  private static List<String> codes(PairFindings found) {
    return found.warnings().stream().map(Warning::code).toList();
  }

  private static double off(Figure figure, double truth) {
    Double value = figure.value();
    return value == null ? Double.NaN : Math.abs(value / truth - 1);
  }

  private static double uncertainty(Figure figure) {
    Double u = figure.expandedUncertainty();
    return u == null ? Double.NaN : u;
  }

  private static PairSide side(int teeth, double microseconds, long seed) {
    return side(SHAFT, teeth, microseconds, seed, t -> t);
  }

  private static PairSide side(
      Shaft shaft, int teeth, double microseconds, long seed, DoubleUnaryOperator stamped) {
    double rate = TURNS * teeth;
    SpeedTrace.Builder trace = new SpeedTrace.Builder();
    EdgeSpeed speed =
        new EdgeSpeed(
            rate,
            EdgeSpeed.decimationFor(rate),
            EdgeSpeed.perEdgeFor(rate),
            v -> trace.add(100 * (v / rate - 1)));
    for (double t : shaft.edges(rate, 60, microseconds * 1e-6, seed)) {
      speed.edge(stamped.applyAsDouble(t));
    }
    return new PairSide(
        trace.build(speed.startSeconds(), speed.rateHertz()),
        rate,
        teeth,
        List.of(),
        Figure.absent("not asked for"));
  }
}
