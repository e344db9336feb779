package turnsheet.core.diagnose;

import java.util.List;
import turnsheet.core.measure.Figure;
import turnsheet.core.stats.Moments;

/**
 * The same figure from all runs of one condition.
 *
 * <p>Practice plays a transport several times, stopped and started between, and states the mean of
 * the runs' figures (handbook of sound engineering, chapter on magnetic recording; edition from
 * memory).
 */
public record Runs(List<Run> runs) {

  public Runs {
    if (runs.isEmpty()) {
      throw new IllegalArgumentException("no run");
    }
    runs = List.copyOf(runs);
  }

  public int count() {
    return runs.size();
  }

  /** Whether every run has a value with an uncertainty. */
  public boolean areComplete() {
    return runs.stream().noneMatch(run -> Double.isNaN(run.standardUncertainty()));
  }

  /** Mean of the runs' values; each must have one. */
  public double mean() {
    return moments().mean();
  }

  /** Standard deviation between runs (divisor n - 1); NaN for a single one. */
  public double spread() {
    return count() < 2 ? Double.NaN : moments().sampleStdDev();
  }

  /** The value of the largest magnitude. */
  public double worst() {
    return values().stream().reduce((a, b) -> Math.abs(b) > Math.abs(a) ? b : a).orElseThrow();
  }

  /**
   * The figure of the condition: the only run's own, or the mean of all with an interval that holds
   * what the runs share, what each run leaves to chance and how the runs differ.
   *
   * <p>The largest expanded uncertainty of a run is kept for what they share and their own chance,
   * the spread of the mean is added (JCGM 100, 5.1.2 and 4.2.3).
   */
  public Figure figure() {
    if (count() == 1) {
      return runs.get(0).figure();
    }
    Figure without =
        runs.stream()
            .map(Run::figure)
            .filter(f -> f.value() == null || f.expandedUncertainty() == null)
            .findFirst()
            .orElse(null);
    if (without != null) {
      String why = "one run: " + without.why();
      return without.value() == null ? Figure.absent(why) : Figure.withoutUncertainty(mean(), why);
    }
    double own =
        runs.stream()
            .mapToDouble(r -> Coverage.standardUncertainty(r.figure()))
            .max()
            .orElseThrow();
    double ofMean = spread() / Math.sqrt(count());
    double freedom = Coverage.freedom(own, Double.POSITIVE_INFINITY, ofMean, count() - 1.0);
    return Coverage.figure(mean(), Math.hypot(own, ofMean), freedom);
  }

  List<Double> values() {
    return runs.stream()
        .map(
            run -> {
              Double value = run.figure().value();
              if (value == null) {
                throw new IllegalStateException("a run without value");
              }
              return value;
            })
        .toList();
  }

  private Moments moments() {
    Moments moments = new Moments();
    values().forEach(moments::add);
    return moments;
  }
}
