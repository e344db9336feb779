package turnsheet.core.format.audio;

import java.io.EOFException;
import java.io.IOException;
import java.io.InputStream;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import turnsheet.core.format.api.ByteSource;
import turnsheet.core.signal.RejectedException;
import turnsheet.core.signal.SampleReader;
import turnsheet.core.signal.Warning;

/**
 * Reads one channel of a FLAC stream, frame by frame. Every frame must continue the one before it
 * and keep rate, depth and channels; at the end the samples are held against the stream's MD5.
 */
final class FlacReader implements SampleReader {

  private final FlacHeader header;
  private final FlacBits bits;
  private final FlacSubframe subframe;
  private final FlacDigest digest;
  private final int channel;
  private final double step;
  private final long[][] block;
  private final List<Warning> warnings = new ArrayList<>();
  private int blockSize;
  private int used;
  private long framesDecoded;
  private long blocksDecoded;
  private boolean ended;

  FlacReader(ByteSource source, FlacHeader header, int channel) throws IOException {
    this.header = header;
    this.channel = channel;
    step = Math.scalb(1.0, 1 - header.bits());
    block = new long[header.channels()][0];
    digest = new FlacDigest(header);
    InputStream in = source.open();
    try {
      in.skipNBytes(header.audioOffset());
    } catch (IOException | RuntimeException e) {
      in.close();
      throw e;
    }
    bits = new FlacBits(in);
    subframe = new FlacSubframe(bits);
  }

  @Override
  public double sampleRateHertz() {
    return header.sampleRateHertz();
  }

  @Override
  public int read(double[] into) throws IOException, RejectedException {
    int written = 0;
    while (written < into.length) {
      if (used == blockSize && !nextBlock()) {
        break;
      }
      int count = Math.min(blockSize - used, into.length - written);
      long[] samples = block[channel - 1];
      for (int i = 0; i < count; i++) {
        into[written + i] = samples[used + i] * step;
      }
      used += count;
      written += count;
    }
    return written;
  }

  private boolean nextBlock() throws IOException, RejectedException {
    used = 0;
    blockSize = 0;
    if (ended || bits.atEnd() || beyondAudio()) {
      finish();
      return false;
    }
    try {
      decodeFrame();
      return true;
    } catch (FlacDamage e) {
      throw FlacHeader.damaged(e.what() + where());
    } catch (EOFException e) {
      if (framesDecoded == 0) {
        throw FlacHeader.damaged("it ends inside the first frame of audio");
      }
      blockSize = 0;
      if (header.frames() == 0) {
        warnings.add(
            new Warning(
                "truncated",
                "The file ends in the middle of a frame"
                    + where()
                    + "; the header does not tell how much is missing."));
      }
      finish();
      return false;
    }
  }

  /** Whether what follows is no frame and need not be one, such as a tag behind the audio. */
  private boolean beyondAudio() {
    int next = bits.peekByte();
    return header.frames() > 0
        ? next != 0xff && framesDecoded >= header.frames()
        : next == 'T' && framesDecoded > 0;
  }

  private void decodeFrame() throws IOException, FlacDamage, RejectedException {
    bits.mark();
    FlacFrameHeader frame = FlacFrameHeader.read(bits);
    requireSameStream(frame);
    requireSuccession(frame);
    int count = frame.blockSize();
    if (block[0].length < count) {
      for (int c = 0; c < block.length; c++) {
        block[c] = new long[count];
      }
    }
    for (int c = 0; c < frame.channels(); c++) {
      boolean side =
          frame.pairing() != 0 && (frame.pairing() == FlacFrameHeader.SIDE_RIGHT) == (c == 0);
      subframe.read(block[c], count, header.bits() + (side ? 1 : 0));
    }
    bits.alignToByte();
    int crc = bits.crc16();
    if (bits.unsigned(16) != crc) {
      throw new FlacDamage("the check sum of a frame does not match");
    }
    unpair(frame);
    digest.add(block, count);
    blockSize = count;
    framesDecoded += count;
    blocksDecoded++;
  }

  private void requireSameStream(FlacFrameHeader frame) throws RejectedException {
    boolean sameRate =
        frame.sampleRateHertz() == 0 || frame.sampleRateHertz() == header.sampleRateHertz();
    boolean sameDepth = frame.bits() == 0 || frame.bits() == header.bits();
    if (!sameRate || !sameDepth || frame.channels() != header.channels()) {
      throw new RejectedException(
          "changingFormat",
          String.format(
              Locale.ROOT,
              "The FLAC stream changes its format%s: %d Hz, channels: %d, %d bits where the header"
                  + " announces %d Hz, channels: %d, %d bits. Export the recording as one piece.",
              where(),
              frame.sampleRateHertz() == 0 ? header.sampleRateHertz() : frame.sampleRateHertz(),
              frame.channels(),
              frame.bits() == 0 ? header.bits() : frame.bits(),
              header.sampleRateHertz(),
              header.channels(),
              header.bits()));
    }
  }

  /** A missing frame would shift everything after it in time without a trace. */
  private void requireSuccession(FlacFrameHeader frame) throws FlacDamage {
    long expected = frame.variableBlocks() ? framesDecoded : blocksDecoded;
    if (frame.number() != expected) {
      throw new FlacDamage("frame " + frame.number() + " comes where " + expected + " is due");
    }
  }

  private void unpair(FlacFrameHeader frame) {
    if (frame.pairing() == 0) {
      return;
    }
    long[] first = block[0];
    long[] second = block[1];
    for (int i = 0; i < frame.blockSize(); i++) {
      long a = first[i];
      long b = second[i];
      switch (frame.pairing()) {
        case FlacFrameHeader.LEFT_SIDE -> second[i] = a - b;
        case FlacFrameHeader.SIDE_RIGHT -> first[i] = a + b;
        default -> {
          long mid = a << 1 | (b & 1);
          first[i] = (mid + b) >> 1;
          second[i] = (mid - b) >> 1;
        }
      }
    }
  }

  private void finish() throws RejectedException {
    if (ended) {
      return;
    }
    ended = true;
    if (framesDecoded == 0) {
      throw new RejectedException(
          "noSamples", "The FLAC file holds no samples: record or copy it again.");
    }
    if (header.frames() > framesDecoded) {
      warnings.add(WavSizes.truncated(header.frames(), framesDecoded, header.sampleRateHertz()));
      return;
    }
    if (header.frames() > 0 && header.frames() < framesDecoded) {
      warnings.add(
          new Warning(
              "wrongSize",
              "The header announces "
                  + header.frames()
                  + " frames, the stream holds "
                  + framesDecoded
                  + "; all of them were read."));
    }
    if (!digest.matches()) {
      warnings.add(
          new Warning(
              "md5Mismatch",
              "The samples do not match the MD5 sum that the file carries for them: its content or"
                  + " its header was changed after it was made."));
    }
  }

  private String where() {
    return String.format(
        Locale.ROOT, " at %.3f s", (double) framesDecoded / header.sampleRateHertz());
  }

  @Override
  public List<Warning> warnings() {
    return List.copyOf(warnings);
  }

  @Override
  public void close() throws IOException {
    bits.close();
  }
}
