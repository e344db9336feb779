package turnsheet.core.measure;

import turnsheet.core.dsp.FineValues;
import turnsheet.core.dsp.QuasiPeakDetector;
import turnsheet.core.stats.MagnitudeHistogram;

/** Reads the weighted fluctuation as a meter does, sample by sample. One use. */
final class Meter {

  /** What the two-sigma and the quasi-peak value exceed for 5 % of the time. */
  private static final double SHARE = 0.95;

  private final FineValues fine;
  private final QuasiPeakDetector detector;
  private final double[] values;
  private double indicated;

  private Meter(FineValues fine, double rateHertz) {
    this.fine = fine;
    detector = new QuasiPeakDetector(rateHertz * fine.perSample());
    values = new double[fine.perSample()];
  }

  /** Fills up between samples, so that crests are found. */
  static Meter between(double rateHertz) {
    return new Meter(FineValues.at(rateHertz), rateHertz);
  }

  /** As quick and as late, but reads samples only: enough to tell one stretch from the next. */
  static Meter ofSamples(double rateHertz) {
    return new Meter(FineValues.none(), rateHertz);
  }

  /** Samples that the values lie behind the latest one. */
  int delaySamples() {
    return fine.delaySamples();
  }

  void next(double sample) {
    fine.add(sample);
    for (int p = 0; p < values.length; p++) {
      values[p] = fine.value(p);
      indicated = detector.next(values[p]);
    }
  }

  /** The sample {@link #delaySamples} ago and the values between it and the next. */
  double[] values() {
    return values;
  }

  double indicated() {
    return indicated;
  }

  void tell(Tally tally) {
    for (double value : values) {
      tally.magnitude.add(value);
    }
    tally.indicated.add(indicated);
    tally.squares += values[0] * values[0];
    tally.samples++;
  }

  /** What was read over a stretch. */
  static final class Tally {
    private final MagnitudeHistogram magnitude = new MagnitudeHistogram();
    private final MagnitudeHistogram indicated = new MagnitudeHistogram();
    private double squares;
    private long samples;

    long samples() {
      return samples;
    }

    void add(Tally other) {
      magnitude.add(other.magnitude);
      indicated.add(other.indicated);
      squares += other.squares;
      samples += other.samples;
    }

    /** Two-sigma, quasi-peak and root mean square. */
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
}
