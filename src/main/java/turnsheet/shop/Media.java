package turnsheet.shop;

import java.sql.ResultSet;
import java.sql.SQLException;
import java.sql.Types;
import java.util.List;
import java.util.Optional;
import org.springframework.dao.DuplicateKeyException;
import org.springframework.jdbc.core.simple.JdbcClient;
import org.springframework.stereotype.Component;

/** The reference media of the shop: a handful. */
@Component
public final class Media {

  private static final PageQuery.Listing LISTING =
      new PageQuery.Listing(
          "select *", "from reference_medium", "", List.of(), "name", "order by lower(name), id");

  private final JdbcClient jdbc;

  public Media(JdbcClient jdbc) {
    this.jdbc = jdbc;
  }

  public Optional<ReferenceMedium> find(MediumId id) {
    return jdbc.sql("select * from reference_medium where id = ?")
        .param(id.value())
        .query(Media::medium)
        .optional();
  }

  /** All of them in the order of names, for a choice. */
  public List<ReferenceMedium> all() {
    return jdbc.sql("select * from reference_medium order by lower(name), id")
        .query(Media::medium)
        .list();
  }

  public PageOf<ReferenceMedium> page(PageQuery query) {
    return query.run(jdbc, LISTING, Media::medium);
  }

  /**
   * Enters a medium.
   *
   * @throws RefusedChangeException {@code mediumNameTaken}
   */
  public ReferenceMedium add(ReferenceMedium added) {
    return write(
        added,
        """
        insert into reference_medium
          (name, tone_hz, speed_tolerance_percent, own_flutter_percent, note, id)
        values (?, ?, ?, ?, ?, ?)
        """);
  }

  /**
   * Writes what a medium is now; nothing where there is no such medium.
   *
   * @throws RefusedChangeException {@code mediumNameTaken}
   */
  public Optional<ReferenceMedium> change(ReferenceMedium changed) {
    return find(changed.id())
        .map(
            old ->
                write(
                    changed,
                    """
                    update reference_medium set name = ?, tone_hz = ?,
                      speed_tolerance_percent = ?, own_flutter_percent = ?, note = ?
                    where id = ?
                    """));
  }

  private ReferenceMedium write(ReferenceMedium medium, String sql) {
    try {
      jdbc.sql(sql)
          .param(1, medium.name())
          .param(2, medium.toneHz(), Types.DOUBLE)
          .param(3, medium.speedTolerancePercent())
          .param(4, medium.ownFlutterPercent(), Types.DOUBLE)
          .param(5, medium.note())
          .param(6, medium.id().value())
          .update();
      return medium;
    } catch (DuplicateKeyException e) {
      throw new RefusedChangeException("mediumNameTaken", medium.name());
    }
  }

  private static ReferenceMedium medium(ResultSet row, int number) throws SQLException {
    return new ReferenceMedium(
        new MediumId(Columns.uuid(row, "id")),
        row.getString("name"),
        Columns.doubleOrNull(row, "tone_hz"),
        row.getDouble("speed_tolerance_percent"),
        Columns.doubleOrNull(row, "own_flutter_percent"),
        row.getString("note"));
  }
}
