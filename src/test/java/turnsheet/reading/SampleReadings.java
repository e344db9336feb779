package turnsheet.reading;

import java.util.List;
import turnsheet.core.measure.Figure;
import turnsheet.core.measure.MeasureSettings;
import turnsheet.core.measure.Reading;
import turnsheet.core.measure.Series;
import turnsheet.core.signal.Fluctuation;
import turnsheet.core.signal.SpeedTrace;
import turnsheet.core.signal.Warning;
import turnsheet.core.stats.Budget;
import turnsheet.core.stats.MagnitudeBlocks;

/** Readings made by hand, for tests of what is done with readings. */
public final class SampleReadings {

  private SampleReadings() {}

  /** A tone that runs as much too fast, with the rest of the figures as they may be. */
  public static Reading tone(double deviationPercent) {
    return tone(deviationPercent, 0.067);
  }

  /** The same with a two-sigma value of its own, U = 0.0020. */
  public static Reading tone(double deviationPercent, double twoSigmaPercent) {
    Figure absent = Figure.absent("too short");
    return new Reading(
        new Reading.Source(
            "ab".repeat(32),
            "WAV, 16-bit PCM",
            turnsheet.core.measure.CaptureKind.TONE,
            1,
            48_000.0,
            4.0),
        new Reading.Method("1", MeasureSettings.tone(3150)),
        new Reading.Speed(
            3150,
            Figure.of(3150 * (1 + deviationPercent / 100), 0.2),
            Figure.of(deviationPercent, 0.006),
            absent,
            Figure.of(deviationPercent - 0.01, 0.02),
            Figure.of(deviationPercent + 0.01, 0.02)),
        new Reading.Flutter(
            Figure.of(
                twoSigmaPercent,
                Budget.empty().plus("length of the recording", 0.0006).plus("weighting", 0.0008)),
            Figure.of(0.071, 0.003),
            Figure.withoutUncertainty(0.031, "one stretch only"),
            Figure.of(0.052, 0.002),
            List.of(new Reading.Band("wow", 0.5, 6, Figure.of(0.04, 0.002)))),
        List.of(
            new Reading.Line(
                Figure.of(9.98, 0.02),
                Figure.of(0.045, 0.001),
                List.of(new Reading.Suspect("capstan shaft", 1, 10.02)))),
        null,
        new Reading.Signal(
            Figure.of(51, 2),
            List.of(new Reading.MainsLine(50, -62)),
            0,
            List.of(),
            Figure.of(0.004, 0.001)),
        List.of(new Warning("shortCapture", "The recording lasts 4 s: record 60 s or more.")));
  }

  /** Eight blocks of a sine of 0.05 %. */
  public static Series.Blocks blocks() {
    MagnitudeBlocks.Collector collector = new MagnitudeBlocks.Collector(125);
    for (int i = 0; i < 1000; i++) {
      collector.add(0.05 * Math.sin(2 * Math.PI * 9.98 * i / 500));
    }
    return new Series.Blocks(collector.blocks(), collector.blocks());
  }

  /** The same on another channel. */
  public static Reading tone(double deviationPercent, int channel) {
    Reading one = tone(deviationPercent);
    Reading.Source source = one.source();
    return new Reading(
        new Reading.Source(
            source.sha256(),
            source.format(),
            source.kind(),
            channel,
            source.sampleRateHz(),
            source.durationSeconds()),
        new Reading.Method(one.method().version(), one.method().settings().onChannel(channel)),
        one.speed(),
        one.flutter(),
        one.lines(),
        one.edges(),
        one.signal(),
        one.warnings());
  }

  public static Series series() {
    float[] speed = new float[2000];
    for (int i = 0; i < speed.length; i++) {
      speed[i] = (float) (0.37 + 0.05 * Math.sin(2 * Math.PI * 9.98 * i / 500));
    }
    double[] peaks = new double[1001];
    peaks[40] = 0.05;
    return new Series(
        SpeedTrace.of(0, 500, speed),
        new Series.Spectrum(0.25, peaks),
        new Series.Histogram(300, 0.5, new long[] {1, 5, 2}),
        blocks(),
        SampleReadings::fluctuation);
  }

  /** A minute of 9.98 Hz at 0.05 %. */
  public static Fluctuation fluctuation() {
    double[] percent = new double[60 * 500];
    for (int i = 0; i < percent.length; i++) {
      percent[i] = 0.05 * Math.sin(2 * Math.PI * 9.98 * i / 500);
    }
    return Fluctuation.of(0, 500, percent);
  }
}
