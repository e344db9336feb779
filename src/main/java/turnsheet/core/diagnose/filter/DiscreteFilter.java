package turnsheet.core.diagnose.filter;

import java.util.List;

/**
 * An analogue filter carried over to samples by the bilinear transform, each side warped so that
 * its cutoff stays where it is.
 *
 * <p>Error: at the cutoff none but rounding. Elsewhere the response at f is the analogue one at
 * {@code fc tan(pi f / fs) / tan(pi fc / fs)}: below a tenth of the sample rate, with the cutoff
 * there too, frequencies are at most 3.4 % off; above it a low-pass falls ever too fast, to nothing
 * at half the sample rate.
 *
 * <p>Source: A. V. Oppenheim and R. W. Schafer, "Discrete-time signal processing", chapter on
 * filter design. One stream per object.
 */
public final class DiscreteFilter {

  /** Cutoffs above this share of the sample rate are refused. */
  public static final double HIGHEST_SHARE = 0.45;

  /** The transient of the start is left out until it has fallen by e to this power: 87 dB. */
  private static final double SETTLED = 10;

  private final List<Stage> stages;
  private final double rateHertz;

  // coefficients and states of all stages, one after the other
  private final double[] b0;
  private final double[] b1;
  private final double[] b2;
  private final double[] a1;
  private final double[] a2;
  private final double[] s1;
  private final double[] s2;

  /**
   * Coefficients of one stage, the first of the denominator being 1.
   *
   * @param decaySeconds in which its transient falls by e
   */
  record Stage(double b0, double b1, double b2, double a1, double a2, double decaySeconds) {

    static Stage of(Section section, double cutoffHertz, double rateHertz) {
      if (!(cutoffHertz <= HIGHEST_SHARE * rateHertz)) {
        throw new IllegalArgumentException(
            "cutoff " + cutoffHertz + " Hz at " + rateHertz + " samples per second");
      }
      double w = StrictMath.tan(Math.PI * cutoffHertz / rateHertz) * (section.f0Hz() / cutoffHertz);
      double a0 = 1 + w / section.q() + w * w;
      double gain = (section.highPass() ? 1 : w * w) / a0;
      return new Stage(
          gain,
          section.highPass() ? -2 * gain : 2 * gain,
          gain,
          2 * (w * w - 1) / a0,
          (1 - w / section.q() + w * w) / a0,
          // below Q of one half the slower of two real poles, never met here
          2 * section.q() / (2 * Math.PI * section.f0Hz()));
    }
  }

  DiscreteFilter(List<Stage> stages, double rateHertz) {
    this.stages = List.copyOf(stages);
    this.rateHertz = rateHertz;
    int n = stages.size();
    b0 = stages.stream().mapToDouble(Stage::b0).toArray();
    b1 = stages.stream().mapToDouble(Stage::b1).toArray();
    b2 = stages.stream().mapToDouble(Stage::b2).toArray();
    a1 = stages.stream().mapToDouble(Stage::a1).toArray();
    a2 = stages.stream().mapToDouble(Stage::a2).toArray();
    s1 = new double[n];
    s2 = new double[n];
  }

  /** A filter that changes nothing. */
  public static DiscreteFilter none(double rateHertz) {
    return new DiscreteFilter(List.of(), rateHertz);
  }

  /** Begins as if a level had stood at the input for ever. */
  public void settleAt(double level) {
    double x = level;
    for (int k = 0; k < b0.length; k++) {
      double y = x * (b0[k] + b1[k] + b2[k]) / (1 + a1[k] + a2[k]);
      s2[k] = b2[k] * x - a2[k] * y;
      s1[k] = b1[k] * x - a1[k] * y + s2[k];
      x = y;
    }
  }

  /** How long after its start the output still carries its transient. */
  public double settleSeconds() {
    return SETTLED * stages.stream().mapToDouble(Stage::decaySeconds).max().orElse(0);
  }

  /** Filters samples in place. */
  public void process(double[] samples, int count) {
    for (int k = 0; k < b0.length; k++) {
      stage(k, samples, count);
    }
  }

  /** Direct form II transposed. */
  private void stage(int k, double[] samples, int count) {
    double c0 = b0[k];
    double c1 = b1[k];
    double c2 = b2[k];
    double d1 = a1[k];
    double d2 = a2[k];
    double p = s1[k];
    double q = s2[k];
    for (int i = 0; i < count; i++) {
      double x = samples[i];
      double y = c0 * x + p;
      p = c1 * x - d1 * y + q;
      q = c2 * x - d2 * y;
      samples[i] = y;
    }
    s1[k] = p;
    s2[k] = q;
  }

  /** Response at a frequency from 0 to half the sample rate. */
  Complex response(double hertz) {
    double w = 2 * Math.PI * hertz / rateHertz;
    Complex z1 = new Complex(Math.cos(w), -Math.sin(w));
    Complex z2 = z1.times(z1);
    Complex all = Complex.ONE;
    for (Stage s : stages) {
      Complex above = new Complex(s.b0, 0).plus(z1.times(s.b1)).plus(z2.times(s.b2));
      Complex below = Complex.ONE.plus(z1.times(s.a1)).plus(z2.times(s.a2));
      all = all.times(above.over(below));
    }
    return all;
  }

  /** Gain in dB. */
  public double gainDb(double hertz) {
    return 20 * Math.log10(response(hertz).magnitude());
  }

  /** Group delay in seconds at a frequency above 0. */
  public double groupDelaySeconds(double hertz) {
    double w = 2 * Math.PI * hertz / rateHertz;
    Complex z1 = new Complex(Math.cos(w), -Math.sin(w));
    Complex z2 = z1.times(z1);
    double samples = 0;
    for (Stage s : stages) {
      Complex above = new Complex(s.b0, 0).plus(z1.times(s.b1)).plus(z2.times(s.b2));
      Complex below = Complex.ONE.plus(z1.times(s.a1)).plus(z2.times(s.a2));
      samples += z1.times(s.b1).plus(z2.times(2 * s.b2)).over(above).re();
      samples -= z1.times(s.a1).plus(z2.times(2 * s.a2)).over(below).re();
    }
    return samples / rateHertz;
  }
}
