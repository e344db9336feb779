package turnsheet.capture;

import java.io.ByteArrayInputStream;
import java.io.IOException;
import java.io.InputStream;
import java.sql.ResultSet;
import java.sql.SQLException;
import java.time.Clock;
import java.time.Instant;
import java.time.OffsetDateTime;
import java.time.ZoneOffset;
import java.time.temporal.ChronoUnit;
import java.util.Optional;
import java.util.UUID;
import org.springframework.jdbc.core.simple.JdbcClient;
import org.springframework.stereotype.Service;
import org.springframework.transaction.support.TransactionOperations;
import turnsheet.core.format.api.ByteSource;
import turnsheet.shop.UnitId;
import turnsheet.shop.Visit;
import turnsheet.shop.VisitId;
import turnsheet.shop.Visits;
import turnsheet.web.NotFoundException;
import turnsheet.web.RefusedRequestException;

/** Photographs of type plates, at most one a visit; their bytes lie among the captures. */
@Service
public class PlatePhotos {

  private final JdbcClient jdbc;
  private final TransactionOperations transactions;
  private final CaptureStore store;
  private final Visits visits;
  private final Clock clock;

  PlatePhotos(
      JdbcClient jdbc,
      TransactionOperations transactions,
      CaptureStore store,
      Visits visits,
      Clock clock) {
    this.jdbc = jdbc;
    this.transactions = transactions;
    this.store = store;
    this.visits = visits;
    this.clock = clock;
  }

  /**
   * A photograph.
   *
   * @param bytes a JPEG without anything beside the picture
   * @param takenInBy name of the account that brought it
   */
  public record PlatePhoto(
      VisitId visit,
      StoredBytes bytes,
      int widthPx,
      int heightPx,
      Instant takenInAt,
      String takenInBy) {}

  public Optional<PlatePhoto> of(VisitId visit) {
    return jdbc.sql("select * from plate_photo where visit_id = ?")
        .param(visit.value())
        .query(PlatePhotos::photo)
        .optional();
  }

  /** The photograph of the latest visit that has one. */
  public Optional<PlatePhoto> latestOf(UnitId unit) {
    return jdbc.sql(
            """
            select p.* from plate_photo p join visit v on v.id = p.visit_id where v.unit_id = ?
            order by v.opened_at desc, v.id fetch first 1 rows only
            """)
        .param(unit.value())
        .query(PlatePhotos::photo)
        .optional();
  }

  /**
   * Cleans and keeps a photograph in place of the one before.
   *
   * @throws NotFoundException if there is no such visit
   * @throws RefusedRequestException if the visit is closed or the picture cannot be used
   * @throws StoreException if the disk does not take it
   */
  public PlatePhoto put(VisitId visit, String takenInBy, InputStream in)
      throws IOException, StoreException {
    requireOpen(visit);
    PhotoCleaner.Cleaned cleaned = PhotoCleaner.clean(in);
    StoredBytes bytes = store.receive(new ByteArrayInputStream(cleaned.jpeg()));
    PlatePhoto photo =
        new PlatePhoto(
            visit,
            bytes,
            cleaned.widthPx(),
            cleaned.heightPx(),
            clock.instant().truncatedTo(ChronoUnit.MICROS),
            takenInBy);
    transactions.executeWithoutResult(
        status -> {
          jdbc.sql("delete from plate_photo where visit_id = ?").param(visit.value()).update();
          jdbc.sql(
                  """
                  insert into plate_photo (visit_id, sha256, byte_length, width_px, height_px,
                    taken_in_at, taken_in_by)
                  values (?, ?, ?, ?, ?, ?, ?)
                  """)
              .params(
                  visit.value(),
                  bytes.sha256(),
                  bytes.length(),
                  photo.widthPx(),
                  photo.heightPx(),
                  photo.takenInAt().atOffset(ZoneOffset.UTC),
                  takenInBy)
              .update();
        });
    return photo;
  }

  /**
   * Takes the photograph off a visit.
   *
   * @throws RefusedRequestException if the visit is closed
   */
  public void remove(VisitId visit) {
    requireOpen(visit);
    jdbc.sql("delete from plate_photo where visit_id = ?").param(visit.value()).update();
  }

  public ByteSource open(PlatePhoto photo) {
    return store.open(photo.bytes());
  }

  private void requireOpen(VisitId id) {
    Visit visit = visits.find(id).orElseThrow(() -> new NotFoundException("visit"));
    if (!visit.isOpen()) {
      throw new RefusedRequestException(
          "visitClosed", "This visit is closed: take it up again before changing its photograph.");
    }
  }

  private static PlatePhoto photo(ResultSet row, int number) throws SQLException {
    return new PlatePhoto(
        new VisitId(row.getObject("visit_id", UUID.class)),
        new StoredBytes(row.getString("sha256"), row.getLong("byte_length")),
        row.getInt("width_px"),
        row.getInt("height_px"),
        row.getObject("taken_in_at", OffsetDateTime.class).toInstant(),
        row.getString("taken_in_by"));
  }
}
