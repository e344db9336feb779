package turnsheet.pair;

import java.util.List;
import org.jspecify.annotations.Nullable;
import turnsheet.core.diagnose.Difference;
import turnsheet.core.diagnose.pair.PairFindings;
import turnsheet.core.measure.Figure;
import turnsheet.core.signal.Rejection;
import turnsheet.document.CoreJson;

/**
 * Two sensors compared: everything that the sheet says, never to be changed. Recorded at the same
 * time it holds {@code findings}, recorded one after the other {@code compared}; where the
 * recordings cannot be compared, {@code refusal}.
 *
 * @param method version of the measuring method
 */
public record PairSheet(
    String version,
    String method,
    String machine,
    String setting,
    PairOrder order,
    Source original,
    Source replacement,
    @Nullable PairFindings findings,
    List<Compared> compared,
    @Nullable Rejection refusal) {

  /** Changes whenever a value can. */
  public static final String VERSION = "1";

  public PairSheet {
    compared = List.copyOf(compared);
  }

  /** Where one side comes from. */
  public record Source(
      String fileName,
      String sha256,
      String condition,
      double turnsPerSecond,
      double pulseRateHz) {}

  /**
   * One figure of both, recorded one after the other.
   *
   * @param name path of the result contract
   * @param originals how many recordings stand behind the original
   * @param replacements how many behind the replacement
   */
  public record Compared(
      String name,
      String unit,
      Figure original,
      Figure replacement,
      Difference difference,
      int originals,
      int replacements) {}

  /** One line of JSON. */
  public String toJson() {
    return CoreJson.toJson(this);
  }

  static PairSheet fromJson(String json) {
    return CoreJson.fromJson(json, PairSheet.class);
  }
}
