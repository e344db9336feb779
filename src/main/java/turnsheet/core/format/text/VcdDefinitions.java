package turnsheet.core.format.text;

import java.util.List;
import org.jspecify.annotations.Nullable;

/**
 * What stands before {@code $enddefinitions}.
 *
 * @param timescale as written, without blanks; null where the file has none
 * @param unitSeconds one time stamp unit in seconds; null where the file has none
 * @param signals one-bit signals in order of declaration, each identifier code once
 * @param otherSignals how many vectors, reals, strings and events there are beside
 */
record VcdDefinitions(
    @Nullable String timescale,
    @Nullable Double unitSeconds,
    List<Signal> signals,
    int otherSignals) {

  VcdDefinitions {
    signals = List.copyOf(signals);
  }

  /**
   * A one-bit signal.
   *
   * @param code identifier code
   * @param path scopes and reference, joined by points
   */
  record Signal(String code, String path) {}
}
