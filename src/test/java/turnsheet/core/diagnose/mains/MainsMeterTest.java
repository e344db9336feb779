package turnsheet.core.diagnose.mains;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.assertj.core.api.Assertions.within;

import java.util.List;
import java.util.Random;
import org.junit.jupiter.api.Test;
import turnsheet.core.diagnose.Waves;
import turnsheet.core.measure.CaptureKind;
import turnsheet.core.measure.Figure;
import turnsheet.core.measure.MeasureSettings;
import turnsheet.core.measure.Progress;
import turnsheet.core.signal.RejectedException;
import turnsheet.core.stats.Budget;

/** Against the frequency that the hum was made with. */
class MainsMeterTest {

  private static final double RATE = 2000;
  private static final double TONE = 700;

  /** A tone of 0.5 with noise, and room for more. */
  private static double[] tone(double seconds, double noise, long seed) {
    double[] x = new double[(int) (seconds * RATE)];
    Waves.add(x, RATE, TONE, 0.5, 0);
    Waves.addNoise(x, noise, seed);
    return x;
  }

  private static void addHum(double[] x, double hertz, double... peaks) {
    for (int k = 1; k <= peaks.length; k++) {
      Waves.add(x, RATE, k * hertz, peaks[k - 1], 0.7 * k * k);
    }
  }

  private static MeasureSettings settings(double clockErrorPpm, double clockPpm) {
    return new MeasureSettings(CaptureKind.TONE, 1, TONE, 12, null, clockPpm, clockErrorPpm, 0);
  }

  private static Mains measure(double[] x, MeasureSettings settings) throws Exception {
    return new MainsMeter(settings, Waves.reading(settings, x.length / RATE))
        .measure(Waves.source(x, RATE), Progress.NONE);
  }

  private static double hertz(Mains mains) {
    return value(mains.frequencyHz());
  }

  private static double value(Figure figure) {
    Double value = figure.value();
    return value == null ? Double.NaN : value;
  }

  private static double uncertainty(Figure figure) {
    Double u = figure.expandedUncertainty();
    return u == null ? Double.NaN : u;
  }

  /**
   * The bar: 2 mHz in 60 s. The hum is 2 % of the tone (34 dB below it), the noise 40 dB below the
   * tone over the whole band: fundamental and harmonics stand 26 dB and less above the noise in one
   * hertz. The bound says 0.05 mHz.
   */
  @Test
  void findsTheMainsWithinTwoMillihertzInSixtySeconds() throws Exception {
    for (double truth : new double[] {49.983, 50.0, 50.0134, 50.21, 59.9871, 60.02}) {
      double[] x = tone(60, 0.0035, 5);
      addHum(x, truth, 0.01, 0.001, 0.004);
      Mains mains = measure(x, settings(0, 0));
      assertThat(mains.nominalHz()).isEqualTo(truth < 55 ? 50 : 60);
      assertThat(hertz(mains)).as("%s", truth).isCloseTo(truth, within(0.002));
      assertThat(Math.abs(hertz(mains) - truth)).isLessThan(uncertainty(mains.frequencyHz()));
      assertThat(uncertainty(mains.frequencyHz())).isLessThan(0.002);
      assertThat(mains.points()).hasSize(7);
    }
  }

  /**
   * At the weakest hum that is enough for 2 mHz, two harmonics whose information makes the bound of
   * the Hann window 0.8 mHz, the errors scatter as told. Of 40 draws the root mean square lies
   * within 1/sqrt(80) = 11 % (one standard deviation) of the truth: 35 % are three of them.
   */
  @Test
  void theErrorsScatterAsTheNoiseSays() throws Exception {
    Random random = new Random(3);
    double squares = 0;
    int draws = 40;
    for (int d = 0; d < draws; d++) {
      double truth = 50 + 0.05 * (random.nextDouble() - 0.5);
      double[] x = tone(20, 0.02, 100 + d);
      addHum(x, truth, 0.005, 0, 0.003);
      MeasureSettings settings = settings(0, 0);
      Mains mains = measure(x, settings);
      double noise =
          mains.frequencyHz().budget().stream()
              .filter(c -> c.cause().startsWith("noise"))
              .mapToDouble(Budget.Contribution::standardUncertainty)
              .sum();
      squares += Math.pow((hertz(mains) - truth) / noise, 2);
    }
    assertThat(Math.sqrt(squares / draws)).isBetween(0.65, 1.35);
  }

  /**
   * A clock 80 ppm fast reads 50 Hz as 49.996: told, it is corrected; untold, it is in the budget.
   */
  @Test
  void theClockOfTheRecorderIsCorrectedAndCounted() throws Exception {
    double[] x = tone(60, 0.002, 9);
    addHum(x, 50.01 / (1 + 80e-6), 0.01, 0, 0.004);
    assertThat(hertz(measure(x, settings(80, 2)))).isCloseTo(50.01, within(0.0003));
    Mains unchecked = measure(x, settings(0, MeasureSettings.UNCHECKED_CLOCK_PPM));
    assertThat(hertz(unchecked)).isCloseTo(50.006, within(0.0003));
    // 57.7 ppm of 50 Hz, twice
    assertThat(uncertainty(unchecked.frequencyHz())).isCloseTo(0.00577, within(0.0003));
  }

