package turnsheet.core.measure;

import java.util.List;
import org.jspecify.annotations.Nullable;
import turnsheet.core.signal.Warning;

/**
 * All figures measured from one capture by one method version: the result contract. The component
 * names are the names in JSON; a unit is part of the name. Deviations in {@code speed} are in
 * percent of the nominal speed; {@code flutter}, {@code lines} and {@code wheel} are relative to
 * the capture's own mean speed. Rates are in Hz of real time.
 *
 * @param edges null for a tone
 */
public record Reading(
    Source source,
    Method method,
    Speed speed,
    Flutter flutter,
    List<Line> lines,
    @Nullable Edges edges,
    Signal signal,
    List<Warning> warnings) {

  public Reading {
    lines = List.copyOf(lines);
    warnings = List.copyOf(warnings);
  }

  /** The same reading with other lines, as when suspects have been found for them. */
  public Reading withLines(List<Line> named) {
    return new Reading(source, method, speed, flutter, named, edges, signal, warnings);
  }

  /**
   * Where the figures come from.
   *
   * @param sha256 of the capture's bytes, lower-case hexadecimal
   * @param format name for people
   * @param channel counted from 1
   * @param sampleRateHz null for edges
   * @param durationSeconds length of what was measured
   */
  public record Source(
      String sha256,
      String format,
      CaptureKind kind,
      int channel,
      @Nullable Double sampleRateHz,
      double durationSeconds) {}

  /**
   * How the figures were made.
   *
   * @param version of the method; it changes whenever a figure can
   * @param settings all of them, so that the run can be repeated
   */
  public record Method(String version, MeasureSettings settings) {}

  /**
   * Mean speed and its slow change.
   *
   * @param nominalHz tone or pulse rate at nominal speed
   * @param meanHz tone or pulse rate found
   * @param deviationPercent positive where the unit runs fast
   * @param driftPercentPerMinute slope of the straight line through the speed, positive where it
   *     rises
   * @param startDeviationPercent deviation at the beginning
   * @param endDeviationPercent deviation at the end
   */
  public record Speed(
      double nominalHz,
      Figure meanHz,
      Figure deviationPercent,
      Figure driftPercentPerMinute,
      Figure startDeviationPercent,
      Figure endDeviationPercent) {}

  /** Fluctuation about the mean speed. */
  public record Flutter(
      Figure weightedTwoSigmaPercent,
      Figure weightedQuasiPeakPercent,
      Figure weightedRmsPercent,
      Figure unweightedRmsPercent,
      List<Band> bands) {

    public Flutter {
      bands = List.copyOf(bands);
    }
  }

  /** Unweighted fluctuation in one band of rates. */
  public record Band(String name, double fromHz, double toHz, Figure rmsPercent) {}

  /**
   * One spectral component of the speed.
   *
   * @param peakPercent amplitude from the middle to the crest
   */
  public record Line(Figure rateHz, Figure peakPercent, List<Suspect> suspects) {

    public Line {
      suspects = List.copyOf(suspects);
    }
  }

  /**
   * A part that can cause a line, as the parts were known when the capture was measured.
   *
   * @param harmonic 1 for the rate of the cause itself
   * @param rateHz the rate at which that harmonic is expected; the middle where it has a range
   * @param cause turn, teeth, poles, supply, cage, outerRace, innerRace, ball or hum; this and what
   *     follows is null in documents of the time before it was kept
   * @param sideband turns between that harmonic and the rate expected, negative below it
   * @param mismatchHz line minus expected rate, zero within a range
   * @param toleranceHz how large the mismatch may be
   * @param probability that this is the cause, as far as the list of parts is complete
   */
  public record Suspect(
      String part,
      int harmonic,
      double rateHz,
      @Nullable String cause,
      @Nullable Integer sideband,
      @Nullable Double mismatchHz,
      @Nullable Double toleranceHz,
      @Nullable Double probability) {

    /** A suspect of whom no more is known. */
    public Suspect(String part, int harmonic, double rateHz) {
      this(part, harmonic, rateHz, null, null, null, null, null);
    }
  }

  /**
   * Statistics of the periods between rising edges.
   *
   * @param count rising edges found
   * @param missing edges that ought to have been there
   * @param extra edges that ought not
   * @param cycleToCycleMicroseconds root mean square of the difference of successive periods
   * @param dutyPercent share of the period at the high level; null where falling edges are unknown
   * @param edgeNoiseMicroseconds standard deviation of one edge about its even place, the part that
   *     is white from edge to edge
   * @param wheel null where the number of teeth is unknown
   */
  public record Edges(
      long count,
      long missing,
      long extra,
      Figure meanPeriodMicroseconds,
      Figure periodStdDevMicroseconds,
      Figure cycleToCycleMicroseconds,
      @Nullable Figure dutyPercent,
      Figure edgeNoiseMicroseconds,
      @Nullable Wheel wheel,
      List<Stability> stability) {

    public Edges {
      stability = List.copyOf(stability);
    }
  }

  /** The pattern that repeats with each turn of the sensor wheel. */
  public record Wheel(int teeth, Figure patternRmsPercentOfPeriod) {}

  /** Overlapping Allan deviation of the relative speed over one averaging time. */
  public record Stability(double tauSeconds, Figure allanDeviation) {}

  /**
   * How good the recording is.
   *
   * @param snrDb level of the tone or tachometer signal against the noise near it
   * @param floorPercent unweighted fluctuation that the noise of the recording alone would show
   */
  public record Signal(
      Figure snrDb,
      List<MainsLine> mains,
      long clippedSamples,
      List<Dropout> dropouts,
      Figure floorPercent) {

    public Signal {
      mains = List.copyOf(mains);
      dropouts = List.copyOf(dropouts);
    }
  }

  /** Mains hum relative to the wanted signal. */
  public record MainsLine(double rateHz, double relativeDb) {}

  /** A stretch without usable signal. */
  public record Dropout(double startSeconds, double durationSeconds) {}
}
