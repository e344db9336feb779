package turnsheet.core.dsp;

import org.jtransforms.fft.DoubleFFT_1D;
import org.jtransforms.utils.CommonUtils;

/**
 * Discrete Fourier transform of a fixed power-of-two length, forward without scaling, inverse with
 * 1/n. Runs on the calling thread, so that the bits do not depend on the number of processors. One
 * thread at a time.
 */
public final class Fft {

  static {
    // the library would otherwise split long transforms over as many threads as the machine has
    CommonUtils.setThreadsBeginN_1D_FFT_2Threads(Long.MAX_VALUE);
    CommonUtils.setThreadsBeginN_1D_FFT_4Threads(Long.MAX_VALUE);
  }

  private final int length;
  private final DoubleFFT_1D transform;

  public Fft(int length) {
    if (length < 2 || Integer.bitCount(length) != 1) {
      throw new IllegalArgumentException("length " + length + " is no power of two");
    }
    this.length = length;
    this.transform = new DoubleFFT_1D(length);
  }

  /** The smallest permitted length that holds n values. */
  public static int lengthFor(int n) {
    return n <= 2 ? 2 : Integer.highestOneBit(n - 1) << 1;
  }

  public int length() {
    return length;
  }

  /**
   * Transforms real values in place.
   *
   * @param data n values in; out: {@code data[2k]} and {@code data[2k+1]} are the real and
   *     imaginary part of bin k, for k from 1 to n/2 - 1; {@code data[0]} is bin 0, {@code data[1]}
   *     is bin n/2
   */
  public void real(double[] data) {
    transform.realForward(data);
  }

  /** Undoes {@link #real}. */
  public void realInverse(double[] data) {
    transform.realInverse(data, true);
  }

  /** Transforms n complex values in place, real and imaginary parts alternating. */
  public void complex(double[] data) {
    transform.complexForward(data);
  }
}
