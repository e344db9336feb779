package turnsheet.exchange;

import java.io.IOException;
import java.io.InputStream;
import java.io.UncheckedIOException;
import org.springframework.dao.DataAccessException;
import org.springframework.stereotype.Component;
import org.springframework.transaction.support.TransactionOperations;
import turnsheet.access.AuditTrail;

/**
 * Takes an exported document in, whole or not at all: what is not here is added under its own id,
 * what is here stays as it is, and the result says what differs. Only what the shop has set for
 * itself may be taken over where it differs, by whoever says so.
 */
@Component
public final class Import {

  private final Books books;
  private final Places places;
  private final Checks checks;
  private final Pictures pictures;
  private final AuditTrail audit;
  private final TransactionOperations transactions;

  Import(
      Books books,
      Places places,
      Checks checks,
      Pictures pictures,
      AuditTrail audit,
      TransactionOperations transactions) {
    this.books = books;
    this.places = places;
    this.checks = checks;
    this.pictures = pictures;
    this.audit = audit;
    this.transactions = transactions;
  }

  /** What becomes of letterhead, logo, preferences and rules where the file has others. */
  public enum ShopSettings {
    /** what the shop has set stays */
    KEEP,
    /** what the file says is in force from now on */
    TAKE_OVER
  }

  /**
   * Reads the file to its end; the caller closes it.
   *
   * @throws RefusedFileException if the file cannot be taken in; nothing is stored then
   * @throws IOException if the stream breaks; nothing is stored then
   */
  public ImportResult take(InputStream in, ShopSettings settings) throws IOException {
    try {
      return transactions.execute(status -> inTransaction(in, settings));
    } catch (UncheckedIOException e) {
      throw new IOException(e.getCause());
    } catch (DataAccessException e) {
      throw new RefusedFileException(
          "importDisturbed",
          "The file and work that was going on at the same time got into each other's way: import"
              + " it again.");
    }
  }

  private ImportResult inTransaction(InputStream in, ShopSettings settings) {
    places.lockReportNumbers();
    Importing importing = new Importing(books, places, checks, pictures, settings);
    try {
      ExportReader.read(in, importing);
    } catch (IOException e) {
      throw new UncheckedIOException(e);
    }
    ImportResult result = importing.result();
    audit.record("exchange.audit.imported", Integer.toString(result.added()));
    if (importing.tookOver() > 0) {
      audit.record("exchange.audit.shop", Integer.toString(importing.tookOver()));
    }
    return result;
  }
}
