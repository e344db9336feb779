package turnsheet.reading;

import java.time.Clock;
import java.time.Instant;
import java.time.OffsetDateTime;
import java.time.ZoneOffset;
import java.util.List;
import org.springframework.jdbc.core.simple.JdbcClient;
import org.springframework.transaction.support.TransactionOperations;
import turnsheet.capture.CaptureId;
import turnsheet.core.measure.FigureName;
import turnsheet.shop.Customers;
import turnsheet.shop.MachineModel;
import turnsheet.shop.MachineModels;
import turnsheet.shop.ModelId;
import turnsheet.shop.PartBasis;
import turnsheet.shop.RotatingPart;
import turnsheet.shop.ServiceLimit;
import turnsheet.shop.SpeedSetting;
import turnsheet.shop.SpeedSettingId;
import turnsheet.shop.SpeedUnit;
import turnsheet.shop.Unit;
import turnsheet.shop.Units;
import turnsheet.shop.Visit;
import turnsheet.shop.VisitId;
import turnsheet.shop.Visits;

/** One unit on the bench, with places for captures. */
public final class SampleBench {

  public final MachineModel model;
  public final SpeedSettingId setting;
  public final Unit unit;
  public final Visit visit;
  private final JdbcClient jdbc;
  private final Units units;

  public SampleBench(JdbcClient jdbc, TransactionOperations transactions, Clock clock) {
    this.jdbc = jdbc;
    this.setting = SpeedSettingId.next();
    ModelId modelId = ModelId.next();
    String name = "Testdeck " + modelId.toString().substring(0, 8);
    this.model =
        new MachineModels(jdbc, transactions)
            .add(
                new MachineModel(
                    modelId,
                    name,
                    null,
                    "",
                    List.of(
                        new SpeedSetting(
                            setting, "19 cm/s", SpeedUnit.CM_PER_S, 19.05, 3150.0, 800.0)),
                    // turns 10.0 times a second at 19.05 cm/s
                    List.of(
                        new RotatingPart(
                            "capstan shaft", PartBasis.DIAMETER_MM, 190.5 / (10 * Math.PI), null)),
                    List.of(
                        new ServiceLimit(setting, FigureName.DEVIATION, 0.5, "service manual"),
                        new ServiceLimit(
                            setting, FigureName.WEIGHTED_TWO_SIGMA, 0.06, "service manual"))));
    var customer = new Customers(jdbc, clock).add("A. Customer", "");
    this.units = new Units(jdbc, transactions, clock);
    this.unit = units.add(modelId, customer.id(), "0042", "");
    this.visit = new Visits(jdbc, transactions, clock).open(unit.id(), "voices waver");
  }

  /** Another unit of the model, with nothing behind it. */
  public Unit anotherUnit(String serialNumber) {
    return units.add(model.id(), unit.customerId(), serialNumber, "");
  }

  /** A visit of a unit that was over on the day it began. */
  public VisitId pastVisit(Unit of, Instant opened) {
    VisitId id = VisitId.next();
    jdbc.sql(
            """
            insert into visit (id, unit_id, opened_at, closed_at, complaint, work_done)
            values (?, ?, ?, ?, '', '')
            """)
        .params(id.value(), of.id().value(), utc(opened), utc(opened))
        .update();
    return id;
  }

  /** A capture in a state, without bytes behind it. */
  public CaptureId capture(String condition, String state) {
    return capture(visit.id(), condition, state, Instant.parse("2026-03-01T10:00:00Z"));
  }

  /** A capture of a visit that arrived at a time. */
  public CaptureId capture(VisitId of, String condition, String state, Instant receivedAt) {
    CaptureId id = CaptureId.next();
    jdbc.sql(
            """
            insert into capture (id, visit_id, speed_setting_id, bench_condition, file_name, sha256,
              byte_length, received_at, received_by, state, refusal_message)
            values (?, ?, ?, ?, 'tone.wav', ?, 1000, ?, 'technician', ?, ?)
            """)
        .params(
            id.value(),
            of.value(),
            setting.value(),
            condition,
            "ab".repeat(32),
            utc(receivedAt),
            state,
            state.equals("refused") ? "The file is silent: record it again." : "")
        .update();
    return id;
  }

  private static OffsetDateTime utc(Instant at) {
    return at.atOffset(ZoneOffset.UTC);
  }
}
