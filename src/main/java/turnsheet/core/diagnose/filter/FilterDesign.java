package turnsheet.core.diagnose.filter;

import java.util.ArrayList;
import java.util.List;
import org.jspecify.annotations.Nullable;

/**
 * A filter as it would be ordered: its kind, family, poles and cutoffs.
 *
 * @param poles 2, 4, 6 or 8; a band-pass has as many on either side
 * @param lowHz -3 dB point of the high-pass; null for a low-pass
 * @param highHz -3 dB point of the low-pass; null for a high-pass
 */
public record FilterDesign(
    FilterKind kind,
    FilterFamily family,
    int poles,
    @Nullable Double lowHz,
    @Nullable Double highHz) {

  public FilterDesign {
    boolean low = kind != FilterKind.LOW_PASS;
    boolean high = kind != FilterKind.HIGH_PASS;
    if (low != (lowHz != null) || high != (highHz != null)) {
      throw new IllegalArgumentException(kind + " of " + lowHz + " and " + highHz + " Hz");
    }
    if (lowHz != null && highHz != null && !(lowHz < highHz)) {
      throw new IllegalArgumentException("band from " + lowHz + " to " + highHz + " Hz");
    }
    if ((lowHz != null && !(lowHz > 0)) || (highHz != null && !(highHz > 0))) {
      throw new IllegalArgumentException("cutoffs " + lowHz + " and " + highHz + " Hz");
    }
    if (poles < 2 || poles > 8 || poles % 2 != 0) {
      throw new IllegalArgumentException(poles + " poles");
    }
  }

  public static FilterDesign highPass(FilterFamily family, int poles, double hertz) {
    return new FilterDesign(FilterKind.HIGH_PASS, family, poles, hertz, null);
  }

  public static FilterDesign lowPass(FilterFamily family, int poles, double hertz) {
    return new FilterDesign(FilterKind.LOW_PASS, family, poles, null, hertz);
  }

  public static FilterDesign bandPass(
      FilterFamily family, int poles, double lowHertz, double highHertz) {
    return new FilterDesign(FilterKind.BAND_PASS, family, poles, lowHertz, highHertz);
  }

  /** Its stages in the order of the signal, the lowest Q of each side first. */
  public List<Section> sections() {
    List<Section> sections = new ArrayList<>();
    for (Prototype.Pair pair : Prototype.pairs(family, poles)) {
      if (lowHz != null) {
        sections.add(new Section(true, lowHz / pair.ratio(), pair.q()));
      }
    }
    for (Prototype.Pair pair : Prototype.pairs(family, poles)) {
      if (highHz != null) {
        sections.add(new Section(false, highHz * pair.ratio(), pair.q()));
      }
    }
    return sections;
  }

  /** Gain of the analogue filter in dB. */
  public double gainDb(double hertz) {
    Complex all = Complex.ONE;
    for (Section section : sections()) {
      all = all.times(section.response(hertz));
    }
    return 20 * Math.log10(all.magnitude());
  }

  /**
   * The same filter on samples.
   *
   * @throws IllegalArgumentException if a cutoff lies above {@link DiscreteFilter#HIGHEST_SHARE} of
   *     the sample rate
   */
  public DiscreteFilter at(double sampleRateHertz) {
    List<DiscreteFilter.Stage> stages = new ArrayList<>();
    for (Section section : sections()) {
      Double cutoff = section.highPass() ? lowHz : highHz;
      stages.add(DiscreteFilter.Stage.of(section, cutoff == null ? 0 : cutoff, sampleRateHertz));
    }
    return new DiscreteFilter(stages, sampleRateHertz);
  }
}
