package turnsheet.core.format.audio;

import java.io.EOFException;
import java.io.IOException;
import java.nio.ByteBuffer;
import java.nio.ByteOrder;
import java.util.ArrayList;
import java.util.List;
import org.jspecify.annotations.Nullable;
import turnsheet.core.format.api.ByteSource;
import turnsheet.core.signal.RejectedException;
import turnsheet.core.signal.Warning;

/**
 * Walks the chunks of a RIFF, RIFX, RF64 or BW64 file up to its samples.
 *
 * <p>Source: Microsoft/IBM, "Multimedia Programming Interface and Data Specifications 1.0" (RIFF);
 * EBU Tech 3306 (RF64); ITU-R BS.2088 (BW64).
 */
final class WavHeader {

  /** A sound file has a dozen chunks; a walk over millions of empty ones would take minutes. */
  private static final int MOST_CHUNKS = 10_000;

  private static final int PROBE_BYTES = 64 * 1024;
  private static final int MOST_PROBES = 16;

  private final HeadReader in;
  private final String container;
  private final ByteOrder order;
  private final boolean sizesOf64Bits;
  private long riffSize;
  private long longDataSize = -1;
  private boolean longSizesFound;
  private @Nullable WaveFormatChunk format;

  private WavHeader(HeadReader in) throws IOException, RejectedException {
    this.in = in;
    container = in.name();
    order = container.equals("RIFX") ? ByteOrder.BIG_ENDIAN : ByteOrder.LITTLE_ENDIAN;
    sizesOf64Bits = container.equals("RF64") || container.equals("BW64");
    riffSize = size();
    String kind = in.name();
    if (!kind.equals("WAVE")) {
      throw new RejectedException(
          "notWave",
          "The file is a RIFF container, but of the kind \""
              + kind
              + "\" in place of \"WAVE\": export the recording as WAV.");
    }
  }

  static PcmLayout parse(ByteSource source) throws IOException, RejectedException {
    try (HeadReader in = new HeadReader(source)) {
      return new WavHeader(in).walk();
    } catch (EOFException e) {
      throw new RejectedException(
          "headerCut",
          "The WAV file ends after "
              + source.length()
              + " bytes, in the middle of its header: copy or record it again.");
    }
  }

  private PcmLayout walk() throws IOException, RejectedException {
    for (int i = 0; i < MOST_CHUNKS && in.remaining() >= 8; i++) {
      String name = in.name();
      long size = size();
      if (name.equals("data")) {
        return layout(size);
      }
      long end = in.position() + size + (size & 1);
      if (name.equals("fmt ")) {
        byte[] head = in.bytes((int) Math.min(size, WaveFormatChunk.USEFUL_BYTES));
        format = WaveFormatChunk.parse(head, size, order == ByteOrder.BIG_ENDIAN);
      } else if (name.equals("ds64") && sizesOf64Bits && size >= 16) {
        ByteBuffer sizes = ByteBuffer.wrap(in.bytes(16)).order(order);
        riffSize = sizes.getLong(0);
        longDataSize = sizes.getLong(8);
        longSizesFound = true;
      }
      in.skip(end - in.position());
    }
    if (in.remaining() >= 8) {
      throw new RejectedException(
          "tooManyChunks",
          "The WAV file has more than "
              + MOST_CHUNKS
              + " chunks in front of its samples: export the recording again.");
    }
    if (format == null) {
      throw new RejectedException(
          "noFormatChunk",
          "The WAV file has no format chunk, so nothing tells how its samples are to be read:"
              + " export the recording again.");
    }
    throw new RejectedException(
        "noDataChunk",
        "The WAV file ends after "
            + in.position()
            + " bytes without a data chunk, so it holds no samples: record or copy it again.");
  }

