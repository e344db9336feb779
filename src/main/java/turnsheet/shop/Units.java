package turnsheet.shop;

import java.sql.ResultSet;
import java.sql.SQLException;
import java.time.Clock;
import java.util.List;
import java.util.Optional;
import org.springframework.dao.DuplicateKeyException;
import org.springframework.jdbc.core.simple.JdbcClient;
import org.springframework.stereotype.Component;
import org.springframework.transaction.support.TransactionOperations;

/** The units that the shop knows. */
@Component
public final class Units {

  private static final String SUMMARY =
      """
      select u.*, m.name as model_name, c.name as customer_name,
        (select count(*) from visit v where v.unit_id = u.id) as visits,
        (select max(v.opened_at) from visit v where v.unit_id = u.id) as last_opened_at,
        (select count(*) from visit v where v.unit_id = u.id and v.closed_at is null) as open_visits
      """;

  private static final String JOINED =
      """
      from unit u join machine_model m on m.id = u.model_id
        join customer c on c.id = u.customer_id
      """;

  private static final PageQuery.Listing LISTING =
      new PageQuery.Listing(
          SUMMARY,
          JOINED,
          "",
          List.of(),
          "u.serial_number || ' ' || m.name || ' ' || c.name",
          "order by coalesce((select max(v.opened_at) from visit v where v.unit_id = u.id),"
              + " u.created_at) desc, u.id");

  private final JdbcClient jdbc;
  private final TransactionOperations transactions;
  private final Clock clock;

  public Units(JdbcClient jdbc, TransactionOperations transactions, Clock clock) {
    this.jdbc = jdbc;
    this.transactions = transactions;
    this.clock = clock;
  }

  public Optional<Unit> find(UnitId id) {
    return jdbc.sql("select * from unit where id = ?")
        .param(id.value())
        .query(Units::unit)
        .optional();
  }

  /** The unit whose label says this. */
  public Optional<Unit> coded(UnitCode code) {
    return jdbc.sql("select * from unit where code = ?")
        .param(code.letters())
        .query(Units::unit)
        .optional();
  }

  /** The unit with the names of its model and customer. */
  public Optional<UnitSummary> summary(UnitId id) {
    return jdbc.sql(SUMMARY + JOINED + " where u.id = ?")
        .param(id.value())
        .query(Units::summary)
        .optional();
  }

  /** The unit of a model with this serial number, capitals aside. */
  public Optional<Unit> numbered(ModelId model, String serialNumber) {
    return jdbc.sql("select * from unit where model_id = ? and lower(serial_number) = lower(?)")
        .params(model.value(), serialNumber.strip())
        .query(Units::unit)
        .optional();
  }

  /** A page, last seen first; words are looked for in serial number, model and customer. */
  public PageOf<UnitSummary> page(PageQuery query) {
    return query.run(jdbc, LISTING, Units::summary);
  }

  /** A page of one customer's units. */
  public PageOf<UnitSummary> ofCustomer(CustomerId customer, PageQuery query) {
    return query.run(jdbc, LISTING.where("u.customer_id = ?", customer.value()), Units::summary);
  }

  /** A page of the units of one model. */
  public PageOf<UnitSummary> ofModel(ModelId model, PageQuery query) {
    return query.run(jdbc, LISTING.where("u.model_id = ?", model.value()), Units::summary);
  }

  /**
   * Enters a unit.
   *
   * @throws RefusedChangeException {@code serialTaken} where the model has that number already
   */
  public Unit add(ModelId model, CustomerId customer, String serialNumber, String note) {
    Unit added =
        new Unit(
            UnitId.next(),
            freeCode(),
            model,
            customer,
            serialNumber,
            note,
            Columns.kept(clock.instant()));
    refuseTakenNumber(added);
    try {
      jdbc.sql(
              """
              insert into unit (id, code, model_id, customer_id, serial_number, note, created_at)
              values (?, ?, ?, ?, ?, ?, ?)
              """)
          .params(
              added.id().value(),
              added.code().letters(),
              model.value(),
              customer.value(),
              serialNumber,
              note,
              Columns.time(added.createdAt()))
          .update();
    } catch (DuplicateKeyException e) {
      throw taken(added);
    }
    return added;
  }

  /**
   * Writes what a unit is now; its id and the time it was entered stay. A recording that comes in
   * meanwhile waits, or is waited for: see {@link Visits#lock}.
   *
   * @throws RefusedChangeException {@code serialTaken}, or {@code modelHasCaptures} where the model
   *     changes although captures name its speed settings
   */
  public Optional<Unit> change(
      UnitId id, ModelId model, CustomerId customer, String serialNumber, String note) {
    return transactions.execute(
        status -> {
          lock(jdbc, id);
          return find(id)
              .map(
                  old -> {
                    if (!old.modelId().equals(model) && hasCaptures(id)) {
                      throw new RefusedChangeException("modelHasCaptures", old.serialNumber());
                    }
                    return write(
                        new Unit(
                            id, old.code(), model, customer, serialNumber, note, old.createdAt()));
                  });
        });
  }

  /** Changes to a unit, its visits and what comes in for them queue here until they commit. */
  static void lock(JdbcClient jdbc, UnitId unit) {
    jdbc.sql("select id from unit where id = ? for update")
        .param(unit.value())
        .query((row, n) -> n)
        .list();
  }

  private UnitCode freeCode() {
    UnitCode code = UnitCode.next();
    while (coded(code).isPresent()) {
      code = UnitCode.next();
    }
    return code;
  }

  private Unit write(Unit changed) {
    refuseTakenNumber(changed);
    try {
      jdbc.sql(
              """
              update unit set model_id = ?, customer_id = ?, serial_number = ?, note = ?
              where id = ?
              """)
          .params(
              changed.modelId().value(),
              changed.customerId().value(),
              changed.serialNumber(),
              changed.note(),
              changed.id().value())
          .update();
    } catch (DuplicateKeyException e) {
      throw taken(changed);
    }
    return changed;
  }

  /** Asked before writing, because PostgreSQL spoils the transaction of a failed statement. */
  private void refuseTakenNumber(Unit unit) {
    numbered(unit.modelId(), unit.serialNumber())
        .filter(other -> !other.id().equals(unit.id()))
        .ifPresent(
            other -> {
              throw taken(unit);
            });
  }

  private static RefusedChangeException taken(Unit unit) {
    return new RefusedChangeException("serialTaken", unit.serialNumber());
  }

  private boolean hasCaptures(UnitId id) {
    return jdbc.sql(
                """
                select count(*) from capture c join visit v on v.id = c.visit_id
                where v.unit_id = ?
                """)
            .param(id.value())
            .query(Long.class)
            .single()
        > 0;
  }

  private static UnitSummary summary(ResultSet row, int number) throws SQLException {
    return new UnitSummary(
        unit(row, number),
        row.getString("model_name"),
        row.getString("customer_name"),
        row.getInt("visits"),
        Columns.instantOrNull(row, "last_opened_at"),
        row.getInt("open_visits") > 0);
  }

  private static Unit unit(ResultSet row, int number) throws SQLException {
    return new Unit(
        new UnitId(Columns.uuid(row, "id")),
        new UnitCode(row.getString("code")),
        new ModelId(Columns.uuid(row, "model_id")),
        new CustomerId(Columns.uuid(row, "customer_id")),
        row.getString("serial_number"),
        row.getString("note"),
        Columns.instant(row, "created_at"));
  }
}
