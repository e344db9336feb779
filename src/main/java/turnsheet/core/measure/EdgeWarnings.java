package turnsheet.core.measure;

import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import turnsheet.core.signal.Warning;
import turnsheet.core.stats.RegularGaps;
import turnsheet.core.stats.WheelPattern;

/** What the reader of figures from edges must know beyond them. */
final class EdgeWarnings {

  private static final double TOP_HERTZ = 200;
  private static final double LOWEST_HERTZ = 0.1;
  private static final double UNEVEN_SHARE = 0.05;

  /** Below this share of a period per edge a step is finer than any flutter of interest. */
  private static final double FINE_GRID = 1e-5;

  private final EdgeScan scan;
  private final EdgeProbe probe;
  private final MeasureSettings settings;

  EdgeWarnings(EdgeScan scan, EdgeProbe probe, MeasureSettings settings) {
    this.scan = scan;
    this.probe = probe;
    this.settings = settings;
  }

  List<Warning> all(double bandHertz, EdgeNoise noise) {
    List<Warning> warnings = new ArrayList<>();
    if (probe.skipFirst()) {
      warnings.add(
          new Warning(
              "leadingGap",
              "The first edge stands alone, far before the others: it was taken for an offset and"
                  + " left out."));
    }
    RegularGaps.Mark mark = scan.mark();
    if (mark.count() > 0) {
      warnings.add(
          warning(
              "referenceMark",
              "Every %d pulses %d are missing: that was taken for the reference mark of the wheel"
                  + " and is not counted as lost.",
              mark.every(),
              mark.missing()));
    }
    if (scan.missing() + scan.extra() > 0) {
      warnings.add(repaired());
    }
    if (scan.periods.shareOutside() > UNEVEN_SHARE) {
      warnings.add(uneven());
    }
    double period = scan.periods.meanSeconds();
    if (noise.gridSeconds() > FINE_GRID * period) {
      warnings.add(quantised(noise, Math.min(TOP_HERTZ, bandHertz), period));
    }
    if (bandHertz < TOP_HERTZ) {
      warnings.add(
          warning(
              "limitedBand",
              "The pulses come %s times per second, which shows fluctuation up to %s Hz only:"
                  + " what lies above is in no figure.",
              Plain.number(1 / period, 4),
              Plain.number(bandHertz, 3)));
    }
    WheelPattern wheel = scan.wheel;
    Integer teeth = settings.teeth();
    if (teeth != null
        && wheel != null
        && wheel.known()
        && wheel.rmsPeriods() > 3 * wheel.rmsUncertaintyPeriods()) {
      warnings.add(
          warning(
              "wheelPattern",
              "A pattern of %s %% of a period repeats with each turn of %d pulses: uneven teeth,"
                  + " an eccentric wheel and a true speed variation at the wheel's rate look the"
                  + " same in it, and the flutter figures contain it.",
              Plain.number(100 * wheel.rmsPeriods(), 2),
              teeth));
    }
    return warnings;
  }

  private Warning repaired() {
    return warning(
        "repairedEdges",
        "%d missing pulses were filled in evenly and %d extra edges were left out, of %d edges;"
            + " periods beside a repair are in no period statistics.",
        scan.missing(),
        scan.extra(),
        scan.rises());
  }

  private Warning uneven() {
    return warning(
        "unevenSpeed",
        "The speed is not steady: %.0f %% of the periods lie more than %s %% from the middle one,"
            + " from %s ms to %s ms; the figures describe a changing speed.",
        100 * scan.periods.shareOutside(),
        Plain.number(settings.searchPercent(), 3),
        Plain.number(1e3 * scan.periods.periods().min(), 4),
        Plain.number(1e3 * scan.periods.periods().max(), 4));
  }

  private static Warning quantised(EdgeNoise noise, double topHertz, double period) {
    double best =
        TraceNoise.ofEdges(noise.gridSeconds(), 1 / period)
            .floorPercent(Math.min(LOWEST_HERTZ, topHertz / 2), topHertz);
    return warning(
        "quantised",
        "The edges sit on a grid of %s \u00b5s, the step of the clock that recorded them: the"
            + " smallest unweighted flutter that this recording can show is about %s %%, so"
            + " record with a finer clock for less.",
        Plain.number(noise.gridSeconds() * Math.sqrt(12) * 1e6, 4),
        Plain.number(best, 2));
  }

  private static Warning warning(String code, String format, Object... values) {
    return new Warning(code, String.format(Locale.ROOT, format, values));
  }
}