  private PcmLayout layout(long sizeField) throws IOException, RejectedException {
    if (format == null) {
      throw new RejectedException(
          "formatAfterData",
          "The WAV file's data chunk comes before any format chunk, so its samples cannot be read"
              + " in order: export the recording again.");
    }
    if (sizesOf64Bits && !longSizesFound) {
      throw new RejectedException(
          "damagedHeader",
          "The WAV header is damaged: an "
              + container
              + " file must state its sizes in a ds64 chunk in front of the samples, and there is"
              + " none. Export the recording again.");
    }
    WaveFormatChunk found = format;
    long dataOffset = in.position();
    List<Warning> warnings = new ArrayList<>();
    WavSizes sizes = new WavSizes(riffSize, dataOffset, dataOffset + in.remaining(), found);
    long dataBytes =
        sizeField == WavSizes.UNKNOWN && sizesOf64Bits
            ? sizes.dataBytes(longDataSize <= 0 ? WavSizes.UNKNOWN : longDataSize, true, warnings)
            : sizes.dataBytes(sizeField, sizesOf64Bits, warnings);
    SampleCode code =
        found.mayBeLowAligned() ? alignment(found, dataBytes, warnings) : found.code();
    noteWhatFollows(dataOffset + dataBytes, dataBytes, warnings);
    return new PcmLayout(
        (container.equals("RIFF") ? "WAV, " : "WAV (" + container + "), ") + found.depthName(),
        found.sampleRateHertz(),
        found.channels(),
        code,
        found.frameBytes(),
        dataOffset,
        dataBytes / found.frameBytes(),
        warnings);
  }

  /**
   * Finds out which three of four bytes carry 24-bit samples. The rule says the high ones; where
   * the low byte is in use and the high one only repeats the sign (or is zero), the writer did
   * otherwise.
   */
  private SampleCode alignment(WaveFormatChunk found, long dataBytes, List<Warning> warnings)
      throws IOException {
    boolean big = order == ByteOrder.BIG_ENDIAN;
    long left = dataBytes / 4;
    boolean lowByteUsed = false;
    for (int probe = 0; probe < MOST_PROBES && left > 0 && !lowByteUsed; probe++) {
      int count = (int) Math.min(left, PROBE_BYTES / 4);
      ByteBuffer samples = ByteBuffer.wrap(in.bytes(4 * count)).order(order);
      for (int i = 0; i < count; i++) {
        int sample = samples.getInt(4 * i);
        lowByteUsed |= (sample & 0xff) != 0;
        if (sample << 8 >> 8 != sample && sample >>> 24 != 0) {
          return found.code();
        }
      }
      left -= count;
    }
    if (!lowByteUsed) {
      return found.code();
    }
    warnings.add(
        new Warning(
            "lowAligned",
            "The 24-bit samples lie in the low three of their four bytes, against the WAVE rule;"
                + " they were read from there."));
    return big ? SampleCode.S24_LOW_OF_32_BIG : SampleCode.S24_LOW_OF_32_LITTLE;
  }

  /** Samples behind a data chunk whose size was never corrected would be lost without a word. */
  private void noteWhatFollows(long dataEnd, long dataBytes, List<Warning> warnings)
      throws IOException {
    // the shortest chunk has eight bytes, and one of padding may come first
    if (in.position() + in.remaining() - dataEnd < 9) {
      return;
    }
    in.skip(dataEnd - in.position());
    long behind = in.remaining();
    byte[] next = in.bytes(5);
    boolean zeros = (next[0] | next[1] | next[2] | next[3]) == 0;
    boolean chunk = isName(next, 0) || ((dataBytes & 1) == 1 && isName(next, 1));
    if (!zeros && !chunk) {
      warnings.add(
          new Warning(
              "wrongSize",
              "Behind the announced end of the samples come "
                  + behind
                  + " bytes that are no chunk and were not read: if the recording was longer, its"
                  + " header is wrong; save it again with an audio editor."));
    }
  }

  private static boolean isName(byte[] bytes, int at) {
    return !HeadReader.name(bytes, at).contains("?");
  }

  private long size() throws IOException {
    return ByteBuffer.wrap(in.bytes(4)).order(order).getInt() & 0xffffffffL;
  }
}
