package turnsheet.core.format.audio;

import java.io.Closeable;
import java.io.EOFException;
import java.io.IOException;
import java.io.InputStream;
import java.lang.invoke.MethodHandles;
import java.lang.invoke.VarHandle;
import java.nio.ByteOrder;

/**
 * Bits of a FLAC stream, most significant first, with the check sum of the bytes passed since a
 * mark. One buffer of fixed size.
 */
final class FlacBits implements Closeable {

  private static final int BUFFER_BYTES = 128 * 1024;

  /** A sane encoder escapes long before; beyond it, runs of zeros would only burn time. */
  private static final int LONGEST_UNARY = 1 << 24;

  private static final VarHandle LONG =
      MethodHandles.byteArrayViewVarHandle(long[].class, ByteOrder.BIG_ENDIAN);

  private final InputStream in;
  private final byte[] buffer = new byte[BUFFER_BYTES];
  private int next;
  private int limit;

  /**
   * The upcoming bits from the top; below the valid ones it may hold the start of further bytes.
   */
  private long cache;

  private int cached;
  private int crcFrom;
  private int crc16;
  private boolean ended;

  FlacBits(InputStream in) {
    this.in = in;
  }

  /** Reads 0 to 32 bits as an unsigned number. */
  long unsigned(int bits) throws IOException {
    if (bits == 0) {
      return 0;
    }
    need(bits);
    long value = cache >>> (64 - bits);
    cache <<= bits;
    cached -= bits;
    return value;
  }

  /** Reads 0 to 33 bits as a two's complement number. */
  long signed(int bits) throws IOException {
    if (bits == 0) {
      return 0;
    }
    need(bits);
    long value = cache >> (64 - bits);
    cache <<= bits;
    cached -= bits;
    return value;
  }

  /** Counts zeros up to the next one bit, which is passed as well. */
  int unary() throws IOException, FlacDamage {
    int zeros = 0;
    while (true) {
      if (cached == 0) {
        need(1);
      }
      int run = Long.numberOfLeadingZeros(cache);
      if (run < cached) {
        // two steps, because a shift by 64 would do nothing
        cache = cache << run << 1;
        cached -= run + 1;
        return zeros + run;
      }
      zeros += cached;
      cache = 0;
      cached = 0;
      if (zeros > LONGEST_UNARY) {
        throw new FlacDamage("a run of zero bits does not end");
      }
    }
  }

  /**
   * Reads Rice-coded numbers.
   *
   * @param parameter number of low bits, 0 to 30
   */
  void rice(long[] into, int from, int to, int parameter) throws IOException, FlacDamage {
    for (int i = from; i < to; i++) {
      long quotient = unary();
      long folded = quotient << parameter | unsigned(parameter);
      into[i] = folded >>> 1 ^ -(folded & 1);
    }
  }

  void alignToByte() {
    int drop = cached & 7;
    cache <<= drop;
    cached -= drop;
  }

  boolean atEnd() throws IOException {
    if (cached < 8) {
      load();
    }
    return cached < 8;
  }

  /** The next whole byte without passing it; the end must have been ruled out. */
  int peekByte() {
    return (int) (cache >>> 56);
  }

  /** Starts the check sum at the current byte. */
  void mark() {
    crcFrom = next - (cached >>> 3);
    crc16 = 0;
  }

  /** CRC-16 of the bytes from the mark to here. */
  int crc16() {
    int to = next - (cached >>> 3);
    crc16 = FlacCrc.crc16(crc16, buffer, crcFrom, to);
    crcFrom = to;
    return crc16;
  }

  private void need(int bits) throws IOException {
    if (cached < bits) {
      load();
      if (cached < bits) {
        throw new EOFException();
      }
    }
  }

  private void load() throws IOException {
    if (limit - next < 8 && !ended) {
      refill();
    }
    if (limit - next >= 8) {
      if (cached <= 56) {
        cache |= (long) LONG.get(buffer, next) >>> cached;
        int bytes = (64 - cached) >>> 3;
        next += bytes;
        cached += 8 * bytes;
      }
      return;
    }
    while (cached <= 56 && next < limit) {
      // what lies below the valid bits is dropped, since it would be added twice otherwise
      long valid = cached == 0 ? 0 : cache & -1L << (64 - cached);
      cache = valid | (buffer[next++] & 0xffL) << (56 - cached);
      cached += 8;
    }
  }

  private void refill() throws IOException {
    int unread = next - (cached >>> 3);
    crc16 = FlacCrc.crc16(crc16, buffer, crcFrom, unread);
    int kept = limit - unread;
    System.arraycopy(buffer, unread, buffer, 0, kept);
    next -= unread;
    crcFrom = 0;
    int got = in.readNBytes(buffer, kept, buffer.length - kept);
    limit = kept + got;
    ended = limit < buffer.length;
  }

  @Override
  public void close() throws IOException {
    in.close();
  }
}
