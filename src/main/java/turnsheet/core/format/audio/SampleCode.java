package turnsheet.core.format.audio;

import java.lang.invoke.MethodHandles;
import java.lang.invoke.VarHandle;
import java.nio.ByteOrder;

/**
 * How one sample lies in the bytes of a file. Integers narrower than their container are
 * left-justified in it, so that only the container's width matters; full scale becomes 1.
 */
enum SampleCode {
  U8(1, false),
  S8(1, false),
  S16_LITTLE(2, false),
  S16_BIG(2, false),
  S24_LITTLE(3, false),
  S24_BIG(3, false),
  S32_LITTLE(4, false),
  S32_BIG(4, false),
  /** 24 bits in the low three of four bytes, against the WAVE rule but written by some tools. */
  S24_LOW_OF_32_LITTLE(4, false),
  S24_LOW_OF_32_BIG(4, false),
  F32_LITTLE(4, true),
  F32_BIG(4, true),
  F64_LITTLE(8, true),
  F64_BIG(8, true);

  private final int bytes;
  private final boolean floating;

  SampleCode(int bytes, boolean floating) {
    this.bytes = bytes;
    this.floating = floating;
  }

  int bytes() {
    return bytes;
  }

  /** Whether a sample may be infinite or no number at all. */
  boolean floating() {
    return floating;
  }

  /** Signed integers of a container of 1 to 4 bytes. */
  static SampleCode signed(int bytes, boolean big) {
    return switch (bytes) {
      case 1 -> S8;
      case 2 -> big ? S16_BIG : S16_LITTLE;
      case 3 -> big ? S24_BIG : S24_LITTLE;
      case 4 -> big ? S32_BIG : S32_LITTLE;
      default -> throw new IllegalArgumentException(bytes + " bytes");
    };
  }

  /** Floating point of 4 or 8 bytes. */
  static SampleCode floating(int bytes, boolean big) {
    if (bytes == 4) {
      return big ? F32_BIG : F32_LITTLE;
    }
    return big ? F64_BIG : F64_LITTLE;
  }

  /**
   * Decodes every {@code stride}-th byte's sample.
   *
   * @param at index of the first sample's first byte
   * @param out receives samples from {@code from} to before {@code to}
   */
  void decode(byte[] in, int at, int stride, double[] out, int from, int to) {
    switch (this) {
      case U8 -> Loops.u8(in, at, stride, out, from, to);
      case S8 -> Loops.s8(in, at, stride, out, from, to);
      case S16_LITTLE -> Loops.s16Little(in, at, stride, out, from, to);
      case S16_BIG -> Loops.s16Big(in, at, stride, out, from, to);
      case S24_LITTLE -> Loops.s24Little(in, at, stride, out, from, to);
      case S24_BIG -> Loops.s24Big(in, at, stride, out, from, to);
      case S32_LITTLE -> Loops.s32Little(in, at, stride, out, from, to);
      case S32_BIG -> Loops.s32Big(in, at, stride, out, from, to);
      case S24_LOW_OF_32_LITTLE -> Loops.s24LowLittle(in, at, stride, out, from, to);
      case S24_LOW_OF_32_BIG -> Loops.s24LowBig(in, at, stride, out, from, to);
      case F32_LITTLE -> Loops.f32Little(in, at, stride, out, from, to);
      case F32_BIG -> Loops.f32Big(in, at, stride, out, from, to);
      case F64_LITTLE -> Loops.f64Little(in, at, stride, out, from, to);
      case F64_BIG -> Loops.f64Big(in, at, stride, out, from, to);
    }
  }

  /** One tight loop per code: a switch or call per sample would cost more than the conversion. */
  private static final class Loops {
    private static final double STEP_8 = 0x1p-7;
    private static final double STEP_16 = 0x1p-15;
    private static final double STEP_24 = 0x1p-23;
    private static final double STEP_32 = 0x1p-31;

    private static final VarHandle SHORT_LITTLE = view(short[].class, ByteOrder.LITTLE_ENDIAN);
    private static final VarHandle SHORT_BIG = view(short[].class, ByteOrder.BIG_ENDIAN);
    private static final VarHandle INT_LITTLE = view(int[].class, ByteOrder.LITTLE_ENDIAN);
    private static final VarHandle INT_BIG = view(int[].class, ByteOrder.BIG_ENDIAN);
    private static final VarHandle FLOAT_LITTLE = view(float[].class, ByteOrder.LITTLE_ENDIAN);
    private static final VarHandle FLOAT_BIG = view(float[].class, ByteOrder.BIG_ENDIAN);
    private static final VarHandle DOUBLE_LITTLE = view(double[].class, ByteOrder.LITTLE_ENDIAN);
    private static final VarHandle DOUBLE_BIG = view(double[].class, ByteOrder.BIG_ENDIAN);

