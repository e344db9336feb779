package turnsheet.shop;

import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.stream.Stream;
import org.springframework.jdbc.core.RowMapper;
import org.springframework.jdbc.core.simple.JdbcClient;

/**
 * Which page of which items is wanted.
 *
 * @param words what each item must contain, in any order; blank for all
 * @param number counted from 1
 * @param size most items on the page
 */
public record PageQuery(String words, int number, int size) {

  /** More words than a person would type only cost time. */
  private static final int MOST_WORDS = 6;

  private static final int LAST_NUMBER = 1_000_000;

  /** Brings whatever was asked for within bounds: it comes from an address. */
  public PageQuery {
    number = Math.min(Math.max(1, number), LAST_NUMBER);
    size = Math.min(Math.max(1, size), PageOf.LARGEST);
  }

  /** The first page of everything. */
  public static PageQuery first(int size) {
    return new PageQuery("", 1, size);
  }

  /** Two statements: how many there are, and this page of them. */
  <T> PageOf<T> run(JdbcClient jdbc, Listing listing, RowMapper<T> mapper) {
    List<Object> params = new ArrayList<>(listing.params());
    List<String> conditions = new ArrayList<>();
    if (!listing.condition().isBlank()) {
      conditions.add(listing.condition());
    }
    for (String pattern : patterns()) {
      conditions.add("lower(" + listing.searched() + ") like ? escape '!'");
      params.add(pattern);
    }
    String where = conditions.isEmpty() ? "" : " where " + String.join(" and ", conditions);
    String from = " " + listing.from() + where;
    long total = jdbc.sql("select count(*)" + from).params(params).query(Long.class).single();
    String page = " limit " + size + " offset " + (long) (number - 1) * size;
    List<T> items =
        jdbc.sql(listing.select() + from + " " + listing.order() + page)
            .params(params)
            .query(mapper)
            .list();
    return new PageOf<>(items, number, size, total);
  }

  private List<String> patterns() {
    return Stream.of(words.toLowerCase(Locale.ROOT).split("\\s+"))
        .filter(w -> !w.isBlank())
        .limit(MOST_WORDS)
        .map(w -> "%" + w.replaceAll("([!%_])", "!$1") + "%")
        .toList();
  }

  /**
   * What the pages are cut from.
   *
   * @param select {@code select ...} without {@code from}
   * @param from {@code from ...} with joins, ending before {@code where}
   * @param condition on the rows besides the words; blank for none
   * @param params of the condition
   * @param searched expression that the words are looked for in
   * @param order {@code order by ...}
   */
  record Listing(
      String select,
      String from,
      String condition,
      List<Object> params,
      String searched,
      String order) {

    Listing where(String narrower, Object... its) {
      return new Listing(select, from, narrower, List.of(its), searched, order);
    }
  }
}
