package turnsheet.core.measure;

/** Told now and then how much of a capture has been worked through. */
@FunctionalInterface
public interface Progress {

  /** For callers that do not care. */
  Progress NONE = fraction -> {};

  /**
   * May throw a runtime exception of the caller's own to stop the work.
   *
   * @param fraction 0 to 1, never decreasing
   */
  void reached(double fraction);
}
