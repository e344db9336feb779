package turnsheet.core.measure;

import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import turnsheet.core.dsp.Window;
import turnsheet.core.signal.Fluctuation;
import turnsheet.core.signal.SpeedTrace;
import turnsheet.core.signal.Warning;
import turnsheet.core.stats.Budget;

/**
 * All figures that follow from a speed trace, whatever it was made from. How each is read over a
 * capture stands in docs/interpretation.md.
 *
 * <p>Memory: a few tens of megabytes beside the trace, however long it is.
 */
final class TraceFigures {

  /** Below this the figures of fluctuation would be guesses. */
  static final double SHORTEST_SECONDS = 1;

  /** Filters may have cost a capture of five seconds its ends. */
  private static final double SHORTEST_TWO_SIGMA_SECONDS = 4.8;

  private static final double LOWEST_HERTZ = 0.1;
  private static final double HIGHEST_HERTZ = 200;
  private static final double AT_FLOOR = 1.5;
  private static final int MOST_BINS = 20_000;

  /**
   * The 0.022 dB that the filter is off at most above 0.2 Hz (WeightingTest), as a share of the
   * reading. It is off by 0.07 dB at 0.1 Hz, where the weighting leaves 0.4 % of a line.
   */
  private static final double WEIGHTING_SHARE = Math.pow(10, 0.022 / 20) - 1;

  /** Loss of the line interpolation between bins, as a share of the peak. */
  private static final double INTERPOLATION_SHARE = 0.002;

  private final Residual residual;
  private final TraceNoise noise;
  private final double bandHertz;
  private final MeasureSettings settings;
  private final SpeedSpectrum soft;
  private final SpeedSpectrum sharp;
  private final WeightedFigures weighted;
  private final double swell;

  private TraceFigures(
      CleanTrace clean, TraceNoise noise, double bandHertz, MeasureSettings settings) {
    this.residual = Residual.of(clean);
    this.noise = noise;
    this.bandHertz = Math.min(bandHertz, clean.rateHertz() / 2);
    this.settings = settings;
    double margin = 10 * clean.rateHertz() / clean.longestPiece().length() + 1;
    this.soft = SpeedSpectrum.of(residual, Window.HANN, HIGHEST_HERTZ + margin);
    this.sharp = SpeedSpectrum.of(residual, Window.BLACKMAN_HARRIS, HIGHEST_HERTZ + margin);
    this.swell = residual.swell();
    this.weighted =
        new WeightedFigures(
            residual, sharp.segments() == 1 ? LineFinder.find(sharp, topHertz()) : List.of());
  }

  /**
   * Works the figures out.
   *
   * @param trace in percent of nominal, already on the corrected clock
   * @param excluded stretches of capture time that must not count, in any order
   * @param noise known from the recording itself
   * @param bandHertz highest rate of fluctuation that the trace shows in full
   * @throws IllegalArgumentException if less than {@link #SHORTEST_SECONDS} in one piece is left
   */
  static TraceFigures of(
      SpeedTrace trace,
      List<Stretch> excluded,
      TraceNoise noise,
      double bandHertz,
      MeasureSettings settings) {
    CleanTrace clean = new CleanTrace(trace, excluded);
    double usable = longestSeconds(clean);
    if (usable < SHORTEST_SECONDS) {
      throw new IllegalArgumentException("longest piece " + usable + " s");
    }
    return new TraceFigures(clean, noise, bandHertz, settings);
  }

  /** Length of the longest stretch without a long gap: what {@link #of} needs. */
  static double longestUsableSeconds(SpeedTrace trace, List<Stretch> excluded) {
    return longestSeconds(new CleanTrace(trace, excluded));
  }

  private static double longestSeconds(CleanTrace clean) {
    return clean.longestPiece().length() / clean.rateHertz();
  }

  Reading.Speed speed() {
    CleanTrace clean = residual.clean();
    double mean = residual.meanPercent();
    double own = meanUncertaintyPercent();
    Budget systematic = systematic(1 + mean / 100);
    Budget deviation = systematic.plus("unsteadiness and noise", own);
    double nominal = settings.nominalHz();
    double seconds = clean.trace().durationSeconds();
    // the slope of a Hann-weighted line: its weights spread over 0.181 of the length
    double slopeU = 60 * own / (0.181 * seconds);
    int ends = (int) (endSeconds() * clean.rateHertz());
    double scatter = residual.blockScatterPercent(ends);
    int first = clean.pieces().get(0).from();
    int last = clean.pieces().get(clean.pieces().size() - 1).to();
    return new Reading.Speed(
        nominal,
        Figure.of(nominal * (1 + mean / 100), deviation.times(nominal / 100)),
        Figure.of(mean, deviation),
        Figure.of(
            60 * residual.slopePercentPerSecond(),
            Budget.empty().plus("unsteadiness and noise", slopeU)),
        atEnd(residual.averagePercent(first, Math.min(last, first + ends)), scatter, systematic),
        atEnd(residual.averagePercent(Math.max(first, last - ends), last), scatter, systematic));
  }

