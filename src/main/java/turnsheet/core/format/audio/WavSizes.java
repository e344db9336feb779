package turnsheet.core.format.audio;

import java.util.List;
import java.util.Locale;
import turnsheet.core.signal.RejectedException;
import turnsheet.core.signal.Warning;

/**
 * Settles how many bytes of samples there are where the header and the file disagree.
 *
 * @param riffSize size field of the whole container
 * @param dataOffset byte at which the samples begin
 * @param fileBytes length of the file
 */
record WavSizes(long riffSize, long dataOffset, long fileBytes, WaveFormatChunk format) {

  /** What a writer that could not go back leaves in a size field. */
  static final long UNKNOWN = 0xffffffffL;

  /** Another such value: the largest 31-bit size less a header, rounded down by some writers. */
  private static final long LEAST_PLACEHOLDER_31 = 0x7ffff000L;

  private static final long MOST_PLACEHOLDER_31 = 0x7fffffffL;

  /** Bytes of samples to read, at most what the file has; says in the warnings what was odd. */
  long dataBytes(long announced, boolean sizesOf64Bits, List<Warning> warnings)
      throws RejectedException {
    long available = fileBytes - dataOffset;
    long bytes = Math.min(announced, available);
    if (isPlaceholder(announced, available)) {
      bytes = available;
      warnings.add(
          new Warning(
              "lengthUnknown",
              "The header does not tell the length of the recording (as streaming programs leave"
                  + " it); everything up to the end of the file was taken as samples."));
    } else if (!sizesOf64Bits && fileBytes > UNKNOWN + 8) {
      bytes = available;
      warnings.add(
          new Warning(
              "wrongSize",
              "The file is longer than 4 GiB, which its size fields cannot express; everything up"
                  + " to the end of the file was taken as samples."));
    } else if (announced > available) {
      warnings.add(missing(announced, available));
    } else {
      noteContainerSize(dataOffset + announced, warnings);
    }
    int cut = (int) (bytes % format.frameBytes());
    if (bytes - cut == 0 && (announced > 0 || available > 0) && bytes + announced > 0) {
      throw new RejectedException(
          "noSamples",
          "The WAV file announces samples, but ends before the first one is complete: record or"
              + " copy it again.");
    }
    if (cut > 0) {
      warnings.add(
          new Warning(
              "partialFrame",
              "The samples end in the middle of a frame: its "
                  + cut
                  + " of "
                  + format.frameBytes()
                  + " bytes were left out."));
    }
    return bytes;
  }

  private boolean isPlaceholder(long announced, long available) {
    if (announced == UNKNOWN && available != UNKNOWN) {
      return true;
    }
    if (announced == 0) {
      boolean containerKnowsItsEnd = Math.abs(riffSize + 8 - fileBytes) <= 1;
      return available > 0 && !containerKnowsItsEnd;
    }
    return announced >= LEAST_PLACEHOLDER_31
        && announced <= MOST_PLACEHOLDER_31
        && announced > available;
  }

  private Warning missing(long announced, long available) {
    long framesAnnounced = announced / format.frameBytes();
    long framesThere = available / format.frameBytes();
    return truncated(framesAnnounced, framesThere, (double) format.sampleRateHertz());
  }

  /** Says how much of a recording is not there. */
  static Warning truncated(long framesAnnounced, long framesThere, double sampleRateHertz) {
    return new Warning(
        "truncated",
        String.format(
            Locale.ROOT,
            "The file ends early: %d of %d announced frames are there, the last %.3f s of %.3f s"
                + " are missing; copy the file again if they matter.",
            framesThere,
            framesAnnounced,
            (framesAnnounced - framesThere) / sampleRateHertz,
            framesAnnounced / sampleRateHertz));
  }

  private void noteContainerSize(long dataEnd, List<Warning> warnings) {
    boolean stated = riffSize > 0 && riffSize != UNKNOWN;
    long riffEnd = riffSize + 8;
    if (stated && (riffEnd < dataEnd || riffEnd > fileBytes + 1)) {
      warnings.add(
          new Warning(
              "wrongSize",
              "The header announces a file of "
                  + riffEnd
                  + " bytes, but it has "
                  + fileBytes
                  + "; the data chunk is complete, and its own size was used."));
    }
  }
}
