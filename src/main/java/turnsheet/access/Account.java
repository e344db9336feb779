package turnsheet.access;

import java.time.Instant;
import java.util.UUID;
import org.jspecify.annotations.Nullable;

/**
 * Someone who may sign in.
 *
 * @param signInName lower case, unique
 * @param disabledAt null while the account may sign in
 */
public record Account(
    UUID id,
    String signInName,
    String displayName,
    Role role,
    Instant createdAt,
    @Nullable Instant disabledAt) {

  public boolean enabled() {
    return disabledAt == null;
  }
}
