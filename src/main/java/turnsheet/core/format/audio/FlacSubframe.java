package turnsheet.core.format.audio;

import java.io.IOException;
import java.util.Arrays;

/**
 * Decodes one channel of one FLAC frame. All sums run in 64 bits, so that no legal stream
 * overflows.
 *
 * <p>Source: RFC 9639, section 9.2.
 */
final class FlacSubframe {

  private static final int LARGEST_ORDER = 32;

  private final FlacBits bits;
  private final long[] coefficients = new long[LARGEST_ORDER];

  FlacSubframe(FlacBits bits) {
    this.bits = bits;
  }

  /**
   * Decodes {@code count} samples.
   *
   * @param depth bits of a sample, one more than the stream's for a side channel
   */
  void read(long[] out, int count, int depth) throws IOException, FlacDamage {
    int head = (int) bits.unsigned(8);
    int wasted = (head & 1) == 0 ? 0 : bits.unary() + 1;
    int type = head >>> 1;
    int width = depth - wasted;
    if (type > 63 || width < 1) {
      throw new FlacDamage("a channel header uses reserved values");
    }
    if (type == 0) {
      Arrays.fill(out, 0, count, bits.signed(width));
    } else if (type == 1) {
      plain(out, 0, count, width);
    } else if (type >= 8 && type <= 12) {
      fixed(out, count, width, type - 8);
    } else if (type >= 32) {
      linear(out, count, width, type - 31);
    } else {
      throw new FlacDamage("a channel header uses reserved values");
    }
    if (wasted > 0) {
      for (int i = 0; i < count; i++) {
        out[i] <<= wasted;
      }
    }
  }

  private void plain(long[] out, int from, int to, int width) throws IOException {
    for (int i = from; i < to; i++) {
      out[i] = bits.signed(width);
    }
  }

  private void warmUp(long[] out, int count, int width, int order) throws IOException, FlacDamage {
    if (order > count) {
      throw new FlacDamage("a predictor is longer than its block");
    }
    plain(out, 0, order, width);
  }

  private void fixed(long[] out, int count, int width, int order) throws IOException, FlacDamage {
    warmUp(out, count, width, order);
    residual(out, count, order);
    switch (order) {
      case 1 -> {
        for (int i = 1; i < count; i++) {
          out[i] += out[i - 1];
        }
      }
      case 2 -> {
        for (int i = 2; i < count; i++) {
          out[i] += 2 * out[i - 1] - out[i - 2];
        }
      }
      case 3 -> {
        for (int i = 3; i < count; i++) {
          out[i] += 3 * (out[i - 1] - out[i - 2]) + out[i - 3];
        }
      }
      case 4 -> {
        for (int i = 4; i < count; i++) {
          out[i] += 4 * (out[i - 1] + out[i - 3]) - 6 * out[i - 2] - out[i - 4];
        }
      }
      default -> {}
    }
  }

  private void linear(long[] out, int count, int width, int order) throws IOException, FlacDamage {
    warmUp(out, count, width, order);
    int precision = (int) bits.unsigned(4) + 1;
    int shift = (int) bits.signed(5);
    if (precision == 16 || shift < 0) {
      throw new FlacDamage("a predictor uses reserved values");
    }
    for (int i = 0; i < order; i++) {
      coefficients[i] = bits.signed(precision);
    }
    residual(out, count, order);
    for (int i = order; i < count; i++) {
      long sum = 0;
      for (int j = 0; j < order; j++) {
        sum += coefficients[j] * out[i - 1 - j];
      }
      out[i] += sum >> shift;
    }
  }

  private void residual(long[] out, int count, int order) throws IOException, FlacDamage {
    int method = (int) bits.unsigned(2);
    if (method > 1) {
      throw new FlacDamage("a residual uses reserved values");
    }
    int parameterBits = 4 + method;
    int escape = (1 << parameterBits) - 1;
    int partitionOrder = (int) bits.unsigned(4);
    int partition = count >>> partitionOrder;
    if (partition << partitionOrder != count || partition < order) {
      throw new FlacDamage("a block cannot be cut into the announced partitions");
    }
    int from = order;
    for (int end = partition; end <= count; end += partition) {
      int parameter = (int) bits.unsigned(parameterBits);
      if (parameter < escape) {
        bits.rice(out, from, end, parameter);
      } else {
        plain(out, from, end, (int) bits.unsigned(5));
      }
      from = end;
    }
  }
}
