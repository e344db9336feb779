package turnsheet.core.measure;

import java.util.Locale;
import java.util.Optional;
import turnsheet.core.format.api.Recognised;
import turnsheet.core.signal.Rejection;

/**
 * Whether a recording can be measured in the memory that there is. Told before it is read: a
 * service that runs out of memory takes everything else that it does with it.
 */
public final class HeapNeed {

  /** The speed trace: up to 2000 values per second of four bytes each, and room to grow it. */
  private static final double BYTES_PER_SECOND = 2000 * 4 * 1.5;

  /** The service itself and what a measurement needs beside the trace. */
  private static final long BESIDE_BYTES = 60L << 20;

  /** What each channel measured beside the first needs for its blocks and tables. */
  private static final long CHANNEL_BYTES = 12L << 20;

  private HeapNeed() {}

  /**
   * How many channels of a recording can be measured at the same time. One after the other needs no
   * more than one alone.
   *
   * @param heapBytes the most that the virtual machine may take
   * @param most what is wanted, at least 1
   * @return 1 to {@code most}; {@code most} where the file does not tell its length
   */
  public static int channelsAtOnce(Recognised recognised, long heapBytes, int most) {
    Double rate = recognised.sampleRateHertz();
    Long frames = recognised.frames();
    if (rate == null || frames == null) {
      return most;
    }
    double further = frames / rate * BYTES_PER_SECOND + CHANNEL_BYTES;
    double left = heapBytes - BESIDE_BYTES + CHANNEL_BYTES;
    return (int) Math.max(1, Math.min(most, Math.floor(left / further)));
  }

  /**
   * Why it cannot.
   *
   * @param heapBytes the most that the virtual machine may take
   * @return empty where it fits, or where the file does not tell its length
   */
  public static Optional<Rejection> refusal(Recognised recognised, long heapBytes) {
    Double rate = recognised.sampleRateHertz();
    Long frames = recognised.frames();
    if (rate == null || frames == null) {
      return Optional.empty();
    }
    double seconds = frames / rate;
    double needed = seconds * BYTES_PER_SECOND + BESIDE_BYTES;
    return needed <= heapBytes
        ? Optional.empty()
        : Optional.of(
            new Rejection(
                "tooLongForMemory",
                String.format(
                    Locale.ROOT,
                    "The recording lasts %.1f h and needs some %.0f MB of memory to be measured,"
                        + " where the service has %.0f MB: cut it to a shorter stretch, or give the"
                        + " service more (java -Xmx).",
                    seconds / 3600,
                    needed / 1e6,
                    heapBytes / 1e6)));
  }
}
