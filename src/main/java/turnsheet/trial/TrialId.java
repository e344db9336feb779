package turnsheet.trial;

import java.util.UUID;

/** Names one trial. */
public record TrialId(UUID value) {

  static TrialId random() {
    return new TrialId(UUID.randomUUID());
  }

  @Override
  public String toString() {
    return value.toString();
  }
}
