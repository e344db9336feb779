package turnsheet.shop;

import java.sql.ResultSet;
import java.sql.SQLException;
import java.sql.Types;
import java.time.LocalDate;
import java.util.List;
import java.util.Optional;
import org.springframework.dao.DuplicateKeyException;
import org.springframework.jdbc.core.simple.JdbcClient;
import org.springframework.stereotype.Component;

/** The bench instruments of the shop: a handful. */
@Component
public final class Instruments {

  private static final PageQuery.Listing LISTING =
      new PageQuery.Listing(
          "select *", "from bench_instrument", "", List.of(), "name", "order by lower(name), id");

  private final JdbcClient jdbc;

  public Instruments(JdbcClient jdbc) {
    this.jdbc = jdbc;
  }

  public Optional<BenchInstrument> find(InstrumentId id) {
    return jdbc.sql("select * from bench_instrument where id = ?")
        .param(id.value())
        .query(Instruments::instrument)
        .optional();
  }

  /** All of them in the order of names, for a choice. */
  public List<BenchInstrument> all() {
    return jdbc.sql("select * from bench_instrument order by lower(name), id")
        .query(Instruments::instrument)
        .list();
  }

  public PageOf<BenchInstrument> page(PageQuery query) {
    return query.run(jdbc, LISTING, Instruments::instrument);
  }

  /**
   * Enters an instrument.
   *
   * @throws RefusedChangeException {@code instrumentNameTaken}
   */
  public BenchInstrument add(BenchInstrument added) {
    return write(
        added,
        """
        insert into bench_instrument
          (name, clock_error_ppm, clock_expanded_uncertainty_ppm, checked_on, note, id)
        values (?, ?, ?, ?, ?, ?)
        """);
  }

  /**
   * Writes what an instrument is now; nothing where there is no such instrument.
   *
   * @throws RefusedChangeException {@code instrumentNameTaken}
   */
  public Optional<BenchInstrument> change(BenchInstrument changed) {
    return find(changed.id())
        .map(
            old ->
                write(
                    changed,
                    """
                    update bench_instrument set name = ?, clock_error_ppm = ?,
                      clock_expanded_uncertainty_ppm = ?, checked_on = ?, note = ?
                    where id = ?
                    """));
  }

  private BenchInstrument write(BenchInstrument instrument, String sql) {
    try {
      jdbc.sql(sql)
          .param(1, instrument.name())
          .param(2, instrument.clockErrorPpm())
          .param(3, instrument.clockExpandedUncertaintyPpm(), Types.DOUBLE)
          .param(4, instrument.checkedOn(), Types.DATE)
          .param(5, instrument.note())
          .param(6, instrument.id().value())
          .update();
      return instrument;
    } catch (DuplicateKeyException e) {
      throw new RefusedChangeException("instrumentNameTaken", instrument.name());
    }
  }

  private static BenchInstrument instrument(ResultSet row, int number) throws SQLException {
    return new BenchInstrument(
        new InstrumentId(Columns.uuid(row, "id")),
        row.getString("name"),
        row.getDouble("clock_error_ppm"),
        Columns.doubleOrNull(row, "clock_expanded_uncertainty_ppm"),
        row.getObject("checked_on", LocalDate.class),
        row.getString("note"));
  }
}
