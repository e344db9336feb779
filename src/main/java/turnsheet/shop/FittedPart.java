package turnsheet.shop;

import java.util.List;
import java.util.regex.Matcher;
import java.util.regex.Pattern;
import java.util.stream.Collectors;
import org.jspecify.annotations.Nullable;

/**
 * A part that the bench has fitted.
 *
 * @param quantity null where nobody counted
 */
public record FittedPart(String name, @Nullable Integer quantity) {

  public static final int NAME_LENGTH = 200;
  public static final int MOST_PARTS = 100;
  public static final int MOST_OF_ONE = 9999;

  /** A count, a sign of multiplication, the name: {@code 2 x belt}. */
  private static final Pattern COUNTED = Pattern.compile("(\\d{1,4})\\s*[x×*]\\s*(\\S.*)");

  public FittedPart {
    Require.text("part", name, NAME_LENGTH);
    if (quantity != null && (quantity < 1 || quantity > MOST_OF_ONE)) {
      throw new IllegalArgumentException("quantity " + quantity);
    }
  }

  /** Parts as people write them down, one on each line; empty lines say nothing. */
  public static List<FittedPart> read(String lines) {
    return lines
        .lines()
        .map(String::strip)
        .filter(l -> !l.isEmpty())
        .map(FittedPart::line)
        .toList();
  }

  /** The same parts as lines to be edited again. */
  public static String written(List<FittedPart> parts) {
    return parts.stream().map(FittedPart::toString).collect(Collectors.joining("\n"));
  }

  private static FittedPart line(String line) {
    Matcher counted = COUNTED.matcher(line);
    return counted.matches() && Integer.parseInt(counted.group(1)) > 0
        ? new FittedPart(counted.group(2), Integer.valueOf(counted.group(1)))
        : new FittedPart(line, null);
  }

  /** As people write it: {@code 2 × belt}. */
  @Override
  public String toString() {
    return quantity == null ? name : quantity + " × " + name;
  }
}
