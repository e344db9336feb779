package turnsheet.trial;

import java.math.BigDecimal;
import java.math.MathContext;
import java.util.ArrayList;
import java.util.List;
import org.jspecify.annotations.Nullable;
import turnsheet.core.diagnose.filter.Circuit;
import turnsheet.core.diagnose.filter.ESeries;
import turnsheet.core.diagnose.filter.FilterDesign;
import turnsheet.core.diagnose.filter.FilterFamily;
import turnsheet.core.diagnose.filter.FilterKind;
import turnsheet.core.diagnose.filter.TrialPlan;

/**
 * What the bench wants tried. Every kind in every family with every number of poles, its cutoff
 * swept in equal ratios.
 *
 * @param highPass cutoffs of high-passes, and of the lower edge of band-passes
 * @param lowPass cutoffs of low-passes; the upper edge of band-passes is its end
 * @param steps cutoffs from the first to the last of a range
 * @param comparator what comes after the filter
 * @param speeds at which the filter has to do as well
 * @param parts that the circuits are built of
 */
public record TrialOrder(
    List<FilterKind> kinds,
    List<FilterFamily> families,
    List<Integer> poles,
    Range highPass,
    Range lowPass,
    int steps,
    After comparator,
    Speeds speeds,
    Circuit.Parts parts) {

  public static final int MOST_STEPS = 12;

  /** From one cutoff to another. */
  public record Range(double fromHz, double toHz) {

    public Range {
      if (!(fromHz > 0 && toHz >= fromHz && Double.isFinite(toHz))) {
        throw new IllegalArgumentException("from " + fromHz + " to " + toHz + " Hz");
      }
    }
  }

  /**
   * The comparator, in percent of the swing recorded.
   *
   * @param goodEnoughPercent movement of edges, in percent of their period, that is quiet enough
   */
  public record After(double hysteresisPercent, double offsetPercent, double goodEnoughPercent) {}

  /**
   * The machine's speed settings.
   *
   * @param lowestHz pulses per second at the lowest
   * @param highestHz pulses per second at the highest
   * @param levelFollows whether the sensor's level is proportional to speed
   */
  public record Speeds(double lowestHz, double highestHz, boolean levelFollows) {}

  public TrialOrder {
    kinds = List.copyOf(kinds);
    families = List.copyOf(families);
    poles = List.copyOf(poles);
    if (steps < 1 || steps > MOST_STEPS) {
      throw new IllegalArgumentException(steps + " steps");
    }
  }

  /**
   * What to begin with: high-passes from just above the mains to just below the lowest pulse rate,
   * low-passes from just above the highest, parts as they are usually at hand.
   *
   * @param sampleRateHertz of the recording; null where not known
   */
  static TrialOrder proposed(
      double lowestHertz, double highestHertz, @Nullable Double sampleRateHertz) {
    double highest = sampleRateHertz == null ? 6 * highestHertz : 0.4 * sampleRateHertz;
    double from = round(1.25 * highestHertz);
    return new TrialOrder(
        List.of(FilterKind.values()),
        List.of(FilterFamily.values()),
        List.of(2, 4, 6, 8),
        new Range(round(Math.min(70, 0.2 * lowestHertz)), round(0.8 * lowestHertz)),
        new Range(from, round(Math.max(from, Math.min(6 * highestHertz, highest)))),
        3,
        new After(10, 0, 0.05),
        new Speeds(lowestHertz, highestHertz, true),
        new Circuit.Parts(ESeries.E96, 10e-9, ESeries.E96.tolerancePercent(), 5));
  }

  private static double round(double value) {
    return new BigDecimal(value).round(new MathContext(3)).doubleValue();
  }

  /** How many candidates that makes. */
  public int count() {
    return kinds.size() * families.size() * poles.size() * steps;
  }

  /** All candidates. */
  public List<FilterDesign> designs() {
    List<FilterDesign> designs = new ArrayList<>();
    for (FilterKind kind : kinds) {
      for (FilterFamily family : families) {
        for (int count : poles) {
          for (int step = 0; step < steps; step++) {
            designs.add(design(kind, family, count, step));
          }
        }
      }
    }
    return designs;
  }

  private FilterDesign design(FilterKind kind, FilterFamily family, int count, int step) {
    return switch (kind) {
      case HIGH_PASS -> FilterDesign.highPass(family, count, cutoff(highPass, step));
      case LOW_PASS -> FilterDesign.lowPass(family, count, cutoff(lowPass, step));
      case BAND_PASS ->
          FilterDesign.bandPass(family, count, cutoff(highPass, step), lowPass.toHz());
    };
  }

  /** To three figures: nobody builds 143.7352 Hz. */
  private double cutoff(Range range, int step) {
    double share = steps == 1 ? 0 : (double) step / (steps - 1);
    double exact = range.fromHz() * Math.pow(range.toHz() / range.fromHz(), share);
    return round(exact);
  }

  /** For the core. */
  TrialPlan plan(double nominalHertz) {
    return new TrialPlan(
        nominalHertz,
        speeds.lowestHz(),
        speeds.highestHz(),
        speeds.levelFollows(),
        comparator.hysteresisPercent(),
        comparator.offsetPercent(),
        comparator.goodEnoughPercent(),
        designs());
  }
}