    private static VarHandle view(Class<?> array, ByteOrder order) {
      return MethodHandles.byteArrayViewVarHandle(array, order);
    }

    static void u8(byte[] in, int at, int stride, double[] out, int from, int to) {
      for (int i = from, p = at; i < to; i++, p += stride) {
        out[i] = ((in[p] & 0xff) - 128) * STEP_8;
      }
    }

    static void s8(byte[] in, int at, int stride, double[] out, int from, int to) {
      for (int i = from, p = at; i < to; i++, p += stride) {
        out[i] = in[p] * STEP_8;
      }
    }

    static void s16Little(byte[] in, int at, int stride, double[] out, int from, int to) {
      for (int i = from, p = at; i < to; i++, p += stride) {
        out[i] = (short) SHORT_LITTLE.get(in, p) * STEP_16;
      }
    }

    static void s16Big(byte[] in, int at, int stride, double[] out, int from, int to) {
      for (int i = from, p = at; i < to; i++, p += stride) {
        out[i] = (short) SHORT_BIG.get(in, p) * STEP_16;
      }
    }

    static void s24Little(byte[] in, int at, int stride, double[] out, int from, int to) {
      int i = from;
      int p = at;
      if (i < to && p == 0) {
        out[i++] = (in[2] << 16 | (in[1] & 0xff) << 8 | (in[0] & 0xff)) * STEP_24;
        p += stride;
      }
      // one read of four bytes, of which the first belongs to the sample before
      for (; i < to; i++, p += stride) {
        out[i] = ((int) INT_LITTLE.get(in, p - 1) >> 8) * STEP_24;
      }
    }

    static void s24Big(byte[] in, int at, int stride, double[] out, int from, int to) {
      for (int i = from, p = at; i < to; i++, p += stride) {
        out[i] = (in[p] << 16 | (in[p + 1] & 0xff) << 8 | (in[p + 2] & 0xff)) * STEP_24;
      }
    }

    static void s32Little(byte[] in, int at, int stride, double[] out, int from, int to) {
      for (int i = from, p = at; i < to; i++, p += stride) {
        out[i] = (int) INT_LITTLE.get(in, p) * STEP_32;
      }
    }

    static void s32Big(byte[] in, int at, int stride, double[] out, int from, int to) {
      for (int i = from, p = at; i < to; i++, p += stride) {
        out[i] = (int) INT_BIG.get(in, p) * STEP_32;
      }
    }

    static void s24LowLittle(byte[] in, int at, int stride, double[] out, int from, int to) {
      for (int i = from, p = at; i < to; i++, p += stride) {
        out[i] = ((int) INT_LITTLE.get(in, p) << 8) * STEP_32;
      }
    }

    static void s24LowBig(byte[] in, int at, int stride, double[] out, int from, int to) {
      for (int i = from, p = at; i < to; i++, p += stride) {
        out[i] = ((int) INT_BIG.get(in, p) << 8) * STEP_32;
      }
    }

    static void f32Little(byte[] in, int at, int stride, double[] out, int from, int to) {
      for (int i = from, p = at; i < to; i++, p += stride) {
        out[i] = (float) FLOAT_LITTLE.get(in, p);
      }
    }

    static void f32Big(byte[] in, int at, int stride, double[] out, int from, int to) {
      for (int i = from, p = at; i < to; i++, p += stride) {
        out[i] = (float) FLOAT_BIG.get(in, p);
      }
    }

    static void f64Little(byte[] in, int at, int stride, double[] out, int from, int to) {
      for (int i = from, p = at; i < to; i++, p += stride) {
        out[i] = (double) DOUBLE_LITTLE.get(in, p);
      }
    }

    static void f64Big(byte[] in, int at, int stride, double[] out, int from, int to) {
      for (int i = from, p = at; i < to; i++, p += stride) {
        out[i] = (double) DOUBLE_BIG.get(in, p);
      }
    }
  }
}
