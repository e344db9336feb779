package turnsheet.core.diagnose.mains;

import java.io.IOException;
import java.util.ArrayList;
import java.util.List;
import org.jspecify.annotations.Nullable;
import turnsheet.core.dsp.LowBand;
import turnsheet.core.measure.Causes;
import turnsheet.core.measure.Figure;
import turnsheet.core.measure.MeasureSettings;
import turnsheet.core.measure.Progress;
import turnsheet.core.measure.Reading;
import turnsheet.core.signal.RejectedException;
import turnsheet.core.signal.SampleReader;
import turnsheet.core.signal.SampleSource;
import turnsheet.core.stats.Budget;

/**
 * Finds the mains frequency from the hum in a recording. Up to 128 s are one stretch, longer
 * recordings are read in stretches of 64 s; memory does not grow with their length.
 */
public final class MainsMeter {

  private static final double TOP_HERTZ = 610;
  private static final double LONGEST_STRETCH_SECONDS = 128;
  private static final double USUAL_STRETCH_SECONDS = 64;

  /** Side bands of the signal reach as far as the fluctuation that is shown. */
  private static final double SIDE_BANDS_HERTZ = 215;

  private final MeasureSettings settings;
  private final double signalHertz;
  private final @Nullable Double turnHertz;
  private final double expectedSeconds;
  private final List<HumStretch> stretches = new ArrayList<>();
  private @Nullable RejectedException why;

  /**
   * @param reading of the same channel: its rate tells where hum would hide in the signal
   */
  public MainsMeter(MeasureSettings settings, Reading reading) {
    this.settings = settings;
    Double mean = reading.speed().meanHz().value();
    this.signalHertz = mean == null ? settings.nominalHz() : mean;
    Integer teeth = settings.teeth();
    this.turnHertz = teeth == null ? null : signalHertz / teeth;
    this.expectedSeconds = reading.source().durationSeconds();
  }

  /**
   * Reads the recording once.
   *
   * @throws RejectedException where no hum stands out, or where it cannot be told from the signal
   *     or from a turning part
   */
  public Mains measure(SampleSource source, Progress progress)
      throws IOException, RejectedException {
    try (SampleReader reader = source.open()) {
      // a clock that runs fast takes more samples than it says
      double rate = reader.sampleRateHertz() * (1 + settings.clockErrorPpm() * 1e-6);
      LowBand band = new LowBand(rate, TOP_HERTZ);
      double length =
          expectedSeconds <= LONGEST_STRETCH_SECONDS
              ? LONGEST_STRETCH_SECONDS + 1
              : USUAL_STRETCH_SECONDS;
      double[] kept = new double[(int) Math.ceil(length * band.rateHertz())];
      double[] block = new double[8192];
      List<Mains.Point> points = new ArrayList<>();
      double begun = 0;
      int used = 0;
      long taken = 0;
      int n;
      while ((n = reader.read(block)) > 0) {
        taken += n;
        progress.reached(Math.min(1, taken / rate / Math.max(1, expectedSeconds)));
        int made = band.process(block, n);
        int done = 0;
        while (done < made) {
          int part = Math.min(made - done, kept.length - used);
          System.arraycopy(band.values(), done, kept, used, part);
          done += part;
          used += part;
          if (used == kept.length) {
            look(kept, used, band, begun, false, points);
            begun += used / band.rateHertz();
            used = 0;
          }
        }
      }
      double left = used / band.rateHertz();
      if (begun == 0 || left > USUAL_STRETCH_SECONDS / 2) {
        look(kept, used, band, begun, begun == 0, points);
      }
      return result(points);
    }
  }

  private void look(
      double[] values,
      int count,
      LowBand band,
      double begun,
      boolean whole,
      List<Mains.Point> points) {
    try {
      HumStretch stretch = HumStretch.of(values, count, band, this::hidden);
      stretches.add(stretch);
      if (whole) {
        points.addAll(stretch.points());
      } else {
        double middle = begun + stretch.seconds() / 2;
        points.add(new Mains.Point(middle, stretch.hertz(), stretch.noiseHertz()));
      }
    } catch (RejectedException e) {
      why = e;
    }
  }

  /** About the signal's own harmonics, and on those of its wheel, hum cannot be told from them. */
  private boolean hidden(double hertz) {
    double reach = Math.min(SIDE_BANDS_HERTZ, signalHertz / 2);
    double off = Math.abs(hertz - Math.rint(hertz / signalHertz) * signalHertz);
    if (hertz > signalHertz / 2 && off < reach) {
      return true;
    }
    Double turn = turnHertz;
    return turn != null && Math.abs(hertz - Math.rint(hertz / turn) * turn) < 0.3;
  }

  private Mains result(List<Mains.Point> points) throws RejectedException {
    if (stretches.isEmpty()) {
      throw why == null ? HumStretch.tooShort() : why;
    }
    HumStretch first = stretches.get(0);
    List<HumStretch> same =
        stretches.stream().filter(s -> s.nominalHertz() == first.nominalHertz()).toList();
    double seconds = same.stream().mapToDouble(HumStretch::seconds).sum();
    double hertz = same.stream().mapToDouble(s -> s.hertz() * s.seconds()).sum() / seconds;
    double squares =
        same.stream().mapToDouble(s -> Math.pow(s.noiseHertz() * s.seconds(), 2)).sum();
    double wander = HumStretch.wander(points);
    Budget budget =
        Budget.empty()
            .plus("noise beside the hum", Math.sqrt(squares) / seconds)
            .plusRectangular("interpolation", 0.01 / seconds)
            .plus(
                "wander of the mains", Double.isNaN(wander) ? 0 : wander / Math.sqrt(points.size()))
            .plus(Causes.CLOCK, hertz * settings.clockStandardUncertaintyPpm() * 1e-6);
    return new Mains(
        first.nominalHertz(),
        Figure.of(hertz, budget),
        Double.isNaN(wander)
            ? Figure.absent("fewer than three stretches of the recording show hum")
            : Figure.of(wander, 2 * wander / Math.sqrt(2.0 * (points.size() - 1))),
        harmonics(first),
        points);
  }

  private static List<Mains.Harmonic> harmonics(HumStretch stretch) {
    return stretch.lines().stream()
        .map(
            l ->
                new Mains.Harmonic(
                    l.order(),
                    l.hertz(),
                    Math.sqrt(l.power()),
                    // the noise of one Hann bin is 3 S / T, a sine's power half its squared peak
                    10 * Math.log10(l.overNoise() * 3 / (2 * stretch.seconds()))))
        .toList();
  }
}
