package turnsheet.core.diagnose.pair;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Locale;
import org.jspecify.annotations.Nullable;
import turnsheet.core.measure.Causes;
import turnsheet.core.measure.Figure;
import turnsheet.core.stats.Budget;

/** What both sensors show: the real part of the cross-spectrum, summed and drawn. */
final class CommonPart {

  private static final int MOST_POINTS = 240;

  /** A line stands out of its neighbourhood by this factor in power. */
  private static final double STANDS_OUT = 6;

  /** How far from a multiple of the shaft's rate a line still belongs to it, in that rate. */
  private static final double BESIDE = 0.1;

  private final PairSpectra spectra;
  private final OwnLines lines;
  private final NoiseSplit split;

  CommonPart(PairSpectra spectra, OwnLines lines, NoiseSplit split) {
    this.spectra = spectra;
    this.lines = lines;
    this.split = split;
  }

  double fromHertz() {
    return spectra.lowestBin() * spectra.stepHertz();
  }

  double toHertz() {
    return spectra.highestBin() * spectra.stepHertz();
  }

  /**
   * Root mean square that both show. What the noise of both leaves of chance follows from the
   * errors of a cross-spectrum; how the machine itself varies along the recording, from the scatter
   * of the segments beyond that.
   */
  Figure rms(boolean weighted) {
    double power = spectra.commonPower(spectra.all(), weighted);
    double noise = Math.sqrt(noiseVariance(weighted));
    double scatter = spectra.scatter(weighted);
    double length = Math.sqrt(Math.max(0, scatter * scatter - noise * noise));
    if (power <= Budget.K * noise) {
      return Figure.absent(
          String.format(
              Locale.ROOT,
              "nothing that both share stands out of their noise: it is below %.2g %%",
              100 * Math.sqrt(Math.max(0, power) + Budget.K * noise)));
    }
    double rms = 100 * Math.sqrt(power);
    double slope = rms / (2 * power);
    return Figure.of(
        rms,
        Budget.empty()
            .plus("noise of both sensors", slope * noise)
            .plus(Causes.LENGTH, slope * length)
            .plusRectangular("pattern of the wheels", slope * patternPower(weighted)));
  }

  /** Variance of the common power that the sensors' noise leaves, the machine as it was. */
  private double noiseVariance(boolean weighted) {
    double a1 = Math.max(0, split.first().value());
    double a2 = Math.max(0, split.second().value());
    double step = spectra.stepHertz();
    double sum = 0;
    for (int k = spectra.lowestBin(); k <= spectra.highestBin(); k++) {
      double f2 = Math.pow(k * step, 2);
      double m = Math.max(0, spectra.all().common(k));
      double c = spectra.share(k, weighted) * step;
      sum += c * c * (m * (a1 + a2) * f2 + a1 * a2 * f2 * f2) / 2;
    }
    return sum / spectra.averagesOfSums();
  }

  /**
   * How much of the common power may come from patterns that the wheels show differently: with the
   * power P of both and D of their difference at a line, no more than the root of P D, and not more
   * than P.
   */
  private double patternPower(boolean weighted) {
    double sum = 0;
    for (int[] span : lines.spans()) {
      double common = 0;
      double difference = 0;
      for (int k = span[0]; k <= Math.min(span[1], spectra.highestBin()); k++) {
        double c = spectra.share(k, weighted) * spectra.stepHertz();
        common += c * spectra.all().common(k);
        difference += c * Math.max(0, spectra.all().difference(k));
      }
      double p = Math.max(0, common);
      sum += Math.min(p, Math.sqrt(p * difference));
    }
    return sum;
  }

  /** The lines that the sensors show differently. */
  List<PairFindings.OwnLine> ownLines(double turnsPerSecond) {
    List<PairFindings.OwnLine> found = new ArrayList<>();
    double step = spectra.stepHertz();
    for (int[] span : lines.spans()) {
      double one = 0;
      double other = 0;
      double moment = 0;
      double weight = 0;
      for (int k = span[0]; k <= span[1]; k++) {
        double f2 = Math.pow(k * step, 2);
        one += step * (spectra.all().first(k) - Math.max(0, split.first().value()) * f2);
        other += step * (spectra.all().second(k) - Math.max(0, split.second().value()) * f2);
        moment += k * step * spectra.all().difference(k);
        weight += spectra.all().difference(k);
      }
      add(found, moment / weight, one, other, turnsPerSecond);
    }
    return found;
  }

