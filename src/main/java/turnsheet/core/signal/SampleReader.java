package turnsheet.core.signal;

import java.io.Closeable;
import java.io.IOException;
import java.util.List;

/**
 * One channel of evenly spaced samples, read once from the start.
 *
 * <p>Units: full scale is 1 for integer formats; the file's own unit for tables and float formats.
 * Every sample handed out is finite.
 */
public interface SampleReader extends Closeable {

  /** Samples per second of the recording's own clock, positive. */
  double sampleRateHertz();

  /**
   * Reads the next samples.
   *
   * @param into receives samples from index 0
   * @return how many were written; 0 at the end of the stream only
   * @throws RejectedException where the bytes turn out to be unusable
   */
  int read(double[] into) throws IOException, RejectedException;

  /** What was noticed so far that the reader of the figures must know, in order of appearance. */
  List<Warning> warnings();
}
