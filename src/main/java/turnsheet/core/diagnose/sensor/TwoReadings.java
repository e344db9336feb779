package turnsheet.core.diagnose.sensor;

import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;
import org.jspecify.annotations.Nullable;
import turnsheet.core.measure.Figure;
import turnsheet.core.measure.Outcome;
import turnsheet.core.measure.Reading;
import turnsheet.core.measure.Series;

/**
 * One waveform read twice: by its edges, as a servo sees it, and by demodulating the band about the
 * pulse rate, as the shaft turns. Both go through the same figures.
 *
 * @param edgesPercent, bandPercent unweighted flutter
 * @param edgesWeightedPercent, bandWeightedPercent two-sigma
 * @param edgesFloorPercent what the noise of the edges alone would show
 * @param falsePercent root mean square of the lines that the riding ones put into the edges
 * @param bandFloorPercent what the noise beside the pulse rate alone would show
 * @param smallestByEdgesPercent, smallestByBandPercent the smallest flutter that can be shown
 * @param bandTopHz highest fluctuation that the band shows in full: it is narrow where pulses are
 *     few or near half the sample rate
 * @param lines by rate
 */
public record TwoReadings(
    Figure edgesPercent,
    Figure bandPercent,
    Figure edgesWeightedPercent,
    Figure bandWeightedPercent,
    Figure edgesFloorPercent,
    double falsePercent,
    Figure bandFloorPercent,
    Figure smallestByEdgesPercent,
    Figure smallestByBandPercent,
    double bandTopHz,
    List<Line> lines) {

  /** A figure below this many times its floor is marked everywhere else as well. */
  private static final double ABOVE_FLOOR = 1.5;

  private static final double HIGHEST_HERTZ = 200;

  public TwoReadings {
    lines = List.copyOf(lines);
  }

  /**
   * One line in both readings.
   *
   * @param bandPeakPercent null beyond what the band shows
   * @param predictedPercent what a riding line must put there; null where none does
   * @param who what the two readings say of it
   */
  public record Line(
      double rateHz,
      double edgesPeakPercent,
      @Nullable Double bandPeakPercent,
      @Nullable Double predictedPercent,
      Who who) {}

  /** Whose a line is. */
  public enum Who {
    /** both readings show it alike */
    SHAFT,
    /** the edges show what a riding line must put there, the band does not */
    SIGNAL,
    /** neither fits */
    UNTOLD
  }

  /** Sets the two side by side. */
  static TwoReadings of(
      Outcome.Measured edges, Outcome.Measured band, double bandTopHz, List<RidingLine> riding) {
    Reading byEdges = edges.reading();
    Reading byBand = band.reading();
    double squares =
        riding.stream()
            .filter(r -> r.falseRateHz() <= HIGHEST_HERTZ)
            .mapToDouble(r -> r.falsePeakPercent() * r.falsePeakPercent() / 2)
            .sum();
    Figure edgesFloor = byEdges.signal().floorPercent();
    Figure bandFloor = byBand.signal().floorPercent();
    return new TwoReadings(
        byEdges.flutter().unweightedRmsPercent(),
        byBand.flutter().unweightedRmsPercent(),
        byEdges.flutter().weightedTwoSigmaPercent(),
        byBand.flutter().weightedTwoSigmaPercent(),
        edgesFloor,
        Math.sqrt(squares),
        bandFloor,
        smallest(edgesFloor, squares),
        smallest(bandFloor, 0),
        bandTopHz,
        lines(edges, band, bandTopHz, riding));
  }

  private static Figure smallest(Figure floor, double falseSquares) {
    Double value = floor.value();
    if (value == null) {
      return Figure.absent("the floor of this reading is not known");
    }
    return Figure.withoutUncertainty(
        ABOVE_FLOOR * Math.sqrt(value * value + falseSquares),
        "it is one and a half times the floor");
  }

  private static List<Line> lines(
      Outcome.Measured edges, Outcome.Measured band, double bandTopHz, List<RidingLine> riding) {
    double apart = 2 / edges.reading().source().durationSeconds();
    List<Double> rates = new ArrayList<>();
    rates(edges.reading()).forEach(r -> addOnce(rates, r, apart));
    rates(band.reading()).forEach(r -> addOnce(rates, r, apart));
    double least = smallestShown(edges.reading());
    for (RidingLine line : riding) {
      if (line.falseRateHz() <= HIGHEST_HERTZ
          && line.falseRateHz() > apart
          && line.falsePeakPercent() > least) {
        addOnce(rates, line.falseRateHz(), apart);
      }
    }
    return rates.stream()
        .sorted(Comparator.naturalOrder())
        .map(rate -> line(rate, apart, edges, rate > bandTopHz ? null : band, riding))
        .toList();
  }

  private static double smallestShown(Reading reading) {
    Double floor = reading.signal().floorPercent().value();
    return floor == null ? 0 : floor / 10;
  }

  private static List<Double> rates(Reading reading) {
    return reading.lines().stream()
        .flatMap(l -> java.util.stream.Stream.ofNullable(l.rateHz().value()))
        .toList();
  }

  private static void addOnce(List<Double> rates, double rate, double apart) {
    if (rates.stream().noneMatch(r -> Math.abs(r - rate) < apart)) {
      rates.add(rate);
    }
  }

  private static Line line(
      double rate,
      double apart,
      Outcome.Measured edges,
      Outcome.@Nullable Measured band,
      List<RidingLine> riding) {
    double squares =
        riding.stream()
            .filter(r -> Math.abs(r.falseRateHz() - rate) < apart)
            .mapToDouble(r -> r.falsePeakPercent() * r.falsePeakPercent())
            .sum();
    Double predicted = squares == 0 ? null : Math.sqrt(squares);
    double byEdges = peak(edges, rate, apart);
    Double byBand = band == null ? null : peak(band, rate, apart);
    return new Line(rate, byEdges, byBand, predicted, who(byEdges, byBand, predicted));
  }

  /** A quarter either way: two lines of unknown phase in one place may differ by more. */
  private static Who who(double edges, @Nullable Double band, @Nullable Double predicted) {
    if (band == null) {
      return Who.UNTOLD;
    }
    if (Math.abs(edges - band) < 0.25 * Math.max(edges, band)) {
      return Who.SHAFT;
    }
    if (predicted != null && Math.abs(edges - predicted) < 0.25 * predicted + band) {
      return Who.SIGNAL;
    }
    return Who.UNTOLD;
  }

  /** Of the line found there, else what the spectrum reads at most. */
  private static double peak(Outcome.Measured measured, double rate, double apart) {
    for (Reading.Line line : measured.reading().lines()) {
      Double at = line.rateHz().value();
      Double peak = line.peakPercent().value();
      if (at != null && peak != null && Math.abs(at - rate) < apart) {
        return peak;
      }
    }
    Series.Spectrum spectrum = measured.series().spectrum();
    int middle = (int) Math.round(rate / spectrum.stepHz());
    int reach = (int) Math.ceil(apart / 2 / spectrum.stepHz());
    double highest = 0;
    for (int k = Math.max(0, middle - reach);
        k <= Math.min(spectrum.size() - 1, middle + reach);
        k++) {
      highest = Math.max(highest, spectrum.peakPercent(k));
    }
    return highest;
  }
}
