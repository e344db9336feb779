package turnsheet.core.format.audio;

import java.io.EOFException;
import java.io.IOException;
import java.nio.ByteBuffer;
import java.util.ArrayList;
import java.util.List;
import org.jspecify.annotations.Nullable;
import turnsheet.core.format.api.ByteSource;
import turnsheet.core.signal.RejectedException;
import turnsheet.core.signal.Warning;

/**
 * Walks the chunks of an AIFF or AIFF-C file; they may come in any order.
 *
 * <p>Source: Apple, "Audio Interchange File Format" 1.3 (1989) and the AIFF-C draft of 1991.
 */
final class AiffHeader {

  private static final int MOST_CHUNKS = 10_000;
  private static final long UNKNOWN = 0xffffffffL;

  private final HeadReader in;
  private final boolean compressionNamed;
  private @Nullable AiffCommon common;
  private long dataOffset = -1;
  private long dataAnnounced;

  private AiffHeader(HeadReader in) throws IOException, RejectedException {
    this.in = in;
    in.skip(8);
    String kind = in.name();
    if (!kind.equals("AIFF") && !kind.equals("AIFC")) {
      throw damaged("its kind is \"" + kind + "\"");
    }
    compressionNamed = kind.equals("AIFC");
  }

  static PcmLayout parse(ByteSource source) throws IOException, RejectedException {
    try (HeadReader in = new HeadReader(source)) {
      return new AiffHeader(in).walk(source.length());
    } catch (EOFException e) {
      throw new RejectedException(
          "headerCut",
          "The AIFF file ends after "
              + source.length()
              + " bytes, in the middle of its header: copy or record it again.");
    }
  }

  private PcmLayout walk(long fileBytes) throws IOException, RejectedException {
    for (int i = 0; i < MOST_CHUNKS && in.remaining() >= 8 && !complete(); i++) {
      String name = in.name();
      long size = ByteBuffer.wrap(in.bytes(4)).getInt() & 0xffffffffL;
      long end = in.position() + size + (size & 1);
      if (name.equals("COMM")) {
        byte[] head = in.bytes((int) Math.min(size, AiffCommon.USEFUL_BYTES));
        common = AiffCommon.parse(head, compressionNamed);
      } else if (name.equals("SSND") && dataOffset < 0) {
        // a writer that could not go back leaves zero, though the two fields are there
        if (size == 0) {
          size = UNKNOWN;
          end = fileBytes;
        }
        if (size < 8) {
          throw damaged("its sound chunk has " + size + " bytes, at least 8 are needed");
        }
        long offset = ByteBuffer.wrap(in.bytes(8)).getInt() & 0xffffffffL;
        if (offset > size - 8 || in.position() + offset > fileBytes) {
          throw damaged("its samples are said to begin behind the end of the sound chunk");
        }
        dataOffset = in.position() + offset;
        dataAnnounced = size - 8 - offset;
      }
      in.skip(end - in.position());
    }
    if (common == null) {
      throw new RejectedException(
          "noFormatChunk",
          "The AIFF file has no COMM chunk within reach, so nothing tells how its samples are to"
              + " be read: export the recording again.");
    }
    if (dataOffset < 0) {
      if (common.frames() > 0) {
        throw new RejectedException(
            "noDataChunk",
            "The AIFF file announces "
                + common.frames()
                + " frames, but has no SSND chunk that holds them: record or copy it again.");
      }
      dataOffset = fileBytes;
    }
    return layout(common, fileBytes - dataOffset);
  }

  private boolean complete() {
    return common != null && dataOffset >= 0;
  }

  private PcmLayout layout(AiffCommon found, long available) throws RejectedException {
    List<Warning> warnings = new ArrayList<>();
    int frameBytes = found.frameBytes();
    long there = Math.min(dataAnnounced, available);
    long framesThere = there / frameBytes;
    boolean lengthKnown = (found.frames() > 0 && found.frames() < UNKNOWN) || framesThere == 0;
    long announced = lengthKnown ? found.frames() : framesThere;
    long frames = Math.min(announced, framesThere);
    if (announced > 0 && frames == 0) {
      throw new RejectedException(
          "noSamples",
          "The AIFF file announces "
              + announced
              + " frames, but ends before the first one is complete: record or copy it again.");
    }
    if (!lengthKnown) {
      warnings.add(
          new Warning(
              "lengthUnknown",
              "The header does not tell the length of the recording (as streaming programs leave"
                  + " it); everything in the sound chunk was taken as samples."));
    } else if (frames < announced) {
      warnings.add(WavSizes.truncated(announced, frames, found.sampleRateHertz()));
    } else if (framesThere > frames) {
      warnings.add(
          new Warning(
              "wrongSize",
              "The header announces "
                  + frames
                  + " frames, the sound chunk holds "
                  + framesThere
                  + "; those beyond the announced ones were not read."));
    }
    if (frames == framesThere && there % frameBytes > 0) {
      warnings.add(
          new Warning(
              "partialFrame",
              "The samples end in the middle of a frame: its "
                  + there % frameBytes
                  + " of "
                  + frameBytes
                  + " bytes were left out."));
    }
    return new PcmLayout(
        found.formatName(),
        found.sampleRateHertz(),
        found.channels(),
        found.code(),
        frameBytes,
        dataOffset,
        frames,
        warnings);
  }

  static RejectedException damaged(String what) {
    return new RejectedException(
        "damagedHeader", "The AIFF file is damaged: " + what + ". Export the recording again.");
  }
}
