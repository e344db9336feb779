package turnsheet.access;

import java.util.Arrays;
import java.util.Optional;
import org.springframework.jdbc.core.simple.JdbcClient;
import org.springframework.stereotype.Service;

/** How the shop likes to see things. No stored figure depends on it. */
@Service
public class ShopPreferences {

  /** Which unit of tape speed comes first; speeds are kept in cm/s whatever it is. */
  public enum SpeedLiking {
    CM_PER_S,
    IN_PER_S
  }

  /** What is printed on. */
  public enum Paper {
    A4("A4"),
    LETTER("letter");

    private final String css;

    Paper(String css) {
      this.css = css;
    }

    /** Its name in CSS Paged Media. */
    public String css() {
      return css;
    }
  }

  /**
   * The preferences.
   *
   * @param mainsHz 50 or 60: which hum is told from other lines
   */
  public record Liked(SpeedLiking speeds, int mainsHz, Paper paper) {

    /** Before anyone has said otherwise. */
    public static final Liked USUAL = new Liked(SpeedLiking.CM_PER_S, 50, Paper.A4);

    public Liked {
      if (mainsHz != 50 && mainsHz != 60) {
        throw new IllegalArgumentException("mains " + mainsHz + " Hz");
      }
    }
  }

  private final JdbcClient jdbc;

  public ShopPreferences(JdbcClient jdbc) {
    this.jdbc = jdbc;
  }

  public Liked get() {
    return jdbc.sql("select speed_unit, mains_hz, paper from shop_profile where id = 1")
        .query(
            (row, n) ->
                new Liked(
                    named(SpeedLiking.values(), row.getString("speed_unit"))
                        .orElse(Liked.USUAL.speeds()),
                    row.getInt("mains_hz"),
                    named(Paper.values(), row.getString("paper")).orElse(Liked.USUAL.paper())))
        .optional()
        .orElse(Liked.USUAL);
  }

  /** Keeps them beside the letterhead, which is there since the first run. */
  public void put(Liked liked) {
    jdbc.sql("update shop_profile set speed_unit = ?, mains_hz = ?, paper = ? where id = 1")
        .params(liked.speeds().name(), liked.mainsHz(), liked.paper().name())
        .update();
  }

  private static <E extends Enum<E>> Optional<E> named(E[] values, String name) {
    return Arrays.stream(values).filter(v -> v.name().equals(name)).findFirst();
  }
}
