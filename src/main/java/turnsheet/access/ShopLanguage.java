package turnsheet.access;

import java.util.Locale;
import java.util.Optional;
import org.springframework.jdbc.core.simple.JdbcClient;
import org.springframework.stereotype.Service;
import turnsheet.web.PageLanguage;

/** The language in which the shop reads its pages. Reports are issued in one of their own. */
@Service
public class ShopLanguage {

  private final JdbcClient jdbc;

  ShopLanguage(JdbcClient jdbc) {
    this.jdbc = jdbc;
  }

  /** Empty before the first run is over. */
  public Optional<Locale> get() {
    return jdbc.sql("select language from shop_profile where id = 1")
        .query((row, n) -> PageLanguage.of(row.getString("language")))
        .optional();
  }

  /** Keeps it beside the letterhead, which is there since the first run. */
  public void put(Locale locale) {
    jdbc.sql("update shop_profile set language = ? where id = 1")
        .params(PageLanguage.of(locale.getLanguage()).getLanguage())
        .update();
  }
}
