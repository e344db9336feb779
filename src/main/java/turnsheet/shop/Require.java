package turnsheet.shop;

import org.jspecify.annotations.Nullable;

/** Bounds that every record of this package keeps; forms tell people about them before. */
final class Require {

  private Require() {}

  static void text(String what, String value, int atMost) {
    if (value.isBlank()) {
      throw new IllegalArgumentException(what + " is empty");
    }
    atMost(what, value, atMost);
  }

  static void atMost(String what, String value, int atMost) {
    if (value.length() > atMost) {
      throw new IllegalArgumentException(what + " has " + value.length() + " characters");
    }
  }

  static void positive(String what, @Nullable Double value) {
    if (value != null && !(value > 0 && Double.isFinite(value))) {
      throw new IllegalArgumentException(what + " " + value);
    }
  }

  static void notNegative(String what, @Nullable Double value) {
    if (value != null && !(value >= 0 && Double.isFinite(value))) {
      throw new IllegalArgumentException(what + " " + value);
    }
  }
}
