package turnsheet.core.diagnose.pair;

import java.util.ArrayList;
import java.util.List;
import turnsheet.core.diagnose.pair.Alignment.Clock;
import turnsheet.core.dsp.Weighting;
import turnsheet.core.dsp.Window;
import turnsheet.core.measure.Reading;

/**
 * The spectra of two traces over the time that both show without a gap.
 *
 * <p>Every second segment stands in a set of its own: what weighs the values of one set is taken
 * from the other, so that chance cannot favour itself.
 */
final class PairSpectra {

  private static final double SEGMENT_SECONDS = 8;
  private static final double SHORTEST_SEGMENT_SECONDS = 2;
  private static final int FEWEST_SEGMENTS = 8;
  private static final double LOWEST_HERTZ = 0.2;
  private static final double HIGHEST_HERTZ = 200;

  private final PairSide one;
  private final PairSide other;
  private final Clock clock;
  private final double rateHertz;
  private final int length;
  private final CrossSpectra even;
  private final CrossSpectra odd;
  private final CrossSpectra all;
  private final List<double[]> powers = new ArrayList<>();
  private double[] covered = new double[0];
  private double secondsUsed;

  /**
   * @param clock how the second trace's time becomes the first one's
   */
  PairSpectra(PairSide one, PairSide other, Clock clock) {
    this.one = one;
    this.other = other;
    this.clock = clock;
    this.rateHertz = Math.max(one.trace().rateHertz(), other.trace().rateHertz());
    TraceReader left = new TraceReader(one.trace());
    TraceReader right = new TraceReader(other.trace());
    double from = Math.max(left.fromSeconds(), clock.first(right.fromSeconds()));
    double to = Math.min(left.toSeconds(), clock.first(right.toSeconds()));
    this.length = segment(to - from);
    this.even = new CrossSpectra(length, rateHertz);
    this.odd = even.empty();
    this.all = even.empty();
    run(left, right, from, to);
    all.add(even);
    all.add(odd);
  }

  /** A power of two that leaves enough of them. */
  private int segment(double seconds) {
    double most = Math.min(Math.sqrt(2) * SEGMENT_SECONDS, seconds / 5) * rateHertz;
    int length = 2;
    while (2 * length <= most) {
      length *= 2;
    }
    return length;
  }

  private void run(TraceReader left, TraceReader right, double from, double to) {
    double step = 1 / rateHertz;
    double[] a = new double[length];
    double[] b = new double[length];
    int room = (int) Math.max(0, (to - from) * rateHertz) + 1;
    covered = new double[room];
    double[] window = Window.HANN.values(length);
    CrossSpectra single = even.empty();
    for (int at = 0; at + length < room; at += length / 2) {
      double start = from + at * step;
      if (!whole(start, start + length * step)) {
        continue;
      }
      left.read(start, step, a, length);
      right.read(clock.second(start), clock.second(start + step) - clock.second(start), b, length);
      single.clear();
      single.add(a, b);
      powers.add(new double[] {commonPower(single, false), commonPower(single, true)});
      (powers.size() % 2 == 0 ? even : odd).add(single);
      for (int i = 0; i < length; i++) {
        covered[at + i] += window[i] * window[i];
      }
    }
    for (double c : covered) {
      secondsUsed += c > 0 ? step : 0;
    }
  }

  private boolean whole(double from, double to) {
    for (Reading.Dropout gap : one.gaps()) {
      if (gap.startSeconds() - one.marginSeconds() < to
          && gap.startSeconds() + gap.durationSeconds() + one.marginSeconds() > from) {
        return false;
      }
    }
    for (Reading.Dropout gap : other.gaps()) {
      double end = gap.startSeconds() + gap.durationSeconds();
      if (clock.first(gap.startSeconds() - other.marginSeconds()) < to
          && clock.first(end + other.marginSeconds()) > from) {
        return false;
      }
    }
    return true;
  }

  /** Mean square that both show in the band. */
  double commonPower(CrossSpectra spectra, boolean weighted) {
    double sum = 0;
    for (int k = lowestBin(); k <= highestBin(); k++) {
      sum += share(k, weighted) * spectra.common(k);
    }
    return sum * stepHertz();
  }

  /** The weighting's gain in power at a bin, or 1. */
  double share(int bin, boolean weighted) {
    double gain = weighted ? Weighting.gain(bin * stepHertz()) : 1;
    return gain * gain;
  }

  /** Whether there is enough to average. */
  boolean enough() {
    return powers.size() >= FEWEST_SEGMENTS && length >= SHORTEST_SEGMENT_SECONDS * 0.7 * rateHertz;
  }

  int lowestBin() {
    return Math.max(2, (int) Math.ceil(LOWEST_HERTZ / stepHertz()));
  }

  /** Last bin of the band of the common fluctuation. */
  int highestBin() {
    return (int) Math.floor(Math.min(HIGHEST_HERTZ, passHertz()) / stepHertz());
  }

  /** Last bin that both traces show in full. */
  int lastBin() {
    return (int) Math.floor(passHertz() / stepHertz());
  }

  double passHertz() {
    return Math.min(one.passHertz(), other.passHertz());
  }

  double stepHertz() {
    return rateHertz / length;
  }

  double secondsUsed() {
    return secondsUsed;
  }

  int segments() {
    return powers.size();
  }

  /** Independent averages behind one bin: neighbouring Hann segments correlate by a sixth. */
  double averages() {
    int n = powers.size();
    return n / (1 + 2.0 / 36 * (n - 1) / n);
  }

  /**
   * Independent averages for each bin of a sum over many: the time that the windows cover evenly,
   * over the length of one segment.
   */
  double averagesOfSums() {
    double sum = 0;
    double squares = 0;
    for (double c : covered) {
      sum += c;
      squares += c * c;
    }
    return sum * sum / squares / length;
  }

  /** Standard deviation of the mean over segments of {@link #commonPower}. */
  double scatter(boolean weighted) {
    double mean = 0;
    for (double[] p : powers) {
      mean += p[weighted ? 1 : 0] / powers.size();
    }
    double squares = 0;
    for (double[] p : powers) {
      squares += Math.pow(p[weighted ? 1 : 0] - mean, 2);
    }
    return Math.sqrt(squares / (powers.size() - 1) / averages());
  }

  CrossSpectra all() {
    return all;
  }

  CrossSpectra even() {
    return even;
  }

  CrossSpectra odd() {
    return odd;
  }
}
