package turnsheet.access;

import java.util.Optional;
import org.springframework.jdbc.core.simple.JdbcClient;
import org.springframework.stereotype.Service;
import org.springframework.transaction.annotation.Transactional;

/** The shop's letterhead. */
@Service
public class ShopProfiles {

  /**
   * What stands at the head of a sheet.
   *
   * @param address lines separated by line feeds; may be empty
   */
  public record ShopProfile(String name, String address) {}

  private final JdbcClient jdbc;

  ShopProfiles(JdbcClient jdbc) {
    this.jdbc = jdbc;
  }

  /** The letterhead; empty before the first run is over. */
  public Optional<ShopProfile> get() {
    return jdbc.sql("select name, address from shop_profile where id = 1")
        .query((row, n) -> new ShopProfile(row.getString("name"), row.getString("address")))
        .optional();
  }

  @Transactional
  public void put(ShopProfile profile) {
    boolean there = get().isPresent();
    jdbc.sql(
            there
                ? "update shop_profile set name = :name, address = :address where id = 1"
                : "insert into shop_profile (id, name, address) values (1, :name, :address)")
        .param("name", profile.name())
        .param("address", profile.address())
        .update();
  }
}
