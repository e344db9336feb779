package turnsheet.core.diagnose.sensor;

import java.io.IOException;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import org.jspecify.annotations.Nullable;
import turnsheet.core.dsp.ToneBand;
import turnsheet.core.format.api.ByteSource;
import turnsheet.core.format.api.ReadOptions;
import turnsheet.core.measure.CaptureKind;
import turnsheet.core.measure.Figure;
import turnsheet.core.measure.MeasureSettings;
import turnsheet.core.measure.Measurement;
import turnsheet.core.measure.Outcome;
import turnsheet.core.measure.Progress;
import turnsheet.core.measure.Reading;
import turnsheet.core.signal.RejectedException;
import turnsheet.core.stats.Budget;

/** Judges the waveform of a tachometer: its shape at the beginning, both readings of all of it. */
public final class HealthMeter {

  /** Peak to peak of noise that a comparator must not see, in standard deviations. */
  private static final double NOISE_WIDTHS = 8;

  /**
   * A band-limited step takes 0.9 samples from 10 to 90 %: below this many it is the recorder's.
   */
  private static final double FEWEST_RISE_SAMPLES = 2.5;

  private final Measurement measurement;
  private final ByteSource bytes;
  private final String sha256;
  private final ReadOptions options;
  private final MeasureSettings settings;

  /**
   * @param options for the channel
   * @param settings of a tachometer, for the channel
   */
  public HealthMeter(
      Measurement measurement,
      ByteSource bytes,
      String sha256,
      ReadOptions options,
      MeasureSettings settings) {
    this.measurement = measurement;
    this.bytes = bytes;
    this.sha256 = sha256;
    this.options = options;
    this.settings = settings;
  }

  /**
   * Judges.
   *
   * @throws RejectedException where there are too few pulses
   */
  public SensorHealth judge(Progress progress) throws IOException, RejectedException {
    Wave wave =
        Wave.read(
            () -> measurement.formats().openSamples(bytes, options), settings.clockErrorPpm());
    progress.reached(0.1);
    WaveShape shape = new WaveShape(wave);
    double[] peaks = shape.harmonics();
    WaveShape.Mean rise = shape.slope(wave.rises());
    Integer teeth = settings.teeth();
    double pulses = wave.pulsesPerSecond();
    List<RidingLine> riding =
        new RidingLines(pulses, rise.value(), peaks[0], teeth == null ? null : pulses / teeth)
            .of(wave);
    progress.reached(0.2);
    Outcome edges = measured(CaptureKind.TACHOMETER, f -> progress.reached(0.2 + 0.4 * f));
    Outcome band = measured(CaptureKind.TONE, f -> progress.reached(0.6 + 0.4 * f));
    TwoReadings both =
        edges instanceof Outcome.Measured one && band instanceof Outcome.Measured other
            ? TwoReadings.of(
                one, other, ToneBand.of(pulses, wave.rateHertz()).flutterHertz(), riding)
            : null;
    Reading.Edges counted = edges instanceof Outcome.Measured one ? one.reading().edges() : null;
    double noise = WaveNoise.rms(wave);
    boolean quiet = Double.isNaN(noise);
    return new SensorHealth(
        wave.seconds(),
        pulses,
        wave.low(),
        wave.high(),
        quiet ? null : noise,
        quiet || noise == 0
            ? Figure.absent("the noise between the pulses' harmonics cannot be told")
            : Figure.withoutUncertainty(
                20 * Math.log10(shape.rms() / noise),
                "the noise is that between the pulses' harmonics"),
        distortion(peaks),
        decibels(peaks),
        slope(rise),
        slope(shape.slope(wave.falls())),
        new SensorHealth.Hysteresis(
            100 * wave.widestHysteresis() / wave.swing(),
            quiet ? null : 100 * NOISE_WIDTHS * noise / wave.swing()),
        duty(counted),
        rise(shape.riseSamples(), wave.rateHertz()),
        quiet
            ? Figure.absent("the noise between the pulses' harmonics cannot be told")
            : Figure.withoutUncertainty(
                1e6 * noise / Math.abs(rise.value()), "it takes the noise as even over the band"),
        counted == null
            ? Figure.absent("the edges could not be measured")
            : counted.edgeNoiseMicroseconds(),
        riding,
        boxed(shape.points()),
        both,
        both != null
            ? null
            : edges instanceof Outcome.Refused why
                ? why.rejection()
                : ((Outcome.Refused) band).rejection());
  }

  private Outcome measured(CaptureKind kind, Progress progress) throws IOException {
    MeasureSettings so =
        new MeasureSettings(
            kind,
            settings.channel(),
            settings.nominalHz(),
            settings.searchPercent(),
            settings.teeth(),
            settings.clockStandardUncertaintyPpm(),
            settings.clockErrorPpm(),
            settings.mediumStandardUncertaintyPercent());
    return measurement.measure(bytes, sha256, options, so, progress);
  }

  private static Figure duty(Reading.@Nullable Edges edges) {
    Figure duty = edges == null ? null : edges.dutyPercent();
    return duty == null ? Figure.absent("the edges could not be measured") : duty;
  }

  private static double distortion(double[] peaks) {
    double squares = 0;
    for (int h = 1; h < peaks.length; h++) {
      squares += peaks[h] * peaks[h];
    }
    return 100 * Math.sqrt(squares) / peaks[0];
  }

  private static List<Double> decibels(double[] peaks) {
    List<Double> db = new ArrayList<>();
    for (int h = 1; h < peaks.length; h++) {
      db.add(20 * Math.log10(peaks[h] / peaks[0] + 1e-9));
    }
    return db;
  }

  private static Figure slope(WaveShape.Mean mean) {
    return Figure.of(
        mean.value(),
        Budget.empty()
            .plus("noise", mean.standardUncertainty())
            .plusRectangular("interpolation", 0.005 * Math.abs(mean.value())));
  }

  private static Figure rise(double samples, double rateHertz) {
    if (Double.isNaN(samples)) {
      return Figure.absent("the flanks never reach 10 and 90 % of the pulse");
    }
    double microseconds = 1e6 * samples / rateHertz;
    if (samples < FEWEST_RISE_SAMPLES) {
      return Figure.absent(
          String.format(
              Locale.ROOT,
              "the waveform rises within %.1f samples, so that all that can be said is less than"
                  + " %.3g us: record with more samples per second",
              samples,
              microseconds));
    }
    return Figure.of(
        microseconds, Budget.empty().plusRectangular("interpolation", 0.1 * 1e6 / rateHertz));
  }

  private static List<Double> boxed(double[] values) {
    List<Double> all = new ArrayList<>();
    for (double v : values) {
      all.add(v);
    }
    return all;
  }
}
