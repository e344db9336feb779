package turnsheet.core.dsp;

/**
 * Follows the frequency of a tone: the recording is shifted by the expected frequency, cut to the
 * band around it, and the phase of the complex signal that is left is differenced.
 *
 * <p>Shape: {@link #process} takes samples of the recording and leaves baseband values (amplitude
 * and phase step) at {@link ToneBand#phaseRateHertz}. The caller passes the steps, mended where it
 * sees fit, to a {@link SpeedSmoother}.
 *
 * <p>The first filter is a band pass made of complex taps, so that the shift costs nothing at the
 * rate of the recording; it is exact, the filter of a shifted signal being the shift of a filtered
 * one.
 */
public final class ToneDemodulator {

  private static final int BLOCK = 8192;

  private final FirDecimator first;
  private final FirDecimator secondRe;
  private final FirDecimator secondIm;
  private final Rotation rotation;
  private final double delaySeconds;
  private final double[][] mid;
  private final double[] re;
  private final double[] im;

  public ToneDemodulator(ToneBand band) {
    double[] shape =
        band.firstFactor() == 1
            ? new double[] {1}
            : KaiserFir.lowPass(
                band.passHertz(),
                band.firstStopHertz(),
                ToneBand.ATTENUATION_DB,
                band.sampleRateHertz());
    double turnsPerSample = band.toneHertz() / band.sampleRateHertz();
    double[] cosine = new double[shape.length];
    double[] sine = new double[shape.length];
    for (int i = 0; i < shape.length; i++) {
      double angle = 2 * Math.PI * fraction(turnsPerSample * (i - shape.length / 2));
      // twice, so that the result has the amplitude of the tone
      cosine[i] = 2 * shape[i] * StrictMath.cos(angle);
      sine[i] = -2 * shape[i] * StrictMath.sin(angle);
    }
    first = new FirDecimator(new double[][] {cosine, sine}, band.firstFactor());
    rotation = new Rotation(0, turnsPerSample * band.firstFactor());
    double[] taps =
        KaiserFir.lowPass(
            band.passHertz(), band.stopHertz(), ToneBand.ATTENUATION_DB, band.firstRateHertz());
    secondRe = new FirDecimator(taps, band.secondFactor());
    secondIm = new FirDecimator(taps, band.secondFactor());
    delaySeconds =
        first.delaySamples() / band.sampleRateHertz()
            + secondRe.delaySamples() / band.firstRateHertz();
    mid = new double[2][first.roomFor(BLOCK)];
    re = new double[secondRe.roomFor(mid[0].length)];
    im = new double[re.length];
  }

  /** Most samples that {@link #process} takes at once. */
  public static int blockSamples() {
    return BLOCK;
  }

  /** Time of the first baseband value. */
  public double delaySeconds() {
    return delaySeconds;
  }

  /**
   * Takes samples.
   *
   * @param in read from index 0, left alone
   * @return how many baseband values {@link #re} and {@link #im} now hold
   */
  public int process(double[] in, int samples) {
    int n = first.process(in, samples, mid);
    double[] midRe = mid[0];
    double[] midIm = mid[1];
    turn(midRe, midIm, n);
    int count = secondRe.process(midRe, n, re);
    secondIm.process(midIm, n, im);
    return count;
  }

  private void turn(double[] midRe, double[] midIm, int n) {
    for (int i = 0; i < n; i++) {
      rotation.advance();
      double c = rotation.cosine();
      double s = rotation.sine();
      double x = midRe[i];
      midRe[i] = x * c + midIm[i] * s;
      midIm[i] = midIm[i] * c - x * s;
    }
  }

  /** Real parts of the latest values; valid up to the next {@link #process}. */
  public double[] re() {
    return re;
  }

  /** Imaginary parts of the latest values; valid up to the next {@link #process}. */
  public double[] im() {
    return im;
  }

  private static double fraction(double turns) {
    return turns - Math.floor(turns);
  }
}
