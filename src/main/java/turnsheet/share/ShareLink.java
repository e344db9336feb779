package turnsheet.share;

import java.time.Instant;
import org.jspecify.annotations.Nullable;

/**
 * A link that shows one issued report to whoever has it. The token itself is not kept.
 *
 * @param reportNumber what it opens
 * @param showsHistory whether the history of the unit may be seen as well
 * @param withdrawnAt null while it has not been withdrawn
 * @param lastViewAt null before the first view
 */
public record ShareLink(
    ShareLinkId id,
    long reportNumber,
    boolean showsHistory,
    Instant createdAt,
    String createdBy,
    Instant expiresAt,
    @Nullable Instant withdrawnAt,
    int views,
    @Nullable Instant lastViewAt) {

  /** Whether it opens its report at a time. */
  public boolean opensAt(Instant time) {
    return withdrawnAt == null && time.isBefore(expiresAt);
  }
}
