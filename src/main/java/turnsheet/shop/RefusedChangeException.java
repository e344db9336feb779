package turnsheet.shop;

import java.util.List;

/**
 * A change that a rule of the shop forbids. The sentence for people stands in the messages under
 * {@code shop.refused.<code>} and takes the arguments in their order.
 */
public final class RefusedChangeException extends RuntimeException {

  private final String code;
  private final transient List<Object> arguments;

  /**
   * @param code stable word in lower camel case, for programs
   * @param arguments names and numbers that the sentence mentions
   */
  public RefusedChangeException(String code, Object... arguments) {
    super(code + " " + List.of(arguments));
    this.code = code;
    this.arguments = List.of(arguments);
  }

  public String code() {
    return code;
  }

  public List<Object> arguments() {
    return arguments;
  }
}
