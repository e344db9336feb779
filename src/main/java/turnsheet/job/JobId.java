package turnsheet.job;

import java.util.UUID;

/** Names one job. */
public record JobId(UUID value) {

  public static JobId random() {
    return new JobId(UUID.randomUUID());
  }
}
