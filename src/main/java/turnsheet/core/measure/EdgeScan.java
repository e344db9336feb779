package turnsheet.core.measure;

import java.io.IOException;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import org.jspecify.annotations.Nullable;
import turnsheet.core.dsp.EdgeSpeed;
import turnsheet.core.signal.EdgeReader;
import turnsheet.core.signal.RejectedException;
import turnsheet.core.signal.SpeedTrace;
import turnsheet.core.signal.Warning;
import turnsheet.core.stats.BlockScatter;
import turnsheet.core.stats.EdgeRepair;
import turnsheet.core.stats.EdgeSink;
import turnsheet.core.stats.Moments;
import turnsheet.core.stats.PeriodHistogram;
import turnsheet.core.stats.PeriodStatistics;
import turnsheet.core.stats.RegularGaps;
import turnsheet.core.stats.StabilityLadder;
import turnsheet.core.stats.WheelPattern;

/** One pass over all edges of a capture: everything that is counted, averaged or traced. */
final class EdgeScan {

  private static final int BLOCK = 4096;
  private static final int FINEST_CLASSES = 400;
  private static final int LONGEST_REPAIR = 3;
  private static final long MOST_LOST = 1_000_000;

  final PeriodStatistics periods;
  final StabilityLadder stability = new StabilityLadder();
  final @Nullable WheelPattern wheel;
  final PeriodHistogram histogram;
  final BlockScatter spread;
  final BlockScatter steps;
  final Moments highShare = new Moments();
  final List<Stretch> gaps = new ArrayList<>();
  final List<Warning> warnings = new ArrayList<>();
  final EdgeSpeed speed;
  private final SpeedTrace.Builder trace = new SpeedTrace.Builder();
  private final EdgeRepair repair;
  private final EdgeProbe probe;
  private final double nominalHz;
  private final RegularGaps regular = new RegularGaps();
  private long places;
  private long rises;
  private double lastRise = Double.NaN;
  private double fall = Double.NaN;
  private double previous = Double.NaN;
  private double previousPeriod = Double.NaN;

  EdgeScan(EdgeProbe probe, MeasureSettings settings) {
    this.probe = probe;
    this.nominalHz = settings.nominalHz();
    double rate = 1 / probe.medianSeconds();
    this.periods = new PeriodStatistics(probe.medianSeconds(), settings.searchPercent() / 100);
    Integer teeth = settings.teeth();
    this.wheel = teeth == null || teeth < 2 ? null : new WheelPattern(teeth);
    this.speed =
        new EdgeSpeed(
            rate,
            EdgeSpeed.decimationFor(rate),
            EdgeSpeed.perEdgeFor(rate),
            v -> trace.add(100 * (v / nominalHz - 1)));
    double finest =
        Math.max(
            probe.gridSeconds(),
            Math.max(probe.spreadSeconds(), 1e-6 * probe.medianSeconds()) / FINEST_CLASSES);
    this.histogram = new PeriodHistogram(finest, probe.medianSeconds());
    int block = (int) Math.min(1e6, Math.max(32, rate));
    this.spread = new BlockScatter(block);
    this.steps = new BlockScatter(block);
    EdgeSink all = this::repaired;
    this.repair = new EdgeRepair(probe.startSeconds(), all, this::gap);
  }

  /** Reads everything; the opener is used once. */
  void run(EdgeOpener opener, double clockFactor) throws IOException, RejectedException {
    try (EdgeReader reader = opener.open()) {
      double[] times = new double[BLOCK];
      boolean[] rising = new boolean[BLOCK];
      int count;
      while ((count = reader.read(times, rising)) > 0) {
        for (int i = 0; i < count; i++) {
          edge(times[i] * clockFactor, rising[i]);
        }
        requireRepairable();
      }
      repair.finish();
      requireRepairable();
      warnings.addAll(reader.warnings());
    }
  }

  private void requireRepairable() throws RejectedException {
    if (repair.missing() > MOST_LOST) {
      throw new RejectedException(
          "notSteady",
          String.format(
              Locale.ROOT,
              "Gaps of %d pulses in all lie between the edges: cut the recording to the stretch"
                  + " that runs.",
              repair.missing()));
    }
  }

  private void edge(double seconds, boolean rising) {
    if (!rising) {
      fall = seconds;
      return;
    }
    rises++;
    if (rises == 1 && probe.skipFirst()) {
      return;
    }
    double period = seconds - lastRise;
    if (fall > lastRise && Math.abs(period / probe.medianSeconds() - 1) < 0.25) {
      highShare.add((fall - lastRise) / period);
    }
    lastRise = seconds;
    repair.edge(seconds);
  }

  private void repaired(double seconds, boolean real) {
    places++;
    periods.edge(seconds, real);
    stability.edge(seconds, real);
    if (wheel != null) {
      wheel.edge(seconds, real);
    }
    speed.edge(seconds);
    if (!real) {
      previous = Double.NaN;
      previousPeriod = Double.NaN;
      return;
    }
    double period = seconds - previous;
    if (!Double.isNaN(period)) {
      histogram.add(period);
      spread.add(period - probe.medianSeconds());
      if (!Double.isNaN(previousPeriod)) {
        steps.add(period - previousPeriod);
      }
    }
    previousPeriod = period;
    previous = seconds;
  }

  private void gap(double fromSeconds, double toSeconds, long missing) {
    regular.gap(places, missing);
    if (missing > LONGEST_REPAIR) {
      gaps.add(new Stretch(fromSeconds, toSeconds));
    }
  }

  /** Rising edges found, before any repair. */
  long rises() {
    return rises;
  }

  /** Edges that ought to have been there; teeth that a reference mark lacks are none of them. */
  long missing() {
    RegularGaps.Mark mark = mark();
    return repair.missing() - mark.missing() * mark.count();
  }

  /** The reference mark of the wheel; of no gaps where there is none. */
  RegularGaps.Mark mark() {
    return regular.mark(places);
  }

  long extra() {
    return repair.extra();
  }

  /** The speed; may be asked for once. */
  SpeedTrace trace() {
    double start = Double.isNaN(speed.startSeconds()) ? 0 : speed.startSeconds();
    return trace.build(start, speed.rateHertz());
  }
}
