package turnsheet.pair;

import java.util.UUID;

/**
 * What to compare, and what was typed beside it.
 *
 * @param original the sensor that was there
 * @param replacement the one that may take its place
 */
public record PairOrder(Side original, Side replacement, Details details) {

  /**
   * One sensor in a recording.
   *
   * @param channel counted from 1
   * @param teeth pulses per turn of the shaft
   */
  public record Side(UUID capture, int channel, int teeth) {}

  /** Read off data sheets and instruments by hand; each may be empty. */
  public record Details(String supply, String level, String output, String remarks) {}

  /** Whether both sensors stand in one recording. */
  public boolean together() {
    return original.capture.equals(replacement.capture);
  }
}
