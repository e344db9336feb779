package turnsheet.share;

import java.time.Instant;
import org.jspecify.annotations.Nullable;
import turnsheet.shop.VisitId;

/**
 * A link that shows the sheet of one visit to whoever has it. The token itself is not kept.
 *
 * @param withdrawnAt null while it has not been withdrawn
 * @param lastViewAt null before the first view
 */
public record ShareLink(
    ShareLinkId id,
    VisitId visitId,
    Instant createdAt,
    String createdBy,
    Instant expiresAt,
    @Nullable Instant withdrawnAt,
    int views,
    @Nullable Instant lastViewAt) {

  /** Whether it opens its sheet at a time. */
  public boolean opensAt(Instant time) {
    return withdrawnAt == null && time.isBefore(expiresAt);
  }
}
