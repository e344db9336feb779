package turnsheet.core.measure;

import java.io.IOException;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import org.jspecify.annotations.Nullable;
import turnsheet.core.signal.RejectedException;
import turnsheet.core.signal.SpeedTrace;
import turnsheet.core.signal.Warning;
import turnsheet.core.stats.PeriodHistogram;

/**
 * From edges to a reading, whether they come from a list or from a waveform: a look at the
 * beginning, one pass over everything, then the figures.
 *
 * <p>Memory does not grow with the number of edges but for the speed trace, four bytes a
 * millisecond.
 */
final class EdgePlan {

  private static final int FEWEST_EDGES = 10;
  private static final int MOST_CLASSES = 100;

  /** More than this and the train is called uneven. */
  private static final double UNEVEN_SHARE = 0.05;

  /** Uneven, and changing by jumps more often than this: no rotation. */
  private static final double JUMPING_SHARE = 0.12;

  /** Below this the weighting, which has its middle at 4 Hz, sees too little of what it weighs. */
  private static final double LOWEST_WEIGHTED_BAND_HERTZ = 10;

  private final String sha256;
  private final String format;
  private final @Nullable Double sampleRateHz;
  private final MeasureSettings settings;

  EdgePlan(String sha256, String format, @Nullable Double sampleRateHz, MeasureSettings settings) {
    this.sha256 = sha256;
    this.format = format;
    this.sampleRateHz = sampleRateHz;
    this.settings = settings;
  }

  /**
   * Measures.
   *
   * @param opener used twice
   * @param signal what the waveform itself tells; for a list nothing
   */
  Outcome.Measured measure(EdgeOpener opener, WaveformSignal signal)
      throws IOException, RejectedException {
    // a clock that runs fast counts more seconds than went by
    double clockFactor = 1 / (1 + settings.clockErrorPpm() * 1e-6);
    EdgeProbe probe = EdgeProbe.of(opener, clockFactor);
    EdgeScan scan = new EdgeScan(probe, settings);
    scan.run(opener, clockFactor);
    requireSteady(scan, probe);
    requireNominal(scan);

    SpeedTrace trace = scan.trace();
    double band = scan.speed.passHertz();
    List<Stretch> excluded = excluded(scan);
    EdgeNoise noise = EdgeNoise.of(scan, probe);
    List<Warning> warnings = new ArrayList<>(scan.warnings);
    warnings.addAll(new EdgeWarnings(scan, probe, settings).all(band, noise));
    if (scan.periods.edges() >= BriefReading.FEWEST_EDGES && !showsSpeed(trace, excluded)) {
      return new Outcome.Measured(
          reading(
              scan,
              noise,
              signal,
              BriefReading.speed(1 / scan.periods.meanSeconds(), settings),
              BriefReading.flutter(),
              List.of(),
              BriefReading.floor(),
              BriefReading.and(warnings)),
          BriefReading.series(histogram(scan.histogram)));
    }
    requireLength(scan, trace, excluded);
    TraceFigures figures =
        TraceFigures.of(
            trace,
            excluded,
            TraceNoise.ofEdges(noise.floorSeconds(), 1 / scan.periods.meanSeconds()),
            band,
            settings);
    requireSpeed(figures.speed());
    warnings.addAll(figures.warnings());
    return new Outcome.Measured(
        reading(
            scan,
            noise,
            signal,
            figures.speed(),
            flutter(figures, band),
            figures.lines(),
            noise.floorFigure(figures.floorPercent()),
            warnings),
        new Series(
            trace,
            figures.spectrum(),
            histogram(scan.histogram),
            figures.blocks(),
            figures::fluctuation));
  }

  private Reading reading(
      EdgeScan scan,
      EdgeNoise noise,
      WaveformSignal signal,
      Reading.Speed speed,
      Reading.Flutter flutter,
      List<Reading.Line> lines,
      Figure floor,
      List<Warning> warnings) {
    return new Reading(
        new Reading.Source(
            sha256,
            format,
            settings.kind(),
            settings.channel(),
            sampleRateHz,
            scan.periods.spanSeconds()),
        new Reading.Method(Measurement.METHOD_VERSION, settings),
        speed,
        flutter,
        lines,
        new EdgeFigures(scan, settings, noise).edges(),
        new Reading.Signal(
            signal.snrDb(),
            signal.mains(),
            signal.clippedSamples().getAsLong(),
            scan.gaps.stream()
                .map(g -> new Reading.Dropout(g.startSeconds(), g.durationSeconds()))
                .toList(),
            floor),
        warnings);
  }

