package turnsheet.core.measure;

import turnsheet.core.stats.WheelPattern;

/**
 * What scatters single edges about their even place.
 *
 * @param seconds standard deviation found from edge to edge, cleared of the wheel's pattern where
 *     the number of teeth is known; NaN where there were too few edges
 * @param relativeUncertainty standard uncertainty of that as a share of it
 * @param gridSeconds standard deviation that the recording clock's step gives each edge
 */
record EdgeNoise(double seconds, double relativeUncertainty, double gridSeconds) {

  static EdgeNoise of(EdgeScan scan, EdgeProbe probe) {
    double found = scan.periods.edgeNoiseSeconds();
    WheelPattern wheel = scan.wheel;
    if (wheel != null && wheel.known()) {
      double period = scan.periods.meanSeconds();
      double pattern = wheel.fourthDifferenceMeanSquare() / 70 * period * period;
      found = Math.sqrt(Math.max(0, found * found - pattern));
    }
    return new EdgeNoise(
        found,
        scan.periods.edgeNoiseRelativeUncertainty(),
        // rectangular over one step (JCGM 100 clause F.2.2.1)
        probe.gridSeconds() / Math.sqrt(12));
  }

  /** The larger of what was found and what the clock's step must give. */
  double floorSeconds() {
    return Double.isNaN(seconds) ? gridSeconds : Math.max(seconds, gridSeconds);
  }

  /** What of it the clock's step does not explain. */
  double beyondGridSeconds() {
    double floor = floorSeconds();
    return Math.sqrt(Math.max(0, floor * floor - gridSeconds * gridSeconds));
  }

  Figure microseconds() {
    return Double.isNaN(seconds)
        ? Figure.absent("fewer than six edges follow each other without a repair")
        : Figure.of(seconds * 1e6, 2 * relativeUncertainty * seconds * 1e6);
  }

  /** The floor in percent with the uncertainty that the noise has. */
  Figure floorFigure(double floorPercent) {
    return Double.isNaN(seconds)
        ? Figure.withoutUncertainty(floorPercent, "the noise of the edges is not known")
        : Figure.of(floorPercent, 2 * relativeUncertainty * floorPercent);
  }
}
