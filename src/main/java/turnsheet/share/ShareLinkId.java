package turnsheet.share;

import java.util.UUID;

/** Names one share link; it opens nothing. */
public record ShareLinkId(UUID value) {

  static ShareLinkId next() {
    return new ShareLinkId(UUID.randomUUID());
  }
}
