package turnsheet.shop.web;

import java.util.List;
import java.util.function.Function;
import turnsheet.shop.PageOf;

/**
 * A page of a list in JSON.
 *
 * @param page counted from 1
 * @param size most items on a page
 * @param total items on all pages
 */
record PageDocument<T>(List<T> items, int page, int size, long total) {

  static <S, T> PageDocument<T> of(PageOf<S> page, Function<S, T> item) {
    return new PageDocument<>(
        page.items().stream().map(item).toList(), page.number(), page.size(), page.total());
  }
}
