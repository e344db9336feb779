package turnsheet.core.diagnose.wheel;

/**
 * Synchronous average over the turns with Hann weights, as harmonics of the turn.
 *
 * <p>Everything that does not repeat with the turn leaks into a plain average with one over the
 * number of cycles by which it slips; with Hann weights the leak falls with the third power. What
 * slips less than twice in the capture cannot be told from the pattern. The noise of each harmonic
 * is read from the same average taken 3 to 8 slips aside, where the pattern itself has none, so it
 * is right whatever the spectrum of the true fluctuation.
 */
final class TurnAverage {

  /** Fewer turns leave no room between the harmonics in which to read the noise. */
  static final int FEWEST_TURNS = 10;

  private static final int NEAREST = 3;
  private static final int FARTHEST = 8;

  private final int places;
  private final double turns;
  private final boolean[] tooth;
  private final double[] re;
  private final double[] im;
  private final double[] noise;

  /**
   * Averages.
   *
   * @param train of at least {@link #FEWEST_TURNS} turns and two more for the ends
   */
  static TurnAverage of(EdgeTrain train, Deviations deviations, Numbering numbering) {
    return new TurnAverage(train, deviations, numbering);
  }

  private TurnAverage(EdgeTrain train, Deviations deviations, Numbering numbering) {
    places = numbering.places();
    int n = deviations.size();
    turns = (double) n / places;
    int farthest = Math.min(FARTHEST, (int) (turns / 2) - 1);
    int slips = farthest - NEAREST + 1;
    double[] weight = new double[places];
    double[] even = new double[places];
    double[][] cosine = new double[slips][places];
    double[][] sine = new double[slips][places];
    int[] seen = new int[places];
    int[] passed = new int[places];
    for (int i = 0; i < n; i++) {
      int k = i + deviations.from();
      int place = numbering.place(k);
      if (place < 0) {
        continue;
      }
      passed[place]++;
      if (!train.real()[k]) {
        continue;
      }
      seen[place]++;
      double angle = 2 * Math.PI * (i + 0.5) / n;
      double w = 0.5 - 0.5 * Math.cos(angle);
      double x = w * deviations.periods(i);
      weight[place] += w;
      even[place] += x;
      for (int s = 0; s < slips; s++) {
        double slipped = (NEAREST + s) * angle;
        cosine[s][place] += x * Math.cos(slipped);
        sine[s][place] -= x * Math.sin(slipped);
      }
    }
    tooth = new boolean[places];
    for (int j = 0; j < places; j++) {
      // an edge in fewer than half the turns is no tooth to speak of
      tooth[j] = 2 * seen[j] > passed[j];
    }
    double[] pattern = filled(even, weight);
    double mean = 0;
    int teeth = 0;
    for (int j = 0; j < places; j++) {
      if (tooth[j]) {
        mean += pattern[j];
        teeth++;
      }
    }
    for (int j = 0; j < places; j++) {
      pattern[j] -= mean / Math.max(1, teeth);
    }
    re = new double[places];
    im = new double[places];
    Harmonics.transform(pattern, new double[places], re, im);
    noise = noise(cosine, sine, weight);
  }

  /** Divided by the weights; places without a tooth lie evenly between their neighbours. */
  private double[] filled(double[] sums, double[] weight) {
    double[] values = new double[places];
    for (int j = 0; j < places; j++) {
      values[j] = tooth[j] ? sums[j] / weight[j] : 0;
    }
    for (int j = 0; j < places; j++) {
      if (!tooth[j]) {
        int before = 1;
        int after = 1;
        while (before < places && !tooth[Math.floorMod(j - before, places)]) {
          before++;
        }
        while (after < places && !tooth[(j + after) % places]) {
          after++;
        }
        double a = values[Math.floorMod(j - before, places)];
        double b = values[(j + after) % places];
        values[j] = a + (b - a) * before / (before + after);
      }
    }
    return values;
  }

  /** Mean square of noise in each harmonic. */
  private double[] noise(double[][] cosine, double[][] sine, double[] weight) {
    int slips = cosine.length;
    double[][] power = new double[2 * slips][];
    for (int s = 0; s < slips; s++) {
      double[] a = new double[places];
      double[] b = new double[places];
      Harmonics.transform(filled(cosine[s], weight), filled(sine[s], weight), a, b);
      double[] above = new double[places];
      double[] below = new double[places];
      for (int m = 0; m < places; m++) {
        above[m] = a[m] * a[m] + b[m] * b[m];
      }
      for (int m = 0; m < places; m++) {
        // of real deviations the average slipped backwards is the mirror image
        below[m] = above[(places - m) % places];
      }
      power[2 * s] = above;
      power[2 * s + 1] = below;
    }
    double[] noise = new double[places];
    double[] beside = new double[2 * slips];
    for (int m = 0; m < places; m++) {
      double leak = 0;
      for (int i = 0; i < beside.length; i++) {
        beside[i] = power[i][m];
        double q = NEAREST + i / 2;
        // the most that a line so far aside sends into the harmonic through Hann weights
        double through = 1 / (Math.PI * q * (q * q - 1));
        leak = Math.max(leak, power[i][m] * through * through);
      }
      java.util.Arrays.sort(beside);
      double median = (beside[beside.length / 2] + beside[(beside.length - 1) / 2]) / 2;
      // the power of noise in one bin is exponentially distributed: its median is ln 2 of its mean
      noise[m] = median / Math.log(2) + leak;
    }
    return noise;
  }

  int places() {
    return places;
  }

  /** Turns averaged over. */
  double turns() {
    return turns;
  }

  /** Whether there is a tooth at a place. */
  boolean tooth(int place) {
    return tooth[place];
  }

  /** Real part of the Fourier coefficient of a harmonic of the turn, in periods. */
  double re(int m) {
    return re[m];
  }

  double im(int m) {
    return im[m];
  }

  double power(int m) {
    return re[m] * re[m] + im[m] * im[m];
  }

  /** Mean square of what noise contributes to that coefficient. */
  double noise(int m) {
    return noise[m];
  }
}
