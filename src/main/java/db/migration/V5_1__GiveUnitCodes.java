package db.migration;

import java.sql.PreparedStatement;
import java.sql.ResultSet;
import java.sql.SQLException;
import java.sql.Statement;
import java.util.ArrayList;
import java.util.HashSet;
import java.util.List;
import java.util.Set;
import java.util.UUID;
import org.flywaydb.core.api.migration.BaseJavaMigration;
import org.flywaydb.core.api.migration.Context;
import turnsheet.shop.UnitCode;

/** Gives the units that were there before codes were a code each; from now on each has one. */
@SuppressWarnings("MemberName") // Flyway reads the version from the name
public final class V5_1__GiveUnitCodes extends BaseJavaMigration {

  @Override
  public void migrate(Context context) throws SQLException {
    try (Statement statement = context.getConnection().createStatement()) {
      List<UUID> units = new ArrayList<>();
      try (ResultSet rows = statement.executeQuery("select id from unit")) {
        while (rows.next()) {
          units.add(rows.getObject(1, UUID.class));
        }
      }
      Set<UnitCode> given = new HashSet<>();
      try (PreparedStatement update =
          context.getConnection().prepareStatement("update unit set code = ? where id = ?")) {
        for (UUID unit : units) {
          UnitCode code = UnitCode.next();
          while (!given.add(code)) {
            code = UnitCode.next();
          }
          update.setString(1, code.letters());
          update.setObject(2, unit);
          update.executeUpdate();
        }
      }
      statement.execute("alter table unit alter column code set not null");
      statement.execute("alter table unit add constraint unit_code unique (code)");
    }
  }
}