  /** How much of the beginning and of the end the start and end deviations are averaged over. */
  double endSeconds() {
    double seconds = residual.clean().trace().durationSeconds();
    return Math.min(Math.max(2, Math.min(seconds / 10, 30)), seconds / 2);
  }

  private static Figure atEnd(double value, double scatter, Budget systematic) {
    if (Double.isNaN(value)) {
      return Figure.absent("there was no usable signal at this end of the recording");
    }
    if (Double.isNaN(scatter)) {
      return Figure.withoutUncertainty(value, "the recording is too short to tell its scatter");
    }
    return Figure.of(value, systematic.plus("fluctuation", scatter));
  }

  private Budget systematic(double relativeSpeed) {
    return Budget.empty()
        .plus(Causes.CLOCK, settings.clockStandardUncertaintyPpm() * 1e-4 * relativeSpeed)
        .plus(Causes.MEDIUM, settings.mediumStandardUncertaintyPercent());
  }

  /**
   * Standard deviation of the Hann-weighted mean: a quarter of the noise power of one Hann bin,
   * read just above zero, reduced by the number of segments that the trace holds.
   */
  private double meanUncertaintyPercent() {
    double step = soft.resolutionHertz() / soft.stepHertz();
    double[] low = new double[3];
    for (int i = 0; i < low.length; i++) {
      low[i] = soft.power((int) Math.round((2 + i) * step));
    }
    java.util.Arrays.sort(low);
    double seconds = residual.clean().usableSamples() / residual.clean().rateHertz();
    return Math.sqrt(low[1] / 4 * Math.min(1, soft.segmentSeconds() / seconds));
  }

  Reading.Flutter flutter() {
    double seconds = residual.clean().usableSamples() / residual.clean().rateHertz();
    Figure twoSigma =
        seconds < SHORTEST_TWO_SIGMA_SECONDS
            ? Figure.absent(
                String.format(
                    Locale.ROOT,
                    "%.1f s are usable and the standard asks for at least 5 s",
                    seconds))
            : weighted(weighted.twoSigma());
    return new Reading.Flutter(
        twoSigma,
        weighted(weighted.quasiPeak()),
        weighted(weighted.rms()),
        unweighted(LOWEST_HERTZ, HIGHEST_HERTZ, true),
        List.of(band("wow", 0.5, 6), band("flutter", 6, 200)));
  }

  private Figure weighted(WeightedFigures.Value v) {
    // the weighting falls by 6 dB per octave beyond 200 Hz and does not end there
    double floor = noise.weightedFloorPercent(LOWEST_HERTZ, bandHertz);
    // what noise adds is not taken off: all of it stands as standard uncertainty (JCGM 100, F.2.4.5
    // warns of less); percentiles grow with the root mean square
    double rms = weighted.rms().percent();
    double added = rms > 0 ? v.percent() * noiseShare(rms, floor) / rms : 0;
    return Figure.of(
        v.percent(),
        Budget.empty()
            .plus(Causes.LENGTH, v.lengthUncertaintyPercent())
            .plusRectangular(Causes.WEIGHTING, WEIGHTING_SHARE * v.percent())
            .plus("noise of the recording", added));
  }

  private Reading.Band band(String name, double fromHertz, double toHertz) {
    return new Reading.Band(name, fromHertz, toHertz, unweighted(fromHertz, toHertz, false));
  }

  /**
   * Root mean square in a band.
   *
   * @param wholeLines whether a line at the very border counts in full, by two bins of margin
   */
  private Figure unweighted(double fromHertz, double toHertz, boolean wholeLines) {
    double to = Math.min(toHertz, bandHertz);
    if (to <= fromHertz) {
      return Figure.absent(
          String.format(Locale.ROOT, "the recording shows fluctuation up to %.3g Hz only", to));
    }
    double margin = wholeLines ? 2 * soft.resolutionHertz() : 0;
    double rms = soft.rmsPercent(fromHertz - margin, to + margin);
    double floor = noise.floorPercent(fromHertz, to);
    // relative scatter of a power summed over the independent bins of a band, halved for the root;
    // for lines it is too careful, which is the safe side
    double bins = Math.max(1, (to - fromHertz) / (1.5 * soft.resolutionHertz()));
    double length = rms / 2 / Math.sqrt(bins * soft.segments());
    Budget budget =
        Budget.empty()
            .plus(Causes.LENGTH, length)
            .plusRectangular("noise of the recording", noiseShare(rms, floor));
    // one Hann segment weighs the middle of the capture most
    return Figure.of(
        rms,
        wholeLines && soft.segments() == 1
            ? budget.plusRectangular("swelling and fading", rms * Math.abs(swell))
            : budget);
  }

