package turnsheet.testing;

import java.time.Instant;
import java.time.OffsetDateTime;
import java.time.ZoneOffset;
import java.time.temporal.ChronoUnit;
import java.util.ArrayList;
import java.util.HashSet;
import java.util.List;
import java.util.Set;
import java.util.UUID;
import java.util.stream.Collectors;
import java.util.stream.Stream;
import org.springframework.jdbc.core.JdbcTemplate;
import turnsheet.core.measure.FigureName;
import turnsheet.shop.UnitCode;

/**
 * A shop after many years, written past the repositories: 1000 units of five models, half of them
 * of one, five visits a unit with two readings each, all recorded with one instrument; documents
 * hold next to nothing. Forty visits are still open.
 */
public final class BigShop {

  public static final int UNITS = 1000;
  public static final int READINGS = 10_000;

  private static final int MODELS = 5;
  private static final int CUSTOMERS = 200;
  private static final int VISITS = 5;
  private static final int OPEN = 40;
  private static final Instant FIRST = Instant.parse("2015-01-01T09:00:00Z");

  /** Of the model that half of the units are of. */
  public final UUID model = id(1, 0);

  public final UUID setting = id(2, 0);
  public final UUID customer = id(3, 0);
  public final UUID instrument = id(4, 0);
  public final UUID unit = id(5, 0);

  /** Open. */
  public final UUID visit = id(6, VISITS - 1);

  private final JdbcTemplate jdbc;

  public BigShop(JdbcTemplate jdbc) {
    this.jdbc = jdbc;
    models();
    units();
    visits();
    captures();
  }

  private void models() {
    List<Object[]> models = new ArrayList<>();
    List<Object[]> settings = new ArrayList<>();
    List<Object[]> limits = new ArrayList<>();
    for (int m = 0; m < MODELS; m++) {
      models.add(new Object[] {id(1, m), "Invented deck " + m, ""});
      settings.add(new Object[] {id(2, m), id(1, m), 0, "19 cm/s", "CM_PER_S", 19.05, 3150.0});
      limits.add(
          new Object[] {id(1, m), id(2, m), "flutter.weightedTwoSigmaPercent", 0.06, "rule"});
    }
    jdbc.batchUpdate("insert into machine_model (id, name, note) values (?, ?, ?)", models);
    jdbc.batchUpdate(
        "insert into speed_setting (id, model_id, position, label, speed_unit, nominal_speed,"
            + " tone_hz) values (?, ?, ?, ?, ?, ?, ?)",
        settings);
    jdbc.batchUpdate(
        "insert into service_limit (model_id, position, speed_setting_id, figure, upper_bound,"
            + " origin) values (?, 0, ?, ?, ?, ?)",
        limits);
    jdbc.update(
        "insert into bench_instrument (id, name, clock_error_ppm, note) values (?, 'Card', 0, '')",
        instrument);
  }

  private void units() {
    List<Object[]> customers = new ArrayList<>();
    for (int c = 0; c < CUSTOMERS; c++) {
      customers.add(new Object[] {id(3, c), "Customer %04d".formatted(c), "", time(0)});
    }
    jdbc.batchUpdate(
        "insert into customer (id, name, contact, created_at) values (?, ?, ?, ?)", customers);
    Set<UnitCode> codes = new HashSet<>();
    List<Object[]> units = new ArrayList<>();
    for (int u = 0; u < UNITS; u++) {
      UnitCode code = UnitCode.next();
      while (!codes.add(code)) {
        code = UnitCode.next();
      }
      String serial = "S%05d".formatted(u);
      units.add(
          new Object[] {
            id(5, u), code.letters(), id(1, modelOf(u)), id(3, u % CUSTOMERS), serial, "", time(0)
          });
    }
    jdbc.batchUpdate(
        "insert into unit (id, code, model_id, customer_id, serial_number, note, created_at)"
            + " values (?, ?, ?, ?, ?, ?, ?)",
        units);
  }

  private void visits() {
    List<Object[]> visits = new ArrayList<>();
    for (int u = 0; u < UNITS; u++) {
      for (int v = 0; v < VISITS; v++) {
        OffsetDateTime closed = v == VISITS - 1 && u < OPEN ? null : time(day(u, v) + 3);
        visits.add(
            new Object[] {
              id(6, u * VISITS + v), id(5, u), time(day(u, v)), closed, "check", "done"
            });
      }
    }
    jdbc.batchUpdate(
        "insert into visit (id, unit_id, opened_at, closed_at, complaint, work_done)"
            + " values (?, ?, ?, ?, ?, ?)",
        visits);
  }

  private void captures() {
    List<Object[]> captures = new ArrayList<>();
    List<Object[]> readings = new ArrayList<>();
    for (int c = 0; c < READINGS; c++) {
      int visit = c / 2;
      int unit = visit / VISITS;
      String condition = c % 2 == 0 ? "as received" : "after repair";
      OffsetDateTime at = time(day(unit, visit % VISITS) + 1 + c % 2);
      captures.add(
          new Object[] {
            id(7, c), id(6, visit), id(2, modelOf(unit)), condition, instrument, "0".repeat(64), at
          });
      readings.add(new Object[] {id(8, c), id(7, c), at});
    }
    jdbc.batchUpdate(
        "insert into capture (id, visit_id, speed_setting_id, bench_condition, instrument_id,"
            + " file_name, sha256, byte_length, received_at, received_by, state)"
            + " values (?, ?, ?, ?, ?, 'tone.wav', ?, 1000, ?, 'somebody', 'measured')",
        captures);
    jdbc.batchUpdate(
        "insert into reading (id, capture_id, method_version, made_at, document, channel)"
            + " values (?, ?, '2', ?, '{}', 1)",
        readings);
    String paths =
        Stream.of(FigureName.values())
            .map(name -> "('" + name.path() + "'), ")
            .collect(Collectors.joining());
    // in the database: 90 000 rows one by one take longer than everything else
    jdbc.update(
        "insert into reading_figure (reading_id, figure, amount, expanded_uncertainty)"
            + " select r.id, f.path, 0.04 + 0.02 * rand(), 0.002 from reading r cross join (values "
            + paths
            + "('signal.floorPercent')) f (path)");
  }

  private static int modelOf(int unit) {
    return unit % 2 == 0 ? 0 : 1 + unit / 2 % (MODELS - 1);
  }

  /** Every other year, spread over the year. */
  private static int day(int unit, int visit) {
    return 730 * visit + unit % 365;
  }

  private static OffsetDateTime time(int day) {
    return FIRST.plus(day, ChronoUnit.DAYS).atOffset(ZoneOffset.UTC);
  }

  private static UUID id(int kind, int number) {
    return new UUID(kind, number);
  }
}
