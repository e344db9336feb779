package turnsheet.shop;

import java.security.SecureRandom;
import java.util.Locale;
import java.util.Optional;

/**
 * The short name of a unit on its label: seven random characters and one that checks them.
 *
 * <p>The alphabet has 29 characters: digits and capitals without 0, 1, I, L and O, which look
 * alike, and without Y and Z, which scanners send for each other under a foreign keyboard layout.
 * The sum of the characters' places in it, weighted 1 to 8, is a multiple of 29. As 29 is prime and
 * the weights differ, one wrong character and two that changed places never check.
 *
 * @param letters eight capital letters and digits
 */
public record UnitCode(String letters) {

  public static final int LENGTH = 8;

  private static final String ALPHABET = "23456789ABCDEFGHJKMNPQRSTUVWX";
  private static final SecureRandom RANDOM = new SecureRandom();

  /**
   * @throws IllegalArgumentException where it does not check
   */
  public UnitCode {
    if (!checks(letters)) {
      throw new IllegalArgumentException("unit code " + letters);
    }
  }

  /** A random one of 17 thousand million. */
  public static UnitCode next() {
    StringBuilder letters = new StringBuilder(LENGTH);
    for (int i = 0; i < LENGTH - 1; i++) {
      letters.append(ALPHABET.charAt(RANDOM.nextInt(ALPHABET.length())));
    }
    return new UnitCode(letters.append(checkCharacter(letters)).toString());
  }

  /**
   * The code in what was typed or scanned: alone, in two groups, or at the end of an address. Marks
   * between the characters are passed over, because a scanner may send others than are printed.
   */
  public static Optional<UnitCode> in(String typed) {
    String letters = typed.toUpperCase(Locale.ROOT).replaceAll("[^A-Z0-9]", "");
    String end = letters.substring(Math.max(0, letters.length() - LENGTH));
    boolean alone = letters.length() == LENGTH;
    // the letter of the address before the code tells it from words that happen to check
    boolean addressed = letters.endsWith("U" + end) && typed.strip().indexOf(' ') < 0;
    return (alone || addressed) && checks(end) ? Optional.of(new UnitCode(end)) : Optional.empty();
  }

  /** In two groups of four, as people read it: {@code K7F4-2MXC}. */
  public String grouped() {
    return letters.substring(0, LENGTH / 2) + "-" + letters.substring(LENGTH / 2);
  }

  @Override
  public String toString() {
    return letters;
  }

  private static boolean checks(String letters) {
    return letters.length() == LENGTH
        && letters.chars().allMatch(c -> ALPHABET.indexOf(c) >= 0)
        && sum(letters) % ALPHABET.length() == 0;
  }

  private static int sum(CharSequence letters) {
    int sum = 0;
    for (int i = 0; i < letters.length(); i++) {
      sum += (i + 1) * ALPHABET.indexOf(letters.charAt(i));
    }
    return sum;
  }

  /** Exactly one character completes the sum, because 8 has an inverse modulo 29. */
  private static char checkCharacter(CharSequence seven) {
    int sum = sum(seven);
    for (int i = 0; i < ALPHABET.length(); i++) {
      if ((sum + LENGTH * i) % ALPHABET.length() == 0) {
        return ALPHABET.charAt(i);
      }
    }
    throw new IllegalStateException("no check character for " + seven);
  }
}
