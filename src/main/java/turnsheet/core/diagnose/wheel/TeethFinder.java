package turnsheet.core.diagnose.wheel;

import java.util.Arrays;
import turnsheet.core.dsp.Fft;
import turnsheet.core.stats.Quantiles;

/**
 * Finds after how many edges the pattern of a train repeats.
 *
 * <p>A pattern that repeats after P edges has lines at all multiples of 1/P cycles per edge, and
 * uneven teeth fill most of them, while a fluctuation of the machine fills one. For each P the
 * lines are weighed by how far they stand above what is beside them; one line counts for no more
 * than 20 times that, so that a single strong fluctuation cannot pass for a wheel, and each place
 * costs what noise would gain by chance, so that multiples of the true number lose. A wheel that is
 * only eccentric has a single line and is not found: the data of such a wheel are those of a
 * fluctuation.
 */
final class TeethFinder {

  static final int MOST = 1000;

  private static final int LONGEST = 1 << 18;
  private static final int FEWEST_TURNS = 12;
  private static final int NEIGHBOURS = 96;

  /** Twenty times the mean power of noise comes with a chance of exp(-20). */
  private static final double MOST_OF_A_LINE = 20;

  /** What each line costs: noise exceeds it on its own with a chance of exp(-3.5). */
  private static final double PRICE = 3.5;

  /** Among a thousand numbers noise passes with a chance of 1000 exp(-14), one in a thousand. */
  private static final double ENOUGH = 14;

  /**
   * Power against the strongest line below which a line is not looked at: Hann weights leave so
   * much of that line ten bins beside it, and a fluctuation of a tenth of a percent makes side
   * lines of the pattern that strong.
   */
  private static final double FAINTEST = 3e-7;

  private final double[] lines;
  private final int padded;
  private final int edges;

  TeethFinder(EdgeTrain train) {
    int n = Math.min(LONGEST, train.size() - 1);
    edges = n;
    padded = Fft.lengthFor(2 * n);
    double[] data = new double[padded];
    double[] t = train.seconds();
    double mean = (t[n] - t[0]) / n;
    for (int k = 0; k < n; k++) {
      // periods, not times: the slow fluctuation is then no stronger than the pattern
      double w = 0.5 - 0.5 * Math.cos(2 * Math.PI * (k + 0.5) / n);
      data[k] = w * ((t[k + 1] - t[k]) / mean - 1);
    }
    new Fft(padded).real(data);
    lines = aboveTheirNeighbours(powers(data));
  }

  private static double[] powers(double[] data) {
    int half = data.length / 2;
    double[] power = new double[half + 1];
    power[0] = data[0] * data[0];
    power[half] = data[1] * data[1];
    for (int i = 1; i < half; i++) {
      power[i] = data[2 * i] * data[2 * i] + data[2 * i + 1] * data[2 * i + 1];
    }
    return power;
  }

  /** Of exponentially distributed powers the lower quartile is ln(4/3) of the mean. */
  private static double[] aboveTheirNeighbours(double[] power) {
    double least = FAINTEST * Arrays.stream(power).max().orElse(0);
    double[] ratio = new double[power.length];
    for (int from = 0; from < power.length; from += NEIGHBOURS) {
      int to = Math.min(power.length, from + NEIGHBOURS);
      int begin = Math.max(0, to - NEIGHBOURS);
      double level =
          Math.max(
              least,
              new Quantiles(Arrays.copyOfRange(power, begin, to)).at(0.25) / Math.log(4.0 / 3));
      for (int i = from; i < to; i++) {
        ratio[i] = level > 0 ? power[i] / level : 0;
      }
    }
    return ratio;
  }

  /** Whether the number can be looked for at all. */
  boolean canTell(int places) {
    return places >= 2 && edges >= FEWEST_TURNS * places;
  }

  /**
   * How well the lines fit a repetition; {@link #ENOUGH} and more is one. None where fewer than
   * half of the lines are there, as with hum whose harmonics fall on a fraction of the pulse rate.
   */
  double weight(int places) {
    double sum = 0;
    int there = 0;
    for (int m = 1; 2 * m <= places; m++) {
      int at = (int) Math.round((double) padded * m / places);
      double line = lines[Math.min(lines.length - 1, at)];
      sum += Math.min(MOST_OF_A_LINE, line) - PRICE;
      there += line > PRICE ? 1 : 0;
    }
    return 4 * there >= places - 1 ? sum : 0;
  }

  boolean isOne(int places) {
    return canTell(places) && weight(places) >= ENOUGH;
  }

  /** The number that fits best; 0 where none does. */
  int find() {
    int best = 0;
    double most = ENOUGH;
    for (int places = 2; places <= MOST && canTell(places); places++) {
      double weight = weight(places);
      if (weight > most) {
        most = weight;
        best = places;
      }
    }
    return smallest(best, most);
  }

  /** A multiple may have a fluctuation on one more of its lines: it must gain more than that. */
  private int smallest(int best, double most) {
    for (int places = 2; places < best; places++) {
      if (best % places == 0 && isOne(places) && weight(places) > most - 2 * MOST_OF_A_LINE) {
        return places;
      }
    }
    return best;
  }
}