  /** Long recordings are read in stretches; the mains move by 20 mHz up and down meanwhile. */
  @Test
  void wanderIsFollowed() throws Exception {
    double seconds = 200;
    double[] x = tone(seconds, 0.003, 11);
    double turns = 0;
    for (int i = 0; i < x.length; i++) {
      x[i] += 0.02 * Math.sin(2 * Math.PI * turns) + 0.01 * Math.sin(6 * Math.PI * turns);
      turns += (50.03 + 0.02 * Math.sin(2 * Math.PI * i / RATE / seconds)) / RATE;
    }
    Mains mains = measure(x, settings(0, 0));
    assertThat(mains.points()).hasSize(3);
    // means of the sine over 64 s: 0.02 * 200 / (2 pi 64) * (cos a - cos b) beside 50.03; a tenth
    // of
    // the 10 mHz by which the parts of 8 s differ is left for their windows
    for (int k = 0; k < 3; k++) {
      double a = 2 * Math.PI * 64 * k / seconds;
      double b = 2 * Math.PI * 64 * (k + 1) / seconds;
      double mean = 50.03 + 0.02 * (Math.cos(a) - Math.cos(b)) / (b - a);
      assertThat(mains.points().get(k).frequencyHz()).isCloseTo(mean, within(0.001));
    }
    assertThat(value(mains.wanderHz())).isBetween(0.01, 0.02);
  }

  @Test
  void nothingIsClaimedWhereThereIsNoHum() {
    assertRefused(tone(60, 0.01, 21), "noHum");
  }

  @Test
  void aSingleLineIsNotTakenForTheMains() {
    double[] x = tone(60, 0.003, 22);
    Waves.add(x, RATE, 49.7, 0.01, 0);
    assertRefused(x, "humSingle");
  }

  /** An eccentric rotor at 24.9 Hz has lines at 49.8, 99.6 and 149.4 Hz, and between them. */
  @Test
  void aTurningPartIsNotTakenForTheMains() {
    double[] x = tone(60, 0.003, 23);
    for (int k = 1; k < 7; k++) {
      Waves.add(x, RATE, 24.9 * k, 0.01 / k, k);
    }
    assertRefused(x, "humTurns");
  }

  /** Side bands of the tone by a part at 50.1 Hz: they lie about the tone, where nobody looks. */
  @Test
  void sideBandsOfTheToneAreNotHum() {
    double[] x = new double[(int) (60 * RATE)];
    for (int i = 0; i < x.length; i++) {
      double t = i / RATE;
      x[i] =
          0.5
              * (1 + 0.1 * Math.cos(2 * Math.PI * 50.1 * t))
              * Math.sin(2 * Math.PI * TONE * t + 0.2 * Math.sin(2 * Math.PI * 50.1 * t));
    }
    Waves.addNoise(x, 0.002, 24);
    assertRefused(x, "noHum");
  }

  @Test
  void aSignalAmongTheHarmonicsHidesThem() {
    MeasureSettings settings =
        new MeasureSettings(CaptureKind.TACHOMETER, 1, 25, 12, null, 50, 0, 0);
    double[] x = new double[(int) (30 * RATE)];
    Waves.add(x, RATE, 25, 0.5, 0);
    assertThatThrownBy(
            () ->
                new MainsMeter(settings, Waves.reading(settings, 30))
                    .measure(Waves.source(x, RATE), Progress.NONE))
        .isInstanceOfSatisfying(
            RejectedException.class, e -> assertThat(e.rejection().code()).isEqualTo("humHidden"));
  }

  /**
   * Supply 0.2 % low (49.9 Hz) and a capstan 0.5 % too thick: (1 - 0.002)(1 + 0.005) - 1 = 0.299 %
   * fast. The clock's 0.006 % is common to both and in neither's rest.
   */
  @Test
  void theSplitGivesEachSideItsShare() {
    Mains mains =
        new Mains(
            50,
            Figure.of(
                49.9,
                Budget.empty().plus("noise beside the hum", 0.0005).plus("recording clock", 0.003)),
            Figure.absent("none"),
            List.of(),
            List.of());
    Figure deviation =
        Figure.of(
            0.299,
            Budget.empty().plus("length of the recording", 0.0008).plus("recording clock", 0.006));
    SupplySplit split = SupplySplit.of(deviation, mains);
    assertThat(value(split.supplyPercent())).isCloseTo(-0.2, within(1e-9));
    assertThat(value(split.restPercent())).isCloseTo(0.5, within(1e-9));
    // 0.0005 Hz of 50 Hz are 0.001 %: with 0.0008 % that makes 0.00128 %, twice that
    assertThat(uncertainty(split.restPercent())).isCloseTo(0.00256, within(1e-5));
    assertThat(uncertainty(split.supplyPercent())).isCloseTo(0.01217, within(1e-5));
  }

  private static void assertRefused(double[] x, String code) {
    assertThatThrownBy(() -> measure(x, settings(0, 0)))
        .isInstanceOfSatisfying(
            RejectedException.class, e -> assertThat(e.rejection().code()).isEqualTo(code));
  }
}
