package turnsheet.core.diagnose.parts;

import java.util.List;
import org.jspecify.annotations.Nullable;

/**
 * What can be said about the cause of one line.
 *
 * @param rateHz the line's rate
 * @param resolutionHz how near two rates may come and still be told apart in the capture
 * @param suspects the most probable first; one for each rate of a part that comes near
 * @param unknownProbability that none of them is the cause
 * @param rivals names of the other parts that cannot be told from the first; empty where it can
 * @param explanation what would explain a line without suspect; null where it has one
 */
public record LineFinding(
    double rateHz,
    double resolutionHz,
    List<RankedSuspect> suspects,
    double unknownProbability,
    List<String> rivals,
    LockVerdict lock,
    @Nullable Explanation explanation) {

  public LineFinding {
    suspects = List.copyOf(suspects);
    rivals = List.copyOf(rivals);
  }

  /** Whether another part explains the line nearly as well as the first. */
  public boolean ambiguous() {
    return !rivals.isEmpty();
  }

  /** Probability of the first suspect's part, over all its rates; zero without suspect. */
  public double firstProbability() {
    return suspects.stream()
        .filter(s -> s.part().equals(suspects.get(0).part()))
        .mapToDouble(RankedSuspect::probability)
        .sum();
  }

  public Advice advice() {
    return suspects.isEmpty() ? Advice.UNNAMED : Advice.of(suspects.get(0).expected());
  }
}
