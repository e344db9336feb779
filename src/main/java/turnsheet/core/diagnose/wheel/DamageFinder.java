package turnsheet.core.diagnose.wheel;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import org.jspecify.annotations.Nullable;
import turnsheet.core.stats.Quantiles;

/** Points to single teeth that differ from their neighbours. */
final class DamageFinder {

  /** With fewer teeth there is no telling what is usual on this wheel. */
  private static final int FEWEST_PLACES = 8;

  /** Among a thousand normally spaced teeth one lies beyond 4.9 standard deviations in 1000. */
  private static final double OUTSTANDING = 5.5;

  private static final double BEYOND_NOISE = 6;
  private static final double LEAST_PERIODS = 0.002;

  /** Standard deviation over the median of magnitudes, normal distribution. */
  private static final double OF_MEDIAN = 1.4826;

  private final EdgeTrain train;
  private final Numbering numbering;
  private final TurnAverage average;
  private final Marks.@Nullable Mark mark;
  private final int[] passed;

  DamageFinder(
      EdgeTrain train, Numbering numbering, TurnAverage average, Marks.@Nullable Mark mark) {
    this.train = train;
    this.numbering = numbering;
    this.average = average;
    this.mark = mark;
    this.passed = new int[numbering.places()];
    for (int k = 0; k < train.size(); k++) {
      if (numbering.place(k) >= 0) {
        passed[numbering.place(k)]++;
      }
    }
  }

  /**
   * Looks.
   *
   * @param pattern round the wheel, in periods
   * @param noisePeriods standard deviation of the noise of one of its values
   * @return in the order of the teeth
   */
  List<ToothDamage> find(double[] pattern, double noisePeriods) {
    List<ToothDamage> found = new ArrayList<>();
    double[] aside = aside(pattern);
    double usual = usual(aside);
    double most =
        Math.max(LEAST_PERIODS, Math.max(OUTSTANDING * usual, BEYOND_NOISE * noisePeriods));
    int[] extra = extra();
    int places = numbering.places();
    for (int j = 0; j < places; j++) {
      if (!average.tooth(j)) {
        if (!inMark(j)) {
          found.add(damage(ToothDamage.Kind.MISSING, j, 0, 1 - seenShare(j)));
        }
      } else if (places >= FEWEST_PLACES && Math.abs(aside[j]) > most) {
        found.add(
            damage(
                aside[j] < 0 ? ToothDamage.Kind.EARLY : ToothDamage.Kind.LATE,
                j,
                100 * aside[j],
                1));
      }
      if (2 * extra[j] > passed[j]) {
        found.add(damage(ToothDamage.Kind.SPLIT, j, 0, Math.min(1, extra[j] / (double) passed[j])));
      }
    }
    return List.copyOf(found);
  }

  private static ToothDamage damage(
      ToothDamage.Kind kind, int place, double percent, double share) {
    return new ToothDamage(kind, place + 1, percent, share);
  }

  boolean inMark(int place) {
    return mark != null && place >= mark.places() - mark.missing();
  }

  /** Edges left out again and again at the same place. */
  private int[] extra() {
    int[] count = new int[numbering.places()];
    for (int k : train.extraAfter()) {
      if (numbering.place(k) >= 0) {
        count[numbering.place(k)]++;
      }
    }
    return count;
  }

  private double seenShare(int place) {
    int seen = 0;
    for (int k = 0; k < train.size(); k++) {
      if (numbering.place(k) == place && train.real()[k]) {
        seen++;
      }
    }
    return seen / (double) Math.max(1, passed[place]);
  }

  /** Off the middle of two neighbours on either side, which an eccentric wheel moves alike. */
  private double[] aside(double[] pattern) {
    int n = pattern.length;
    double[] aside = new double[n];
    double[] beside = new double[4];
    for (int j = 0; j < n; j++) {
      for (int i = 0; i < 4; i++) {
        beside[i] = pattern[Math.floorMod(j + (i < 2 ? i - 2 : i - 1), n)];
      }
      aside[j] = pattern[j] - new Quantiles(beside.clone()).median();
    }
    return aside;
  }

  private double usual(double[] aside) {
    double[] sizes = new double[aside.length];
    int n = 0;
    for (int j = 0; j < aside.length; j++) {
      if (average.tooth(j)) {
        sizes[n++] = Math.abs(aside[j]);
      }
    }
    return n == 0 ? 0 : OF_MEDIAN * new Quantiles(Arrays.copyOf(sizes, n)).median();
  }
}
