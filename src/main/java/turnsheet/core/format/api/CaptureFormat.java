package turnsheet.core.format.api;

import java.io.IOException;
import turnsheet.core.signal.EdgeReader;
import turnsheet.core.signal.RejectedException;
import turnsheet.core.signal.SampleReader;

/**
 * One family of files. Stateless; everything that belongs to one file lives in the readers.
 *
 * <p>Every method works in bounded memory and, but for the readers, in bounded time, whatever the
 * bytes are. Options that do not fit the file are a rejection as well ({@code noSuchChannel}).
 */
public interface CaptureFormat {

  /** Bytes that {@link #claims} gets to see, fewer only where the file is shorter. */
  int HEAD_BYTES = 64 * 1024;

  /** Whether the first bytes are of this family, sound or damaged. */
  boolean claims(byte[] head);

  /** Looks at the head of the file and says what it holds. */
  Recognised recognise(ByteSource source, ReadOptions options)
      throws IOException, RejectedException;

  /**
   * Opens a waveform for reading.
   *
   * @throws IllegalStateException if the file holds edges or periods
   */
  SampleReader openSamples(ByteSource source, ReadOptions options)
      throws IOException, RejectedException;

  /**
   * Opens edges for reading; a period list hands out the running sum of its periods.
   *
   * @throws IllegalStateException if the file holds a waveform
   */
  EdgeReader openEdges(ByteSource source, ReadOptions options)
      throws IOException, RejectedException;
}