  /** How much of a reading the floor can account for; powers add. */
  private static double noiseShare(double reading, double floor) {
    return reading - Math.sqrt(Math.max(0, reading * reading - floor * floor));
  }

  List<Reading.Line> lines() {
    List<Reading.Line> lines = new ArrayList<>();
    double resolution = sharp.resolutionHertz();
    for (LineFinder.Found f : LineFinder.find(sharp, topHertz())) {
      // D. C. Rife and R. R. Boorstyn, IEEE Trans. Inf. Theory 20 (1974), 591-598: bound on the
      // rate of a sinusoid in noise, from memory; a hundredth of a bin for the interpolation
      double noiseHertz = 0.55 * resolution * f.noisePercent() / f.peakPercent() * Math.sqrt(2);
      Budget rateU =
          Budget.empty()
              .plus("noise", noiseHertz)
              .plusRectangular("interpolation", 0.02 * resolution)
              .plus(Causes.CLOCK, f.rateHertz() * settings.clockStandardUncertaintyPpm() * 1e-6);
      Budget peakU =
          Budget.empty()
              .plus("noise", f.noisePercent())
              .plusRectangular("interpolation", INTERPOLATION_SHARE * f.peakPercent());
      lines.add(
          new Reading.Line(
              Figure.of(f.rateHertz(), rateU), Figure.of(f.peakPercent(), peakU), List.of()));
    }
    return List.copyOf(lines);
  }

  /** Up to 200 Hz in at most {@value #MOST_BINS} bins; each reads the highest of what it covers. */
  Series.Spectrum spectrum() {
    int last = (int) Math.min(sharp.size() - 1, Math.ceil(topHertz() / sharp.stepHertz()));
    int group = last / MOST_BINS + 1;
    double[] peaks = new double[last / group + 1];
    for (int k = 0; k < peaks.length; k++) {
      double highest = 0;
      int to = Math.min(last, k * group + group / 2);
      for (int i = Math.max(0, k * group - (group - 1) / 2); i <= to; i++) {
        highest = Math.max(highest, sharp.power(i));
      }
      peaks[k] = Math.sqrt(highest);
    }
    return new Series.Spectrum(group * sharp.stepHertz(), peaks);
  }

  /** The weighted fluctuation and the indicator's readings in blocks. */
  Series.Blocks blocks() {
    return new Series.Blocks(weighted.fluctuation(), weighted.indication());
  }

  /** The fluctuation itself, as far as it is shown. */
  Fluctuation fluctuation() {
    return FluctuationSeries.of(residual);
  }

  /** What the noise of the recording alone would show as unweighted figure. */
  double floorPercent() {
    return noise.floorPercent(LOWEST_HERTZ, topHertz());
  }

  /** Highest rate that the figures cover. */
  double topHertz() {
    return Math.min(HIGHEST_HERTZ, bandHertz);
  }

  /** What the reader of these figures must know beyond them. */
  List<Warning> warnings() {
    List<Warning> warnings = new ArrayList<>();
    double seconds = residual.clean().usableSamples() / residual.clean().rateHertz();
    if (seconds < 20) {
      warnings.add(
          new Warning(
              "shortCapture",
              String.format(
                  Locale.ROOT,
                  "Only %.1f s were usable: slow wow shows few turns in that time, so record 30 s"
                      + " or more for figures that repeat.",
                  seconds)));
    }
    Double rms = unweighted(LOWEST_HERTZ, HIGHEST_HERTZ, true).value();
    if (rms != null && rms < AT_FLOOR * floorPercent()) {
      warnings.add(
          new Warning(
              "atFloor",
              String.format(
                  Locale.ROOT,
                  "The unweighted fluctuation of %.2g %% lies at the floor of %.2g %% that the noise"
                      + " of this recording sets: the unit may be better than the figure, so record"
                      + " at a higher level.",
                  rms,
                  floorPercent())));
    }
    return List.copyOf(warnings);
  }
}
