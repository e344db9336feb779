package turnsheet.core.dsp;

/**
 * Discrete Fourier transform of a fixed power-of-two length, forward without scaling, inverse with
 * 1/n. Runs on the calling thread, so that the bits do not depend on the number of processors. One
 * thread at a time.
 *
 * <p>Source: a real transform is a complex one of half the length, its even values taken as real
 * and its odd ones as imaginary parts, and a step that parts the two, A. V. Oppenheim and R. W.
 * Schafer, "Discrete-time signal processing".
 */
public final class Fft {

  private final int length;
  private final SplitRadix transform;
  private double[] spare = new double[0];

  public Fft(int length) {
    if (length < 2 || Integer.bitCount(length) != 1) {
      throw new IllegalArgumentException("length " + length + " is no power of two");
    }
    this.length = length;
    this.transform = new SplitRadix(Integer.numberOfTrailingZeros(length));
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
    double[] z = spare(length);
    half(data, z);
    data[0] = z[0] + z[1];
    data[1] = z[0] - z[1];
    if (length >= 4) {
      data[length / 2] = z[length / 2];
      data[length / 2 + 1] = -z[length / 2 + 1];
    }
    part(z, data, transform.longestRoots(), length);
  }

  /** Bins from the transform of pairs: even and odd values, the odd ones turned. */
  private static void part(double[] z, double[] data, double[] w, int length) {
    for (int k = 2, m = length - 2; k < m; k += 2, m -= 2) {
      double evenRe = 0.5 * (z[k] + z[m]);
      double evenIm = 0.5 * (z[k + 1] - z[m + 1]);
      double oddRe = 0.5 * (z[k + 1] + z[m + 1]);
      double oddIm = 0.5 * (z[m] - z[k]);
      double re = oddRe * w[k] - oddIm * w[k + 1];
      double im = oddRe * w[k + 1] + oddIm * w[k];
      data[k] = evenRe + re;
      data[k + 1] = evenIm + im;
      data[m] = evenRe - re;
      data[m + 1] = im - evenIm;
    }
  }

  /** Undoes {@link #real}. */
  public void realInverse(double[] data) {
    double first = data[0];
    data[0] = 0.5 * (first + data[1]);
    data[1] = 0.5 * (first - data[1]);
    if (length >= 4) {
      data[length / 2 + 1] = -data[length / 2 + 1];
    }
    unite(data, transform.longestRoots(), length);
    swap(data, data, length, 1);
    double[] z = spare(length);
    half(data, z);
    swap(z, data, length, 2.0 / length);
  }

  /** The transform of pairs from bins: undoes {@link #part}. */
  private static void unite(double[] data, double[] w, int length) {
    for (int k = 2, m = length - 2; k < m; k += 2, m -= 2) {
      double evenRe = 0.5 * (data[k] + data[m]);
      double evenIm = 0.5 * (data[k + 1] - data[m + 1]);
      double re = 0.5 * (data[k] - data[m]);
      double im = 0.5 * (data[k + 1] + data[m + 1]);
      double oddRe = re * w[k] + im * w[k + 1];
      double oddIm = im * w[k] - re * w[k + 1];
      data[k] = evenRe - oddIm;
      data[k + 1] = evenIm + oddRe;
      data[m] = evenRe + oddIm;
      data[m + 1] = oddRe - evenIm;
    }
  }

  /** Real and imaginary parts changed over: a forward transform between two of these goes back. */
  private static void swap(double[] from, double[] to, int length, double scale) {
    for (int k = 0; k < length; k += 2) {
      double re = from[k];
      to[k] = from[k + 1] * scale;
      to[k + 1] = re * scale;
    }
  }

  /** Transforms n complex values in place, real and imaginary parts alternating. */
  public void complex(double[] data) {
    double[] z = spare(2 * length);
    transform.transform(length, data, z);
    System.arraycopy(z, 0, data, 0, z.length);
  }

  private void half(double[] data, double[] z) {
    if (length == 2) {
      z[0] = data[0];
      z[1] = data[1];
    } else {
      transform.transform(length / 2, data, z);
    }
  }

  private double[] spare(int needed) {
    if (spare.length != needed) {
      spare = new double[needed];
    }
    return spare;
  }
}