  /** A pattern on a shaft that flutters has sidebands: they count with their multiple. */
  private void add(
      List<PairFindings.OwnLine> found,
      double rate,
      double one,
      double other,
      double turnsPerSecond) {
    int multiple = (int) Math.round(rate / turnsPerSecond);
    double off = Math.abs(rate - multiple * turnsPerSecond);
    boolean mains = isMains(rate);
    boolean locked =
        multiple >= 1 && off < Math.max(spectra.stepHertz(), mains ? 0 : BESIDE * turnsPerSecond);
    PairFindings.OwnLine last = found.isEmpty() ? null : found.get(found.size() - 1);
    double alone = 0;
    double others = 0;
    if (last != null && locked && Integer.valueOf(multiple).equals(last.turnMultiple())) {
      alone = last.originalPercent() / 100;
      others = last.replacementPercent() / 100;
      found.remove(last);
    }
    found.add(
        new PairFindings.OwnLine(
            locked ? multiple * turnsPerSecond : rate,
            100 * Math.sqrt(Math.max(0, one) + alone * alone),
            100 * Math.sqrt(Math.max(0, other) + others * others),
            locked ? Integer.valueOf(multiple) : null,
            mains));
  }

  private boolean isMains(double rate) {
    for (double mains : new double[] {50, 60}) {
      double multiple = Math.rint(rate / mains);
      if (multiple >= 1 && Math.abs(rate - multiple * mains) < spectra.stepHertz()) {
        return true;
      }
    }
    return false;
  }

  /** Common lines at the mains that the shaft's own rate does not explain; null where none. */
  @Nullable Double mainsPercent(double turnsPerSecond) {
    double power = 0;
    double step = spectra.stepHertz();
    for (double mains : new double[] {50, 60}) {
      for (double rate = mains; rate < toHertz(); rate += mains) {
        double nearest = Math.max(1, Math.rint(rate / turnsPerSecond)) * turnsPerSecond;
        boolean both = mains == 60 && Math.rint(rate / 50) * 50 == rate;
        if (!both && Math.abs(rate - nearest) > 2 * step) {
          power += lineAt((int) Math.round(rate / step));
        }
      }
    }
    return power > 0 ? 100 * Math.sqrt(power) : null;
  }

  /** Power of a common line, 0 where none stands out. */
  private double lineAt(int bin) {
    int from = Math.max(1, bin - 20);
    int to = Math.min(spectra.lastBin(), bin + 20);
    if (bin + 2 > to) {
      return 0;
    }
    CrossSpectra all = spectra.all();
    double[] near = new double[to - from + 1];
    for (int k = from; k <= to; k++) {
      near[k - from] = Math.max(0, all.common(k));
    }
    Arrays.sort(near);
    // coherence that chance passes once in a hundred thousand: Bendat and Piersol, from memory
    double chance = 1 - Math.pow(1e-5, 1 / (spectra.averages() - 1));
    double sum = 0;
    boolean line = false;
    for (int k = bin - 2; k <= bin + 2; k++) {
      double common = Math.max(0, all.common(k));
      line |=
          Math.abs(k - bin) < 2
              && common * common > chance * all.first(k) * all.second(k)
              && common > STANDS_OUT * near[near.length / 2];
      sum += common * spectra.stepHertz();
    }
    return line ? sum : 0;
  }

  /** The spectra, in steps that grow with the rate. */
  List<PairFindings.Point> points() {
    List<PairFindings.Point> points = new ArrayList<>();
    int last = spectra.lastBin();
    double factor = Math.pow((double) last / spectra.lowestBin(), 1.0 / MOST_POINTS);
    int from = spectra.lowestBin();
    while (from <= last) {
      int to = Math.min(last, Math.max(from, (int) Math.floor(from * factor)));
      points.add(point(from, to));
      from = to + 1;
    }
    return points;
  }

  private PairFindings.Point point(int from, int to) {
    CrossSpectra all = spectra.all();
    int n = to - from + 1;
    double one = 0;
    double other = 0;
    double common = 0;
    double imaginary = 0;
    for (int k = from; k <= to; k++) {
      one += all.first(k) / n;
      other += all.second(k) / n;
      common += all.common(k) / n;
      imaginary += all.imaginary(k) / n;
    }
    double averages =
        n == 1 ? spectra.averages() : Math.max(spectra.averages(), n * spectra.averagesOfSums());
    double coherence = (common * common + imaginary * imaginary) / (one * other);
    // what the coherence of nothing shared stays below: Bendat and Piersol, from memory
    double chance = 1 - Math.pow(0.05, 1 / (averages - 1));
    return new PairFindings.Point(
        (from + to) / 2.0 * spectra.stepHertz(),
        100 * Math.sqrt(one),
        100 * Math.sqrt(other),
        coherence > chance && common > 0 ? Double.valueOf(100 * Math.sqrt(common)) : null,
        Math.min(1, coherence),
        chance);
  }
}