  private void requireSteady(EdgeScan scan, EdgeProbe probe) throws RejectedException {
    if (scan.periods.edges() < FEWEST_EDGES) {
      throw new RejectedException(
          "tooShort",
          String.format(
              Locale.ROOT,
              "Only %d edges are in the recording: record at least %d, better 30 s.",
              scan.periods.edges(),
              FEWEST_EDGES));
    }
    double lost = (double) (scan.missing() + scan.extra()) / scan.periods.edges();
    boolean jumping =
        scan.periods.shareOutside() > UNEVEN_SHARE && scan.periods.shareOfJumps() > JUMPING_SHARE;
    if (jumping || lost > 0.5) {
      double median = probe.medianSeconds();
      throw new RejectedException(
          "notSteady",
          String.format(
              Locale.ROOT,
              "The pulses are no steady rotation: %.0f %% of the periods lie more than %s %% from"
                  + " the middle one of %s ms and %.0f %% jump from one to the next; check the"
                  + " signal, or cut the recording to the stretch that runs.",
              100 * scan.periods.shareOutside(),
              Plain.number(settings.searchPercent(), 3),
              Plain.number(median * 1e3, 4),
              100 * scan.periods.shareOfJumps()));
    }
  }

  private void requireNominal(EdgeScan scan) throws RejectedException {
    double rate = 1 / scan.periods.meanSeconds();
    double nominal = settings.nominalHz();
    if (Math.abs(rate / nominal - 1) > settings.searchPercent() / 100) {
      throw new RejectedException(
          "otherRate",
          String.format(
              Locale.ROOT,
              "The pulses come %s times per second, not within %s %% of the nominal %s: check"
                  + " the speed setting and the pulses per turn.",
              Plain.number(rate, 6),
              Plain.number(settings.searchPercent(), 3),
              Plain.number(nominal, 6)));
    }
  }

  /** Where pauses lie between stretches that run, the rate over everything says little. */
  private void requireSpeed(Reading.Speed speed) throws RejectedException {
    Double deviation = speed.deviationPercent().value();
    if (deviation != null && Math.abs(deviation) > settings.searchPercent()) {
      throw new RejectedException(
          "notSteady",
          String.format(
              Locale.ROOT,
              "Between gaps the speed is %s %% from nominal, beyond the %s %% that are looked at,"
                  + " while over the whole recording the pulses are about as many as they should"
                  + " be: cut the recording to one stretch that runs.",
              Plain.number(deviation, 3),
              Plain.number(settings.searchPercent(), 3)));
    }
  }

  private static boolean showsSpeed(SpeedTrace trace, List<Stretch> excluded) {
    return trace.length() >= 2 * FEWEST_EDGES
        && TraceFigures.longestUsableSeconds(trace, excluded) >= TraceFigures.SHORTEST_SECONDS;
  }

  private static void requireLength(EdgeScan scan, SpeedTrace trace, List<Stretch> excluded)
      throws RejectedException {
    if (!showsSpeed(trace, excluded)) {
      throw new RejectedException(
          "tooShort",
          String.format(
              Locale.ROOT,
              "The longest stretch without a gap is %.2f s of the %.2f s recorded: record at least"
                  + " %d pulses and 5 s in one piece, better 30 s.",
              trace.length() == 0 ? 0 : TraceFigures.longestUsableSeconds(trace, excluded),
              scan.periods.spanSeconds(),
              2 * scan.speed.reachEdges() + 2 * FEWEST_EDGES));
    }
  }

  /** Long gaps and as much beside them as the filter looks across with weight. */
  private static List<Stretch> excluded(EdgeScan scan) {
    double margin = scan.speed.reachEdges() / 3.0 * scan.periods.meanSeconds();
    return scan.gaps.stream()
        .map(g -> new Stretch(g.startSeconds() - margin, g.endSeconds() + margin))
        .toList();
  }

  private Reading.Flutter flutter(TraceFigures figures, double bandHertz) {
    Reading.Flutter all = figures.flutter();
    if (bandHertz >= LOWEST_WEIGHTED_BAND_HERTZ) {
      return all;
    }
    Figure none =
        Figure.absent(
            String.format(
                Locale.ROOT,
                "the pulses show fluctuation up to %s Hz only, and the weighting needs %.0f Hz",
                Plain.number(bandHertz, 2),
                LOWEST_WEIGHTED_BAND_HERTZ));
    return new Reading.Flutter(none, none, none, all.unweightedRmsPercent(), all.bands());
  }

  private static Series.Histogram histogram(PeriodHistogram histogram) {
    PeriodHistogram.Classes classes = histogram.classes(MOST_CLASSES);
    return new Series.Histogram(classes.from() * 1e6, classes.width() * 1e6, classes.counts());
  }
}
