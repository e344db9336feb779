package turnsheet.core.diagnose;

import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;
import turnsheet.core.measure.Reading;

/**
 * Names the rotating parts that can cause a line.
 *
 * <p>A part is a suspect where the line lies within the resolution of the capture plus the
 * tolerance of diameters of one of its first four harmonics. The order is by probability: mismatch
 * as a Gaussian of half that tolerance, a harmonic h times rarer than the part's own rate (both
 * common practice, no source).
 */
public final class Suspects {

  private static final int HARMONICS = 4;
  // main lobe of a Hann window between its half-amplitude points is two bins wide, one to each
  // side; half a bin more for the interpolation on noise
  private static final double RESOLUTION_BINS = 1.5;
  // a diameter read off a worn part is good to about one percent (common practice, no source)
  private static final double DIAMETER_TOLERANCE = 0.01;

  private Suspects() {}

  /**
   * Gives every line its suspects.
   *
   * @param durationSeconds of the capture, positive
   */
  public static List<Reading.Line> name(
      List<Reading.Line> lines, List<RotatingPart> parts, double durationSeconds) {
    return lines.stream()
        .map(
            line -> {
              Double rate = line.rateHz().value();
              List<Reading.Suspect> found =
                  rate == null ? List.of() : of(rate, parts, durationSeconds);
              return new Reading.Line(line.rateHz(), line.peakPercent(), found);
            })
        .toList();
  }

  /** The suspects of one line, the most probable first; empty where no part comes near. */
  public static List<Reading.Suspect> of(
      double lineHertz, List<RotatingPart> parts, double durationSeconds) {
    if (!(durationSeconds > 0)) {
      throw new IllegalArgumentException("duration " + durationSeconds + " s");
    }
    record Scored(Reading.Suspect suspect, double score) {}
    List<Scored> found = new ArrayList<>();
    for (RotatingPart part : parts) {
      for (int h = 1; h <= HARMONICS; h++) {
        double rate = h * part.rateHertz();
        double tolerance = RESOLUTION_BINS / durationSeconds + DIAMETER_TOLERANCE * rate;
        double mismatch = Math.abs(lineHertz - rate);
        if (mismatch <= tolerance) {
          double z = mismatch / (tolerance / 2);
          double score = z * z / 2 + Math.log(tolerance) + Math.log(h);
          found.add(new Scored(new Reading.Suspect(part.name(), h, rate), score));
        }
      }
    }
    return found.stream()
        .sorted(Comparator.comparingDouble(Scored::score))
        .map(Scored::suspect)
        .toList();
  }
}
