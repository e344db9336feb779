package turnsheet.core.diagnose.wheel;

import java.io.IOException;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Locale;
import org.jspecify.annotations.Nullable;
import turnsheet.core.measure.EdgeTimes;
import turnsheet.core.measure.Figure;
import turnsheet.core.measure.Progress;
import turnsheet.core.measure.Reading;
import turnsheet.core.signal.RejectedException;
import turnsheet.core.stats.Budget;

/** Looks at the sensor wheel of a capture of edges. docs/interpretation.md says how. */
public final class WheelLook {

  /** Edges looked at; at 800 a second almost an hour and a half. */
  public static final int MOST_EDGES = 4_000_000;

  private static final double ARC_SECONDS = 360 * 3600.0;

  private final EdgeTimes edges;
  private final EdgeTrain train;
  private final Marks.@Nullable Mark mark;
  private final Repetition repetition;
  private final Numbering numbering;
  private final Deviations deviations;
  private final TurnAverage average;
  private final Pattern pattern;

  private WheelLook(EdgeTimes edges, @Nullable Integer stated) throws RejectedException {
    this.edges = edges;
    double[] rises = edges.risesSeconds();
    train = EdgeTrain.of(rises, edges.startPeriodSeconds());
    mark = Marks.find(train).orElse(null);
    repetition = Repetition.of(train, stated, mark);
    int places = repetition.places();
    requireTurns(places);
    numbering = Numbering.of(train, places, mark);
    deviations = Deviations.of(train, places);
    average = TurnAverage.of(train, deviations, numbering);
    pattern = new Pattern(train, deviations, numbering, average, turnRateHertz());
  }

  /**
   * Looks.
   *
   * @param stated places of a turn as far as known beforehand; null where not
   * @param measured the figures of the same edges as they are
   * @throws RejectedException where the number of places is neither stated nor found, or there are
   *     too few turns
   */
  public static WheelFinding find(
      EdgeTimes edges, @Nullable Integer stated, Reading measured, Progress progress)
      throws IOException, RejectedException {
    WheelLook look = new WheelLook(edges, stated);
    progress.reached(0.4);
    double[] whole = look.pattern.values(true);
    FlutterTrio without = look.flutter(whole);
    progress.reached(0.7);
    FlutterTrio withoutSpacing =
        look.pattern.open() ? look.flutter(look.pattern.values(false)) : null;
    progress.reached(1);
    return look.finding(stated, whole, FlutterTrio.of(measured), without, withoutSpacing);
  }

  private void requireTurns(int places) throws RejectedException {
    double turns = train.size() / (double) places - 2;
    if (turns < TurnAverage.FEWEST_TURNS) {
      throw new RejectedException(
          "fewTurns",
          String.format(
              Locale.ROOT,
              "The recording holds %.1f turns of the wheel with %d pulses each, and %d are the least"
                  + " to tell its pattern from the speed: record longer.",
              train.size() / (double) places,
              places,
              TurnAverage.FEWEST_TURNS + 2));
    }
  }

  private double turnRateHertz() {
    return 1 / (train.meanPeriodSeconds() * repetition.places());
  }

  private FlutterTrio flutter(double[] removed) throws IOException, RejectedException {
    return FlutterTrio.of(edges.measured(corrected(removed), null));
  }

  /**
   * The edges as an even wheel would have given them. Places without a tooth are filled, as the
   * mark is no loss; edges lost elsewhere stay lost, and the measurement treats them as always.
   */
  double[] corrected(double[] removed) {
    double[] t = train.seconds();
    double[] out = new double[t.length];
    int n = 0;
    int last = -1;
    double lastSeconds = 0;
    for (int k = 0; k < t.length; k++) {
      int place = numbering.place(k);
      if (place < 0 || !train.real()[k]) {
        continue;
      }
      double seconds = t[k] - removed[place] * deviations.localSeconds(k);
      if (last >= 0 && onlyGapsOfTheWheel(last + 1, k)) {
        for (int gap = last + 1; gap < k; gap++) {
          out[n++] = lastSeconds + (seconds - lastSeconds) * (gap - last) / (k - last);
        }
      }
      out[n++] = seconds;
      last = k;
      lastSeconds = seconds;
    }
    return Arrays.copyOf(out, n);
  }

  private boolean onlyGapsOfTheWheel(int from, int to) {
    for (int k = from; k < to; k++) {
      if (numbering.place(k) < 0 || average.tooth(numbering.place(k))) {
        return false;
      }
    }
    return true;
  }

  private WheelFinding finding(
      @Nullable Integer stated,
      double[] whole,
      FlutterTrio measured,
      FlutterTrio without,
      @Nullable FlutterTrio withoutSpacing) {
    int places = repetition.places();
    double rms = pattern.rms(whole);
    Budget budget = Budget.empty().plus("scatter of the turns", pattern.rmsUncertainty(rms));
    double toArc = ARC_SECONDS / places;
    DamageFinder damage = new DamageFinder(train, numbering, average, mark);
    double noise = Math.sqrt(pattern.noiseMeanSquare());
    List<ToothDamage> damaged = damage.find(whole, noise);
    List<WheelPlace> teeth = new ArrayList<>();
    long gone = 0;
    for (int j = 0; j < places; j++) {
      if (average.tooth(j)) {
        teeth.add(new WheelPlace(j + 1, 100 * whole[j], toArc * whole[j]));
      } else {
        gone++;
      }
    }
    return new WheelFinding(
        places,
        repetition.origin(),
        stated,
        repetition.repeatsAfter(),
        mark == null ? 0 : mark.missing(),
        average.turns(),
        turnRateHertz(),
        speedRangePercent(),
        gone == 0 ? train.missing() : missingBeside(),
        extraBeside(damaged),
        numbering.miscounted(),
        Figure.of(100 * rms, budget.times(100)),
        Figure.of(toArc * rms, budget.times(toArc)),
        certainRms(),
        2 * 100 * noise,
        teeth,
        pattern.harmonics(),
        damaged,
        measured,
        without,
        withoutSpacing);
  }

  private Figure certainRms() {
    double rms = pattern.rms(pattern.values(false));
    double u = Math.min(pattern.rmsUncertainty(rms), Math.sqrt(pattern.noiseMeanSquare()));
    return Figure.of(100 * rms, Budget.empty().plus("scatter of the turns", 100 * u));
  }

  private long missingBeside() {
    long lost = 0;
    for (int k = 0; k < train.size(); k++) {
      int place = numbering.place(k);
      if (!train.real()[k] && (place < 0 || average.tooth(place))) {
        lost++;
      }
    }
    return lost;
  }

  private long extraBeside(List<ToothDamage> damaged) {
    return Arrays.stream(train.extraAfter())
        .filter(
            k ->
                damaged.stream()
                    .noneMatch(
                        d ->
                            d.kind() == ToothDamage.Kind.SPLIT
                                && d.tooth() == numbering.place(k) + 1))
        .count();
  }

  private double speedRangePercent() {
    double least = Double.POSITIVE_INFINITY;
    double most = 0;
    for (int i = 0; i < deviations.size(); i += Math.max(1, repetition.places())) {
      double period = deviations.localSeconds(i + deviations.from());
      least = Math.min(least, period);
      most = Math.max(most, period);
    }
    return 100 * (most - least) / train.meanPeriodSeconds();
  }
}
