package turnsheet.core.stats;

/** Takes the rising edges of an even pulse train, one after the other. */
@FunctionalInterface
public interface EdgeSink {

  /**
   * @param seconds later than the edge before
   * @param real false for an edge that was put where one is missing
   */
  void edge(double seconds, boolean real);
}
