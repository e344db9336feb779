package turnsheet.core.signal;

import java.io.Closeable;
import java.io.IOException;
import java.util.List;

/**
 * Level changes of one signal in order of time, read once from the start.
 *
 * <p>Units: seconds from the capture's own zero, finite, never decreasing. A list that holds only
 * one kind of edge hands them all out as rising.
 */
public interface EdgeReader extends Closeable {

  /**
   * Reads the next edges.
   *
   * @param timesSeconds receives the times from index 0
   * @param rising receives true for each edge that rises; at least as long as {@code timesSeconds}
   * @return how many were written; 0 at the end of the stream only
   * @throws RejectedException where the content turns out to be unusable
   */
  int read(double[] timesSeconds, boolean[] rising) throws IOException, RejectedException;

  /** Step of the clock that stamped the edges, in seconds; 0 where the source does not tell. */
  double timeStepSeconds();

  /** What was noticed so far that the reader of the figures must know, in order of appearance. */
  List<Warning> warnings();
}
