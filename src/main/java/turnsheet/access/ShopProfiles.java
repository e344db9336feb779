package turnsheet.access;

import java.util.Base64;
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

  /** A mark stands in every issued report, so it is kept small. */
  public static final int LOGO_BYTES = 200_000;

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

  /** The shop's mark as a data address; empty where it has none. */
  public Optional<String> logo() {
    return jdbc.sql("select media_type, content from shop_logo where id = 1")
        .query(
            (row, n) ->
                "data:"
                    + row.getString("media_type")
                    + ";base64,"
                    + Base64.getEncoder().encodeToString(row.getBytes("content")))
        .optional();
  }

  /**
   * Puts a mark in place of the one there is.
   *
   * @param content a picture that was looked at before, {@link #LOGO_BYTES} at most
   */
  @Transactional
  public void putLogo(String mediaType, byte[] content) {
    if (content.length > LOGO_BYTES) {
      throw new IllegalArgumentException(content.length + " bytes");
    }
    removeLogo();
    jdbc.sql("insert into shop_logo (id, media_type, content) values (1, ?, ?)")
        .params(mediaType, content)
        .update();
  }

  @Transactional
  public void removeLogo() {
    jdbc.sql("delete from shop_logo").update();
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
