package turnsheet.core.diagnose.parts;

import java.util.ArrayList;
import java.util.Comparator;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import turnsheet.core.measure.Figure;
import turnsheet.core.measure.Reading;

/**
 * Ranks the parts that can stand behind each line.
 *
 * <p>A rate is a suspect where the line lies no further from it than the resolution of the capture
 * plus all limits of the numbers it follows from. Its weight is its prior times the density of the
 * line's rate: a normal distribution with half the resolution and the standard uncertainty of the
 * expected rate, spread evenly over the range of a rate that has one. A harmonic of a turning part
 * counts as much as the part's own rate where the line of that own rate is there as well. One
 * unknown part, as probable as a known one and anywhere between 0.1 and 200 Hz on a logarithmic
 * scale, competes with them; where lines without any suspect lie closer than that within an octave
 * to either side, as many as they are. Two parts cannot be told apart where the better is less than
 * nineteen times as probable as the other, that is 95 to 5 (the weights are common practice, no
 * source; how often they are right is measured).
 */
public final class LineSuspects {

  // main lobe of a Hann window between its half-amplitude points is two bins wide, one to each
  // side; half a bin more for the interpolation on noise
  private static final double RESOLUTION_BINS = 1.5;
  private static final double UNKNOWN_RANGE = Math.log(200 / 0.1);

  /** From half a rate to twice that rate. */
  private static final double CROWD_RANGE = Math.log(4);

  private static final double CERTAIN = 19;

  private final List<ExpectedRate> rates;
  private final Running running;
  private final double resolutionHertz;

  /**
   * @param rates of the parts, as from {@link RateTable}
   * @param durationSeconds of the capture, positive
   */
  public LineSuspects(List<ExpectedRate> rates, Running running, double durationSeconds) {
    Numbers.positive("duration, s", durationSeconds);
    this.rates = List.copyOf(rates);
    this.running = running;
    this.resolutionHertz = RESOLUTION_BINS / durationSeconds;
  }

  /** What can be said about each line, in their order; lines without a rate are left out. */
  public List<LineFinding> of(List<Reading.Line> lines) {
    return lines.stream().flatMap(line -> of(line, lines).stream()).toList();
  }

  /** What can be said about one line beside all others; empty where it has no rate. */
  public Optional<LineFinding> of(Reading.Line line, List<Reading.Line> all) {
    Double rate = line.rateHz().value();
    return rate == null || rate <= 0 ? Optional.empty() : Optional.of(of(rate, line.rateHz(), all));
  }

  private LineFinding of(double line, Figure figure, List<Reading.Line> all) {
    double resolution = Math.max(resolutionHertz, expanded(figure));
    List<RankedSuspect> weighed = new ArrayList<>();
    for (ExpectedRate rate : rates) {
      double mismatch = rate.rate().distance(line);
      double tolerance = resolution + rate.rate().limitHertz();
      if (Math.abs(mismatch) <= tolerance) {
        double prior = supported(rate, line, all) ? 1 : rate.prior();
        double weight = prior * density(line, rate.rate(), resolution / 2);
        weighed.add(new RankedSuspect(rate, mismatch, tolerance, weight));
      }
    }
    double unknown = Math.max(1 / (line * UNKNOWN_RANGE), crowd(line, all));
    double sum = unknown + weighed.stream().mapToDouble(RankedSuspect::probability).sum();
    Map<String, Double> ofPart = new HashMap<>();
    weighed.forEach(s -> ofPart.merge(s.part(), s.probability() / sum, Double::sum));
    List<RankedSuspect> suspects =
        weighed.stream()
            .map(
                s ->
                    new RankedSuspect(
                        s.expected(), s.mismatchHz(), s.toleranceHz(), s.probability() / sum))
            .sorted(
                Comparator.comparingDouble((RankedSuspect s) -> -part(ofPart, s))
                    .thenComparingDouble(s -> -s.probability()))
            .toList();
    return new LineFinding(
        line,
        resolution,
        suspects,
        unknown / sum,
        rivals(suspects, ofPart),
        lock(suspects),
        suspects.isEmpty() ? Explanation.of(line, lineExpanded(figure), rates, running) : null);
  }

  /**
   * How densely lines without any suspect lie about a line, per hertz: where many things turn that
   * nobody has entered, one that meets a part by chance is likelier.
   */
  private double crowd(double line, List<Reading.Line> all) {
    double unnamed = 0;
    for (Reading.Line other : all) {
      Double rate = other.rateHz().value();
      if (rate != null
          && rate > line / 2
          && rate < 2 * line
          && rates.stream().noneMatch(expected -> meets(expected, rate))) {
        unnamed++;
      }
    }
    return unnamed / (line * CROWD_RANGE);
  }

  private boolean meets(ExpectedRate expected, double line) {
    return Math.abs(expected.rate().distance(line))
        <= resolutionHertz + expected.rate().limitHertz();
  }

  private static double part(Map<String, Double> ofPart, RankedSuspect suspect) {
    return ofPart.getOrDefault(suspect.part(), 0.0);
  }

  private static double density(double line, Turning rate, double measured) {
    double sigma = Math.hypot(measured, rate.standardHertz());
    double width = rate.highHertz() - rate.lowHertz();
    return width < sigma
        ? Numbers.normal(line - rate.hertz(), Math.hypot(sigma, width / Math.sqrt(12)))
        : (Numbers.cumulative((line - rate.lowHertz()) / sigma)
                - Numbers.cumulative((line - rate.highHertz()) / sigma))
            / width;
  }

  /** Whether the line of the part's own rate is there as well. */
  private boolean supported(ExpectedRate rate, double line, List<Reading.Line> all) {
    if (rate.cause() != Cause.TURN || rate.harmonic() == 1) {
      return false;
    }
    double own = line / rate.harmonic();
    return all.stream()
        .map(l -> l.rateHz().value())
        .anyMatch(r -> r != null && Math.abs(r - own) <= resolutionHertz);
  }

  private static List<String> rivals(List<RankedSuspect> suspects, Map<String, Double> ofPart) {
    if (suspects.isEmpty()) {
      return List.of();
    }
    double first = part(ofPart, suspects.get(0));
    return suspects.stream()
        .filter(s -> part(ofPart, s) > first / CERTAIN)
        .map(RankedSuspect::part)
        .distinct()
        .skip(1)
        .toList();
  }

  private static LockVerdict lock(List<RankedSuspect> suspects) {
    double shaft = sum(suspects, Lock.SHAFT);
    double mains = sum(suspects, Lock.MAINS);
    double free = sum(suspects, Lock.FREE);
    if (free > Math.max(shaft, mains) || shaft + mains == 0) {
      return LockVerdict.NEITHER;
    }
    if (shaft > CERTAIN * mains) {
      return LockVerdict.SHAFT;
    }
    return mains > CERTAIN * shaft ? LockVerdict.MAINS : LockVerdict.UNDECIDED;
  }

  private static double sum(List<RankedSuspect> suspects, Lock lock) {
    return suspects.stream()
        .filter(s -> s.expected().rate().lock() == lock)
        .mapToDouble(RankedSuspect::probability)
        .sum();
  }

  private static double expanded(Figure figure) {
    Double stated = figure.expandedUncertainty();
    return stated == null ? 0 : stated;
  }

  private double lineExpanded(Figure figure) {
    Double stated = figure.expandedUncertainty();
    return stated == null ? resolutionHertz : stated;
  }
}
