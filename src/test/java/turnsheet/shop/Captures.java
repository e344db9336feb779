package turnsheet.shop;

import java.util.UUID;
import turnsheet.testing.Database;

/**
 * A capture's row, written past the feature that makes them: here it only has to stand in the way.
 */
final class Captures {

  private Captures() {}

  static void insertOne(Database database, ShopFixture shop, Unit unit) {
    insertOne(database, shop, unit, shop.visits.open(unit.id(), ""));
  }

  /** In the transaction at hand, where there is one. */
  static void insertOne(Database database, ShopFixture shop, Unit unit, Visit visit) {
    SpeedSetting setting = shop.models.find(unit.modelId()).orElseThrow().settings().get(0);
    database
        .jdbc()
        .sql(
            """
            insert into capture (id, visit_id, speed_setting_id, bench_condition, file_name,
              sha256, byte_length, received_at, received_by, state)
            values (?, ?, ?, 'as received', 'a.wav', ?, 1, ?, 'bench', 'STORED')
            """)
        .params(
            UUID.randomUUID(),
            visit.id().value(),
            setting.id().value(),
            "0".repeat(64),
            Columns.time(ShopFixture.NOW))
        .update();
  }
}
