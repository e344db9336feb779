package turnsheet.core.diagnose.mains;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Locale;
import turnsheet.core.dsp.LowBand;
import turnsheet.core.signal.RejectedException;

/**
 * The hum of one stretch of a recording. Where the mains keep still the stretch is taken as a
 * whole, which is the sharpest; where they wander by so much that the higher harmonics smear, the
 * mean of its parts is.
 *
 * @param noiseHertz standard uncertainty that the noise leaves
 * @param points the frequency in parts of the stretch, by time from its beginning
 */
record HumStretch(
    double nominalHertz,
    double hertz,
    double noiseHertz,
    double seconds,
    List<HumFinder.Line> lines,
    List<Mains.Point> points) {

  private static final double[] NOMINAL = {50, 60};
  private static final int FEWEST_LINES = 2;
  private static final double SHORTEST_SECONDS = 10;
  private static final double PART_SECONDS = 8;
  private static final int MOST_PARTS = 12;

  /** Share of a bin by which the highest harmonic may wander before the whole is given up. */
  private static final double STILL_BINS = 0.3;

  /**
   * Looks at a stretch.
   *
   * @throws RejectedException where no hum stands out, or what does cannot be told from something
   *     else
   */
  static HumStretch of(double[] values, int count, LowBand band, HumFinder.Hidden hidden)
      throws RejectedException {
    double seconds = count / band.rateHertz();
    if (seconds < SHORTEST_SECONDS) {
      throw tooShort();
    }
    HumSpectrum spectrum = new HumSpectrum(values, 0, count, band.rateHertz());
    HumFinder finder = new HumFinder(spectrum, hidden);
    double nominal = NOMINAL[0];
    HumFinder.Found best = finder.about(nominal, band.topHertz());
    HumFinder.Found other = finder.about(NOMINAL[1], band.topHertz());
    if (score(other) > score(best)) {
      best = other;
      nominal = NOMINAL[1];
    }
    if (best.lines().size() < FEWEST_LINES) {
      throw best.lines().isEmpty() ? nothing(finder, band) : single(best.lines().get(0));
    }
    if (finder.turns(best.hertz())) {
      throw turning(best.hertz());
    }
    List<Integer> orders = best.lines().stream().map(HumFinder.Line::order).toList();
    List<Mains.Point> points = parts(values, count, band, hidden, best.hertz(), orders);
    double wander = wander(points);
    int highest = orders.get(orders.size() - 1);
    if (Double.isNaN(wander) || wander * highest * seconds < STILL_BINS) {
      HumFinder.Found sharp = finder.near(best.hertz(), 1 / seconds, orders, 0);
      if (sharp.lines().size() < FEWEST_LINES) {
        throw single(sharp.lines().get(0));
      }
      return new HumStretch(
          nominal, sharp.hertz(), sharp.noiseHertz(seconds), seconds, sharp.lines(), points);
    }
    double mean = points.stream().mapToDouble(Mains.Point::frequencyHz).average().orElseThrow();
    double squares = points.stream().mapToDouble(p -> p.noiseHz() * p.noiseHz()).sum();
    return new HumStretch(
        nominal, mean, Math.sqrt(squares) / points.size(), seconds, best.lines(), points);
  }

  private static double score(HumFinder.Found found) {
    return found.lines().size() < FEWEST_LINES ? found.lines().size() - 2 : found.joint();
  }

  /** Parts in which harmonics agree; each is looked for beside the frequency of the whole. */
  private static List<Mains.Point> parts(
      double[] values,
      int count,
      LowBand band,
      HumFinder.Hidden hidden,
      double aboutHertz,
      List<Integer> orders) {
    double rate = band.rateHertz();
    int parts = (int) Math.min(MOST_PARTS, Math.floor(count / rate / PART_SECONDS));
    List<Mains.Point> points = new ArrayList<>();
    for (int p = 0; p < parts && parts > 1; p++) {
      int from = (int) ((long) count * p / parts);
      int to = (int) ((long) count * (p + 1) / parts);
      HumSpectrum spectrum = new HumSpectrum(values, from, to - from, rate);
      HumFinder.Found found =
          new HumFinder(spectrum, hidden).near(aboutHertz, 1 / spectrum.seconds(), orders, 0);
      if (!found.lines().isEmpty()) {
        points.add(
            new Mains.Point(
                (from + to) / 2.0 / rate, found.hertz(), found.noiseHertz(spectrum.seconds())));
      }
    }
    return List.copyOf(points);
  }

  /** What the parts scatter beyond their noise; NaN where there are fewer than three. */
  static double wander(List<Mains.Point> points) {
    if (points.size() < 3) {
      return Double.NaN;
    }
    double[] f = points.stream().mapToDouble(Mains.Point::frequencyHz).toArray();
    double mean = Arrays.stream(f).average().orElseThrow();
    double spread = Arrays.stream(f).map(x -> (x - mean) * (x - mean)).sum() / (f.length - 1);
    double noise =
        points.stream().mapToDouble(p -> p.noiseHz() * p.noiseHz()).average().orElseThrow();
    return Math.sqrt(Math.max(0, spread - noise));
  }

  static RejectedException tooShort() {
    return new RejectedException(
        "tooShortForHum",
        "The recording is shorter than the 10 s that the mains frequency needs: record 60 s.");
  }

  /** Whether there was any place to look at decides what is said. */
  private static RejectedException nothing(HumFinder finder, LowBand band) {
    for (double about : NOMINAL) {
      if (finder.orders(about, band.topHertz()).size() >= FEWEST_LINES) {
        return new RejectedException(
            "noHum",
            "No mains hum stands out of the noise of this recording, so the mains frequency cannot"
                + " be told: a clean recording is none the worse for it.");
      }
    }
    return new RejectedException(
        "humHidden",
        "The signal has lines of its own wherever the mains would show, so hum cannot be told from"
            + " them.");
  }

  private static RejectedException single(HumFinder.Line line) {
    return new RejectedException(
        "humSingle",
        String.format(
            Locale.ROOT,
            "A single line stands out at %.2f Hz and nothing at its multiples: whether it is the"
                + " mains or a part of the machine cannot be told.",
            line.hertz()));
  }

  private static RejectedException turning(double hertz) {
    return new RejectedException(
        "humTurns",
        String.format(
            Locale.ROOT,
            "Lines at multiples of %.2f Hz have others between them, as a part that turns more"
                + " slowly makes them: they are not taken for the mains.",
            hertz));
  }
}
