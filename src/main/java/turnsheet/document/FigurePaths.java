package turnsheet.document;

import java.util.LinkedHashMap;
import java.util.Map;
import org.jspecify.annotations.Nullable;
import turnsheet.core.measure.Figure;
import turnsheet.core.measure.Reading;

/** All figures of a reading under their paths in the result contract, for flat tables. */
public final class FigurePaths {

  private FigurePaths() {}

  /** In the order of the document; units are in the paths, lines count from 1. */
  public static Map<String, Figure> of(Reading reading) {
    Map<String, Figure> figures = new LinkedHashMap<>();
    Reading.Speed speed = reading.speed();
    figures.put("speed.meanHz", speed.meanHz());
    figures.put("speed.deviationPercent", speed.deviationPercent());
    figures.put("speed.driftPercentPerMinute", speed.driftPercentPerMinute());
    figures.put("speed.startDeviationPercent", speed.startDeviationPercent());
    figures.put("speed.endDeviationPercent", speed.endDeviationPercent());
    Reading.Flutter flutter = reading.flutter();
    figures.put("flutter.weightedTwoSigmaPercent", flutter.weightedTwoSigmaPercent());
    figures.put("flutter.weightedQuasiPeakPercent", flutter.weightedQuasiPeakPercent());
    figures.put("flutter.weightedRmsPercent", flutter.weightedRmsPercent());
    figures.put("flutter.unweightedRmsPercent", flutter.unweightedRmsPercent());
    flutter.bands().forEach(b -> figures.put("flutter.bands." + b.name(), b.rmsPercent()));
    for (int i = 0; i < reading.lines().size(); i++) {
      figures.put("lines." + (i + 1) + ".rateHz", reading.lines().get(i).rateHz());
      figures.put("lines." + (i + 1) + ".peakPercent", reading.lines().get(i).peakPercent());
    }
    Reading.Edges edges = reading.edges();
    if (edges != null) {
      figures.put("edges.meanPeriodMicroseconds", edges.meanPeriodMicroseconds());
      figures.put("edges.periodStdDevMicroseconds", edges.periodStdDevMicroseconds());
      figures.put("edges.cycleToCycleMicroseconds", edges.cycleToCycleMicroseconds());
      putIfKnown(figures, "edges.dutyPercent", edges.dutyPercent());
      figures.put("edges.edgeNoiseMicroseconds", edges.edgeNoiseMicroseconds());
      Reading.Wheel wheel = edges.wheel();
      putIfKnown(
          figures,
          "edges.wheel.patternRmsPercentOfPeriod",
          wheel == null ? null : wheel.patternRmsPercentOfPeriod());
      edges
          .stability()
          .forEach(
              s ->
                  figures.put(
                      "edges.stability." + s.tauSeconds() + "s.allanDeviation",
                      s.allanDeviation()));
    }
    figures.put("signal.snrDb", reading.signal().snrDb());
    figures.put("signal.floorPercent", reading.signal().floorPercent());
    return figures;
  }

  private static void putIfKnown(
      Map<String, Figure> figures, String path, @Nullable Figure figure) {
    if (figure != null) {
      figures.put(path, figure);
    }
  }
}
