package turnsheet.core.diagnose.pair;

import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import org.jspecify.annotations.Nullable;
import turnsheet.core.dsp.Weighting;
import turnsheet.core.measure.Figure;
import turnsheet.core.signal.RejectedException;
import turnsheet.core.signal.Warning;
import turnsheet.core.stats.Budget;

/**
 * Tells the machine from its sensors, where two of them see one shaft at the same time: what both
 * show is the machine's, the rest is each sensor's own (J. S. Bendat and A. G. Piersol, "Random
 * data"; docs/interpretation.md says how each figure is defined).
 */
public final class SensorPair {

  /** Same shaft: a clock of one file against another's, a hundredth of which is enough. */
  private static final double SAME_RATE = 2e-3;

  /** The weighting has its middle at 4 Hz and needs this much to show what it weighs. */
  private static final double LOWEST_WEIGHTED_BAND_HERTZ = 10;

  /** Of what a recording tells by itself; below it something of the noise is shared. */
  private static final double SHARED = 0.7;

  /** Noise that differs by less than these many standard deviations is called even. */
  private static final double UNEVEN = 4;

  private SensorPair() {}

  /**
   * Compares two sensors recorded on one clock, such as two channels of a file.
   *
   * @throws RejectedException where they cannot be compared, with a sentence for the bench
   */
  public static PairFindings together(PairSide original, PairSide replacement)
      throws RejectedException {
    requireOneShaft(original, replacement);
    return findings(original, replacement, Alignment.Clock.SAME, null);
  }

  private static PairFindings findings(
      PairSide original, PairSide replacement, Alignment.Clock clock, @Nullable Alignment alignment)
      throws RejectedException {
    PairSpectra spectra = new PairSpectra(original, replacement, clock);
    if (!spectra.enough()) {
      throw new RejectedException(
          "pairTooShort",
          String.format(
              Locale.ROOT,
              "Both sensors together show %.1f s without a gap: record at least 15 s, better 60 s,"
                  + " in one piece.",
              spectra.secondsUsed()));
    }
    OwnLines lines = OwnLines.find(spectra);
    NoiseSplit split = NoiseSplit.of(spectra, lines);
    CommonPart common = new CommonPart(spectra, lines, split);
    PairFindings.Sensor one = sensor(original, split.first(), common);
    PairFindings.Sensor other = sensor(replacement, split.second(), common);
    List<PairFindings.OwnLine> own = common.ownLines(original.turnsPerSecond());
    Double mains = common.mainsPercent(original.turnsPerSecond());
    return new PairFindings(
        common.fromHertz(),
        common.toHertz(),
        spectra.passHertz(),
        spectra.secondsUsed(),
        spectra.segments(),
        spectra.stepHertz(),
        original.turnsPerSecond(),
        one,
        other,
        ratio(original, replacement, split),
        common.toHertz() < LOWEST_WEIGHTED_BAND_HERTZ
            ? Figure.absent(
                String.format(
                    Locale.ROOT,
                    "both pulses together show fluctuation up to %.2g Hz only, and the weighting"
                        + " needs %.0f Hz",
                    common.toHertz(),
                    LOWEST_WEIGHTED_BAND_HERTZ))
            : common.rms(true),
        common.rms(false),
        own,
        mains,
        alignment,
        common.points(),
        warnings(one, other, split, own, mains));
  }

  private static void requireOneShaft(PairSide original, PairSide replacement)
      throws RejectedException {
    double one = original.turnsPerSecond();
    double other = replacement.turnsPerSecond();
    if (Math.abs(one / other - 1) > SAME_RATE) {
      throw new RejectedException(
          "pairOtherShaft",
          String.format(
              Locale.ROOT,
              "The original tells %.4g turns per second and the replacement %.4g: check the pulses"
                  + " per turn of both, and that both sense the same shaft.",
              one,
              other));
    }
  }

