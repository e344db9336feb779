package turnsheet.core.measure;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import turnsheet.core.dsp.FineValues;
import turnsheet.core.dsp.OverlapSaveFir;
import turnsheet.core.dsp.Weighting;
import turnsheet.core.stats.MagnitudeBlocks;

/**
 * The readings of a flutter meter: the weighted fluctuation's two-sigma value, quasi-peak value and
 * root mean square. docs/interpretation.md says how each is read over a capture.
 */
final class WeightedFigures {

  private static final int BLOCK = 8192;
  private static final double SETTLING_SECONDS = 2;
  private static final double SETTLING_SHARE = 0.2;

  /** Long against the memory of the weighting above 0.4 Hz, short against the usual minute. */
  private static final double RESAMPLED_SECONDS = 2.5;

  private static final int MOST_RESAMPLED = 60;

  private final double rateHertz;
  private final double[] response;
  private final Meter.Tally whole = new Meter.Tally();
  private final Meter.Tally block = new Meter.Tally();
  private final List<double[]> blocks = new ArrayList<>();
  private final Meter.Tally lineBlock = new Meter.Tally();
  private final List<double[]> lineBlocks = new ArrayList<>();
  private final List<LineFinder.Found> found;
  private final long blockSamples;
  private final MagnitudeBlocks.Collector fluctuation;
  private final MagnitudeBlocks.Collector indication;

  /**
   * @param found lines in the one spectrum of the capture; none where it took more
   */
  WeightedFigures(Residual residual, List<LineFinder.Found> found) {
    this.found = found;
    rateHertz = residual.clean().rateHertz();
    response = Weighting.response(rateHertz);
    long settled = 0;
    for (CleanTrace.Piece piece : residual.clean().pieces()) {
      settled += piece.length() - settling(piece);
    }
    long count = Math.max(3, Math.min(12, (long) (settled / rateHertz)));
    blockSamples = Math.max(1, settled / count);
    long resampled =
        Math.max((long) Math.ceil(RESAMPLED_SECONDS * rateHertz), settled / MOST_RESAMPLED);
    fluctuation = new MagnitudeBlocks.Collector(resampled * FineValues.perSample(rateHertz));
    indication = new MagnitudeBlocks.Collector(resampled);
    for (CleanTrace.Piece piece : residual.clean().pieces()) {
      run(residual, piece);
    }
    whole.add(block);
  }

  private int settling(CleanTrace.Piece piece) {
    return (int) Math.ceil(Math.min(SETTLING_SECONDS * rateHertz, SETTLING_SHARE * piece.length()));
  }

  /** The filter is run in on the piece mirrored at its own beginning. */
  private void run(Residual residual, CleanTrace.Piece piece) {
    OverlapSaveFir filter = new OverlapSaveFir(response);
    Meter meter = Meter.between(rateHertz);
    double[] in = new double[BLOCK];
    double[] out = new double[filter.roomFor(BLOCK)];
    int mirrored = Math.min(response.length, piece.length() - 1);
    WeightedLines lines = WeightedLines.of(residual, found, response, mirrored);
    Meter lineMeter = Meter.ofSamples(rateHertz);
    long at = (long) piece.from() - mirrored;
    for (int left = mirrored; left > 0; ) {
      int part = Math.min(BLOCK, left);
      residual.copyBackwards(piece.from() + left, in, part);
      at =
          take(
              residual.clean(),
              piece,
              at,
              out,
              filter.process(in, part, out),
              meter,
              lines,
              lineMeter);
      left -= part;
    }
    for (int from = piece.from(); from < piece.to(); from += BLOCK) {
      int part = Math.min(BLOCK, piece.to() - from);
      residual.copy(from, in, part);
      at =
          take(
              residual.clean(),
              piece,
              at,
              out,
              filter.process(in, part, out),
              meter,
              lines,
              lineMeter);
    }
    take(residual.clean(), piece, at, out, filter.finish(out), meter, lines, lineMeter);
  }

  private long take(
      CleanTrace clean,
      CleanTrace.Piece piece,
      long at,
      double[] out,
      int count,
      Meter meter,
      WeightedLines lines,
      Meter lineMeter) {
    int settled = piece.from() + settling(piece);
    for (int i = 0; i < count; i++) {
      meter.next(out[i]);
      if (!lines.isEmpty()) {
        lineMeter.next(lines.next());
      }
      long index = at + i - meter.delaySamples();
      if (index >= settled && clean.usable((int) index)) {
        meter.tell(block);
        for (double value : meter.values()) {
          fluctuation.add(value);
        }
        indication.add(meter.indicated());
        if (!lines.isEmpty()) {
          lineMeter.tell(lineBlock);
        }
        if (block.samples() >= blockSamples) {
          blocks.add(block.readings());
          whole.add(block);
          block.clear();
          lineBlocks.add(lines.isEmpty() ? new double[3] : lineBlock.readings());
          lineBlock.clear();
        }
      }
    }
    return at + count;
  }

  /** One reading with the standard uncertainty that the limited length leaves. */
  record Value(double percent, double lengthUncertaintyPercent) {}

  double settledSeconds() {
    return whole.samples() / rateHertz;
  }

  /** The weighted fluctuation in blocks. */
  MagnitudeBlocks fluctuation() {
    return fluctuation.blocks();
  }

  /** The indicator's readings in blocks. */
  MagnitudeBlocks indication() {
    return indication.blocks();
  }

  Value twoSigma() {
    return value(0);
  }

  Value quasiPeak() {
    return value(1);
  }

  Value rms() {
    return value(2);
  }

  /**
   * The scatter of blocks has two parts. What is left when the readings of the lines alone are
   * taken off is chance and falls with the root of the number of blocks; few blocks tell it badly,
   * which Student's distribution allows for (JCGM 101:2008, 6.4.9, from memory). The readings of
   * the lines differ as blocks hold no whole turns: of that the whole capture keeps what one block
   * has, over its number of blocks.
   */
  private Value value(int which) {
    int n = blocks.size();
    double[] rest = new double[n];
    double[] lines = new double[n];
    for (int i = 0; i < n; i++) {
      lines[i] = lineBlocks.get(i)[which];
      rest[i] = blocks.get(i)[which] - lines[i];
    }
    double student = n > 3 ? Math.sqrt((n - 1.0) / (n - 3)) : 1;
    double chance = student * deviation(rest) / Math.sqrt(Math.max(1, n));
    boolean phases = which != 2 && found.size() > 1;
    double turns = deviation(lines) / (phases ? Math.sqrt(Math.max(1, n)) : Math.max(1, n));
    return new Value(whole.readings()[which], Math.hypot(chance, turns));
  }

  private static double deviation(double[] values) {
    double mean = Arrays.stream(values).average().orElse(0);
    double squares = Arrays.stream(values).map(v -> (v - mean) * (v - mean)).sum();
    return values.length < 2 ? 0 : Math.sqrt(squares / (values.length - 1));
  }
}
