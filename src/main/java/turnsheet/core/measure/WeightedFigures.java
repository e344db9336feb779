package turnsheet.core.measure;

import java.util.ArrayList;
import java.util.List;
import turnsheet.core.dsp.FineValues;
import turnsheet.core.dsp.OverlapSaveFir;
import turnsheet.core.dsp.QuasiPeakDetector;
import turnsheet.core.dsp.Weighting;
import turnsheet.core.stats.MagnitudeBlocks;
import turnsheet.core.stats.MagnitudeHistogram;

/**
 * The readings of a flutter meter: the weighted fluctuation's two-sigma value, quasi-peak value and
 * root mean square. docs/interpretation.md says how each is read over a capture.
 */
final class WeightedFigures {

  private static final int BLOCK = 8192;
  private static final double SHARE = 0.95;
  private static final double SETTLING_SECONDS = 2;
  private static final double SETTLING_SHARE = 0.2;

  /** Long against the memory of the weighting above 0.4 Hz, short against the usual minute. */
  private static final double RESAMPLED_SECONDS = 2.5;

  private static final int MOST_RESAMPLED = 60;

  private final double rateHertz;
  private final double[] response;
  private final Tally whole = new Tally();
  private final Tally block = new Tally();
  private final List<double[]> blocks = new ArrayList<>();
  private final long blockSamples;
  private final MagnitudeBlocks.Collector fluctuation;
  private final MagnitudeBlocks.Collector indication;

  private static final class Tally {
    final MagnitudeHistogram magnitude = new MagnitudeHistogram();
    final MagnitudeHistogram indicated = new MagnitudeHistogram();
    double squares;
    long samples;

    void add(double weighted, double indication) {
      indicated.add(indication);
      squares += weighted * weighted;
      samples++;
    }

    double[] readings() {
      return new double[] {
        magnitude.quantile(SHARE), indicated.quantile(SHARE), Math.sqrt(squares / samples)
      };
    }

    void clear() {
      magnitude.clear();
      indicated.clear();
      squares = 0;
      samples = 0;
    }
  }

  WeightedFigures(Residual residual) {
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
    fluctuation =
        new MagnitudeBlocks.Collector(resampled * new FineValues(rateHertz).perSample());
    indication = new MagnitudeBlocks.Collector(resampled);
    for (CleanTrace.Piece piece : residual.clean().pieces()) {
      run(residual, piece);
    }
  }

  private int settling(CleanTrace.Piece piece) {
    return (int) Math.ceil(Math.min(SETTLING_SECONDS * rateHertz, SETTLING_SHARE * piece.length()));
  }

  /** The filter is run in on the piece mirrored at its own beginning. */
  private void run(Residual residual, CleanTrace.Piece piece) {
    OverlapSaveFir filter = new OverlapSaveFir(response);
    FineValues fine = new FineValues(rateHertz);
    QuasiPeakDetector detector = new QuasiPeakDetector(rateHertz * fine.perSample());
    double[] in = new double[BLOCK];
    double[] out = new double[filter.roomFor(BLOCK)];
    int mirrored = Math.min(response.length, piece.length() - 1);
    long at = (long) piece.from() - mirrored;
    for (int left = mirrored; left > 0; ) {
      int part = Math.min(BLOCK, left);
      residual.copyBackwards(piece.from() + left, in, part);
      at = take(residual.clean(), piece, at, out, filter.process(in, part, out), fine, detector);
      left -= part;
    }
    for (int from = piece.from(); from < piece.to(); from += BLOCK) {
      int part = Math.min(BLOCK, piece.to() - from);
      residual.copy(from, in, part);
      at = take(residual.clean(), piece, at, out, filter.process(in, part, out), fine, detector);
    }
    take(residual.clean(), piece, at, out, filter.finish(out), fine, detector);
  }

  private long take(
      CleanTrace clean,
      CleanTrace.Piece piece,
      long at,
      double[] out,
      int count,
      FineValues fine,
      QuasiPeakDetector detector) {
    int settled = piece.from() + settling(piece);
    for (int i = 0; i < count; i++) {
      fine.add(out[i]);
      long index = at + i - fine.delaySamples();
      boolean counts = index >= settled && clean.usable((int) index);
      double indicated = 0;
      for (int p = 0; p < fine.perSample(); p++) {
        double value = fine.value(p);
        indicated = detector.next(value);
        if (counts) {
          whole.magnitude.add(value);
          block.magnitude.add(value);
          fluctuation.add(value);
        }
      }
      if (counts) {
        whole.add(fine.value(0), indicated);
        block.add(fine.value(0), indicated);
        indication.add(indicated);
        if (block.samples >= blockSamples) {
          blocks.add(block.readings());
          block.clear();
        }
      }
    }
    return at + count;
  }

  /** One reading with the standard uncertainty that the limited length leaves. */
  record Value(double percent, double lengthUncertaintyPercent) {}

  double settledSeconds() {
    return whole.samples / rateHertz;
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

  private Value value(int which) {
    double mean = 0;
    for (double[] b : blocks) {
      mean += b[which] / blocks.size();
    }
    double squares = 0;
    for (double[] b : blocks) {
      squares += (b[which] - mean) * (b[which] - mean);
    }
    double n = blocks.size();
    return new Value(whole.readings()[which], n < 2 ? 0 : Math.sqrt(squares / (n - 1) / n));
  }
}
