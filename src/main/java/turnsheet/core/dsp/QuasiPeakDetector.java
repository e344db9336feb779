package turnsheet.core.dsp;

/**
 * The indicator of a meter that reads peaks: it rises fast, falls slowly and hardly answers to a
 * single short burst. Fed with the weighted signal; reads half of the peak-to-peak value.
 *
 * <p>Source: the dynamics of AES6 / IEC 60386 (indications for 10, 30, 60 and 100 ms pulses and the
 * fall between them). The structure (a detector for either polarity, half their sum, an indicator
 * that lags) and its time constants are our own fit to that table; calibrated so that a steady 4 Hz
 * sine of peak A reads A at the crest of the indicator.
 */
public final class QuasiPeakDetector {

  private static final double CHARGE_SECONDS = 0.022;
  private static final double DISCHARGE_SECONDS = 0.54;
  private static final double INDICATOR_SECONDS = 0.16;
  private static final double REFERENCE_HERTZ = 4;

  /** Between samples the signal is taken as straight, so that slow traces read the same. */
  private static final double LONGEST_STEP_SECONDS = 0.0005;

  private static final double CALIBRATION_SECONDS = 6;

  private final int substeps;
  private final double substepShare;
  private final double charge;
  private final double discharge;
  private final double lag;
  private final double scale;
  private double last;
  private double positive;
  private double negative;
  private double indicator;

  public QuasiPeakDetector(double rateHertz) {
    this(rateHertz, 1 / rawReadingOfReference(rateHertz));
  }

  private QuasiPeakDetector(double rateHertz, double scale) {
    this.substeps = (int) Math.ceil(1 / (rateHertz * LONGEST_STEP_SECONDS));
    this.substepShare = 1.0 / substeps;
    double step = substepShare / rateHertz;
    this.charge = 1 - StrictMath.exp(-step / CHARGE_SECONDS);
    this.discharge = StrictMath.exp(-step / DISCHARGE_SECONDS);
    this.lag = 1 - StrictMath.exp(-step / INDICATOR_SECONDS);
    this.scale = scale;
  }

  /** Time after which the reading no longer depends on how the signal began. */
  public static double settlingSeconds() {
    return 2 * DISCHARGE_SECONDS;
  }

  /** Takes the next sample and tells what the indicator shows. */
  public double next(double weighted) {
    double part = (weighted - last) * substepShare;
    double x = last;
    for (int s = 1; s < substeps; s++) {
      x += part;
      step(x);
    }
    step(weighted);
    last = weighted;
    return indicator * scale;
  }

  private void step(double x) {
    double p = positive;
    double n = negative;
    p = x > p ? p + charge * (x - p) : p * discharge;
    n = -x > n ? n + charge * (-x - n) : n * discharge;
    indicator += lag * ((p + n) / 2 - indicator);
    positive = p;
    negative = n;
  }

  private static double rawReadingOfReference(double rateHertz) {
    QuasiPeakDetector raw = new QuasiPeakDetector(rateHertz, 1);
    int samples = (int) Math.ceil(CALIBRATION_SECONDS * rateHertz);
    int lastPeriod = samples - (int) Math.ceil(rateHertz / REFERENCE_HERTZ);
    double crest = 0;
    for (int i = 0; i < samples; i++) {
      double r = raw.next(StrictMath.sin(2 * Math.PI * REFERENCE_HERTZ * i / rateHertz));
      if (i >= lastPeriod) {
        crest = Math.max(crest, r);
      }
    }
    return crest;
  }
}
