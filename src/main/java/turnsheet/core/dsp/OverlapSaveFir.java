package turnsheet.core.dsp;

/**
 * Long real filter through the transform, block by block. The stream before the first sample is
 * taken as zero. Bits do not depend on how the stream is cut.
 *
 * <p>Shape: as many samples out as in; sample k out is the sum of {@code taps[i] * in[k - i]}. What
 * {@link #process} still holds back comes with {@link #finish}.
 *
 * <p>Source: the overlap-save method, A. V. Oppenheim and R. W. Schafer, "Discrete-time signal
 * processing".
 */
public final class OverlapSaveFir {

  private final Fft fft;
  private final double[] response;
  private final double[] history;
  private final double[] work;
  private final int overlap;
  private int filled;

  public OverlapSaveFir(double[] taps) {
    overlap = taps.length - 1;
    fft = new Fft(Fft.lengthFor(Math.max(1024, 4 * taps.length)));
    response = new double[fft.length()];
    System.arraycopy(taps, 0, response, 0, taps.length);
    fft.real(response);
    history = new double[fft.length()];
    work = new double[fft.length()];
    filled = overlap;
  }

  /** How many samples {@link #process} or {@link #finish} may write for a number read. */
  public int roomFor(int count) {
    return count + fft.length();
  }

  /**
   * Filters samples.
   *
   * @param in read from index 0, left alone
   * @param out written from index 0; {@link #roomFor} says how long it must be
   * @return how many were written
   */
  public int process(double[] in, int count, double[] out) {
    int written = 0;
    int read = 0;
    while (read < count) {
      int part = Math.min(count - read, history.length - filled);
      System.arraycopy(in, read, history, filled, part);
      filled += part;
      read += part;
      if (filled == history.length) {
        written = convolve(out, written, history.length - overlap);
        System.arraycopy(history, history.length - overlap, history, 0, overlap);
        filled = overlap;
      }
    }
    return written;
  }

  /** Writes what is left and forgets the stream. */
  public int finish(double[] out) {
    java.util.Arrays.fill(history, filled, history.length, 0);
    int written = convolve(out, 0, filled - overlap);
    java.util.Arrays.fill(history, 0);
    filled = overlap;
    return written;
  }

  private int convolve(double[] out, int at, int count) {
    System.arraycopy(history, 0, work, 0, work.length);
    fft.real(work);
    work[0] *= response[0];
    work[1] *= response[1];
    for (int k = 2; k < work.length; k += 2) {
      double re = work[k] * response[k] - work[k + 1] * response[k + 1];
      work[k + 1] = work[k] * response[k + 1] + work[k + 1] * response[k];
      work[k] = re;
    }
    fft.realInverse(work);
    System.arraycopy(work, overlap, out, at, count);
    return at + count;
  }
}
