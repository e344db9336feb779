package turnsheet.exchange.web;

import java.io.IOException;
import java.io.InputStream;
import org.jspecify.annotations.Nullable;
import org.springframework.security.access.AccessDeniedException;
import org.springframework.stereotype.Component;
import turnsheet.access.CurrentUser;
import turnsheet.exchange.Import;
import turnsheet.exchange.Import.ShopSettings;
import turnsheet.exchange.ImportResult;
import turnsheet.exchange.RefusedFileException;
import turnsheet.web.RefusedRequestException;

/** Takes documents in from an owner, on pages and from programs alike. */
@Component
class ImportDesk {

  static final String TAKE = "take";

  private final Import importer;
  private final CurrentUser user;

  ImportDesk(Import importer, CurrentUser user) {
    this.importer = importer;
    this.user = user;
  }

  /**
   * Takes a document in.
   *
   * @param shop {@value #TAKE} where the shop's own settings give way to those of the file
   * @throws AccessDeniedException if whoever asks is not an owner
   * @throws RefusedRequestException if it cannot be taken in, or did not arrive whole
   */
  ImportResult take(InputStream in, @Nullable String shop) {
    if (!user.isOwner()) {
      throw new AccessDeniedException("documents are taken in by an owner");
    }
    try {
      return importer.take(in, TAKE.equals(shop) ? ShopSettings.TAKE_OVER : ShopSettings.KEEP);
    } catch (RefusedFileException e) {
      throw new RefusedRequestException(e.code(), String.valueOf(e.getMessage()));
    } catch (IOException e) {
      throw new RefusedRequestException(
          "badUpload", "The file did not arrive whole; nothing of it was taken in. Send it again.");
    }
  }
}
