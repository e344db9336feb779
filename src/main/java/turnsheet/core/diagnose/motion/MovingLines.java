package turnsheet.core.diagnose.motion;

import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;
import turnsheet.core.diagnose.motion.MovingLine.Motion;
import turnsheet.core.diagnose.motion.MovingLine.Place;
import turnsheet.core.dsp.FirDecimator;
import turnsheet.core.dsp.KaiserFir;
import turnsheet.core.signal.Fluctuation;
import turnsheet.core.stats.Quantiles;

/**
 * Finds the lines below {@value #HIGHEST_HERTZ} Hz whose rate changes while the capture runs, as
 * the reels of a transport do: followed through short spectra, then fitted to the whole capture by
 * the law of a reel. docs/interpretation.md says when a line counts as moving.
 */
public final class MovingLines {

  public static final double HIGHEST_HERTZ = 20;
  public static final double SHORTEST_SECONDS = 20;
  private static final double RATE_HERTZ = 60;

  /** A standard deviate that chance passes once in 16 000 lines. */
  private static final double SURE = 4;

  /** Motion over the capture below this share of its resolution cannot be told from two lines. */
  private static final double LEAST_CELLS = 0.5;

  /** Off the law by more than this share of the resolution of one window: no reel. */
  private static final double OFF_LAW = 0.15;

  private MovingLines() {}

  /** The strongest first; none of captures below {@value #SHORTEST_SECONDS} s. */
  public static List<MovingLine> of(Fluctuation fluctuation) {
    if (fluctuation.durationSeconds() < SHORTEST_SECONDS) {
      return List.of();
    }
    int factor = Math.max(1, (int) (fluctuation.rateHertz() / RATE_HERTZ));
    double rate = fluctuation.rateHertz() / factor;
    double top = Math.min(HIGHEST_HERTZ, 0.3 * rate);
    double[] taps =
        factor == 1
            ? new double[] {1}
            : KaiserFir.lowPass(top, rate - top, 60, fluctuation.rateHertz());
    FirDecimator filter = new FirDecimator(taps, factor);
    double[] samples = new double[filter.roomFor(fluctuation.length())];
    int count =
        filter.process(fluctuation.percent(0, fluctuation.length()), fluctuation.length(), samples);
    samples = java.util.Arrays.copyOf(samples, count);
    double start = fluctuation.startSeconds() + filter.delaySamples() / fluctuation.rateHertz();
    PeakTracks tracks = new PeakTracks(samples, rate, start, top);
    PackFit whole = new PackFit(samples, rate);
    double middle = start + (count - 1) / 2.0 / rate;
    List<MovingLine> moving = new ArrayList<>();
    for (List<Place> track : tracks.tracks()) {
      MovingLine line = judged(track, tracks.windowSeconds(), whole, middle, count / rate);
      if (line != null) {
        moving.add(line);
      }
    }
    moving.sort(Comparator.comparingDouble(MovingLine::peakPercent).reversed());
    return List.copyOf(moving);
  }

  private static @org.jspecify.annotations.Nullable MovingLine judged(
      List<Place> track,
      double windowSeconds,
      PackFit whole,
      double middleSeconds,
      double captureSeconds) {
    PackLaw seen = law(track, middleSeconds);
    double off = scatter(track, seen, middleSeconds);
    double typical =
        new Quantiles(track.stream().mapToDouble(Place::peakPercent).toArray()).median();
    double first = track.get(0).seconds() - middleSeconds;
    double last = track.get(track.size() - 1).seconds() - middleSeconds;
    if (off > OFF_LAW / windowSeconds) {
      return new MovingLine(
          Motion.WANDERING,
          track.get(0).hertz(),
          seen.middleHertz(),
          track.get(track.size() - 1).hertz(),
          2 * off,
          seen.bendSeconds(),
          Double.NaN,
          typical,
          track);
    }
    PackFit.Fit fit = whole.from(seen);
    // where the whole does not add up to what its parts show, the law or the line is another
    if (fit.peakPercent() < 0.6 * typical) {
      return null;
    }
    PackLaw law = fit.law();
    double half = captureSeconds / 2;
    double cells = Math.abs(law.hertz(half) - law.hertz(-half)) * captureSeconds;
    if (Math.abs(law.bendSeconds()) < SURE * fit.bendU() || cells < LEAST_CELLS) {
      return null;
    }
    return new MovingLine(
        law.bendSeconds() < 0 ? Motion.FASTER : Motion.SLOWER,
        law.hertz(first),
        law.middleHertz(),
        law.hertz(last),
        2 * fit.hertzU(),
        law.bendSeconds(),
        2 * fit.bendU(),
        fit.peakPercent(),
        track);
  }

  /** A straight line through the squared times of one turn. */
  private static PackLaw law(List<Place> track, double middleSeconds) {
    double n = track.size();
    double meanT = track.stream().mapToDouble(p -> p.seconds() - middleSeconds).sum() / n;
    double meanQ = track.stream().mapToDouble(MovingLines::squaredTurn).sum() / n;
    double tq = 0;
    double tt = 0;
    for (Place p : track) {
      double t = p.seconds() - middleSeconds - meanT;
      tq += t * (squaredTurn(p) - meanQ);
      tt += t * t;
    }
    double bend = tq / tt;
    double atMiddle = meanQ - bend * meanT;
    return atMiddle > 0
        ? new PackLaw(1 / Math.sqrt(atMiddle), bend)
        : new PackLaw(1 / Math.sqrt(meanQ), 0);
  }

  private static double squaredTurn(Place place) {
    return 1 / (place.hertz() * place.hertz());
  }

  private static double scatter(List<Place> track, PackLaw law, double middleSeconds) {
    double squares = 0;
    for (Place p : track) {
      double t = p.seconds() - middleSeconds;
      double d = p.hertz() - (law.holds(Math.abs(t)) ? law.hertz(t) : law.middleHertz());
      squares += d * d;
    }
    return Math.sqrt(squares / track.size());
  }
}
