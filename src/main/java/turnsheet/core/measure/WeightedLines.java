package turnsheet.core.measure;

import java.util.ArrayList;
import java.util.List;
import turnsheet.core.dsp.Rotation;

/**
 * What the lines found in a capture make of its weighted fluctuation, sample by sample: the part
 * that does not scatter from one stretch of the machine to the next. Known for captures in one
 * piece that are short enough for one spectrum; of longer ones nothing is told apart, as lines
 * wander.
 */
final class WeightedLines {

  private final List<Rotation> rotations = new ArrayList<>();
  private final List<double[]> amplitudes = new ArrayList<>();

  private WeightedLines() {}

  /**
   * Fits the lines.
   *
   * @param found lines in one spectrum over the whole residual; none where there were more
   * @param response of the weighting
   * @param lead samples before the first one at which {@link #next} begins
   */
  static WeightedLines of(
      Residual residual, List<LineFinder.Found> found, double[] response, int lead) {
    WeightedLines lines = new WeightedLines();
    CleanTrace clean = residual.clean();
    if (clean.pieces().size() != 1 || found.isEmpty()) {
      return lines;
    }
    CleanTrace.Piece piece = clean.pieces().get(0);
    double[] values = new double[piece.length()];
    residual.copy(piece.from(), values, values.length);
    Rotation window = new Rotation(0.5 / values.length, 1.0 / values.length);
    for (int i = 0; i < values.length; i++) {
      window.advance();
      values[i] *= (1 - window.cosine()) * 2 / values.length;
    }
    for (LineFinder.Found line : found) {
      double turns = line.rateHertz() / clean.rateHertz();
      double[] a = transformed(values, turns);
      double[] h = transformed(response, turns);
      lines.amplitudes.add(new double[] {a[0] * h[0] - a[1] * h[1], a[0] * h[1] + a[1] * h[0]});
      lines.rotations.add(new Rotation(-lead * turns, turns));
    }
    return lines;
  }

  /** Real and imaginary part of the sum of {@code values[i] * exp(-2 pi i turns)}. */
  private static double[] transformed(double[] values, double turnsPerSample) {
    Rotation rotation = new Rotation(0, turnsPerSample);
    double re = 0;
    double im = 0;
    for (double value : values) {
      rotation.advance();
      re += value * rotation.cosine();
      im -= value * rotation.sine();
    }
    return new double[] {re, im};
  }

  boolean isEmpty() {
    return amplitudes.isEmpty();
  }

  /** The next sample. */
  double next() {
    double sum = 0;
    for (int k = 0; k < amplitudes.size(); k++) {
      Rotation rotation = rotations.get(k);
      rotation.advance();
      sum += amplitudes.get(k)[0] * rotation.cosine() - amplitudes.get(k)[1] * rotation.sine();
    }
    return sum;
  }
}
