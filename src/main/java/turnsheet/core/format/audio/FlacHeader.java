package turnsheet.core.format.audio;

import java.io.EOFException;
import java.io.IOException;
import java.nio.ByteBuffer;
import java.util.HexFormat;
import turnsheet.core.format.api.ByteSource;
import turnsheet.core.signal.RejectedException;

/**
 * The STREAMINFO block of a FLAC file and where its audio begins. Other metadata blocks are skipped
 * unread, whatever sizes they claim.
 *
 * <p>Source: RFC 9639, section 8.
 *
 * @param frames announced samples per channel; 0 where unknown
 * @param md5 of the samples in hexadecimal digits; all zeros where unknown
 * @param audioOffset byte at which the first frame of audio begins
 */
record FlacHeader(
    int sampleRateHertz, int channels, int bits, long frames, String md5, long audioOffset) {

  static final String MARKER = "fLaC";
  static final String NO_MD5 = "0".repeat(32);

  private static final int STREAM_INFO_BYTES = 34;
  private static final int MOST_BLOCKS = 10_000;

  static FlacHeader parse(ByteSource source) throws IOException, RejectedException {
    try (HeadReader in = new HeadReader(source)) {
      return parse(in);
    } catch (EOFException e) {
      throw new RejectedException(
          "headerCut",
          "The FLAC file ends after "
              + source.length()
              + " bytes, in the middle of its header: copy or record it again.");
    }
  }

  private static FlacHeader parse(HeadReader in) throws IOException, RejectedException {
    byte[] start = in.bytes(4);
    if (!HeadReader.name(start, 0).equals(MARKER)) {
      byte[] tag = new byte[10];
      System.arraycopy(start, 0, tag, 0, 4);
      System.arraycopy(in.bytes(6), 0, tag, 4, 6);
      in.skip(tagBytes(tag) - tag.length);
      if (!in.name().equals(MARKER)) {
        throw new RejectedException(
            "compressedAudio",
            "The file begins with an ID3 tag, and no FLAC stream follows it: most likely it is"
                + " MP3, and compression changes what is to be measured; record or export it as"
                + " WAV.");
      }
    }
    int block = ByteBuffer.wrap(in.bytes(4)).getInt();
    if ((block & 0x7fffffff) != STREAM_INFO_BYTES) {
      throw damaged("it does not begin with a STREAMINFO block of 34 bytes");
    }
    ByteBuffer info = ByteBuffer.wrap(in.bytes(STREAM_INFO_BYTES));
    for (int i = 0; block >= 0; i++) {
      block = ByteBuffer.wrap(in.bytes(4)).getInt();
      int size = block & 0xffffff;
      if ((block >>> 24 & 0x7f) == 0x7f || i == MOST_BLOCKS) {
        throw damaged("its metadata blocks do not end");
      }
      if (size > in.remaining()) {
        throw damaged(
            "the metadata block before byte "
                + in.position()
                + " claims "
                + size
                + " bytes, more than the file has");
      }
      in.skip(size);
    }
    return of(info, in.position());
  }

  private static FlacHeader of(ByteBuffer info, long audioOffset) throws RejectedException {
    // 20 bits rate, 3 bits channels - 1, 5 bits depth - 1, 36 bits frames
    long packed = info.getLong(10);
    int rate = (int) (packed >>> 44);
    int bits = (int) (packed >>> 36 & 31) + 1;
    if (rate == 0) {
      throw new RejectedException(
          "noSampleRate", "The FLAC header announces 0 samples per second: export it again.");
    }
    if (bits < 4) {
      throw damaged("it announces samples of " + bits + " bits, less than the 4 that FLAC knows");
    }
    byte[] md5 = new byte[16];
    info.get(18, md5);
    return new FlacHeader(
        rate,
        (int) (packed >>> 41 & 7) + 1,
        bits,
        packed & 0xfffffffffL,
        HexFormat.of().formatHex(md5),
        audioOffset);
  }

  /**
   * Size of an ID3 version 2 tag at the start, its head of 10 bytes included; 0 if there is none.
   */
  static long tagBytes(byte[] head) {
    if (head.length < 10 || head[0] != 'I' || head[1] != 'D' || head[2] != '3') {
      return 0;
    }
    long size = 0;
    for (int i = 6; i < 10; i++) {
      size = size << 7 | (head[i] & 0x7f);
    }
    boolean footer = (head[5] & 0x10) != 0;
    return size + (footer ? 20 : 10);
  }

  static RejectedException damaged(String what) {
    return new RejectedException(
        "damagedFlac",
        "The FLAC file is damaged: "
            + what
            + ". Copy it again, or export the recording again as WAV.");
  }
}
