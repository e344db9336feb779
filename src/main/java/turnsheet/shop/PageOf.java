package turnsheet.shop;

import java.util.List;
import java.util.function.Function;

/**
 * A stretch of a longer list.
 *
 * @param number of this page, counted from 1
 * @param size most items on a page
 * @param total items on all pages
 */
public record PageOf<T>(List<T> items, int number, int size, long total) {

  /** Most items that one page may hold. */
  public static final int LARGEST = 200;

  public PageOf {
    items = List.copyOf(items);
    if (number < 1 || size < 1 || size > LARGEST || total < 0) {
      throw new IllegalArgumentException("page " + number + " of " + size + ", total " + total);
    }
  }

  public int lastNumber() {
    return (int) Math.max(1, (total + size - 1) / size);
  }

  public <R> PageOf<R> map(Function<T, R> change) {
    return new PageOf<>(items.stream().map(change).toList(), number, size, total);
  }
}
