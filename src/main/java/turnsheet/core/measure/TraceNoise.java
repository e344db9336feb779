package turnsheet.core.measure;

import turnsheet.core.dsp.Weighting;

/**
 * White noise on the times at which the recording sees the unit pass: phase noise of a tone, noise
 * of edges. It turns into speed noise whose density rises with the square of the rate.
 *
 * <p>Source: S_y(f) = (2 pi f)^2 S_x(f), textbook relation of time and frequency fluctuation (IEEE
 * Std 1139, value from memory).
 *
 * @param timeDensitySecondsSquaredPerHertz one-sided density of the time error; 0 where no noise is
 *     known
 */
record TraceNoise(double timeDensitySecondsSquaredPerHertz) {

  static final TraceNoise NONE = new TraceNoise(0);

  TraceNoise {
    if (!(timeDensitySecondsSquaredPerHertz >= 0
        && Double.isFinite(timeDensitySecondsSquaredPerHertz))) {
      throw new IllegalArgumentException("density " + timeDensitySecondsSquaredPerHertz);
    }
  }

  /** Independent errors of single edges. */
  static TraceNoise ofEdges(double standardDeviationSeconds, double edgesPerSecond) {
    return new TraceNoise(2 * standardDeviationSeconds * standardDeviationSeconds / edgesPerSecond);
  }

  /** White phase noise of a tone, one-sided. */
  static TraceNoise ofPhase(double radiansSquaredPerHertz, double toneHertz) {
    double radiansPerSecond = 2 * Math.PI * toneHertz;
    return new TraceNoise(radiansSquaredPerHertz / (radiansPerSecond * radiansPerSecond));
  }

  /** Root mean square of the speed that this noise alone would show in a band, in percent. */
  double floorPercent(double fromHertz, double toHertz) {
    double cubes = toHertz * toHertz * toHertz - fromHertz * fromHertz * fromHertz;
    return 100 * 2 * Math.PI * Math.sqrt(timeDensitySecondsSquaredPerHertz * cubes / 3);
  }

  /** The same behind the weighting. */
  double weightedFloorPercent(double fromHertz, double toHertz) {
    int steps = 400;
    double step = (toHertz - fromHertz) / steps;
    double sum = 0;
    for (int i = 0; i < steps; i++) {
      double f = fromHertz + (i + 0.5) * step;
      double g = f * Weighting.gain(f);
      sum += g * g * step;
    }
    return 100 * 2 * Math.PI * Math.sqrt(timeDensitySecondsSquaredPerHertz * sum);
  }
}