  private static PairFindings.Sensor sensor(
      PairSide side, NoiseSplit.Level level, CommonPart common) {
    double deviation = Math.sqrt(level.variance());
    double rate = side.edgesPerSecond();
    boolean told = level.value() > Budget.K * deviation;
    double microseconds = microseconds(Math.max(0, level.value()), rate);
    double relative = told ? deviation / (2 * level.value()) : 0;
    Figure none = Figure.absent("it is too small to be told beside the noise of the other sensor");
    double from = common.fromHertz();
    double to = common.toHertz();
    double plain = 100 * Math.sqrt(Math.max(0, level.value()) * cubes(from, to, false));
    double weighted = 100 * Math.sqrt(Math.max(0, level.value()) * cubes(from, to, true));
    return new PairFindings.Sensor(
        side.teeth(),
        rate,
        told ? Figure.of(microseconds, Budget.K * relative * microseconds) : none,
        told ? null : microseconds(Math.max(0, level.value()) + Budget.K * deviation, rate),
        told ? Figure.of(plain, Budget.K * relative * plain) : none,
        told ? Figure.of(weighted, Budget.K * relative * weighted) : none,
        side.ownEdgeNoiseMicroseconds());
  }

  /** S_x = a / (2 pi)^2 and s^2 = S_x R / 2. */
  static double microseconds(double level, double edgesPerSecond) {
    return 1e6 * Math.sqrt(level * edgesPerSecond / 2) / (2 * Math.PI);
  }

  /** Integral of f^2, behind the weighting or not. */
  private static double cubes(double from, double to, boolean weighted) {
    int steps = 2000;
    double step = (to - from) / steps;
    double sum = 0;
    for (int i = 0; i < steps; i++) {
      double f = from + (i + 0.5) * step;
      double g = weighted ? f * Weighting.gain(f) : f;
      sum += g * g * step;
    }
    return sum;
  }

  private static Figure ratio(PairSide original, PairSide replacement, NoiseSplit split) {
    NoiseSplit.Level one = split.first();
    NoiseSplit.Level other = split.second();
    boolean told =
        one.value() > Budget.K * Math.sqrt(one.variance())
            && other.value() > Budget.K * Math.sqrt(other.variance());
    if (!told) {
      return Figure.absent("the noise of one sensor is too small to be told");
    }
    double ratio =
        microseconds(one.value(), original.edgesPerSecond())
            / microseconds(other.value(), replacement.edgesPerSecond());
    double relative =
        Math.sqrt(
                Math.max(
                    0,
                    one.variance() / (one.value() * one.value())
                        + other.variance() / (other.value() * other.value())
                        - 2 * split.covariance() / (one.value() * other.value())))
            / 2;
    return Figure.of(ratio, Budget.K * relative * ratio);
  }

  private static List<Warning> warnings(
      PairFindings.Sensor one,
      PairFindings.Sensor other,
      NoiseSplit split,
      List<PairFindings.OwnLine> own,
      @Nullable Double mains) {
    List<Warning> warnings = new ArrayList<>();
    if (Math.abs(split.first().steepness()) > UNEVEN) {
      warnings.add(
          uneven(
              "The noise of the original sensor is not the same at all rates: its microseconds hold"
                  + " for the rates that were looked at."));
    }
    if (Math.abs(split.second().steepness()) > UNEVEN) {
      warnings.add(
          uneven(
              "The noise of the replacement is not the same at all rates: its microseconds hold for"
                  + " the rates that were looked at."));
    }
    if (shared(one) || shared(other)) {
      warnings.add(
          new Warning(
              "pairSharedNoise",
              "A sensor's recording tells more noise of its edges than the other one leaves to it:"
                  + " the two share some of it, as by crosstalk, hum or the timer, or a wheel has a"
                  + " pattern; what they share counts as the machine's."));
    }
    if (mains != null) {
      warnings.add(
          new Warning(
              "pairMains",
              String.format(
                  Locale.ROOT,
                  "Both sensors show %.2g %% at multiples of the mains frequency: hum that reaches"
                      + " both looks like the machine, so it may be in the common fluctuation.",
                  mains)));
    }
    if (own.stream().anyMatch(line -> line.turnMultiple() != null)) {
      warnings.add(
          new Warning(
              "pairPattern",
              "The sensors differ at multiples of the shaft's rate: a pattern of a wheel is neither"
                  + " noise nor the machine's, and it is left out of the noise."));
    }
    return warnings;
  }

  private static boolean shared(PairFindings.Sensor sensor) {
    Double single = sensor.singleEdgeNoiseMicroseconds().value();
    Double alone = sensor.edgeNoiseMicroseconds().value();
    Double most = alone == null ? sensor.atMostMicroseconds() : alone;
    return single != null && most != null && most < SHARED * single;
  }

  private static Warning uneven(String message) {
    return new Warning("pairUnevenNoise", message);
  }
}
